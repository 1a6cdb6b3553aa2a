package sojourn.market;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.nio.file.Path;
import java.time.LocalDate;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import sojourn.market.PriceTable.Bars;
import sojourn.market.PriceTable.Column;

/** Dividends and splits, from the file to the bars. */
class DistributionsTest {
    private static final CashRates NO_INTEREST = CashRates.constant(0, DayCount.ACTUAL_365);
    private static final double ROUNDING = 1e-12;

    @TempDir
    private Path folder;

    private static PriceSource paying() {
        return new PriceSource(
                CsvLayout.of("prices.csv"),
                "close",
                Optional.empty(),
                Optional.empty(),
                Optional.empty(),
                Optional.empty(),
                Optional.of("paid"),
                Optional.of("ratio"));
    }

    @Test
    void namedColumnsAreReadAndEmptyCellsGiveNothing() {
        Market market = Fixture.market(
                folder,
                "date,close,paid,ratio\n2020-01-02,10,,\n2020-01-03,5,0.25,2\n2020-01-06,6,,\n",
                paying(),
                Calendar.DAILY);
        FillPrices prices = market.table().fillPrices();
        assertThat(prices.distributes()).isTrue();
        assertThat(prices.dividend(0, 1)).isEqualTo(0.25);
        assertThat(prices.split(0, 1)).isEqualTo(2);
        assertThat(prices.dividend(0, 2)).isZero();
        assertThat(prices.split(0, 2)).isEqualTo(1);
        assertThat(prices.close(0, 1)).isEqualTo(5);
        assertThat(market.table().knownAt(1).close(0, 1)).isEqualTo(10.5);
        assertThat(market.findings()).isEmpty();
    }

    /** Adjusted prices often stand beside the dividends that they are adjusted for. */
    @Test
    void columnsThatAreNotNamedAreNotRead() {
        Market market = Fixture.market(folder, "date,close,dividend,split\n2020-01-02,10,1,3\n2020-01-03,11,1,3\n");
        assertThat(market.table().fillPrices().distributes()).isFalse();
    }

    @Test
    void faultsAreToldAtTheirPlace() {
        assertThat(Fixture.faults(() -> Fixture.market(
                        folder,
                        "date,close,paid,ratio\n2020-01-02,10,-1,\n2020-01-03,5,,0\n2020-01-06,,0.5,2\n2020-01-07,5,,\n",
                        paying(),
                        Calendar.DAILY)))
                .containsExactly(
                        "prices.csv:2:15: dividend -1 is below 0; mend it, or leave the cell empty if there is none",
                        "prices.csv:3:15: split 0 is not above 0; mend it, or leave the cell empty if there is none",
                        "prices.csv:4:13: dividend 0.5 stands on a day without a close; write it on the next day that has a close",
                        "prices.csv:4:17: split 2 stands on a day without a close; write it on the next day that has a close");
    }

    @Test
    void aJumpLikeASplitIsFoundUnlessItIsRecorded() {
        String rows = "date,close,paid,ratio\n2020-01-02,10,,\n2020-01-03,5.05,,RATIO\n2020-01-06,5,,\n";
        Market silent = Fixture.market(folder, rows.replace("RATIO", ""), paying(), Calendar.DAILY);
        assertThat(silent.findings().stream().map(Finding::toString))
                .contains(
                        "prices.csv:3: 1 move of stocks like a split that is not recorded, the first on 2020-01-03 (-49.5 %),"
                                + " near 2 new units for one old; adjust the prices, or record it in a column: split: … under prices");
        Market recorded = Fixture.market(folder, rows.replace("RATIO", "2"), paying(), Calendar.DAILY);
        assertThat(recorded.findings()).isEmpty();
    }

    /** A holder through rows that are no bars of their own, by hand: 1 unit → 2 paid 2 × 0.3 → 6 paid 6 × 0.1. */
    @Test
    void whatFallsBetweenBarsIsGivenOnTheNextOne() {
        List<LocalDate> days = Fixture.dates("2020-01-02", "2020-01-03", "2020-01-06", "2020-01-07");
        Bars paying = Bars.ofCloses(60, 31, 11, 12).giving(Column.of(0, 0.3, 0.1, 0), Column.of(1, 2, 3, 1));
        Market market = Market.of(
                List.of(
                        PriceSeries.of("a", days, paying),
                        PriceSeries.of(
                                "b", Fixture.dates("2020-01-02", "2020-01-06", "2020-01-07"), Bars.ofCloses(1, 1, 1))),
                Calendar.DAILY,
                NO_INTEREST);
        FillPrices prices = market.table().fillPrices();
        assertThat(prices.split(0, 1)).isEqualTo(6);
        assertThat(prices.split(0, 1) * prices.dividend(0, 1)).isCloseTo(2 * 0.3 + 6 * 0.1, within(ROUNDING));
        assertThat(prices.dividend(0, 2)).isZero();
    }

    /** A week whose split comes on its second day: open and high of the first are in the units after it. */
    @Test
    void aLongerBarIsInTheUnitsOfItsEnd() {
        List<LocalDate> days = Fixture.dates("2020-01-03", "2020-01-06", "2020-01-07", "2020-01-08", "2020-01-13");
        Bars daily = new Bars(
                Column.of(100, 104, 53, 54, 55),
                Optional.of(Column.of(100, 102, 52, 53, 54)),
                Optional.of(Column.of(101, 105, 54, 55, 56)),
                Optional.of(Column.of(99, 101, 51.5, 52, 53)),
                Optional.of(Column.of(10, 10, 20, 20, 20)),
                Optional.of(Column.of(0, 1, 0, 0.25, 0)),
                Optional.of(Column.of(1, 1, 2, 1, 1)));
        Market market = Market.of(
                List.of(PriceSeries.of("a", days, daily)),
                new Calendar(BarLength.WEEKLY, Calendar.Days.COMMON, Calendar.Rows.DAYS),
                NO_INTEREST);
        FillPrices prices = market.table().fillPrices();
        assertThat(market.table().size()).isEqualTo(2);
        assertThat(prices.open(0, 1)).hasValue(51);
        assertThat(prices.close(0, 1)).isEqualTo(54);
        assertThat(prices.split(0, 1)).isEqualTo(2);
        // one unit of the Friday before got 1, then 2 × 0.25
        assertThat(prices.split(0, 1) * prices.dividend(0, 1)).isCloseTo(1.5, within(ROUNDING));
        Known known = market.table().knownAt(1);
        assertThat(known.high(0, 1).orElseThrow() / known.close(0, 1)).isCloseTo(55.0 / 54, within(ROUNDING));
        assertThat(known.low(0, 1).orElseThrow() / known.close(0, 1)).isCloseTo(50.5 / 54, within(ROUNDING));
        assertThat(known.volume(0, 1).orElseThrow() * known.close(0, 1)).isCloseTo(60 * 54, within(1e-9));
    }
}
