package sojourn.trade;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.time.LocalDate;
import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import sojourn.GivenProbabilities;
import sojourn.allocate.HoldFromStart;
import sojourn.allocate.Policy;
import sojourn.allocate.Weights;
import sojourn.market.BarLength;
import sojourn.market.Calendar;
import sojourn.market.CashRates;
import sojourn.market.DayCount;
import sojourn.market.Market;
import sojourn.market.PriceSeries;
import sojourn.market.PriceTable;
import sojourn.market.PriceTable.Bars;
import sojourn.market.PriceTable.Column;

/** Orders on bars on which one leg has no price of its own. Expected values are worked by hand. */
class UnionFillsTest {
    private static final Calendar UNION = new Calendar(BarLength.DAILY, Calendar.Days.UNION, Calendar.Rows.DAYS);
    private static final LocalDate MONDAY = LocalDate.of(2020, 1, 6);
    private static final int BARS = 5;

    /** Five days; b has no row on the days 1 and 2. Opens are twice the closes. */
    private static PriceTable table() {
        PriceSeries a = series("a", new int[] {0, 1, 2, 3, 4}, 10, 11, 12, 13, 14);
        PriceSeries b = series("b", new int[] {0, 3, 4}, 100, 130, 140);
        return Market.of(List.of(a, b), UNION, CashRates.constant(0, DayCount.ACTUAL_360))
                .table();
    }

    private static PriceSeries series(String name, int[] days, double... closes) {
        List<LocalDate> dates = IntStream.of(days).mapToObj(MONDAY::plusDays).toList();
        double[] opens = IntStream.range(0, closes.length)
                .mapToDouble(i -> 2 * closes[i])
                .toArray();
        Bars bars = new Bars(
                Column.of(closes), Optional.of(Column.of(opens)), Optional.empty(), Optional.empty(), Optional.empty());
        return PriceSeries.of(name, dates, bars);
    }

    private static Track run(FillRule rule, Policy policy) {
        Terms terms = new Terms(rule, Costs.none(), 1000);
        return Simulation.run(table(), GivenProbabilities.stormy(new double[BARS]), policy, terms, 0)
                .orElseThrow();
    }

    @Test
    void anOrderWaitsForTheNextOwnCloseOfItsLeg() {
        Track track = run(new NextClose(0), new HoldFromStart(Weights.of(0.5, 0.5)));
        assertThat(track.hindrances())
                .containsExactly(
                        new Hindrance(1, 0, 1, Hindrance.Kind.NO_PRICE),
                        new Hindrance(2, 0, 1, Hindrance.Kind.NO_PRICE));
        assertThat(track.fills()).extracting(Fill::filledOn).containsExactly(3, 3);
        assertThat(track.fills()).extracting(Fill::price).containsExactly(13.0, 130.0);
        assertThat(track.wealth(4)).isCloseTo(500 * 14 / 13.0 + 500 * 140 / 130.0, within(1e-9));
    }

    @Test
    void atTheOpenItWaitsForTheNextOwnOpen() {
        Track track = run(new NextOpen(0), new HoldFromStart(Weights.of(0.5, 0.5)));
        assertThat(track.hindrances()).extracting(Hindrance::bar).containsExactly(1, 2);
        assertThat(track.fills()).extracting(Fill::filledOn).containsExactly(3, 3);
        assertThat(track.fills()).extracting(Fill::price).containsExactly(26.0, 260.0);
    }

    @Test
    void aWaitingOrderGivesWayToTheNextOneDue() {
        Track track = run(new NextClose(0), Policies.always(0.5, 0.5));
        assertThat(track.fills().get(0).decidedOn()).isEqualTo(2);
        assertThat(track.fills().get(0).filledOn()).isEqualTo(3);
        assertThat(track.hindrances()).extracting(Hindrance::decidedOn).containsExactly(0, 1);
    }

    @Test
    void anOrderWithoutThatLegFills() {
        Track track = run(new NextClose(0), new HoldFromStart(Weights.of(1, 0)));
        assertThat(track.hindrances()).isEmpty();
        assertThat(track.fills()).extracting(Fill::filledOn).containsExactly(1);
    }

    @Test
    void anEstimateGoesByTheCloseThatIsCarried() {
        Terms terms = new Terms(new NextClose(0), Costs.none(), 1000);
        Basket basket = Basket.at(table(), 2, Quantities.of(0, 0), 1000, Weights.of(0.5, 0.5), terms)
                .orElseThrow();
        assertThat(basket.legs()).extracting(Fill::price).containsExactly(12.0, 100.0);
    }

    @Test
    void volatilityForCostsIsOfOwnClosesOnly() {
        // returns of b between its own closes, 130 / 100 - 1 and 140 / 130 - 1: |difference| / sqrt 2
        double expected = (0.3 - (140 / 130.0 - 1)) / Math.sqrt(2);
        assertThat(Trailing.volatility(table().knownAt(4), 1, 2).orElseThrow()).isCloseTo(expected, within(1e-12));
        assertThat(Trailing.volatility(table().knownAt(3), 1, 2)).isEmpty();
    }
}
