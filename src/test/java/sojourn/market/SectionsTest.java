package sojourn.market;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import sojourn.document.Document;
import sojourn.document.Problem;
import sojourn.document.Problems;
import sojourn.document.Shape;

/** The sections prices, calendar and cash as a user writes them. */
class SectionsTest {
    private final Problems problems = new Problems();

    @Test
    void pricesInTheOrderWritten() {
        Map<String, PriceSource> prices = read(PriceSource.SECTION, """
                stocks: {csv: a.csv}
                bonds:
                  csv: b.csv
                  date: Tag
                  close: Schluss
                  open: Anfang
                  volume: Umsatz
                  date-format: dd.MM.yyyy
                  separator: semicolon
                """).orElseThrow();
        assertThat(prices.keySet()).containsExactly("stocks", "bonds");
        assertThat(prices.get("stocks")).isEqualTo(PriceSource.of("a.csv"));
        assertThat(prices.get("bonds"))
                .isEqualTo(new PriceSource(
                        new CsvLayout("b.csv", "Tag", DatePattern.of("dd.MM.yyyy"), Optional.of(Separator.SEMICOLON)),
                        "Schluss",
                        Optional.of("Anfang"),
                        Optional.empty(),
                        Optional.empty(),
                        Optional.of("Umsatz")));
    }

    @ParameterizedTest
    @ValueSource(strings = {"Stocks", "2x", "a-b", "_a", "größe"})
    void assetNamesArePlain(String name) {
        read(PriceSource.SECTION, name + ": {csv: a.csv}\n");
        assertThat(faults()).hasSize(1).first().asString().startsWith("s.yaml:1:1: ");
    }

    @ParameterizedTest
    @CsvSource({
        "cash, is what the rest of the money is called",
        "in, is a word of the formula language",
        "while, is a word of the formula language"
    })
    void someNamesAreTaken(String name, String why) {
        read(PriceSource.SECTION, name + ": {csv: a.csv}\n");
        assertThat(faults()).containsExactly("s.yaml:1:1: '" + name + "' " + why + "; give another name");
    }

    @ParameterizedTest
    @ValueSource(strings = {"a", "in_", "cash2", "null_bonds", "s_and_p500"})
    void otherNamesAreFree(String name) {
        read(PriceSource.SECTION, name + ": {csv: a.csv}\n");
        assertThat(faults()).isEmpty();
    }

    @Test
    void calendarHasDefaults() {
        assertThat(read(Calendar.SHAPE, "{}")).hasValue(Calendar.DAILY);
        assertThat(read(Calendar.SHAPE, "{bars: weekly, rows: bars}"))
                .hasValue(new Calendar(BarLength.WEEKLY, Calendar.Days.COMMON, Calendar.Rows.BARS));
        assertThat(faults()).isEmpty();
    }

    @Test
    void cashIsOneRateOrAFile() {
        assertThat(read(CashSource.SHAPE, "{percent-per-year: 2}"))
                .hasValue(new CashSource.Constant(2, DayCount.ACTUAL_365));
        assertThat(read(CashSource.SHAPE, "{csv: b.csv, column: rate, day-count: actual/360}"))
                .hasValue(new CashSource.Dated(CsvLayout.of("b.csv"), "rate", DayCount.ACTUAL_360));
        assertThat(faults()).isEmpty();
    }

    @ParameterizedTest
    @ValueSource(
            strings = {
                "{csv: a.csv}",
                "{}",
                "{csv: a.csv, column: rate, percent-per-year: 2}",
                "{percent-per-year: 2, column: rate}",
                "{percent-per-year: 1000}",
                "{percent-per-year: 2, day-count: actual/actual}"
            })
    void cashIsNothingElse(String text) {
        assertThat(read(CashSource.SHAPE, text)).isEmpty();
        assertThat(faults()).isNotEmpty();
    }

    @ParameterizedTest
    @ValueSource(strings = {"dd.MM.yyyy", "uuuuMMdd", "d MMM yyyy", "yyyy-MM-dd' 00:00'", "M/d/yyyy", "yyyy-DDD"})
    void patternsOfWholeDates(String pattern) {
        DatePattern dates = DatePattern.of(pattern);
        assertThat(dates.parse(dates.example()))
                .hasValueSatisfying(date -> assertThat(date).isEqualTo("2001-10-23"));
    }

    @ParameterizedTest
    @ValueSource(strings = {"dd.MM.yy", "MM/yyyy", "YYYY-MM-dd", "yyyy-mm-dd", "yyyy-MM-dd HH:mm", "hello", "'yyyy'"})
    void otherPatternsAreRefused(String pattern) {
        assertThatThrownBy(() -> DatePattern.of(pattern)).isInstanceOf(IllegalArgumentException.class);
    }

    @Test
    void aBadPatternIsRefusedAtItsPlace() {
        read(PriceSource.SHAPE, "{csv: a.csv, date-format: dd.MM.yy}");
        assertThat(faults())
                .containsExactly(
                        "s.yaml:1:27: date-format 'dd.MM.yy' has a year of fewer than four digits, which does not say"
                                + " its century; write yyyy for the year, MM for the month, dd for the day, and fixed text in quotes,"
                                + " as in dd.MM.yyyy or yyyy-MM-dd' 00:00'");
    }

    @ParameterizedTest
    @CsvSource({
        "yyyy-MM-dd, 2021-02-29",
        "yyyy-MM-dd, 2021-2-9",
        "yyyy-MM-dd, +12021-02-09",
        "yyyy-MM-dd, 0021-02-09",
        "dd.MM.yyyy, 31.04.2021",
        "dd.MM.yyyy, 1.4.2021",
        "d MMM yyyy, 1 Foo 2021",
        "yyyyMMdd, 2021-02-09"
    })
    void datesAreReadStrictly(String pattern, String text) {
        assertThat(DatePattern.of(pattern).parse(text)).isEmpty();
    }

    @Test
    void monthsMayBeNamedInEnglish() {
        DatePattern pattern = DatePattern.of("d-MMM-yyyy");
        assertThat(pattern.parse("3-FEB-2021"))
                .isEqualTo(pattern.parse("3-Feb-2021"))
                .isPresent();
    }

    private <T> Optional<T> read(Shape<T> shape, String yaml) {
        return Document.parse("s.yaml", yaml, problems).flatMap(document -> shape.read(document.root(), problems));
    }

    private List<String> faults() {
        return problems.list().stream().map(Problem::toString).toList();
    }
}
