package sojourn.trade;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import sojourn.CheckValues;
import sojourn.allocate.Weights;
import sojourn.numeric.RandomStream;

class RebalanceTest {
    /** The iteration stops at a step of 1e-13 of wealth, and cost rates here are far below 1. */
    private static final double SOLVED = 1e-12;

    @ParameterizedTest
    @ValueSource(
            strings = {"fixed_point_buy", "fixed_point_sell", "fixed_point_two_assets", "fixed_point_short_leverage"})
    void agreesWithWorkedCases(String id) {
        CheckValues check = CheckValues.byId(id);
        double[] held = CheckValues.doubles(check.input("holdings_value"));
        double[] rates = CheckValues.doubles(check.input("cost_rate"));
        Rebalance rebalance = new Rebalance(rates);
        Rebalance.Result result = rebalance.solve(
                check.input("wealth_before").asDouble(),
                held,
                Weights.of(CheckValues.doubles(check.input("target_weights"))));
        double[] trades = new double[held.length];
        double[] costs = new double[held.length];
        for (int i = 0; i < held.length; i++) {
            trades[i] = rebalance.valueAfter(i) - held[i];
            costs[i] = rates[i] * Math.abs(trades[i]);
        }
        assertThat(result).isEqualTo(Rebalance.Result.SOLVED);
        check.assertExpected("wealth_after", rebalance.wealthAfter());
        check.assertExpected("trade_values", trades);
        check.assertExpected("costs", costs);
    }

    @Test
    void costsAreExactlyWhatWealthLoses() {
        long seed = 20260101;
        RandomStream random = RandomStream.of(seed, "rebalance");
        for (int trial = 0; trial < 5_000; trial++) {
            double[] rates = {0.02 * random.nextDouble(), 0.02 * random.nextDouble(), 0.02 * random.nextDouble()};
            double[] held = {normal(random), normal(random), normal(random)};
            double[] target = {random.nextNormal(), random.nextNormal(), random.nextNormal()};
            assertSolves(new Rebalance(rates), rates, 1e5, held, target, "seed " + seed + ", trial " + trial);
        }
    }

    @Test
    void costsTooHighForTheIterationAreSolvedAllTheSame() {
        long seed = 20260102;
        RandomStream random = RandomStream.of(seed, "steep");
        int ruined = 0;
        for (int trial = 0; trial < 2_000; trial++) {
            double[] rates = {0.2 * random.nextDouble(), 0.2 * random.nextDouble()};
            double[] held = {4 * normal(random), 4 * normal(random)};
            double[] target = {8 * random.nextNormal(), 8 * random.nextNormal()};
            Rebalance rebalance = new Rebalance(rates);
            String where = "seed " + seed + ", trial " + trial;
            if (rebalance.solve(1e5, held, Weights.of(target)) == Rebalance.Result.RUIN) {
                ruined++;
                assertThat(largestExcess(rates, 1e5, held, target)).as(where).isLessThanOrEqualTo(1e-7);
            } else {
                assertSolves(rebalance, rates, 1e5, held, target, where);
            }
        }
        assertThat(ruined).as("the trials reach both outcomes").isBetween(1, 1_000);
    }

    @Test
    void costsThatEatAllWealthAreRuin() {
        // giving up 100 times wealth at 2 % costs twice the wealth
        Rebalance rebalance = new Rebalance(new double[] {0.02});
        assertThat(rebalance.solve(1_000, new double[] {100_000}, Weights.none(1)))
                .isEqualTo(Rebalance.Result.RUIN);
    }

    @Test
    void tinyTradesDoNotHappen() {
        Rebalance rebalance = new Rebalance(new double[] {0.001, 0.001});
        double[] held = {500_000, 250_000};
        assertThat(rebalance.solve(1e6, held, Weights.of(0.5 + 9e-10, 0.25))).isEqualTo(Rebalance.Result.NOTHING_TO_DO);
        assertThat(rebalance.wealthAfter()).isEqualTo(1e6);
        assertThat(rebalance.solve(1e6, held, Weights.of(0.5 + 9e-10, 0.3))).isEqualTo(Rebalance.Result.SOLVED);
        assertThat(rebalance.traded(0)).isFalse();
        assertThat(rebalance.valueAfter(0)).isEqualTo(500_000);
        assertThat(rebalance.traded(1)).isTrue();
    }

    @Test
    void withoutCostsWealthStaysToTheBit() {
        Rebalance rebalance = new Rebalance(new double[] {0, 0});
        rebalance.solve(123_456.789, new double[] {10, 20}, Weights.of(0.3, 0.6));
        assertThat(rebalance.wealthAfter()).isEqualTo(123_456.789);
    }

    private static void assertSolves(
            Rebalance rebalance, double[] rates, double wealth, double[] held, double[] target, String where) {
        assertThat(rebalance.solve(wealth, held, Weights.of(target))).as(where).isEqualTo(Rebalance.Result.SOLVED);
        double after = rebalance.wealthAfter();
        double costs = 0;
        for (int i = 0; i < rates.length; i++) {
            costs += rates[i] * Math.abs(rebalance.valueAfter(i) - held[i]);
            assertThat(rebalance.valueAfter(i)).as(where).isCloseTo(target[i] * after, within(1e-9 * wealth));
        }
        assertThat(after).as(where).isPositive().isCloseTo(wealth - costs, within(SOLVED * wealth));
    }

    /** Scans wealth after the order for the point where most is left over; the equation has a root only if that is positive. */
    private static double largestExcess(double[] rates, double wealth, double[] held, double[] target) {
        double largest = Double.NEGATIVE_INFINITY;
        for (int step = 1; step <= 20_000; step++) {
            double after = wealth * step / 20_000;
            double excess = wealth - after;
            for (int i = 0; i < rates.length; i++) {
                excess -= rates[i] * Math.abs(target[i] * after - held[i]);
            }
            largest = Math.max(largest, excess);
        }
        return largest;
    }

    private static double normal(RandomStream random) {
        return 1e5 * random.nextNormal();
    }
}
