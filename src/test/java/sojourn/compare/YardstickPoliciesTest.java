package sojourn.compare;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import sojourn.CheckValues;
import sojourn.GivenPrices;
import sojourn.GivenProbabilities;
import sojourn.allocate.Because;
import sojourn.allocate.Decision;
import sojourn.allocate.HoldFromStart;
import sojourn.allocate.Limits;
import sojourn.allocate.Pacing;
import sojourn.allocate.Policy;
import sojourn.allocate.Schedule;
import sojourn.allocate.Weights;
import sojourn.market.PriceTable;
import sojourn.measure.Measured;
import sojourn.measure.SameVolatility;
import sojourn.regime.EmissionFamily;
import sojourn.regime.ModelKind;
import sojourn.regime.StartRunner;
import sojourn.trade.Costs;
import sojourn.trade.NextClose;
import sojourn.trade.Simulation;
import sojourn.trade.Terms;
import sojourn.trade.Track;
import sojourn.walk.FitRecord;
import sojourn.walk.LogReturn;
import sojourn.walk.RefitSchedule;
import sojourn.walk.RefitSettings;
import sojourn.walk.RegimeSettings;
import sojourn.walk.RegimeTimeline;
import sojourn.walk.Walk;

/** What each yardstick holds, against worked cases, closed forms and plain sums over the closes. */
class YardstickPoliciesTest {
    private static final double CAPITAL = 1_000_000;
    /** Trades below 1e-9 of wealth are left out, which moves a bar's return by less than this. */
    private static final double UNTRADED = 1e-9;

    private static final Terms FREE = new Terms(new NextClose(0), Costs.none(), CAPITAL);

    /** Two still bars, then the market of the worked case; the order of the first close fills at the second. */
    private static GivenPrices workedMarket(CheckValues check) {
        double[] market = CheckValues.doubles(check.input("market"));
        double[] closes = new double[market.length + 2];
        double[] cash = new double[closes.length];
        Arrays.fill(closes, 100);
        for (int i = 0; i < market.length; i++) {
            closes[i + 2] = closes[i + 1] * (1 + market[i]);
            cash[i + 2] = CheckValues.doubles(check.input("cash"))[i];
        }
        return GivenPrices.closes(closes).withCash(cash);
    }

    private static Track run(PriceTable table, Policy policy, Terms terms) {
        return Simulation.run(table, GivenProbabilities.random(1, table.size()), policy, terms, 0)
                .orElseThrow();
    }

    private static double deviation(double[] returns) {
        double mean = Arrays.stream(returns).sum() / returns.length;
        return Math.sqrt(
                Arrays.stream(returns).map(r -> (r - mean) * (r - mean)).sum() / (returns.length - 1));
    }

    @Test
    void theConstantMixAndTheSameVolatilityComeToTheWorkedCase() {
        CheckValues check = CheckValues.byId("benchmarks");
        PriceTable table = workedMarket(check).table();
        int last = table.size() - 1;
        double exposure = check.input("average_exposure").asDouble();
        Track mix = run(table, new ConstantMix(Weights.of(exposure)), FREE);
        check.assertExpected("constant_mix_total", mix.wealth(last) / CAPITAL - 1);
        Track held = run(table, new HoldFromStart(Weights.of(1)), FREE);
        double[] market = held.simpleReturns(2, last);
        // up and down by a, n times: a standard deviation of a sqrt(n / (n - 1))
        double swing = check.input("strategy_sd").asDouble() * Math.sqrt((market.length - 1.0) / market.length);
        double[] swinging = new double[market.length];
        Arrays.setAll(swinging, i -> i % 2 == 0 ? swing : -swing);
        double multiple = SameVolatility.multiple(swinging, market).number().orElseThrow();
        check.assertExpected("leverage_to_match", multiple);
        Track scaled = run(table, new ScaledHolding(multiple, held, FREE.fill(), table.fillPrices()), FREE);
        check.assertExpected("vol_matched_total", scaled.wealth(last) / CAPITAL - 1);
        check.assertExpected("vol_matched_sd", deviation(scaled.simpleReturns(2, last)));
    }

    /** Every bar earns lambda r + (1 - lambda) c, whatever the drift of what is held, however late orders fill, beyond any limit. */
    @ParameterizedTest
    @ValueSource(doubles = {0, 0.4, 1, 2.5})
    void aMultipleOfWhatIsHeldEarnsThatMultipleOfItsReturnAndTheRestInCash(double multiple) {
        PriceTable table = GivenPrices.random(5, 120, 3).table();
        Terms late = new Terms(new NextClose(2), Costs.none(), CAPITAL);
        Track held = run(table, new HoldFromStart(Weights.of(0.5, 0.2, 0.1)), late);
        Track scaled = run(table, new ScaledHolding(multiple, held, late.fill(), table.fillPrices()), late);
        for (int bar = 1; bar < table.size(); bar++) {
            double cash = table.fillPrices().cashReturn(bar);
            double expected = bar <= 3 ? cash : multiple * held.simpleReturn(bar) + (1 - multiple) * cash;
            assertThat(scaled.simpleReturn(bar)).isCloseTo(expected, within(UNTRADED));
        }
    }

    @Test
    void aMarketThatStandsStillHasNoMultipleOfAnyVolatility() {
        Measured none = SameVolatility.multiple(new double[] {0.01, -0.01}, new double[] {0.001, 0.001});
        assertThat(none)
                .isInstanceOfSatisfying(
                        Measured.Undefined.class,
                        why -> assertThat(why.reason()).isEqualTo(Measured.Reason.ZERO_VARIANCE));
        assertThat(SameVolatility.multiple(new double[1], new double[] {0.1}).number())
                .isEmpty();
        assertThat(SameVolatility.multiple(new double[2], new double[] {0.1, 0.2})
                        .number())
                .hasValue(0);
    }

    @Test
    void volatilitiesAreThoseOfTheLastBarsAndOfAllBarsSoFar() {
        GivenPrices prices = GivenPrices.random(6, 60, 2);
        TrailingVolatility volatility = TrailingVolatility.of(prices.table(), Weights.of(0.7, 0.2));
        double[] returns = mixed(prices, 0.7, 0.2);
        for (int bar = 0; bar < prices.size(); bar++) {
            if (bar < 21) {
                assertThat(volatility.recent(bar)).isEmpty();
            } else {
                assertThat(volatility.recent(bar).orElseThrow())
                        .isCloseTo(deviation(Arrays.copyOfRange(returns, bar - 21, bar)), within(1e-15));
            }
            if (bar < 2) {
                assertThat(volatility.soFar(bar)).isEmpty();
            } else {
                assertThat(volatility.soFar(bar).orElseThrow())
                        .isCloseTo(deviation(Arrays.copyOf(returns, bar)), within(1e-15));
            }
        }
    }

    @ParameterizedTest
    @ValueSource(doubles = {0.85, 1, 1.3})
    void theMixIsScaledToItsVolatilitySoFarWithinTheLimits(double gross) {
        GivenPrices prices = GivenPrices.random(7, 300, 2);
        PriceTable table = prices.table();
        Weights mix = Weights.of(0.6, 0.3);
        Limits limits = new Limits(gross, 0, 0.9);
        Pacing pacing = new Pacing(Schedule.AT_EVERY_CLOSE, 1, 1, limits, 0);
        Track track = run(table, new SteadyVolatility(mix, pacing, TrailingVolatility.of(table, mix)), FREE);
        double[] returns = mixed(prices, 0.6, 0.3);
        double most = Math.min(gross / 0.9, 0.9 / 0.6);
        int capped = 0;
        for (int bar = 21; bar < table.size(); bar++) {
            double scale =
                    deviation(Arrays.copyOf(returns, bar)) / deviation(Arrays.copyOfRange(returns, bar - 21, bar));
            capped += scale > most ? 1 : 0;
            assertThat(track.target(bar, 0)).isCloseTo(0.6 * Math.min(most, scale), within(1e-12));
            assertThat(track.target(bar, 1)).isCloseTo(0.3 * Math.min(most, scale), within(1e-12));
        }
        assertThat(track.target(5, 0)).isCloseTo(0.6 * Math.min(most, 1), within(1e-15));
        assertThat(capped).isLessThan(table.size() - 21);
    }

    @Test
    void aMarketThatStandsStillIsHeldToTheCap() {
        PriceTable table = GivenPrices.flat(60, 1).table();
        Pacing pacing = new Pacing(Schedule.AT_EVERY_CLOSE, 1, 1, new Limits(1.5, 0, 1.5), 0);
        Weights mix = Weights.of(0.5);
        Track track = run(table, new SteadyVolatility(mix, pacing, TrailingVolatility.of(table, mix)), FREE);
        assertThat(track.target(59, 0)).isEqualTo(1.5);
    }

    private static double[] alone(GivenPrices prices) {
        double[] returns = new double[prices.size() - 1];
        Arrays.setAll(returns, i -> prices.close(0, i + 1) / prices.close(0, i) - 1);
        return returns;
    }

    private static double[] mixed(GivenPrices prices, double a, double b) {
        double[] returns = new double[prices.size() - 1];
        Arrays.setAll(
                returns,
                i -> a * (prices.close(0, i + 1) / prices.close(0, i) - 1)
                        + b * (prices.close(1, i + 1) / prices.close(1, i) - 1));
        return returns;
    }

    /**
     * The regime that the gate tells at each close, against a plain count over the window of the fit in force: a volatility is
     * stormier than a regime's level where at least that share of the window's volatilities lies below.
     */
    @Test
    void theGateIsInEachRegimeAsOftenInsideAFitsWindowAsTheFitWas() {
        GivenPrices prices = GivenPrices.random(8, 700, 1);
        PriceTable table = prices.table();
        RegimeTimeline timeline = Walk.forward(
                table,
                new RegimeSettings(
                        ModelKind.HIDDEN_MARKOV,
                        List.of(new LogReturn("a")),
                        List.of("calm", "uneasy", "stormy"),
                        EmissionFamily.NORMAL,
                        Optional.empty(),
                        Optional.empty()),
                new RefitSettings(
                        300,
                        new RefitSchedule.EveryObservations(100),
                        OptionalInt.of(250),
                        2,
                        7,
                        RefitSettings.OnFailure.KEEP_PREVIOUS),
                StartRunner.sequential(),
                bar -> {});
        List<Integer> told = new ArrayList<>();
        Policy listener = (situation, stance) -> {
            situation.reading().ifPresent(reading -> told.add(reading.mostLikely()));
            return Decision.order(Weights.of(1), stance, Because.of("listening"), Decision.Change.SAME);
        };
        TrailingVolatility volatility = TrailingVolatility.of(table, Weights.of(1));
        int first = timeline.firstBar().orElseThrow();
        Simulation.run(table, timeline, new VolatilityGate(listener, timeline, table, volatility), FREE, first);
        assertThat(told).hasSize(table.size() - first).contains(0, 1, 2);
        double[] returns = alone(prices);
        for (int bar = first; bar < table.size(); bar++) {
            FitRecord fit =
                    timeline.fits().get(timeline.reading(bar).orElseThrow().fit() - 1);
            int start = prices.dates().indexOf(fit.windowStart());
            double now = deviation(Arrays.copyOfRange(returns, bar - 21, bar));
            int window = 0;
            int below = 0;
            for (int past = Math.max(start, 21); past <= fit.bar(); past++) {
                window++;
                below += deviation(Arrays.copyOfRange(returns, past - 21, past)) < now ? 1 : 0;
            }
            double[] share = fit.fit().occupancy();
            double place = (double) below / window;
            int regime = told.get(bar - first);
            double under = regime == 0 ? 0 : share[0] + (regime == 2 ? share[1] : 0);
            double upTo = share[0] + (regime == 0 ? 0 : share[1]) + (regime == 2 ? share[2] : 0);
            assertThat(place).isBetween(under - 1.5 / window, upTo + 1.5 / window);
        }
    }
}
