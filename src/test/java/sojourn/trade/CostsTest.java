package sojourn.trade;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.time.LocalDate;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import sojourn.CheckValues;
import sojourn.GivenPrices;
import sojourn.GivenProbabilities;
import sojourn.allocate.Weights;

/** Each kind of cost, by itself, against what can be worked out by hand. */
class CostsTest {
    private static final double CAPITAL = 1_000_000;
    /** Units are settled at the first part; by the last they may be worth less, as random walks of 1 % a bar are after some ten bars. */
    private static final double MOSTLY = 0.85;

    private static final double ROUNDING = 1e-12 * CAPITAL;

    @Test
    void feesOfALegAreMoneyWhateverIsTraded() {
        Track track = run(GivenPrices.flat(6, 2), Map.of(0, Weights.of(0.5, 0.25)), new Costs(1, 0).withFees(40, 7));
        // 1 bp of about 500 000 is 50, of about 250 000 it is 25, below the least commission of 40
        double after = track.wealth(5);
        assertThat(track.fills().get(0).charges().commission()).isCloseTo(0.5e-4 * after, within(ROUNDING));
        assertThat(track.fills().get(1).charges().commission()).isEqualTo(40);
        assertThat(track.fills())
                .allSatisfy(fill -> assertThat(fill.charges().fixedFee()).isEqualTo(7));
        // V = 1e6 - (0.5e-4 V + 7) - (40 + 7)
        assertThat(after).isCloseTo((CAPITAL - 54) / (1 + 0.5e-4), within(ROUNDING));
    }

    @Test
    void stampDutyIsPaidByBuyersAlone() {
        Track track = run(
                GivenPrices.flat(6, 1),
                Map.of(0, Weights.of(1), 2, Weights.of(0)),
                Costs.none().withStampDuty(50));
        assertThat(track.fills().get(0).charges().stampDuty()).isCloseTo(CAPITAL / 1.005 * 0.005, within(ROUNDING));
        assertThat(track.fills().get(1).charges()).isEqualTo(Charges.NONE);
        assertThat(track.wealth(5)).isCloseTo(CAPITAL / 1.005, within(ROUNDING));
    }

    @Test
    void halfSpreadMovesWithTheVolatilityKnownBeforeTheFill() {
        // returns +10 % and -10 % in turn: two of them have mean 0 and variance 2 × 0.01 / 1
        double[] closes = {100, 110, 99, 108.9, 98.01, 98.01};
        Costs costs = new Costs(0, 10).withSpreadOf(new SpreadOfVolatility(0.05, 2));
        Track track = run(GivenPrices.closes(closes), Map.of(2, Weights.of(1)), costs);
        double rate = 0.001 + 0.05 * Math.sqrt(0.02);
        assertThat(track.fills()).hasSize(1);
        assertThat(track.fills().get(0).charges().halfSpread())
                .isCloseTo(CAPITAL * rate / (1 + rate), within(1e-9 * CAPITAL));
    }

    @Test
    void anOrderWaitsUntilThereIsATrailingVolatility() {
        Costs costs = Costs.none().withSpreadOf(new SpreadOfVolatility(0.05, 4));
        Track track = run(GivenPrices.random(3, 9, 1), Map.of(0, Weights.of(1)), costs);
        assertThat(track.fills()).extracting(Fill::filledOn).containsExactly(5);
        assertThat(track.hindrances())
                .extracting(Hindrance::bar, Hindrance::decidedOn, Hindrance::kind)
                .contains(org.assertj.core.groups.Tuple.tuple(1, 0, Hindrance.Kind.NO_VOLATILITY))
                .hasSize(4);
    }

    @Test
    void withoutVolumeAnOrderUnderImpactWaitsAndNothingIsLost() {
        double[] volumes = {0, 0, Double.NaN, 0, 0, 500, 0, 0, 0};
        Costs costs = Costs.none().withImpact(new Impact(1, 2, 2, Optional.empty()));
        Track track = run(
                GivenPrices.random(3, 9, 1).withCash(new double[9]).withVolumes(volumes),
                Map.of(1, Weights.of(0.5)),
                costs);
        assertThat(track.fills()).extracting(Fill::filledOn).containsExactly(6);
        assertThat(track.hindrances())
                .filteredOn(one -> one.kind() == Hindrance.Kind.NO_VOLUME)
                .extracting(Hindrance::bar)
                .containsExactly(3, 4, 5);
        assertThat(track.wealth(5)).isEqualTo(CAPITAL);
    }

    /** The account of a plain program: at most a tenth of 100 000 a bar, so 10 000 five times over. */
    @Test
    void whatMayNotBeTradedOnOneBarIsCarriedToTheNext() {
        double[] volumes = new double[12];
        Arrays.fill(volumes, 1_000);
        Costs costs = Costs.none().withImpact(new Impact(0, 2, 2, Optional.of(10.0)));
        Track track = run(GivenPrices.flat(12, 1).withVolumes(volumes), Map.of(2, Weights.of(0.045)), costs);
        assertThat(track.fills()).extracting(Fill::filledOn).containsExactly(3, 4, 5, 6, 7);
        assertThat(track.fills()).extracting(Fill::units).containsExactly(100.0, 100.0, 100.0, 100.0, 50.0);
        assertThat(track.fills()).extracting(Fill::decidedOn).containsOnly(2);
        assertThat(track.hindrances())
                .extracting(Hindrance::kind)
                .containsOnly(Hindrance.Kind.PARTICIPATION)
                .hasSize(4);
        assertThat(track.unfilled()).isEmpty();
        assertThat(track.units(11, 0)).isEqualTo(450);
    }

    /** A tenth of 100 000 a bar is 100 units, and one lot 150: nothing may be traded until the mean of two bars before is half as much again. */
    @Test
    void aLotThatIsMoreThanOneBarAllowsWaitsForABarThatAllowsIt() {
        double[] volumes = new double[12];
        Arrays.fill(volumes, 0, 4, 1_000);
        Arrays.fill(volumes, 4, 12, 2_000);
        Costs costs = Costs.none().withImpact(new Impact(0, 2, 2, Optional.of(10.0)));
        Track track = Simulation.run(
                        GivenPrices.flat(12, 1).withVolumes(volumes).table(),
                        GivenProbabilities.stormy(new double[12]),
                        Policies.at(Map.of(2, Weights.of(0.02))),
                        new Terms(new NextClose(0), costs, CAPITAL, SizeAt.FILL, new Lots(150, Map.of())),
                        0)
                .orElseThrow();
        assertThat(track.hindrances())
                .containsExactly(
                        new Hindrance(3, 2, 0, Hindrance.Kind.LOT_BEYOND_PARTICIPATION),
                        new Hindrance(4, 2, 0, Hindrance.Kind.LOT_BEYOND_PARTICIPATION));
        assertThat(track.fills()).extracting(Fill::filledOn).containsExactly(5);
        assertThat(track.fills()).extracting(Fill::units).containsExactly(150.0);
    }

    /** Costs of later parts and prices that move meanwhile must not take a long-only order without leverage into debt. */
    @ParameterizedTest
    @ValueSource(longs = {1, 2, 3, 4, 5, 6})
    void anOrderOfSeveralBarsStaysWithinItsWeightsOnEachOfThem(long seed) {
        Costs costs = new Costs(100, 10).withImpact(new Impact(0.5, 4, 4, Optional.of(5.0)));
        GivenPrices prices = GivenPrices.random(seed, 160, 1).withRandomVolumes(seed, 10_000);
        for (Lots lots : List.of(Lots.FRACTIONS, new Lots(10, Map.of()))) {
            Track track = Simulation.run(
                            prices.table(),
                            GivenProbabilities.stormy(new double[160]),
                            Policies.at(Map.of(5, Weights.of(1))),
                            new Terms(new NextClose(0), costs, CAPITAL, SizeAt.FILL, lots),
                            0)
                    .orElseThrow();
            assertThat(track.fills()).hasSizeGreaterThan(10);
            for (int bar = 5; bar < 160; bar++) {
                assertThat(track.cash(bar)).as("%s, bar %d", lots, bar).isGreaterThanOrEqualTo(-ROUNDING);
            }
            assertThat(track.unfilled()).isEmpty();
            assertThat(track.weight(159, 0)).isBetween(MOSTLY, 1 + 1e-12);
        }
    }

    /** What is bought waits for what can only be sold over many bars. */
    @ParameterizedTest
    @ValueSource(longs = {1, 2, 3, 4, 5, 6})
    void aSlowSaleHoldsBackWhatIsBoughtForIt(long seed) {
        Costs costs = new Costs(20, 10).withImpact(new Impact(0.1, 4, 4, Optional.of(5.0)));
        double[][] volumes = new double[2][160];
        Arrays.fill(volumes[0], 20_000);
        Arrays.fill(volumes[1], 20_000_000);
        GivenPrices prices = GivenPrices.random(seed, 160, 2).withVolumes(volumes);
        Track track = run(prices, Map.of(5, Weights.of(1, 0), 80, Weights.of(0, 1)), costs);
        for (int bar = 5; bar < 160; bar++) {
            assertThat(track.cash(bar)).as("bar %d", bar).isGreaterThanOrEqualTo(-ROUNDING);
        }
        assertThat(track.fills()).filteredOn(fill -> fill.asset() == 1).hasSizeGreaterThan(5);
        assertThat(track.hindrances()).extracting(Hindrance::kind).contains(Hindrance.Kind.HELD_BACK);
        assertThat(track.unfilled()).isEmpty();
        assertThat(track.units(159, 0)).isZero();
        assertThat(track.weight(159, 1)).isBetween(MOSTLY, 1 + 1e-12);
    }

    @Test
    void aCarriedRestGivesWayToTheNextOrderDueAndIsListed() {
        double[] volumes = new double[12];
        Arrays.fill(volumes, 1_000);
        Costs costs = Costs.none().withImpact(new Impact(0, 2, 2, Optional.of(10.0)));
        Track track = run(
                GivenPrices.flat(12, 1).withVolumes(volumes), Map.of(2, Weights.of(0.045), 4, Weights.of(0)), costs);
        assertThat(track.fills()).extracting(Fill::units).containsExactly(100.0, 100.0, -100.0, -100.0);
        assertThat(track.unfilled()).extracting(Order::decidedOn).containsExactly(2);
        assertThat(track.units(11, 0)).isZero();
    }

    @Test
    void aWeekendIsThreeDaysOfInterestAndOfBorrowFee() {
        CheckValues check = CheckValues.byId("interest_act365_weekend");
        LocalDate friday = LocalDate.of(2024, 3, 15);
        GivenPrices prices =
                GivenPrices.flat(4, 1).on(friday.minusDays(1), friday, friday.plusDays(3), friday.plusDays(4));
        double percent = 100 * check.input("rate").asDouble();
        Track shorted = run(prices, Map.of(0, Weights.of(-0.01)), Costs.none().withFinancing(percent, 0));
        // 1 % of 1 000 000 held short is the case's balance of 10 000
        assertThat(shorted.borrowFee(1)).isZero();
        assertThat(shorted.borrowFee(2)).isCloseTo(check.expected("interest").asDouble(), within(1e-9));
        assertThat(shorted.borrowFee(3)).isCloseTo(check.expected("interest").asDouble() / 3, within(1e-9));
        Track borrowed = run(prices, Map.of(0, Weights.of(1.01)), Costs.none().withFinancing(0, percent));
        assertThat(borrowed.marginInterest(2))
                .isCloseTo(check.expected("interest").asDouble(), within(1e-9));
        assertThat(borrowed.interest(2)).isZero();
        assertThat(borrowed.ledger())
                .filteredOn(entry -> entry.kind() == LedgerKind.MARGIN_INTEREST)
                .extracting(LedgerEntry::bar)
                .containsExactly(2, 3);
    }

    @Test
    void higherCostsOfEachKindNeverHelpOneThatTradesTheSameOnce() {
        GivenPrices prices = GivenPrices.random(5, 40, 1).withRandomVolumes(5, 1e5);
        Map<Integer, Weights> orders = Map.of(10, Weights.of(0.8));
        Costs none = Costs.none();
        for (List<Costs> two : List.of(
                List.of(none.withFees(10, 0), none.withFees(20, 0)),
                List.of(none.withFees(0, 10), none.withFees(0, 20)),
                List.of(none.withStampDuty(10), none.withStampDuty(20)),
                List.of(
                        none.withSpreadOf(new SpreadOfVolatility(0.1, 5)),
                        none.withSpreadOf(new SpreadOfVolatility(0.2, 5))),
                List.of(
                        none.withImpact(new Impact(0.5, 5, 5, Optional.empty())),
                        none.withImpact(new Impact(1, 5, 5, Optional.empty()))))) {
            double free = run(prices, orders, none).cost(11);
            double less = run(prices, orders, two.get(0)).cost(11);
            double more = run(prices, orders, two.get(1)).cost(11);
            assertThat(free).isZero();
            assertThat(less).as("%s", two).isPositive().isLessThan(more);
        }
    }

    @Test
    void negativeCostsAreRefused() {
        assertThatThrownBy(() -> Costs.none().withFees(-1, 0)).hasMessage("minimumFee is -1.0, must be at least 0.0");
        assertThatThrownBy(() -> Costs.none().withFees(0, -1)).hasMessageContaining("fixedFee");
        assertThatThrownBy(() -> Costs.none().withStampDuty(Double.NaN)).hasMessageContaining("stampDutyBps");
        assertThatThrownBy(() -> Costs.none().withFinancing(-1, 0)).hasMessageContaining("borrowPercentPerYear");
        assertThatThrownBy(() -> Costs.none().withFinancing(0, -1)).hasMessageContaining("marginPercentPerYear");
        assertThatThrownBy(() -> new Impact(-1, 2, 2, Optional.empty())).hasMessageContaining("coefficient");
        assertThatThrownBy(() -> new Impact(1, 0, 2, Optional.empty())).hasMessageContaining("volumeBars");
        assertThatThrownBy(() -> new Impact(1, 2, 1, Optional.empty())).hasMessageContaining("volatilityBars");
        assertThatThrownBy(() -> new Impact(1, 2, 2, Optional.of(0.0))).hasMessageContaining("participationPercent");
        assertThatThrownBy(() -> new SpreadOfVolatility(-0.1, 2)).hasMessageContaining("share");
    }

    private static Track run(GivenPrices prices, Map<Integer, Weights> orders, Costs costs) {
        return Simulation.run(
                        prices.table(),
                        GivenProbabilities.stormy(new double[prices.size()]),
                        Policies.at(orders),
                        new Terms(new NextClose(0), costs, CAPITAL),
                        0)
                .orElseThrow();
    }
}
