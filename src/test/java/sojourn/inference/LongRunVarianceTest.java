package sojourn.inference;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import sojourn.numeric.RandomStream;

class LongRunVarianceTest {
    private static final double ROUNDING = 1e-14;

    /**
     * floor(4 (n/100)^(2/9)). Exact powers: (51200/100)^(2/9) = 512^(2/9) = 4. The step from 4 to 5 lags lies at n = 100 (5/4)^4.5 = 272.99; the
     * first line is held to n - 1.
     */
    @ParameterizedTest
    @CsvSource({"1, 0", "2, 1", "100, 4", "272, 4", "273, 5", "51199, 15", "51200, 16"})
    void defaultLagsFollowTheRuleOfNeweyAndWest(int observations, int lags) {
        assertThat(LongRunVariance.defaultLags(observations)).isEqualTo(lags);
    }

    @Test
    void agreesWithAnExampleOnPaper() {
        // Deviations -1.5, -0.5, 0.5, 1.5: c_0 = 5/4, c_1 = 1.25/4, c_2 = -1.5/4, c_3 = -2.25/4.
        double[] series = {1, 2, 3, 4};
        assertThat(at(series, 0)).hasValueCloseTo(1.25, within(ROUNDING));
        assertThat(at(series, 1)).hasValueCloseTo(1.25 + 2 * 0.5 * 0.3125, within(ROUNDING));
        assertThat(at(series, 2)).hasValueCloseTo(1.25 + 2 * (2 / 3.0 * 0.3125 - 1 / 3.0 * 0.375), within(ROUNDING));
    }

    @Test
    void lagsBeyondTheSeriesSetTheWeightsOnly() {
        // c_0 = 1/4, c_1 = -1/8; weight of lag 1 with L = 9 is 0.9.
        assertThat(at(new double[] {1, 2}, 9)).hasValueCloseTo(0.25 - 2 * 0.9 * 0.125, within(ROUNDING));
    }

    @Test
    void isNeverNegative() {
        RandomStream random = RandomStream.of(7, "long-run variance");
        for (int trial = 0; trial < 200; trial++) {
            double[] series = new double[2 + random.nextInt(30)];
            for (int t = 0; t < series.length; t++) {
                series[t] = (t % 2 == 0 ? 3 : -3) + random.nextNormal();
            }
            int lags = random.nextInt(40);
            assertThat(at(series, lags).orElseThrow())
                    .as("seed 7, trial %s, %s values, %s lags", trial, series.length, lags)
                    .isGreaterThanOrEqualTo(0);
        }
    }

    @Test
    void growsWithTheSquareOfTheScale() {
        double[] series = {0.4, -1.1, 0.3, 2.2, -0.7};
        double[] larger = new double[series.length];
        for (int t = 0; t < series.length; t++) {
            larger[t] = 10 + 4 * series[t];
        }
        assertThat(at(larger, 2)).hasValueCloseTo(16 * at(series, 2).orElseThrow(), within(1e-12));
    }

    @Test
    void edges() {
        assertThat(LongRunVariance.bartlett(new double[0], 1)).isEqualTo(Estimate.tooFew(0, 1));
        assertThat(at(new double[] {5}, 3)).hasValue(0);
        assertThat(LongRunVariance.bartlett(new double[] {1e300, -1e300}, 0))
                .isEqualTo(Estimate.of(Double.POSITIVE_INFINITY));
        assertThatThrownBy(() -> LongRunVariance.bartlett(new double[] {1}, -1)).hasMessageContaining("lags is -1");
    }

    private static OptionalDouble at(double[] series, int lags) {
        return LongRunVariance.bartlett(series, lags).number();
    }
}
