package sojourn.market;

import static org.assertj.core.api.Assertions.assertThat;
import static sojourn.market.Fixture.faults;
import static sojourn.market.Fixture.market;

import java.nio.file.Path;
import java.time.LocalDate;
import java.time.format.DateTimeFormatter;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.stream.Collectors;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class PriceFileTest {
    private static final String GOOD = "date,close\n2020-01-02,10\n2020-01-03,11\n";

    @TempDir
    Path folder = Path.of("");

    @Test
    void readsEveryColumnByItsDefaultName() {
        Known known = market(folder, """
                date,open,high,low,close,volume
                2020-01-02,10,12,9,11,1000
                2020-01-03,11,13,10.5,12.25,2000
                """).table().knownAt(1);
        assertThat(known.close(0, 1)).isEqualTo(12.25);
        assertThat(known.open(0, 0)).hasValue(10);
        assertThat(known.high(0, 1)).hasValue(13);
        assertThat(known.low(0, 1)).hasValue(10.5);
        assertThat(known.volume(0, 1)).hasValue(2000);
    }

    @Test
    void aColumnThatTheFileLacksIsEmpty() {
        Known known = market(folder, GOOD).table().knownAt(1);
        assertThat(known.open(0, 1)).isEmpty();
        assertThat(known.volume(0, 1)).isEmpty();
    }

    @Test
    void readsByteOrderMarkCarriageReturnsQuotesAndEmptyLines() {
        String text =
                "\ufeff\"date\",\"close\",note\r\n\r\n2020-01-02,\"10\",\"a, \"\"b\"\"\"\r\n\r\n2020-01-03 , 11,\r\n";
        assertThat(market(folder, text).table().knownAt(1).closes(0, 0)).containsExactly(10, 11);
    }

    @ParameterizedTest
    @CsvSource({"';'", "','", "'\t'"})
    void takesTheSeparatorFromTheHeader(String separator) {
        String text = GOOD.replace(",", separator);
        assertThat(market(folder, text).table().knownAt(1).closes(0, 0)).containsExactly(10, 11);
    }

    @Test
    void aStatedSeparatorWins() {
        PriceSource source = source(new CsvLayout("prices.csv", "date", DatePattern.ISO, Optional.of(Separator.TAB)));
        assertThat(faults(() -> market(folder, GOOD, source, Calendar.DAILY)))
                .containsExactly(
                        "prices.csv:1:1: there is no column 'date' (prices of 'stocks'); the header has 'date,close'; give it a header line of"
                                + " several cells, or say what separates them: separator: …",
                        "prices.csv:1:1: there is no column 'close' (prices of 'stocks'); the header has 'date,close'; give it a header line of"
                                + " several cells, or say what separates them: separator: …");
    }

    @Test
    void blankLinesAreSkipped() {
        String text = " \n\ndate,close\n  \n2020-01-02,10\n\n2020-01-03,11\n \n";
        assertThat(market(folder, text).table().knownAt(1).closes(0, 0)).containsExactly(10, 11);
    }

    @Test
    void readsStatedColumnsAndDates() {
        PriceSource source = new PriceSource(
                new CsvLayout("prices.csv", "Tag", DatePattern.of("dd.MM.yyyy"), Optional.empty()),
                "Schluss",
                Optional.of("Anfang"),
                Optional.empty(),
                Optional.empty(),
                Optional.empty());
        Known known = market(folder, "Tag;Anfang;Schluss\n31.01.2020;9;10\n03.02.2020;10;11\n", source, Calendar.DAILY)
                .table()
                .knownAt(1);
        assertThat(known.date()).isEqualTo(LocalDate.of(2020, 2, 3));
        assertThat(known.open(0, 1)).hasValue(10);
    }

    @Test
    void anEmptyCloseIsNoRowAndIsReported() {
        Market market = market(folder, "date,close\n2020-01-02,10\n2020-01-03,\n2020-01-06,11\n2020-01-07,\n");
        assertThat(market.table().size()).isEqualTo(2);
        assertThat(market.findings().stream().map(Finding::toString))
                .containsExactly(
                        "prices.csv:3: 2 rows have no close, the first 2020-01-03, the last 2020-01-07; nothing to"
                                + " do if there was none on those days");
    }

    @Test
    void everyFaultIsToldAtItsPlace() {
        assertThat(faults(folder, """
                date,open,high,low,close,volume
                2020-01-02,10,12,9,-11,1000
                2020-01-03,0,13,14,12.25,-1
                2020-01-04,10,9,10,10,1
                2020-13-05,11,13,10.5,"1,234.5",2000
                ,11,13,10.5,NaN,2000
                2020-01-08,11,13,10.5,1e999,2000
                2020-01-09,11,13,10.5,12
                """))
                .containsExactly(
                        "prices.csv:2:20: close -11 is not above 0; mend it, or leave the cell empty if there is none"
                                + "; a rate or a spread may be at or below 0 where only 'change' of it is observed and 'order-by' names another series",
                        "prices.csv:3:12: open 0 is not above 0; mend it, or leave the cell empty if there is none",
                        "prices.csv:3:26: volume -1 is below 0; mend it, or leave the cell empty if there is none",
                        "prices.csv:4:15: high 9 lies below low 10; mend one of the two",
                        "prices.csv:5:1: date '2020-13-05' is not written as yyyy-MM-dd; write dates as 2001-10-23, or say"
                                + " how they are written: date-format: …",
                        "prices.csv:6:1: the row has no date; give every row a date",
                        "prices.csv:7:23: close 1e999 is too large; mend the number",
                        "prices.csv:8:1: the row has 5 cells, the header 6; give every row as many cells as the header;"
                                + " quote a cell that holds the separator");
    }

    @ParameterizedTest
    @CsvSource(
            delimiter = '|',
            value = {
                "1,234.5|write 1234.5 without thousands separators",
                "1'234'567|write 1234567 without thousands separators",
                "1.234,56|write 1234.56: a decimal point, no thousands separators",
                "12,5|write 12.5 with a decimal point",
                "1,234|write 1234 without a thousands separator, or 1.234 if the comma is decimal",
                "NaN|write a number such as 12.5, or leave the cell empty if there is none",
                "Infinity|write a number such as 12.5, or leave the cell empty if there is none",
                "n/a|write a number such as 12.5, or leave the cell empty if there is none",
                "0x1p3|write a number such as 12.5, or leave the cell empty if there is none",
                "12d|write a number such as 12.5, or leave the cell empty if there is none",
                "+1|write a number such as 12.5, or leave the cell empty if there is none",
                ".5|write a number such as 12.5, or leave the cell empty if there is none",
                "١٢|write a number such as 12.5, or leave the cell empty if there is none"
            })
    void numbersAreDecimalsOfJson(String written, String remedy) {
        assertThat(faults(folder, "date;close\n2020-01-02;10\n2020-01-03;" + written + "\n"))
                .containsExactly("prices.csv:3:12: close '" + written + "' is not a number; " + remedy);
    }

    @Test
    void zeroIsNoPrice() {
        assertThat(faults(folder, GOOD + "2020-01-06,0.00\n"))
                .containsExactly(
                        "prices.csv:4:12: close 0.00 is not above 0; mend it, or leave the cell empty if there is none"
                                + "; a rate or a spread may be at or below 0 where only 'change' of it is observed and 'order-by' names another series");
    }

    @Test
    void datesMustRise() {
        assertThat(faults(folder, GOOD + "2020-01-03,12\n2020-01-01,12\n2020-01-07,oops\n"))
                .containsExactly(
                        "prices.csv:4:1: date 2020-01-03 stands twice; keep one row for each date",
                        "prices.csv:5:1: date 2020-01-01 comes after 2020-01-03; sort the rows by date, oldest first",
                        "prices.csv:6:12: close 'oops' is not a number; write a number such as 12.5, or leave the cell"
                                + " empty if there is none");
    }

    @Test
    void aFileThatRunsBackwardsHasOneFault() {
        assertThat(faults(folder, "date,close\n2020-01-07,1\n2020-01-06,1\n2020-01-03,1\n2020-01-02,1\n"))
                .containsExactly(
                        "prices.csv:1:1: dates run from the newest to the oldest; sort the rows, oldest first");
    }

    @Test
    void theNearestColumnIsNamed() {
        assertThat(faults(folder, "Date,Adj Close,Close\n2020-01-02,10,10\n"))
                .containsExactly(
                        "prices.csv:1:1: there is no column 'date' (prices of 'stocks'); the header has 'Date', 'Adj Close', 'Close'; say which"
                                + " column holds it: date: Date",
                        "prices.csv:1:1: there is no column 'close' (prices of 'stocks'); the header has 'Date', 'Adj Close', 'Close'; say which"
                                + " column holds it: close: Close");
    }

    @Test
    void aStatedColumnMustBeThere() {
        PriceSource source = new PriceSource(
                CsvLayout.of("prices.csv"),
                "close",
                Optional.empty(),
                Optional.empty(),
                Optional.empty(),
                Optional.of("volum"));
        assertThat(faults(() -> market(folder, "date,close,volume\n2020-01-02,10,1\n", source, Calendar.DAILY)))
                .containsExactly("prices.csv:1:1: prices of 'stocks' name the column 'volum', the header has 'date',"
                        + " 'close', 'volume'; did you mean 'volume'?");
        assertThat(faults(() -> market(
                        folder,
                        "date,close,log_return\n2020-01-02,10,1\n",
                        PriceSource.of("prices.csv").withClose("Adj Close"),
                        Calendar.DAILY)))
                .containsExactly(
                        "prices.csv:1:1: prices of 'stocks' name the column 'Adj Close', the header has 'date',"
                                + " 'close', 'log_return'; did you mean 'close'?");
    }

    @Test
    void namesOfTheHeaderMustDiffer() {
        assertThat(faults(folder, "date,close,,close,\n2020-01-02,10,,11,\n"))
                .containsExactly(
                        "prices.csv:1:13: the header names column 'close' twice; give each column a name of its own");
    }

    @ParameterizedTest
    @ValueSource(strings = {"", "\n\n  \n", "\ufeff"})
    void anEmptyFileIsRefused(String text) {
        assertThat(faults(folder, text))
                .containsExactly(
                        "prices.csv: the file is empty (prices of 'stocks'); give a header line and a row for each date");
    }

    @Test
    void aHeaderAloneIsRefused() {
        assertThat(faults(folder, "date,close\n"))
                .containsExactly("prices.csv:1:1: no row follows the header; give a row for each date");
    }

    @Test
    void aFileWithoutAnyCloseIsRefused() {
        assertThat(faults(folder, "date,close\n2020-01-02,\n"))
                .containsExactly("prices.csv:1:1: no row has a close; give a row for each date");
    }

    @Test
    void oneRowIsTooFew() {
        assertThat(faults(folder, "date,close\n2020-01-02,3\n"))
                .containsExactly("prices.csv: stocks has one row only, of 2020-01-02; give at least two rows");
    }

    @Test
    void moreThanTwentyFaultsAreCounted() {
        List<String> faults =
                faults(folder, "date,close" + ",close".repeat(25) + "\n2020-01-02,1" + ",1".repeat(25) + "\n");
        assertThat(faults).hasSize(21);
        assertThat(faults.get(19)).startsWith("prices.csv:1:126: the header names column 'close' twice");
        assertThat(faults.get(20)).isEqualTo("prices.csv:1:126: 5 more faults follow; mend those above first");
    }

    @ParameterizedTest
    @CsvSource(
            delimiter = '|',
            value = {
                "dd/MM/yyyy|01/01/2020|4|dd/MM/yyyy if the day comes first, MM/dd/yyyy if the month does",
                "dd/MM/yyyy|01/01/2020|31|dd/MM/yyyy",
                "MM/dd/yyyy|01/01/2020|31|MM/dd/yyyy",
                "d/M/yyyy|1/1/2020|31|d/M/yyyy",
                "dd.MM.yyyy|01.01.2020|31|dd.MM.yyyy",
                "yyyyMMdd|20200101|31|yyyyMMdd",
                "d-MMM-yyyy|1-Jan-2020|31|d-MMM-yyyy",
                "yyyy-MM-dd' 00:00:00'|2020-01-01 00:00:00|31|yyyy-MM-dd' 00:00:00'"
            })
    void datesOfAnotherFormAreToldOnceWithTheirForm(String form, String first, int rows, String remedy) {
        DateTimeFormatter written = DateTimeFormatter.ofPattern(form, Locale.ENGLISH);
        StringBuilder text = new StringBuilder("date,close\n");
        LocalDate start = LocalDate.of(2020, 1, 1);
        start.datesUntil(start.plusDays(rows))
                .forEach(date -> text.append(date.format(written)).append(",1\n"));
        assertThat(faults(folder, text + "2020-02-01,1\n"))
                .containsExactly("prices.csv:2:1: date '" + first + "' is not written as yyyy-MM-dd, and so in " + rows
                        + " of " + (rows + 1) + " rows; write date-format: " + remedy);
    }

    @Test
    void timesOfDayThatDifferAreToldOnce() {
        assertThat(faults(
                        folder,
                        "date,close\n2020-01-01T09:30,1\n2020-01-02T09:31,1\n2020-01-03T09:30,1\n2020-01-06T09:30,1\n"))
                .containsExactly(
                        "prices.csv:2:1: date '2020-01-01T09:30' is not written as yyyy-MM-dd, and so in 4 of 4"
                                + " rows; cut the time of day off, so that dates read 2001-10-23");
    }

    @ParameterizedTest
    @CsvSource(
            delimiter = '|',
            value = {
                "12,5|convert the column to decimal points",
                "1,234.5|remove the thousands separators from the column",
                "1.234,56|convert the column to decimal points, without thousands separators",
                "1,234|remove the thousands separators from the column, or convert it to decimal points if the comma is decimal",
                "x|write numbers such as 12.5, or leave the cells empty where there is none"
            })
    void oneMistakeOnMostRowsIsToldOnce(String written, String remedy) {
        String rows = IntStream.rangeClosed(1, 31)
                .mapToObj(day -> String.format(Locale.ROOT, "2020-01-%02d;%s\n", day, day > 2 ? written : "7"))
                .collect(Collectors.joining());
        assertThat(faults(folder, "date;close\n" + rows))
                .containsExactly(
                        "prices.csv:4:12: close '" + written + "' is not a number, and so in 29 of 31 rows; " + remedy);
    }

    @Test
    void oneMistakeOnFewRowsIsToldThreeTimesAndItsOtherRowsCounted() {
        String rows = IntStream.rangeClosed(1, 31)
                .mapToObj(day -> String.format(
                        Locale.ROOT, "2020-01-%02d,%s,%s\n", day, day > 26 ? "x" : "7", day == 28 ? "-1" : "1"))
                .collect(Collectors.joining());
        assertThat(faults(folder, "date,close,volume\n" + rows))
                .containsExactly(
                        "prices.csv:28:12: close 'x' is not a number; write a number such as 12.5, or leave the cell"
                                + " empty if there is none",
                        "prices.csv:29:12: close 'x' is not a number; write a number such as 12.5, or leave the cell"
                                + " empty if there is none",
                        "prices.csv:29:14: volume -1 is below 0; mend it, or leave the cell empty if there is none",
                        "prices.csv:30:12: close 'x' is not a number, and 2 more rows like it; write numbers such as 12.5,"
                                + " or leave the cells empty where there is none");
    }

    @Test
    void aQuoteThatNeverClosesIsRefused() {
        assertThat(faults(folder, GOOD + "2020-01-06,\"12\n2020-01-07,13\n"))
                .containsExactly("prices.csv:3: the rows after this line cannot be read: a quote opens or closes amiss;"
                        + " mend the quotes of the next row");
    }

    @Test
    void aHeaderWhoseQuoteNeverClosesIsRefused() {
        assertThat(faults(folder, "date,\"close\n2020-01-02,10\n"))
                .containsExactly(
                        "prices.csv:1: the header cannot be read: a quote opens or closes amiss; mend its quotes");
    }

    @Test
    void placesCountQuotedLineBreaksAndEmptyLines() {
        assertThat(faults(
                        folder,
                        "date,note,close\r\n\r\n2020-01-02,\"two\r\nlines, one cell\",x\r\n\r\n2020-01-03,,y\r\n"))
                .containsExactly(
                        "prices.csv:4:18: close 'x' is not a number; write a number such as 12.5, or leave the cell empty if"
                                + " there is none",
                        "prices.csv:6:13: close 'y' is not a number; write a number such as 12.5, or leave the cell empty if"
                                + " there is none");
    }

    @Test
    void columnsThatDoNotBelongTogetherAreReported() {
        Market market = market(folder, """
                date,open,high,low,close
                2020-01-02,10,12,9,11
                2020-01-03,11,13,10.5,14
                2020-01-06,9,13,10.5,12
                2020-01-07,10.4999999,13,10.5,13.0000001
                """);
        assertThat(market.findings().stream().map(Finding::toString))
                .containsExactly(
                        "prices.csv:3: on 2 rows the open or close lies outside low to high, first the close of"
                                + " 2020-01-03; look whether all columns are adjusted alike for splits and dividends; name columns that"
                                + " belong together");
    }

    @Test
    void rowsThatAreBarsMayNotShareAPeriod() {
        Calendar weeks = new Calendar(BarLength.WEEKLY, Calendar.Days.COMMON, Calendar.Rows.BARS);
        assertThat(faults(() -> market(folder, GOOD, PriceSource.of("prices.csv"), weeks)))
                .containsExactly(
                        "prices.csv:3:1: date 2020-01-03 lies in the same week as 2020-01-02, though each row is said"
                                + " to be one bar; keep one row for each week, or write rows: days");
    }

    private static PriceSource source(CsvLayout layout) {
        return new PriceSource(layout, "close", Optional.empty(), Optional.empty(), Optional.empty(), Optional.empty());
    }
}
