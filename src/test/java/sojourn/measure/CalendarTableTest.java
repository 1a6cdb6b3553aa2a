package sojourn.measure;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;
import static sojourn.measure.CalendarTable.Coverage.PARTIAL;
import static sojourn.measure.CalendarTable.Coverage.WHOLE;

import com.fasterxml.jackson.databind.JsonNode;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import sojourn.CheckValues;

class CalendarTableTest {
    @Test
    void compoundedMonthsAndYearsAgreeWithTheWorkedCase() {
        CheckValues worked = CheckValues.byId("calendar_table");
        List<LocalDate> dates = new ArrayList<>(PerformanceCase.dates(worked.input("dates")));
        dates.add(0, dates.get(0).minusWeeks(1)); // the case gives no base date; its bars are weeks
        CalendarTable table = CalendarTable.of(dates, CheckValues.doubles(worked.input("returns")), 52);
        agrees(worked, worked.expected("monthly"), table.months());
        agrees(worked, worked.expected("yearly"), table.years());
        assertThat(table.months().stream().map(CalendarTable.Period::coverage))
                .containsExactly(PARTIAL, WHOLE, WHOLE, WHOLE, WHOLE, PARTIAL);
        assertThat(table.years().stream().map(CalendarTable.Period::coverage)).containsExactly(PARTIAL, PARTIAL);
        assertThat(table.months().stream().mapToInt(CalendarTable.Period::bars)).containsExactly(2, 4, 5, 4, 4, 1);
    }

    @ParameterizedTest
    @CsvSource({
        "2023-12-29, 2024-01-31, 252, WHOLE", // from the last weekday before to the last weekday of January
        "2024-01-01, 2024-01-31, 252, PARTIAL", // the return into the first of January is missing
        "2023-12-29, 2024-01-30, 252, PARTIAL", // a weekday is missing
        "2024-04-30, 2024-05-31, 252, WHOLE", // the last weekday is a Friday
        "2024-02-29, 2024-03-28, 252, PARTIAL", // Good Friday: looks cut, so it counts as cut
        "2024-02-29, 2024-03-31, 365, WHOLE", // bars on all days
        "2024-02-29, 2024-03-29, 365, PARTIAL",
        "2023-12-27, 2024-01-31, 52, WHOLE", // weeks ending on Wednesday
        "2023-12-01, 2024-01-01, 12, WHOLE" // months dated by their first day
    })
    void aMonthIsWholeWhenNoBarOfItCanBeMissing(
            LocalDate base, LocalDate end, double periodsPerYear, CalendarTable.Coverage coverage) {
        List<LocalDate> dates = List.of(base, end);
        CalendarTable table = CalendarTable.of(dates, new double[] {0.01}, periodsPerYear);
        assertThat(table.months()).singleElement().satisfies(month -> {
            assertThat(month.coverage()).isEqualTo(coverage);
            assertThat(month.name()).isEqualTo(end.toString().substring(0, 7));
            assertThat(month.bars()).isEqualTo(1);
        });
    }

    @Test
    void aReturnBelongsToTheMonthItEndsIn() {
        List<LocalDate> dates = List.of(day("2023-12-20"), day("2023-12-29"), day("2024-01-02"), day("2024-02-01"));
        CalendarTable table = CalendarTable.of(dates, new double[] {0.5, 0.25, -0.5}, 252);
        assertThat(table.months().stream().map(CalendarTable.Period::name))
                .containsExactly("2023-12", "2024-01", "2024-02");
        assertThat(table.months().stream().mapToDouble(CalendarTable.Period::compounded))
                .containsExactly(0.5, 0.25, -0.5);
        assertThat(table.years().stream().mapToDouble(CalendarTable.Period::compounded))
                .containsExactly(0.5, 1.25 * 0.5 - 1);
    }

    @Test
    void compoundedYearsMakeUpTheTotal() {
        EvaluatedPath path = PerformanceCase.byId("measures_monthly").path();
        double[] years = CalendarTable.of(path).years().stream()
                .mapToDouble(CalendarTable.Period::compounded)
                .toArray();
        double[] wealth = path.wealth();
        double total = Growth.total(wealth[0], wealth[path.bars()]).number().orElseThrow();
        assertThat(Growth.compounded(years)).isCloseTo(total, within(1e-13));
    }

    @Test
    void noReturnsMakeAnEmptyTable() {
        CalendarTable table = CalendarTable.of(List.of(day("2024-01-02")), new double[0], 252);
        assertThat(table.months()).isEmpty();
        assertThat(table.years()).isEmpty();
    }

    @Test
    void datesThatDoNotFitAreRefused() {
        assertThatThrownBy(() -> CalendarTable.of(List.of(day("2024-01-02")), new double[1], 252))
                .hasMessageContaining("1 dates for 1 returns");
    }

    private static void agrees(CheckValues worked, JsonNode expected, List<CalendarTable.Period> periods) {
        assertThat(periods).hasSize(expected.size());
        for (CalendarTable.Period period : periods) {
            assertThat(expected.has(period.name())).as(period.name()).isTrue();
            worked.assertClose(period.name(), period.compounded(), expected.get(period.name()));
        }
    }

    private static LocalDate day(String text) {
        return LocalDate.parse(text);
    }
}
