package sojourn.market;

import static org.assertj.core.api.Assertions.assertThat;
import static sojourn.market.Fixture.dates;

import java.nio.file.Path;
import java.time.LocalDate;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import sojourn.CheckValues;

class CashRatesTest {
    private static final TimeAxis WEEKEND = TimeAxis.of(BarLength.DAILY, dates("2020-01-03", "2020-01-06"));

    @TempDir
    Path folder = Path.of("");

    /** Worked case, computed by an independent implementation: three days of a weekend. */
    @Test
    void interestOverAWeekend() {
        CheckValues check = CheckValues.byId("interest_act365_weekend");
        double percent = 100 * check.input("rate").asDouble();
        CashReturns cash = CashRates.dated(dates("2020-01-03"), new double[] {percent}, DayCount.ACTUAL_365)
                .on(WEEKEND);
        check.assertExpected("interest", check.input("balance").asDouble() * cash.earned(1));
    }

    /** Worked case, computed by an independent implementation: one day, a year of 360 days, money owed. */
    @Test
    void interestOfAYearOf360Days() {
        CheckValues check = CheckValues.byId("interest_act360");
        double percent = 100 * check.input("rate").asDouble();
        TimeAxis axis = TimeAxis.of(BarLength.DAILY, dates("2020-01-06", "2020-01-07"));
        CashReturns cash = CashRates.constant(percent, DayCount.ACTUAL_360).on(axis);
        check.assertExpected("interest", check.input("balance").asDouble() * cash.earned(1));
    }

    @Test
    void aBarEarnsTheRateKnownAtTheCloseBeforeIt() {
        TimeAxis axis = TimeAxis.of(BarLength.DAILY, dates("2020-01-06", "2020-01-07", "2020-01-08"));
        CashReturns cash = CashRates.dated(
                        dates("2020-01-05", "2020-01-07", "2020-01-08"),
                        new double[] {3.65, 7.3, 36.5},
                        DayCount.ACTUAL_365)
                .on(axis);
        assertThat(cash.earned(0)).isZero();
        assertThat(cash.earned(1)).isEqualTo(0.0365 / 365);
        assertThat(cash.earned(2)).isEqualTo(0.073 / 365);
    }

    @Test
    void theNextBarIsExpectedToEarnTheRateKnownNow() {
        TimeAxis axis = TimeAxis.of(BarLength.MONTHLY, dates("2020-01-31", "2020-02-28"));
        CashReturns cash = CashRates.dated(dates("2020-01-31", "2020-02-28"), new double[] {0, 12}, DayCount.ACTUAL_365)
                .on(axis);
        assertThat(cash.expectedNext(0)).isZero();
        assertThat(cash.expectedNext(1)).isEqualTo(0.12 * (365.25 / 12) / 365);
    }

    @Test
    void aRateMayBeTenDaysOldAndNoOlder() {
        TimeAxis fresh = TimeAxis.of(BarLength.DAILY, dates("2020-01-03", "2020-01-13"));
        TimeAxis stale = TimeAxis.of(BarLength.DAILY, dates("2020-01-03", "2020-01-14", "2020-01-15"));
        CashRates rates = CashRates.inFile(
                "bills.csv", dates("2020-01-03"), new double[] {1}, new int[] {7}, DayCount.ACTUAL_365);
        assertThat(rates.on(fresh).earned(1)).isEqualTo(0.01 * 10 / 365);
        assertThat(Fixture.faults(() -> rates.on(stale)))
                .containsExactly(
                        "bills.csv:7: at the close of bar 2020-01-14 the last rate, of 2020-01-03, is 11 calendar days"
                                + " old, more than 10 (and too old on 1 of the bars after it); add rates after 2020-01-03, at least one in"
                                + " 10 days, or write cash: {percent-per-year: …} instead");
    }

    @Test
    void barsBeforeTheFirstRateAreRefused() {
        CashRates rates = CashRates.inFile(
                "bills.csv", dates("2020-01-06"), new double[] {1}, new int[] {2}, DayCount.ACTUAL_365);
        assertThat(Fixture.faults(() -> rates.on(WEEKEND)))
                .containsExactly(
                        "bills.csv:2: the first rate is of 2020-01-06, after the first bar, 2020-01-03; add rates from"
                                + " 2020-01-03 on, start the price files at 2020-01-06, or write cash: {percent-per-year: …} instead");
    }

    @Test
    void aRateFileNeverDefinesBars() {
        Fixture.write(folder, "prices.csv", "date,close\n2020-01-03,2\n2020-01-06,2.5\n2020-01-08,2.25\n");
        Fixture.write(folder, "bills.csv", "day;rate\n2020-01-02;3.65\n2020-01-05;\n2020-01-07;7.3\n");
        Market market = read();
        Known known = market.table().knownAt(2);
        assertThat(known.date(1)).isEqualTo(LocalDate.of(2020, 1, 6));
        assertThat(known.cashReturn(1)).isEqualTo(0.0365 * 3 / 365);
        assertThat(known.cashReturn(2)).isEqualTo(0.0365 * 2 / 365);
        assertThat(market.files().get(1).role()).isEqualTo("cash");
        assertThat(market.files().get(1).rows()).isEqualTo(2);
        assertThat(market.findings().stream().map(Finding::toString))
                .containsExactly(
                        "bills.csv:3: 1 row has no rate, that of 2020-01-05; nothing to do if there was none on those"
                                + " days");
    }

    @Test
    void ratesThatLookLikeFractionsAreReported() {
        Fixture.write(folder, "prices.csv", "date,close\n2020-01-03,2\n2020-01-06,2.5\n");
        Fixture.write(folder, "bills.csv", "day,rate\n2020-01-02,0.05\n2020-01-05,-0.01\n");
        assertThat(read().findings().stream().map(Finding::toString))
                .containsExactly(
                        "bills.csv: no rate is above 0.05 percent a year; look whether the rates are fractions; they"
                                + " are read as percent a year");
    }

    @Test
    void aConstantRateThatLooksLikeAFractionIsReported() {
        Fixture.write(folder, "prices.csv", "date,close\n2020-01-03,2\n2020-01-06,2.5\n");
        assertThat(findings(0.03))
                .containsExactly("cash earns 0.03 % a year; did you mean 3? percent-per-year is in percent");
        assertThat(findings(0)).isEmpty();
        assertThat(findings(0.2)).isEmpty();
        assertThat(findings(-0.03)).isEmpty();
    }

    @Test
    void aRateFileWithoutItsColumnIsNamedAsThat() {
        Fixture.write(folder, "prices.csv", "date,close\n2020-01-03,2\n2020-01-06,2.5\n");
        Fixture.write(folder, "bills.csv", "day,Rates\n2020-01-02,2\n");
        assertThat(Fixture.faults(this::read))
                .containsExactly("bills.csv:1:1: rates of cash name the column 'rate', the header has 'day', 'Rates';"
                        + " did you mean 'Rates'?");
    }

    @Test
    void faultsOfARateFileAreToldAtTheirPlace() {
        Fixture.write(folder, "prices.csv", "date,close\n2020-01-03,2\n2020-01-06,2.5\n");
        Fixture.write(folder, "bills.csv", "day,rate\n2020-01-02,2.5%\n2020-01-05,1e3\n2020-01-04,1\n");
        assertThat(Fixture.faults(this::read))
                .containsExactly(
                        "bills.csv:2:12: rate '2.5%' is not a number; write a number such as 12.5, or leave the cell empty if"
                                + " there is none",
                        "bills.csv:3:12: rate 1e3 lies beyond 100 percent a year; write rates in percent a year, e.g. 2.5",
                        "bills.csv:4:1: date 2020-01-04 comes after 2020-01-05; sort the rows by date, oldest first");
    }

    @Test
    void theDigestDependsOnDatesAndRatesOnly() {
        CashRates inMemory = CashRates.dated(dates("2020-01-02"), new double[] {2}, DayCount.ACTUAL_365);
        CashRates inFile =
                CashRates.inFile("a.csv", dates("2020-01-02"), new double[] {2}, new int[] {5}, DayCount.ACTUAL_360);
        CashRates other = CashRates.dated(dates("2020-01-02"), new double[] {2.5}, DayCount.ACTUAL_365);
        assertThat(inMemory.digest()).isEqualTo(inFile.digest()).isNotEqualTo(other.digest());
    }

    private List<String> findings(double percentPerYear) {
        CashSource cash = new CashSource.Constant(percentPerYear, DayCount.ACTUAL_365);
        Map<String, PriceSource> prices = Map.of("stocks", PriceSource.of("prices.csv"));
        return PriceReader.read(folder, prices, Calendar.DAILY, cash, List.of("stocks")).findings().stream()
                .map(Finding::toString)
                .toList();
    }

    private Market read() {
        CsvLayout layout = new CsvLayout("bills.csv", "day", DatePattern.ISO, Optional.empty());
        return PriceReader.read(
                folder,
                Map.of("stocks", PriceSource.of("prices.csv")),
                Calendar.DAILY,
                new CashSource.Dated(layout, "rate", DayCount.ACTUAL_365),
                List.of("stocks"));
    }
}
