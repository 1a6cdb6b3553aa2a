package sojourn.allocate;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;
import static org.assertj.core.groups.Tuple.tuple;

import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import sojourn.CheckValues;
import sojourn.GivenPrices;
import sojourn.GivenProbabilities;
import sojourn.allocate.MeanVariance.Aversion;
import sojourn.allocate.MeanVariance.GrowthFraction;
import sojourn.allocate.MeanVariance.Risk;
import sojourn.regime.WindowMoments;

/** Minimum variance and mean–variance as rules. */
class BestMixesTest {
    private static final double ROUNDING = 1e-13;
    /** So wide that nothing binds. */
    private static final Limits WIDE = new Limits(1_000, -1_000, 1_000);

    @ParameterizedTest
    @CsvSource({
        "mean_variance, long_only_budget, false",
        "mean_variance, unconstrained, true",
        "mean_variance_corner, long_only_budget, false",
        "mean_variance_corner, unconstrained, true"
    })
    void theWorkedCasesOfReturnAndRiskComeOut(String id, String expected, boolean wide) {
        CheckValues check = CheckValues.byId(id);
        Risk risk = new Aversion(check.input("risk_aversion").asDouble());
        check.assertExpected(expected, weights(check, meanVariance(check, risk), wide ? WIDE : Limits.longOnly()));
    }

    @ParameterizedTest
    @CsvSource({
        "mean_variance, kelly_full, 1",
        "mean_variance, kelly_half, 0.5",
        "mean_variance_corner, kelly_full, 1",
        "mean_variance_corner, kelly_half, 0.5"
    })
    void fractionsOfGrowthAreInverseAversions(String id, String expected, double fraction) {
        CheckValues check = CheckValues.byId(id);
        check.assertExpected(expected, weights(check, meanVariance(check, new GrowthFraction(fraction)), WIDE));
    }

    @ParameterizedTest
    @CsvSource({
        "mean_variance, minimum_variance, true",
        "mean_variance, long_only_min_variance, false",
        "mean_variance_corner, minimum_variance, true",
        "mean_variance_corner, long_only_min_variance, false"
    })
    void theWorkedCasesOfLeastVarianceComeOut(String id, String expected, boolean wide) {
        CheckValues check = CheckValues.byId(id);
        MinimumVariance rule = new MinimumVariance(names(check), 1, Manner.plain());
        check.assertExpected(expected, weights(check, rule, wide ? WIDE : Limits.longOnly()));
    }

    /** In the corner a weight stands on its bound exactly, not a rounding error beside it. */
    @Test
    void cornersAreExact() {
        CheckValues check = CheckValues.byId("mean_variance_corner");
        double[] weights = weights(check, new MinimumVariance(names(check), 1, Manner.plain()), Limits.longOnly());
        assertThat(weights[0]).isZero();
    }

    @ParameterizedTest
    @ValueSource(doubles = {0.2, 0.5, 1})
    void halfInvestedIsHalfOfEverything(double invested) {
        CheckValues check = CheckValues.byId("mean_variance");
        double[] whole = weights(check, new MinimumVariance(names(check), 1, Manner.plain()), WIDE);
        double[] part = weights(check, new MinimumVariance(names(check), invested, Manner.plain()), WIDE);
        for (int i = 0; i < part.length; i++) {
            assertThat(part[i]).isCloseTo(invested * whole[i], within(ROUNDING));
        }
    }

    /** One asset: w = (mean - cash) / (aversion variance), held to its limits; the moments mixed over the horizon by hand. */
    @Test
    void oneAssetIsAQuotient() {
        WindowMoments moments =
                WindowMoments.of(2, 1, new double[] {0.5, 0.5}, new double[] {8e-4, -2e-4}, new double[] {1e-4, 4e-4});
        GivenProbabilities signal = GivenProbabilities.stormy(1).meaning(moments);
        MeanVariance rule = new MeanVariance(List.of("a"), new Aversion(2), 0, Manner.plain());
        // two bars ahead the probability of stormy, from 1, is 0.82 by stay probabilities of 0.9
        double mean = 0.18 * 8e-4 - 0.82 * 2e-4;
        double variance = 0.18 * (1e-4 + square(8e-4 - mean)) + 0.82 * (4e-4 + square(-2e-4 - mean));
        Limits shorts = new Limits(1, -1, 1);
        Played played = played(rule, shorts, GivenPrices.flat(1, 1).withCash(1e-5), signal, 2);
        assertThat(played.target(0)[0]).isCloseTo((mean - 1e-5) / (2 * variance), within(ROUNDING));
        assertThat(played(rule, Limits.longOnly(), GivenPrices.flat(1, 1).withCash(1e-5), signal, 2)
                        .target(0)[0])
                .as("long only, a negative excess is nothing")
                .isZero();
    }

    private static double square(double x) {
        return x * x;
    }

    /** All the way, every regime expects the window's mean; half way, half. Shares 0.75 and 0.25 make 5.5e-4. */
    @ParameterizedTest
    @ValueSource(doubles = {0, 0.25, 1})
    void meansAreShrunkToTheWindowsMean(double part) {
        WindowMoments moments = WindowMoments.of(
                2, 1, new double[] {0.75, 0.25}, new double[] {8e-4, -2e-4}, new double[] {1e-4, 1e-4});
        GivenProbabilities signal =
                GivenProbabilities.stormy(0).moving(1, 0, 0, 1).meaning(moments);
        MeanVariance rule = new MeanVariance(List.of("a"), new Aversion(20), part, Manner.plain());
        double mean = 8e-4 + part * (5.5e-4 - 8e-4);
        Played played = played(rule, Limits.longOnly(), GivenPrices.flat(1, 1), signal, 2);
        assertThat(played.target(0)[0]).isCloseTo(mean / (20 * 1e-4), within(ROUNDING));
    }

    @Test
    void reasonsNameWhatWasWeighed() {
        CheckValues check = CheckValues.byId("mean_variance");
        Played best = played(check, meanVariance(check, new Aversion(4)), Limits.longOnly());
        assertThat(best.because(0))
                .isEqualTo("forecast over cash, a year: a 10.08 %, b 2.52 %, c 5.04 %; against their risk that asks for"
                        + " a 0.68, b 0.20, c 0.11; first decision");
        Played least = played(check, new MinimumVariance(names(check), 1, Manner.plain()), Limits.longOnly());
        assertThat(least.because(0))
                .isEqualTo("the least forecast variance with 1 invested: a 0.07, b 0.74, c 0.19; first decision");
    }

    /** Nothing moves, so no covariance has an inverse: no order, the last weights stay, and the reason is told. */
    @Test
    void withoutWeightsNothingIsOrdered() {
        for (Rule rule : List.of(
                new MinimumVariance(List.of("a", "b"), 1, Manner.plain()),
                new MeanVariance(List.of("a", "b"), new Aversion(1), 0, Manner.plain()))) {
            GivenProbabilities still = GivenProbabilities.stormy(0.5, 0.5);
            Played played = played(rule, Limits.longOnly(), GivenPrices.flat(2, 2), still, 2);
            assertThat(played.decisions())
                    .extracting(Decision::kind)
                    .containsExactly(Decision.Kind.UNDEFINED, Decision.Kind.UNDEFINED);
            assertThat(played.decisions()).extracting(Decision::target).containsOnly(Optional.empty());
            assertThat(played.because(1)).contains("covariance of a, b has no inverse");
            assertThat(played.decisions().get(1).next().undecided()).isTrue();
        }
    }

    @Test
    void namesAndSumsThatCannotBeAreMisfits() {
        MinimumVariance rule = new MinimumVariance(List.of("a", "z"), 1, Manner.plain());
        assertThat(rule.misfits(List.of("calm"), List.of("a", "b")))
                .extracting(Misfit::pointer, Misfit::what)
                .containsExactly(tuple("/minimum-variance/among/1", "no asset is called 'z'"));
        assertThat(new Limits(1, 0, 0.4).misfits(rule))
                .extracting(Misfit::pointer, Misfit::what)
                .containsExactly(tuple(
                        "/minimum-variance/invested",
                        "weights that add up to 1 are beyond the limits: 2 assets can add up to 0.8 at most"));
        assertThat(new Limits(1, 0, 0.5).misfits(rule)).isEmpty();
        assertThat(new Limits(0.9, 0, 0.5).misfits(rule)).hasSize(1);
        MeanVariance other = new MeanVariance(List.of("z"), new Aversion(1), 0, Manner.plain());
        assertThat(other.misfits(List.of("calm"), List.of("a")))
                .extracting(Misfit::pointer)
                .containsExactly("/mean-variance/among/0");
        assertThat(rule.namedAssets()).containsExactly("a", "z");
    }

    private static MeanVariance meanVariance(CheckValues check, Risk risk) {
        return new MeanVariance(names(check), risk, 0, Manner.plain());
    }

    private static List<String> names(CheckValues check) {
        return List.of("a", "b", "c").subList(0, check.input("mu").size());
    }

    private static double[] weights(CheckValues check, Rule rule, Limits limits) {
        Decision decision = played(check, rule, limits).decisions().get(0);
        double[] weights = new double[names(check).size()];
        Arrays.setAll(weights, i -> decision.target().orElseThrow().at(i));
        return weights;
    }

    private static Played played(CheckValues check, Rule rule, Limits limits) {
        int n = names(check).size();
        double[][] rows = CheckValues.matrix(check.input("cov"));
        double[] mean = CheckValues.doubles(check.input("mu"));
        double[] means = new double[2 * n];
        double[] covariances = new double[2 * n * n];
        for (int k = 0; k < 2; k++) {
            for (int i = 0; i < n; i++) {
                means[k * n + i] = mean[i];
                System.arraycopy(rows[i], 0, covariances, (k * n + i) * n, n);
            }
        }
        GivenProbabilities signal = GivenProbabilities.stormy(0.3)
                .meaning(WindowMoments.of(2, n, new double[] {0.5, 0.5}, means, covariances));
        GivenPrices prices = GivenPrices.flat(1, n).withCash(check.input("cash").asDouble());
        return played(rule, limits, prices, signal, 2);
    }

    private static Played played(
            Rule rule, Limits limits, GivenPrices prices, GivenProbabilities signal, int barsAhead) {
        RulePolicy policy = RulePolicy.of(
                rule,
                limits,
                Schedule.AT_EVERY_CLOSE,
                1,
                0,
                signal.regimes(),
                prices.table().assets());
        return Played.of(policy, prices.table(), signal, barsAhead);
    }
}
