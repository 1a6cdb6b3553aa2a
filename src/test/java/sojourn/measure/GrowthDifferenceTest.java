package sojourn.measure;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.time.LocalDate;
import java.util.Arrays;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import sojourn.GivenPrices;
import sojourn.GivenProbabilities;
import sojourn.allocate.Because;
import sojourn.allocate.Decision;
import sojourn.allocate.HoldFromStart;
import sojourn.allocate.Policy;
import sojourn.allocate.Weights;
import sojourn.market.PriceTable;
import sojourn.market.TimeAxis;
import sojourn.numeric.RandomStream;
import sojourn.trade.Costs;
import sojourn.trade.LedgerKind;
import sojourn.trade.NextClose;
import sojourn.trade.Simulation;
import sojourn.trade.Terms;
import sojourn.trade.Track;

/** The parts of a difference to buy-and-hold add up to it, and are what they must be where that is known. */
class GrowthDifferenceTest {
    private static final double EXACT = 1e-12;
    private static final Costs COSTS = new Costs(5, 8);
    private static final int BASE = 1;

    private static Track run(PriceTable table, Policy policy, Costs costs) {
        return Simulation.run(
                        table,
                        GivenProbabilities.random(1, table.size()),
                        policy,
                        new Terms(new NextClose(0), costs, 1e6),
                        0)
                .orElseThrow();
    }

    private static Policy always(double... weights) {
        Weights target = Weights.of(weights);
        return (situation, stance) ->
                Decision.order(target, stance, Because.of("a test says so"), Decision.Change.SAME);
    }

    private static Policy random(long seed) {
        return (situation, stance) -> {
            RandomStream random = RandomStream.of(seed, "weights", Integer.toString(situation.bar()));
            return Decision.order(
                    Weights.of(1.4 * random.nextDouble() - 0.4, 1.2 * random.nextDouble() - 0.3),
                    stance,
                    Because.of("a test says so"),
                    Decision.Change.SAME);
        };
    }

    private static double sum(Attribution parts) {
        return parts.exposure().number().orElseThrow()
                + parts.timing().number().orElseThrow()
                + parts.cash().number().orElseThrow()
                + parts.allCosts().number().orElseThrow();
    }

    @ParameterizedTest
    @ValueSource(longs = {1, 2, 3, 4, 5, 6, 7, 8})
    void thePartsAddUpToTheDifference(long seed) {
        PriceTable table = GivenPrices.random(seed, 700, 2).table();
        int last = table.size() - 1 - (int) seed;
        int base = BASE + 3 * (int) seed;
        Track own = run(table, random(seed), COSTS);
        Track held = run(table, new HoldFromStart(Weights.of(0.6, 0.4)), COSTS);
        Attribution total = GrowthDifference.overTheWindow(own, held, table.fillPrices(), base, last);
        double difference = own.wealth(last) / own.wealth(base) - held.wealth(last) / held.wealth(base);
        assertThat(total.difference().number().orElseThrow()).isCloseTo(difference, within(EXACT));
        assertThat(sum(total)).isCloseTo(difference, within(EXACT));
        assertThat(total.costs()).containsOnlyKeys(LedgerKind.COMMISSION, LedgerKind.HALF_SPREAD);
        assertThat(total.allCosts().number().orElseThrow()).isNegative();
        double commission = cost(total, LedgerKind.COMMISSION);
        assertThat(cost(total, LedgerKind.HALF_SPREAD)).isCloseTo(commission * 8 / 5, within(EXACT));
        Attribution yearly = GrowthDifference.perYear(own, held, table.fillPrices(), base, last);
        TimeAxis axis = table.fillPrices().axis();
        double perYear = growth(own, axis.date(base), axis.date(last), base, last)
                - growth(held, axis.date(base), axis.date(last), base, last);
        assertThat(yearly.difference().number().orElseThrow()).isCloseTo(perYear, within(EXACT));
        assertThat(sum(yearly)).isCloseTo(perYear, within(EXACT));
    }

    @Test
    void everyKindOfCostIsAPartOfItsOwn() {
        PriceTable table = GivenPrices.random(31, 500, 2).table();
        Costs all = COSTS.withFees(0, 25).withStampDuty(10).withFinancing(2, 1.5);
        Track own = run(table, random(31), all);
        Track held = run(table, new HoldFromStart(Weights.of(0.6, 0.4)), all);
        Attribution parts = GrowthDifference.overTheWindow(own, held, table.fillPrices(), BASE, 499);
        assertThat(parts.costs())
                .containsOnlyKeys(
                        LedgerKind.MARGIN_INTEREST,
                        LedgerKind.BORROW_FEE,
                        LedgerKind.COMMISSION,
                        LedgerKind.FIXED_FEE,
                        LedgerKind.HALF_SPREAD,
                        LedgerKind.STAMP_DUTY);
        assertThat(parts.costs().values())
                .allSatisfy(paid -> assertThat(paid.number().orElseThrow()).isNegative());
        assertThat(sum(parts)).isCloseTo(parts.difference().number().orElseThrow(), within(EXACT));
        assertThat(parts.difference().number().orElseThrow())
                .isCloseTo(own.wealth(499) / own.wealth(BASE) - held.wealth(499) / held.wealth(BASE), within(EXACT));
    }

    /** Splits change nothing for a holder, so files that are adjusted for them and files that are not tell the same parts. */
    @ParameterizedTest
    @ValueSource(longs = {41, 42, 43})
    void splitsChangeNoPart(long seed) {
        GivenPrices adjusted = GivenPrices.random(seed, 500, 1);
        double[] ratios = new double[500];
        Arrays.fill(ratios, 1);
        ratios[200] = 2;
        ratios[350] = 0.1;
        double[] closes = new double[500];
        double units = 1;
        for (int bar = 0; bar < 500; bar++) {
            units *= ratios[bar];
            closes[bar] = adjusted.close(0, bar) / units;
        }
        Attribution one = inOut(adjusted, seed, COSTS);
        Attribution other = inOut(
                adjusted.withCloses(closes).giving(new double[][] {new double[500]}, new double[][] {ratios}),
                seed,
                COSTS);
        assertAlike(other, one);
        assertThat(other.costs()).containsOnlyKeys(LedgerKind.COMMISSION, LedgerKind.HALF_SPREAD);
    }

    /**
     * Who reinvests a dividend at its close earns the total return. Full weight or none, renewed at every close without cost, is that
     * to the last bit but rounding: the parts must be those of the total-return series, with nothing under costs.
     */
    @ParameterizedTest
    @ValueSource(longs = {51, 52, 53})
    void dividendsAreGainsAndNoCosts(long seed) {
        GivenPrices quoted = GivenPrices.random(seed, 500, 1).withCash(new double[500]);
        double[] money = new double[500];
        double[] none = new double[500];
        double[] total = new double[500];
        Arrays.fill(none, 1);
        total[0] = quoted.close(0, 0);
        for (int bar = 1; bar < 500; bar++) {
            money[bar] = bar % 63 == 5 ? 0.03 * quoted.close(0, bar) : 0;
            total[bar] = total[bar - 1] * (quoted.close(0, bar) + money[bar]) / quoted.close(0, bar - 1);
        }
        Attribution one = inOut(quoted.withCloses(total), seed, Costs.none());
        Attribution other = inOut(quoted.giving(new double[][] {money}, new double[][] {none}), seed, Costs.none());
        assertThat(other.costs()).isEmpty();
        assertAlike(other, one);
        assertThat(other.timing().number().orElseThrow()).isNotCloseTo(0, within(1e-4));
    }

    /** In or out at random, renewed at every close. */
    private static Attribution inOut(GivenPrices prices, long seed, Costs costs) {
        PriceTable table = prices.table();
        Policy inOrOut = (situation, stance) -> Decision.order(
                Weights.of(RandomStream.of(seed, "in", Integer.toString(situation.bar() / 20))
                        .nextInt(2)),
                stance,
                Because.of("a test says so"),
                Decision.Change.SAME);
        Policy all = always(1);
        int last = table.size() - 1;
        return GrowthDifference.overTheWindow(
                run(table, inOrOut, costs), run(table, all, costs), table.fillPrices(), BASE, last);
    }

    private static void assertAlike(Attribution other, Attribution one) {
        double rounding = 1e-9; // sums of 500 bars, each wealth rounded on another way
        assertThat(sum(other)).isCloseTo(other.difference().number().orElseThrow(), within(EXACT));
        assertThat(number(other.difference())).isCloseTo(number(one.difference()), within(rounding));
        assertThat(number(other.exposure())).isCloseTo(number(one.exposure()), within(rounding));
        assertThat(number(other.timing())).isCloseTo(number(one.timing()), within(rounding));
        assertThat(number(other.cash())).isCloseTo(number(one.cash()), within(rounding));
        assertThat(number(other.allCosts())).isCloseTo(number(one.allCosts()), within(rounding));
    }

    private static double number(Measured part) {
        return part.number().orElseThrow();
    }

    private static double cost(Attribution parts, LedgerKind kind) {
        return Optional.ofNullable(parts.costs().get(kind))
                .orElseThrow()
                .number()
                .orElseThrow();
    }

    private static double growth(Track track, LocalDate from, LocalDate to, int base, int last) {
        return Growth.perYear(track.wealth(base), track.wealth(last), from, to)
                .number()
                .orElseThrow();
    }

    /** Renewed at every close without cost, the weight at the start of each bar is the same to rounding. */
    @Test
    void aConstantExposureHasNoTimingAndNoCost() {
        PriceTable table = GivenPrices.random(21, 600, 1).table();
        Track own = run(table, always(0.4), Costs.none());
        Track held = run(table, new HoldFromStart(Weights.of(1)), Costs.none());
        Attribution parts = GrowthDifference.overTheWindow(own, held, table.fillPrices(), BASE, 599);
        assertThat(parts.timing().number().orElseThrow()).isCloseTo(0, within(EXACT));
        assertThat(parts.costs()).isEmpty();
        assertThat(parts.cash().number().orElseThrow()).isPositive();
        assertThat(sum(parts)).isCloseTo(parts.difference().number().orElseThrow(), within(EXACT));
    }

    @Test
    void fullWeightFreeOfCostDiffersInNothing() {
        PriceTable table = GivenPrices.random(22, 600, 1).table();
        Track own = run(table, always(1), Costs.none());
        Track held = run(table, new HoldFromStart(Weights.of(1)), Costs.none());
        Attribution parts = GrowthDifference.overTheWindow(own, held, table.fillPrices(), BASE, 599);
        for (Measured part :
                new Measured[] {parts.difference(), parts.exposure(), parts.timing(), parts.cash(), parts.allCosts()}) {
            assertThat(part.number().orElseThrow()).isCloseTo(0, within(EXACT));
        }
    }

    /** What is all in cash against what is all in the market: the market's return missed, and interest had. */
    @Test
    void allCashHasNoTiming() {
        PriceTable table = GivenPrices.random(23, 600, 1).table();
        Track own = run(table, always(0), COSTS);
        Track held = run(table, new HoldFromStart(Weights.of(1)), COSTS);
        Attribution parts = GrowthDifference.overTheWindow(own, held, table.fillPrices(), BASE, 599);
        assertThat(parts.timing().number().orElseThrow()).isCloseTo(0, within(EXACT));
        assertThat(parts.costs()).isEmpty();
        assertThat(sum(parts)).isCloseTo(parts.difference().number().orElseThrow(), within(EXACT));
        double cash = parts.cash().number().orElseThrow();
        assertThat(cash).isPositive();
        assertThat(parts.exposure().number().orElseThrow())
                .isCloseTo(parts.difference().number().orElseThrow() - cash, within(EXACT));
    }

    /** One bar of +10 % held in full and one of -10 % missed: mean weight 1/2, so timing earns 5 % on each bar (by hand). */
    @Test
    void inOnTheGoodBarAndOutOnTheBadOneIsTiming() {
        double[] closes = {100, 100, 110, 99};
        PriceTable table = GivenPrices.closes(closes).table();
        Policy switching = (situation, stance) -> Decision.order(
                Weights.of(situation.bar() == 0 ? 1 : 0), stance, Because.of("a test says so"), Decision.Change.SAME);
        Track own = run(table, switching, Costs.none());
        Track held = run(table, new HoldFromStart(Weights.of(1)), Costs.none());
        Attribution parts = GrowthDifference.overTheWindow(own, held, table.fillPrices(), BASE, 3);
        // r = (0.1, 0), r' = (0.1, -0.1), M = (0.05, -0.05), links 1 / 1.1 and ln(1 / 0.9) / 0.1
        double first = 1 / 1.1;
        double second = Math.log(1 / 0.9) / 0.1;
        double scale = 0.11 / (Math.log(1.1) - Math.log(0.99));
        assertThat(parts.difference().number().orElseThrow()).isCloseTo(0.11, within(EXACT));
        assertThat(parts.timing().number().orElseThrow()).isCloseTo(scale * 0.05 * (first + second), within(EXACT));
        assertThat(parts.exposure().number().orElseThrow()).isCloseTo(scale * 0.05 * (second - first), within(EXACT));
    }

    @Test
    void underAYearNothingIsAYearlyPartAndAfterRuinNothingHasParts() {
        PriceTable table = GivenPrices.random(24, 100, 1).table();
        Track own = run(table, always(0.5), COSTS);
        Track held = run(table, new HoldFromStart(Weights.of(1)), COSTS);
        assertUndefined(
                GrowthDifference.perYear(own, held, table.fillPrices(), BASE, 99), Measured.Reason.UNDER_ONE_YEAR);
        PriceTable rise = GivenPrices.closes(new double[] {100, 100, 300, 300}).table();
        Track ruined = run(rise, always(-1), Costs.none());
        assertUndefined(
                GrowthDifference.overTheWindow(ruined, run(rise, always(1), Costs.none()), rise.fillPrices(), BASE, 3),
                Measured.Reason.RUIN);
    }

    private static void assertUndefined(Attribution parts, Measured.Reason reason) {
        assertThat(parts.costs()).isEmpty();
        for (Measured part : new Measured[] {parts.difference(), parts.exposure(), parts.allCosts()}) {
            assertThat(part)
                    .isInstanceOfSatisfying(
                            Measured.Undefined.class,
                            why -> assertThat(why.reason()).isEqualTo(reason));
        }
    }
}
