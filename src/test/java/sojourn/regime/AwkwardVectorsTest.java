package sojourn.regime;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import sojourn.numeric.RandomStream;

/** Several series that cannot be fitted together, or should not be: a reason comes back, never NaN. */
class AwkwardVectorsTest {
    private static FitSettings settings(int states) {
        return new FitSettings(ModelKind.HIDDEN_MARKOV, states, EmissionFamily.NORMAL, 5);
    }

    private static double[] noise(int rows, String purpose) {
        RandomStream random = RandomStream.of(51, purpose);
        double[] x = new double[rows];
        for (int t = 0; t < rows; t++) {
            x[t] = random.nextNormal() * (t / 50 % 2 == 0 ? 0.01 : 0.03);
        }
        return x;
    }

    private static Fit fit(FitSettings settings, Observations x) {
        return Fitter.fit(settings, Vectors.request(x));
    }

    @Test
    void aConstantSeriesAmongOthersFailsByName() {
        double[] constant = new double[400];
        Arrays.fill(constant, 0.02);
        Fit fit = fit(settings(2), Vectors.columns(noise(400, "a"), constant));
        assertThat(fit.outcome()).isEqualTo(Outcome.FAILED);
        assertThat(fit.explanation()).isEqualTo("all observations of [1] in the window are equal");
    }

    @ParameterizedTest
    @ValueSource(doubles = {1, -2, 1e-6})
    void seriesThatMoveTogetherExactlyFail(double factor) {
        double[] x = noise(400, "together");
        double[] same = new double[x.length];
        for (int t = 0; t < x.length; t++) {
            same[t] = 0.001 + factor * x[t];
        }
        Observations pair = Vectors.columns(x, same);
        Fit fit = fit(settings(2), pair);
        assertThat(fit.outcome()).isEqualTo(Outcome.FAILED);
        assertThat(fit.explanation()).contains("move together exactly");
        Fit one = fit(new FitSettings(ModelKind.ONE_REGIME, 1, EmissionFamily.NORMAL, 1), pair);
        assertThat(one.explanation()).contains("move together exactly");
        FitSettings diagonal = new FitSettings(ModelKind.HIDDEN_MARKOV, 2, EmissionFamily.NORMAL_DIAGONAL, 5);
        assertFinite(fit(diagonal, pair));
    }

    /** Just short of moving together, where rounding is larger than what EM gains. */
    @ParameterizedTest
    @ValueSource(doubles = {1e-5, 1.2e-5, 2e-5, 1e-4})
    void seriesThatNearlyMoveTogetherEndInSomeOutcome(double apart) {
        for (int seed = 1; seed <= 20; seed++) {
            double[] x = noise(700, "nearly " + seed);
            double[] other = noise(700, "own part " + seed);
            double[] beside = new double[x.length];
            for (int t = 0; t < x.length; t++) {
                beside[t] = 0.5 * x[t] + apart * other[t];
            }
            for (int states = 2; states <= 3; states++) {
                assertFinite(fit(settings(states), Vectors.columns(x, beside)));
            }
        }
    }

    /** What is told of a regime's second series would rest on no observation of it. */
    @Test
    void aRegimeThatASeriesWasNeverSeenInIsDegenerate() {
        RandomStream random = RandomStream.of(8, "seen late");
        double[] values = new double[2400];
        boolean[] missing = new boolean[2400];
        for (int t = 0; t < 1200; t++) {
            double size = t < 600 ? 0.005 : 0.02;
            values[2 * t] = size * random.nextNormal();
            values[2 * t + 1] = 0.01 * random.nextNormal();
            missing[2 * t + 1] = t < 600;
        }
        for (int starts = 1; starts <= 5; starts++) {
            FitSettings settings = new FitSettings(ModelKind.HIDDEN_MARKOV, 2, EmissionFamily.NORMAL, starts);
            Fit fit = fit(settings, Observations.withMissingCells(2, values, missing));
            assertThat(fit.outcome()).isEqualTo(Outcome.DEGENERATE);
        }
    }

    @Test
    void aSumOfTwoOthersFollowsFromThem() {
        double[] a = noise(400, "a");
        double[] b = noise(400, "b");
        double[] sum = new double[400];
        for (int t = 0; t < 400; t++) {
            sum[t] = a[t] + b[t];
        }
        assertThat(fit(settings(2), Vectors.columns(a, b, sum)).explanation()).contains("one of them follows");
    }

    @Test
    void twoDistinctRowsAreDegenerate() {
        double[] a = new double[300];
        double[] b = new double[300];
        RandomStream random = RandomStream.of(52, "two rows");
        for (int t = 0; t < 300; t++) {
            a[t] = (t / 10) % 2 == 0 ? 0.01 : -0.02;
            b[t] = random.nextNormal(); // or else the series would move together
        }
        Fit fit = fit(settings(2), Vectors.columns(a, b));
        assertThat(fit.outcome()).isEqualTo(Outcome.DEGENERATE);
        assertThat(fit.explanation()).contains("closed in on a line or a point").contains("of 300 observations");
        assertFinite(fit);
    }

    @Test
    void tooFewRowsFail() {
        Fit fit = fit(settings(4), Vectors.columns(noise(20, "a"), noise(20, "b")));
        assertThat(fit.outcome()).isEqualTo(Outcome.FAILED);
        // 12 + 3 + 4 (2 + 3) parameters
        assertThat(fit.explanation())
                .contains("20 observations")
                .contains("35 parameters")
                .contains("at least 36");
    }

    @Test
    void aSeriesThatIsHardlyThereFailsByName() {
        boolean[] missing = new boolean[800];
        for (int t = 0; t < 400; t++) {
            missing[2 * t + 1] = t % 50 != 0;
        }
        Observations x = Vectors.without(Vectors.columns(noise(400, "a"), noise(400, "b")), missing);
        assertThat(fit(settings(2), x).explanation())
                .isEqualTo("the window holds 8 observations of [1]; 2 states need at least 10");
        Arrays.fill(missing, true);
        Fit nothing = fit(settings(2), Vectors.without(Vectors.columns(noise(400, "a"), noise(400, "b")), missing));
        assertThat(nothing.outcome()).isEqualTo(Outcome.FAILED);
        assertThat(nothing.explanation()).contains("no observation");
    }

    @Test
    void seriesThatAreNeverThereTogetherHaveNoCorrelation() {
        boolean[] missing = new boolean[800];
        for (int t = 0; t < 400; t++) {
            missing[2 * t + t / 200] = true;
        }
        Observations x = Vectors.without(Vectors.columns(noise(400, "a"), noise(400, "b")), missing);
        assertThat(fit(settings(2), x).explanation())
                .isEqualTo(
                        "the window holds 0 rows with both [0] and [1]; the correlations of 2 states need at least 10");
        FitSettings diagonal = new FitSettings(ModelKind.HIDDEN_MARKOV, 2, EmissionFamily.NORMAL_DIAGONAL, 5);
        Fit fit = fit(diagonal, x);
        assertThat(fit.outcome()).isEqualTo(Outcome.CONVERGED);
        assertFinite(fit);
    }

    @ParameterizedTest
    @CsvSource({"2, 50", "3, 50", "2, 1000"})
    void anOutlierLeavesAllNumbersFinite(int states, double deviations) {
        double[] a = noise(600, "a");
        double[] b = noise(600, "b");
        a[300] = 0.02 * deviations;
        for (ModelKind kind : new ModelKind[] {ModelKind.HIDDEN_MARKOV, ModelKind.MIXTURE}) {
            assertFinite(fit(new FitSettings(kind, states, EmissionFamily.NORMAL, 5), Vectors.columns(a, b)));
        }
    }

    @Test
    void aRowFarFromEveryReachableStateIsScoredByLogarithms() {
        // two tight states; the second row is 1000 spreads out, nearest to the state that cannot be there
        MultivariateNormal normal =
                MultivariateNormal.diagonal(2, new double[] {0, 0, 1, 1}, new double[] {0.01, 0.01, 0.01, 0.01});
        RegimeModel model = HiddenMarkov.of(new double[] {1, 0}, new double[] {1, 0, 0.5, 0.5}, normal);
        Observations x = Observations.of(2, new double[] {0, 0.1, 1, 1, 0.05, 0}, new boolean[3]);
        VectorWindow window = VectorWindow.of(x);
        VectorSums sums = new VectorSums(2, 2);
        assertThat(new VectorExpectation(window, 2).fill(Vectors.standardised(model, window), sums))
                .isTrue();
        double units = 3 * (StrictMath.log(window.scale(0)) + StrictMath.log(window.scale(1)));
        double expected = FilterState.after(model, x).logLikelihood();
        assertThat(sums.chain.logLikelihood - units).isCloseTo(expected, within(1e-8));
        assertThat(sums.count).containsExactly(3, 0);
    }

    private static void assertFinite(Fit fit) {
        RegimeModel model = fit.model().orElseThrow();
        assertThat(fit.logLikelihood()).isFinite();
        MultivariateNormal normal = (MultivariateNormal) model.emission();
        for (int k = 0; k < model.states(); k++) {
            assertThat(fit.orderBy()[k]).isFinite();
            assertThat(fit.occupancy()[k]).isBetween(0.0, 1 + 1e-9);
            for (int i = 0; i < normal.dimension(); i++) {
                assertThat(normal.mean(k, i)).isFinite();
                assertThat(normal.standardDeviation(k, i)).isPositive().isFinite();
                assertThat(normal.correlation(k, i, 0)).isBetween(-1.0, 1.0);
            }
        }
    }
}
