package sojourn.allocate;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;
import static org.assertj.core.groups.Tuple.tuple;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import sojourn.CheckValues;
import sojourn.GivenPrices;
import sojourn.GivenProbabilities;
import sojourn.allocate.VolatilityTarget.Together;
import sojourn.regime.WindowMoments;

class VolatilityTargetTest {
    private static final List<String> REGIMES = List.of("calm", "stormy");
    private static final double ROUNDING = 1e-14;
    /** Variances whose roots are round: deviations of 1 % and 2 % a bar. */
    private static final WindowMoments ROUND =
            WindowMoments.of(2, 2, new double[2], new double[4], new double[] {1e-4, 0, 0, 4e-4, 1e-4, 0, 0, 4e-4});

    private static final double ROOT_OF_BARS = Math.sqrt(252);

    @Test
    void theWorkedCaseComesOutAtAHorizonOfOneBar() {
        CheckValues check = CheckValues.byId("vol_target");
        double[] mean = CheckValues.doubles(check.input("mean"));
        double[] variance = CheckValues.doubles(check.input("variance"));
        double[][] a = CheckValues.matrix(check.input("A"));
        GivenProbabilities signal = GivenProbabilities.stormy(
                        check.input("filtered").get(1).asDouble())
                .moving(a[0][0], a[0][1], a[1][0], a[1][1])
                .meaning(WindowMoments.of(2, 1, new double[2], mean, variance));
        double cap = check.input("cap").asDouble();
        VolatilityTarget rule = new VolatilityTarget(
                Together.MIX, Map.of("a", 1.0), 100 * check.input("target_ann").asDouble(), cap, Manner.plain());
        Played played = played(rule, new Limits(cap, 0, cap), 1, 1, signal);
        check.assertExpected("weight", played.weight(0)[0]);
        assertThat(played.because(0))
                .isEqualTo(
                        "forecast volatility of the mix 16.36 % a year, so 0.61 of it; aimed at 10 %; first decision");
    }

    /** At two bars ahead the mixture is p A A: the probability of stormy goes from 1 by 0.9 and 0.1 each to 0.82. */
    @Test
    void theForecastIsOfTheFirstWholeBarHeld() {
        WindowMoments moments = WindowMoments.of(2, 1, new double[2], new double[2], new double[] {1e-4, 4e-4});
        GivenProbabilities signal = GivenProbabilities.stormy(1).meaning(moments);
        double weight = played(rule(Together.MIX, Map.of("a", 1.0), 5), Limits.longOnly(), 1, 2, signal)
                .weight(0)[0];
        double variance = 0.18 * 1e-4 + 0.82 * 4e-4;
        assertThat(weight).isCloseTo(0.05 / (ROOT_OF_BARS * Math.sqrt(variance)), within(ROUNDING));
    }

    @Test
    void aMixIsScaledAsOneAndEachAssetByItself() {
        Map<String, Double> mix = ordered("a", 0.6, "b", 0.4);
        Played together = played(rule(Together.MIX, mix, 10), Limits.longOnly(), 2, 2, round());
        double deviation = Math.sqrt(0.36 * 1e-4 + 0.16 * 4e-4); // 1 %: the mix's own
        double scale = 0.10 / (ROOT_OF_BARS * deviation);
        assertThat(together.weight(0)[0]).isCloseTo(0.6 * scale, within(ROUNDING));
        assertThat(together.weight(1)[0]).isCloseTo(0.4 * scale, within(ROUNDING));
        Played each = played(rule(Together.EACH, mix, 10), Limits.longOnly(), 2, 2, round());
        assertThat(each.weight(0)[0]).isCloseTo(0.6 * 0.10 / (ROOT_OF_BARS * 0.01), within(ROUNDING));
        assertThat(each.weight(1)[0]).isCloseTo(0.4 * 0.10 / (ROOT_OF_BARS * 0.02), within(ROUNDING));
        assertThat(each.because(0))
                .isEqualTo("forecast volatility of a 15.87 % a year, so 0.63 of it; of b 31.75 % a year, so 0.31 of it;"
                        + " aimed at 10 %; first decision");
    }

    @Test
    void withOneAssetItIsAllTheSame() {
        Map<String, Double> one = Map.of("a", 1.0);
        assertThat(played(rule(Together.EACH, one, 10), Limits.longOnly(), 2, 2, round())
                        .weight(0))
                .isEqualTo(played(rule(Together.MIX, one, 10), Limits.longOnly(), 2, 2, round())
                        .weight(0));
    }

    @Test
    void theCapHoldsAndIsTakenWhereNothingVaries() {
        VolatilityTarget rule = new VolatilityTarget(Together.MIX, Map.of("a", 1.0), 40, 0.9, Manner.plain());
        Played capped = played(rule, Limits.longOnly(), 2, 2, round());
        assertThat(capped.weight(0)).containsExactly(0.9);
        assertThat(capped.because(0)).contains("0.90 of it, the most allowed");
        Played still = played(rule, Limits.longOnly(), 1, 2, GivenProbabilities.stormy(0.5));
        assertThat(still.weight(0)).containsExactly(0.9);
    }

    @Test
    void aChangeThatIsNotConfirmedLeavesTheLastTarget() {
        WindowMoments moments = WindowMoments.of(2, 1, new double[2], new double[2], new double[] {1e-4, 4e-4});
        GivenProbabilities signal = GivenProbabilities.stormy(0, 1, 1, 1).meaning(moments);
        Manner manner = new Manner(ProbabilityKind.FILTERED, Optional.empty(), 3, 1);
        VolatilityTarget rule = new VolatilityTarget(Together.MIX, Map.of("a", 1.0), 5, 1, manner);
        Played played = played(rule, Limits.longOnly(), 1, 2, signal);
        double[] weight = played.weight(0);
        assertThat(weight[1]).isEqualTo(weight[0]);
        assertThat(weight[2]).isEqualTo(weight[0]);
        assertThat(weight[3]).isLessThan(weight[0]);
        assertThat(played.because(2))
                .isEqualTo("stormy is the most likely regime for 2 of 3 closes, the last target stands");
    }

    @Test
    void unknownAssetsAndACapBeyondTheLimitsAreMisfits() {
        VolatilityTarget rule = new VolatilityTarget(Together.MIX, Map.of("z", 1.0), 10, 1.5, Manner.plain());
        assertThat(rule.misfits(REGIMES, List.of("a")))
                .extracting(Misfit::pointer, Misfit::what)
                .containsExactly(tuple("/volatility-target/of/z", "no asset is called 'z'"));
        assertThat(Limits.longOnly().misfits(rule))
                .extracting(Misfit::pointer)
                .containsExactly("/volatility-target/at-most");
        assertThat(new Limits(1.5, 0, 1.5).misfits(rule)).isEmpty();
    }

    private static GivenProbabilities round() {
        return GivenProbabilities.stormy(0.3).meaning(ROUND);
    }

    private static VolatilityTarget rule(Together together, Map<String, Double> mix, double percent) {
        return new VolatilityTarget(together, mix, percent, 1, Manner.plain());
    }

    private static Map<String, Double> ordered(String a, double x, String b, double y) {
        Map<String, Double> map = new LinkedHashMap<>();
        map.put(a, x);
        map.put(b, y);
        return map;
    }

    private static Played played(
            VolatilityTarget rule, Limits limits, int assets, int barsAhead, GivenProbabilities signal) {
        List<String> names = assets == 1 ? List.of("a") : List.of("a", "b");
        RulePolicy policy = RulePolicy.of(rule, limits, Schedule.AT_EVERY_CLOSE, 1, 0, REGIMES, names);
        int bars = rule.confirm() > 1 ? 4 : 1;
        return Played.of(policy, GivenPrices.flat(bars, assets).table(), signal, barsAhead);
    }
}
