package sojourn.trade;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
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
        Rebalance rebalance = new Rebalance(Tariff.ofRates(rates));
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
    void aLeastCommissionAgreesWithTheWorkedCase() {
        CheckValues check = CheckValues.byId("fixed_point_min_ticket");
        Costs costs = new Costs(10_000 * check.input("commission").asDouble(), 0)
                .withFees(check.input("min_ticket").asDouble(), 0);
        double[] spreads = CheckValues.doubles(check.input("half_spread"));
        assertAgrees(check, new Tariff(costs, spreads, new double[2], unlimited(2)));
    }

    @Test
    void squareRootImpactAgreesWithTheWorkedCase() {
        CheckValues check = CheckValues.byId("fixed_point_impact");
        double[] factors = CheckValues.doubles(check.input("impact_coefficient"));
        double[] rates = CheckValues.doubles(check.input("cost_rate"));
        assertAgrees(check, new Tariff(Costs.none(), rates, factors, unlimited(1)));
        // the case's note: Y 0.7, sigma 0.012, average traded value 5e7
        assertThat(Impact.factor(0.7, 0.012, 5e7)).isCloseTo(factors[0], within(1e-12 * factors[0]));
    }

    @Test
    void impactAsAFractionOfTheOrderAgreesWithTheWorkedCase() {
        CheckValues check = CheckValues.byId("sqrt_impact");
        double price = 37.5;
        double order = price * check.input("shares").asDouble();
        double factor = Impact.factor(
                check.input("Y").asDouble(),
                check.input("daily_sigma").asDouble(),
                price * check.input("adv").asDouble());
        Tariff tariff = new Tariff(Costs.none(), new double[1], new double[] {factor}, unlimited(1));
        check.assertExpected("impact_fraction", tariff.charges(0, order).impact() / order);
        check.assertExpected("impact_fraction", tariff.charges(0, -order).impact() / order);
    }

    private static void assertAgrees(CheckValues check, Tariff tariff) {
        double[] held = CheckValues.doubles(check.input("holdings_value"));
        Rebalance rebalance = new Rebalance(tariff);
        Rebalance.Result result = rebalance.solve(
                check.input("wealth_before").asDouble(),
                held,
                Weights.of(CheckValues.doubles(check.input("target_weights"))));
        double[] trades = new double[held.length];
        double[] costs = new double[held.length];
        for (int i = 0; i < held.length; i++) {
            trades[i] = rebalance.valueAfter(i) - held[i];
            costs[i] = tariff.charges(i, trades[i]).total();
        }
        assertThat(result).isEqualTo(Rebalance.Result.SOLVED);
        check.assertExpected("wealth_after", rebalance.wealthAfter());
        check.assertExpected("trade_values", trades);
        check.assertExpected("costs", costs);
    }

    private static double[] unlimited(int assets) {
        double[] most = new double[assets];
        Arrays.fill(most, Double.POSITIVE_INFINITY);
        return most;
    }

    /** Every kind of cost at once, costs from next to nothing to more than there is: the answer is the largest root there is. */
    @Test
    void everyKindOfCostTogetherIsExactlyWhatWealthLosesOrRuin() {
        long seed = 20260103;
        RandomStream random = RandomStream.of(seed, "tariff");
        int ruined = 0;
        for (int trial = 0; trial < 2_000; trial++) {
            double scale = StrictMath.pow(10, -3 + 4 * random.nextDouble());
            Costs costs = new Costs(20 * scale, 0)
                    .withFees(200 * scale * random.nextDouble(), 100 * scale * random.nextDouble())
                    .withStampDuty(50 * scale);
            double[] spreads = {0.1 * scale * random.nextDouble(), 0.1 * scale * random.nextDouble()};
            double[] factors = {1e-5 * scale * random.nextDouble(), 1e-5 * scale * random.nextDouble()};
            Tariff tariff = new Tariff(costs, spreads, factors, unlimited(2));
            double[] held = {normal(random), normal(random)};
            double[] target = {2 * random.nextNormal(), 2 * random.nextNormal()};
            String where = "seed " + seed + ", trial " + trial;
            Rebalance rebalance = new Rebalance(tariff);
            if (rebalance.solve(1e5, held, Weights.of(target)) == Rebalance.Result.RUIN) {
                ruined++;
                assertThat(mostLeft(tariff, held, target)).as(where).isLessThanOrEqualTo(0);
                continue;
            }
            double after = rebalance.wealthAfter();
            double paid = 0;
            for (int i = 0; i < 2; i++) {
                paid += tariff.charges(i, target[i] * after - held[i]).total();
            }
            assertThat(after).as(where).isPositive().isCloseTo(1e5 - paid, within(1e-10 * 1e5));
        }
        assertThat(ruined).as("the trials reach both outcomes").isBetween(20, 1_000);
    }

    /** A scan for the point where most would be left over beyond wealth after the order. */
    private static double mostLeft(Tariff tariff, double[] held, double[] target) {
        double most = Double.NEGATIVE_INFINITY;
        for (int step = 0; step <= 5_000; step++) {
            double after = 1e5 * step / 5_000;
            double left = 1e5 - after;
            for (int i = 0; i < held.length; i++) {
                left -= tariff.charges(i, target[i] * after - held[i]).total();
            }
            most = Math.max(most, left);
        }
        return most;
    }

    @Test
    void noLegTradesMoreThanItMay() {
        Tariff tariff =
                new Tariff(new Costs(10, 0), new double[] {0.0005, 0.0005}, new double[2], new double[] {20_000, 1e9});
        Rebalance rebalance = new Rebalance(tariff);
        assertThat(rebalance.solve(1e5, new double[] {0, 50_000}, Weights.of(0.8, 0.1)))
                .isEqualTo(Rebalance.Result.SOLVED);
        assertThat(rebalance.capped(0)).isTrue();
        assertThat(rebalance.valueAfter(0)).isEqualTo(20_000);
        assertThat(rebalance.capped(1)).isFalse();
        // V = 1e5 - 0.0015 * (20 000 + (50 000 - 0.1 V)), solved by hand
        double after = (1e5 - 0.0015 * 70_000) / (1 - 0.00015);
        assertThat(rebalance.wealthAfter()).isCloseTo(after, within(1e-7));
        assertThat(rebalance.valueAfter(1)).isCloseTo(0.1 * after, within(1e-7));
    }

    @Test
    void costsAreExactlyWhatWealthLoses() {
        long seed = 20260101;
        RandomStream random = RandomStream.of(seed, "rebalance");
        for (int trial = 0; trial < 5_000; trial++) {
            double[] rates = {0.02 * random.nextDouble(), 0.02 * random.nextDouble(), 0.02 * random.nextDouble()};
            double[] held = {normal(random), normal(random), normal(random)};
            double[] target = {random.nextNormal(), random.nextNormal(), random.nextNormal()};
            assertSolves(
                    new Rebalance(Tariff.ofRates(rates)),
                    rates,
                    1e5,
                    held,
                    target,
                    "seed " + seed + ", trial " + trial);
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
            Rebalance rebalance = new Rebalance(Tariff.ofRates(rates));
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
        Rebalance rebalance = new Rebalance(Tariff.ofRates(0.02));
        assertThat(rebalance.solve(1_000, new double[] {100_000}, Weights.none(1)))
                .isEqualTo(Rebalance.Result.RUIN);
    }

    @Test
    void tinyTradesDoNotHappen() {
        Rebalance rebalance = new Rebalance(Tariff.ofRates(0.001, 0.001));
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
        Rebalance rebalance = new Rebalance(Tariff.ofRates(0, 0));
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
