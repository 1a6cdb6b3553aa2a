package sojourn.inference;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import org.junit.jupiter.api.Test;
import sojourn.numeric.RandomStream;

class WeightedMomentsTest {
    private static final double ROUNDING = 1e-14;

    /** Weights 1, 2, 1 on 1, 2, 6: mean 11/4; squares (49/16 + 2 * 9/16 + 169/16) / 4 = 236/64. */
    @Test
    void agreesWithAnExampleOnPaper() {
        WeightedMoments moments = WeightedMoments.of(new double[] {1, 2, 1}, new double[] {1, 2, 6});
        assertThat(moments.count()).isEqualTo(3);
        assertThat(moments.weight()).isEqualTo(4);
        assertThat(moments.mean().number()).hasValue(2.75);
        assertThat(moments.deviation().number()).hasValueCloseTo(Math.sqrt(236 / 64.0), within(ROUNDING));
    }

    /** With weights of 1 the error of the mean is the root of the long-run variance over n, that of s by the delta method. */
    @Test
    void evenWeightsGiveTheUsualErrors() {
        double[] x = {0.3, -0.2, 0.9, 0.1, -0.5, 0.4, 0.2, -0.1};
        double[] ones = new double[x.length];
        Arrays.fill(ones, 1);
        WeightedMoments moments = WeightedMoments.of(ones, x);
        int lags = LongRunVariance.defaultLags(x.length);
        double ofMean = Math.sqrt(LongRunVariance.bartlett(x, lags).number().orElseThrow() / x.length);
        assertThat(moments.meanError().number()).hasValueCloseTo(ofMean, within(ROUNDING));
        Moments plain = Moments.of(x);
        double[] squares = Arrays.stream(x)
                .map(value -> (value - plain.mean()) * (value - plain.mean()))
                .toArray();
        double ofVariance =
                Math.sqrt(LongRunVariance.bartlett(squares, lags).number().orElseThrow() / x.length);
        assertThat(moments.deviationError().number())
                .hasValueCloseTo(ofVariance / (2 * Math.sqrt(plain.populationVariance())), within(ROUNDING));
    }

    /** Independent draws: the mean's error is s / sqrt n, that of s is s / sqrt(2 n) for a normal. */
    @Test
    void theErrorsOfManyNormalDrawsAreThoseOfTheTextbook() {
        RandomStream random = RandomStream.of(9, "weighted moments");
        int n = 40_000;
        double[] x = new double[n];
        double[] weights = new double[n];
        for (int t = 0; t < n; t++) {
            x[t] = 0.02 * random.nextNormal();
            weights[t] = t % 4 == 0 ? 1 : 0;
        }
        WeightedMoments moments = WeightedMoments.of(weights, x);
        double effective = n / 4.0;
        // the long-run variance of 10000 draws with some 15 lags strays by about 5 %
        assertThat(moments.meanError().number()).hasValueCloseTo(0.02 / Math.sqrt(effective), within(3e-5));
        assertThat(moments.deviationError().number()).hasValueCloseTo(0.02 / Math.sqrt(2 * effective), within(2e-5));
    }

    @Test
    void whatCannotBeSaidIsUndefined() {
        WeightedMoments few = WeightedMoments.of(new double[] {0.5, 1}, new double[] {1, 2});
        assertThat(few.mean()).isInstanceOf(Estimate.Undefined.class);
        assertThat(few.deviationError()).isInstanceOf(Estimate.Undefined.class);
        WeightedMoments still = WeightedMoments.of(new double[] {1, 1, 1}, new double[] {2, 2, 2});
        assertThat(still.deviation().number()).hasValue(0);
        assertThat(still.meanError()).isEqualTo(Estimate.zeroVariance());
        assertThat(still.deviationError()).isEqualTo(Estimate.zeroVariance());
        assertThatThrownBy(() -> WeightedMoments.of(new double[] {-1}, new double[] {1}))
                .hasMessageContaining("weight is -1");
    }
}
