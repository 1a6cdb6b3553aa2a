package sojourn.evidence;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.function.DoubleUnaryOperator;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import sojourn.CheckValues;
import sojourn.inference.Estimate;
import sojourn.inference.Moments;
import sojourn.numeric.RandomStream;
import sojourn.regime.Emission;
import sojourn.regime.HiddenMarkov;
import sojourn.regime.LongRun;
import sojourn.regime.Mixture;
import sojourn.regime.Normal;
import sojourn.regime.Observations;
import sojourn.regime.RegimeModel;
import sojourn.regime.StudentT;

class ImpliedMomentsTest {
    private static final double INTEGRAL = 1e-7;

    /** Confirmed there by a simulation of six million draws. */
    @Test
    void agreeWithTheWorkedCase() {
        CheckValues worked = CheckValues.byId("implied_moments_k2");
        double[][] rows = CheckValues.matrix(worked.input("A"));
        double[] mean = CheckValues.doubles(worked.input("mean"));
        double[] variance = CheckValues.doubles(worked.input("variance"));
        double[] transition = {rows[0][0], rows[0][1], rows[1][0], rows[1][1]};
        double[] deviations = {Math.sqrt(variance[0]), Math.sqrt(variance[1])};
        ImpliedMoments implied =
                implied(HiddenMarkov.of(new double[] {0.5, 0.5}, transition, Normal.of(mean, deviations)));
        worked.assertExpected("skewness", number(implied.skewness()));
        worked.assertExpected("kurtosis", number(implied.kurtosis()));
        double[] squares = new double[5];
        double[] sizes = new double[5];
        for (int lag = 1; lag <= 5; lag++) {
            squares[lag - 1] = number(implied.ofSquares(lag));
            sizes[lag - 1] = number(implied.ofSizes(lag));
        }
        worked.assertExpected("acf_squared_centred", squares);
        worked.assertExpected("acf_abs_centred", sizes);
    }

    /** A Student's t of 3 or fewer degrees of freedom has no third moment, of 4 or fewer no finite fourth (common knowledge, no source). */
    @Test
    void tailsTooFatHaveNoSkewness() {
        double[] transition = {0.9, 0.1, 0.2, 0.8};
        double[] mean = {0.001, -0.002};
        double[] scale = {0.01, 0.02};
        ImpliedMoments fat = implied(
                HiddenMarkov.of(new double[] {0.5, 0.5}, transition, StudentT.of(mean, scale, new double[] {2.5, 8})));
        assertThat(fat.skewness()).isInstanceOf(Estimate.Undefined.class);
        assertThat(fat.kurtosis()).isInstanceOf(Estimate.Undefined.class);
        ImpliedMoments less = implied(
                HiddenMarkov.of(new double[] {0.5, 0.5}, transition, StudentT.of(mean, scale, new double[] {3.5, 8})));
        assertThat(less.skewness()).isInstanceOf(Estimate.Value.class);
        assertThat(less.kurtosis()).isInstanceOf(Estimate.Undefined.class);
    }

    @Test
    void anIndependentMixtureHasNoClustering() {
        ImpliedMoments implied = implied(
                Mixture.of(new double[] {0.7, 0.3}, Normal.of(new double[] {0.1, -0.2}, new double[] {0.5, 2})));
        for (int lag = 1; lag <= 20; lag++) {
            assertThat(number(implied.ofSquares(lag))).isCloseTo(0, within(1e-14));
            assertThat(number(implied.ofSizes(lag))).isCloseTo(0, within(1e-14));
        }
        assertThat(number(implied.kurtosis())).isGreaterThan(3);
    }

    /** Kurtosis 3 (nu - 2) / (nu - 4) of a single Student's t: 6 for nu = 6 and 9 for nu = 5. */
    @ParameterizedTest
    @ValueSource(doubles = {5, 6})
    void oneStudentHasItsOwnKurtosis(double nu) {
        Emission emission = StudentT.of(new double[] {0.3}, new double[] {2}, new double[] {nu});
        ImpliedMoments implied = implied(Mixture.of(new double[] {1}, emission));
        assertThat(number(implied.kurtosis())).isCloseTo(nu == 5 ? 9 : 6, within(1e-12));
        assertThat(number(implied.skewness())).isZero();
    }

    /** Kurtosis of what remains, 3 (nu - 2) / (nu - 4) = 4.5 for nu = 8, although the regime that is left for good has an infinite one. */
    @Test
    void aRegimeThatIsLeftForGoodSaysNothingOfTheLongRun() {
        ImpliedMoments implied = implied(HiddenMarkov.of(
                new double[] {0, 1},
                new double[] {1, 0, 0.1, 0.9},
                StudentT.of(new double[] {0, 0}, new double[] {1, 3}, new double[] {8, 3})));
        assertThat(number(implied.kurtosis())).isCloseTo(4.5, within(1e-12));
        assertThat(number(implied.skewness())).isZero();
        assertThat(number(implied.ofSquares(1))).isCloseTo(0, within(1e-12));
        assertThat(number(implied.ofSizes(1))).isCloseTo(0, within(1e-12));
    }

    @Test
    void tailsTooFatHaveNoKurtosisButStillASize() {
        RegimeModel model = HiddenMarkov.of(
                new double[] {1, 0},
                new double[] {0.98, 0.02, 0.05, 0.95},
                StudentT.of(new double[] {0, 0}, new double[] {1, 3}, new double[] {8, 4}));
        ImpliedMoments implied = implied(model);
        assertThat(implied.kurtosis()).isInstanceOf(Estimate.Undefined.class);
        assertThat(implied.ofSquares(1)).isInstanceOf(Estimate.Undefined.class);
        assertThat(number(implied.ofSizes(1))).isBetween(0.0, 1.0);
    }

    /** E|Y + d| by Simpson's rule over the density itself. */
    @Test
    void meanSizesAgreeWithIntegratingTheDensity() {
        Emission normal = Normal.of(new double[] {0.2}, new double[] {1.3});
        Emission student = StudentT.of(new double[] {0.2}, new double[] {1.3}, new double[] {4.5});
        for (double d : new double[] {-2.1, -0.3, 0, 0.8, 5}) {
            assertThat(MeanSize.of(normal, 0, d)).isCloseTo(integral(normal, d, 40), within(INTEGRAL));
            // beyond the range the integrand falls as y^-4.5; what is left out is below the tolerance
            assertThat(MeanSize.of(student, 0, d)).isCloseTo(integral(student, d, 4000), within(INTEGRAL));
        }
    }

    @Test
    void drawnSeriesHaveTheMomentsThatAreImplied() {
        RegimeModel model = HiddenMarkov.of(
                new double[] {1, 0},
                new double[] {0.95, 0.05, 0.1, 0.9},
                StudentT.of(new double[] {0.1, -0.2}, new double[] {0.5, 1.5}, new double[] {12, 9}));
        double[] longRun = LongRun.stationary(model).orElseThrow();
        double[] drawn = DrawnSeries.of(model, longRun, 400_000, RandomStream.of(3, "drawn series"));
        Moments moments = Moments.of(drawn);
        // kurtosis of a sample of 400000 dependent draws strays by about 0.1 here; five times that
        assertThat(number(moments.excessKurtosis()) + 3)
                .isCloseTo(number(implied(model).kurtosis()), within(0.5));
        // by hand: 2/3 0.25 12/10 + 1/3 2.25 9/7 + 2/9 0.3^2 = 1.184285714
        assertThat(moments.populationVariance()).isCloseTo(1.184285714, within(0.02));
        assertThat(moments.mean()).isCloseTo(0, within(0.02));
    }

    private static double integral(Emission emission, double d, double range) {
        double mean = emission.mean(0, 0);
        // split at the kink of |y + d|
        DoubleUnaryOperator integrand = y ->
                Math.abs(y + d) * Math.exp(emission.logDensity(Observations.univariate(new double[] {mean + y}), 0, 0));
        return simpson(integrand, -range, -d) + simpson(integrand, -d, range);
    }

    private static double simpson(DoubleUnaryOperator f, double from, double to) {
        int steps = 400_000;
        double width = (to - from) / steps;
        double sum = f.applyAsDouble(from) + f.applyAsDouble(to);
        for (int i = 1; i < steps; i++) {
            sum += (i % 2 == 1 ? 4 : 2) * f.applyAsDouble(from + i * width);
        }
        return sum * width / 3;
    }

    private static ImpliedMoments implied(RegimeModel model) {
        return Subjects.found(ImpliedMoments.of(model));
    }

    private static double number(Estimate estimate) {
        return estimate.number().orElseThrow();
    }
}
