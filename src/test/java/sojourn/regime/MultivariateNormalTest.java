package sojourn.regime;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatIllegalArgumentException;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import sojourn.CheckValues;
import sojourn.numeric.RandomStream;

/**
 * Normal emissions of several numbers: worked cases of an independent implementation (plain numpy), closed forms, and missing
 * numbers against integrating them out.
 */
class MultivariateNormalTest {
    @Test
    void filterSmootherAndPathOfTwoSeriesAgree() {
        CheckValues check = CheckValues.byId("hmm_mvn_k2_d2");
        WorkedCasesTest.assertAgrees(check, model(check), observations(check));
    }

    @Test
    void oneStepOfEmOfTwoSeriesAgrees() {
        CheckValues check = CheckValues.byId("hmm_mvn_k2_d2");
        VectorWindow window = VectorWindow.of(observations(check));
        VectorParameters before = Vectors.standardised(model(check), window);
        VectorSums sums = new VectorSums(2, 2);
        assertThat(new VectorExpectation(window, 2).fill(before, sums)).isTrue();
        VectorMaximisation step =
                new VectorMaximisation(EmissionFamily.NORMAL, InitialDistribution.FREE, new double[4]);
        RegimeModel after = step.next(before, sums).toModel(window, EmissionFamily.NORMAL, InitialDistribution.FREE);
        MultivariateNormal normal = (MultivariateNormal) after.emission();
        double[] delta = Vectors.flat(check.expected("em_step").get("delta"));
        double[] transition = Vectors.flat(check.expected("em_step").get("A"));
        double[] mean = Vectors.flat(check.expected("em_step").get("mean"));
        double[] covariance = Vectors.flat(check.expected("em_step").get("covariance"));
        for (int e = 0; e < 4; e++) {
            assertThat(after.initial(e / 2)).isCloseTo(delta[e / 2], within(1e-9));
            assertThat(after.transition(e / 2, e % 2)).isCloseTo(transition[e], within(1e-9));
            assertThat(normal.mean(e / 2, e % 2)).isCloseTo(mean[e], within(1e-9));
            assertThat(normal.covariance(0, e / 2, e % 2)).isCloseTo(covariance[e], within(1e-9));
            assertThat(normal.covariance(1, e / 2, e % 2)).isCloseTo(covariance[4 + e], within(1e-9));
        }
    }

    @Test
    void predictiveMeanAndCovarianceAgree() {
        CheckValues check = CheckValues.byId("predictive_cov");
        double[] transition = Vectors.flat(check.input("A"));
        MultivariateNormal normal =
                MultivariateNormal.full(2, Vectors.flat(check.input("mean")), Vectors.flat(check.input("covariance")));
        double[] filtered = CheckValues.doubles(check.input("filtered"));
        RegimeModel model = HiddenMarkov.of(filtered, transition, normal);
        Observations none = Observations.of(2, new double[4], new boolean[] {true, true});
        double[] p = FilterState.after(model, none)
                .probabilities(); // a missing row after the first is one step of the chain
        check.assertExpected("state_probs", p);
        double[] mean = new double[2];
        for (int e = 0; e < 4; e++) {
            mean[e % 2] += p[e / 2] * normal.mean(e / 2, e % 2);
        }
        check.assertExpected("mean", mean);
        double[][] covariance = new double[2][2];
        for (int e = 0; e < 8; e++) {
            int k = e / 4;
            int i = e / 2 % 2;
            int j = e % 2;
            covariance[i][j] +=
                    p[k] * (normal.covariance(k, i, j) + (normal.mean(k, i) - mean[i]) * (normal.mean(k, j) - mean[j]));
        }
        check.assertExpected("covariance", covariance);
    }

    @Test
    void oneColumnIsTheUnivariateNormal() {
        double[] means = {0.3, -1};
        double[] deviations = {0.5, 2};
        Normal one = Normal.of(means, deviations);
        Observations x = Observations.univariate(new double[] {0.1, -3, 8});
        for (MultivariateNormal many : new MultivariateNormal[] {
            MultivariateNormal.diagonal(1, means, deviations), MultivariateNormal.full(1, means, new double[] {0.25, 4})
        }) {
            assertThat(many.parameterCount()).isEqualTo(one.parameterCount());
            for (int e = 0; e < 6; e++) {
                assertThat(many.logDensity(x, e / 2, e % 2)).isCloseTo(one.logDensity(x, e / 2, e % 2), within(1e-13));
            }
        }
    }

    @Test
    void densitiesOfIndependentColumnsMultiply() {
        double[] means = {0.3, -1, 2, 0, 0.5, -0.2};
        double[] deviations = {0.5, 2, 1, 0.1, 3, 0.7};
        MultivariateNormal many = MultivariateNormal.diagonal(3, means, deviations);
        double[] row = {0.2, 1.4, -0.6};
        boolean[][] patterns = {{false, false, false}, {true, false, false}, {false, true, true}};
        for (boolean[] missing : patterns) {
            Observations x = Observations.withMissingCells(3, row, missing);
            for (int k = 0; k < 2; k++) {
                double sum = 0;
                for (int i = 0; i < 3; i++) {
                    Normal one = Normal.of(new double[] {means[3 * k + i]}, new double[] {deviations[3 * k + i]});
                    sum += missing[i] ? 0 : one.logDensity(Observations.univariate(new double[] {row[i]}), 0, 0);
                }
                assertThat(many.logDensity(x, 0, k)).isCloseTo(sum, within(1e-12));
            }
        }
        assertThat(many.parameterCount()).isEqualTo(12);
        assertThat(many.correlation(0, 0, 1)).isZero();
        assertThat(many.correlation(0, 1, 1)).isEqualTo(1);
    }

    @ParameterizedTest
    @CsvSource({"2,1,3", "3,2,4", "3,0,5"})
    void theDensityOfARowWithAMissingNumberIntegratesItOut(int dimension, int column, long seed) {
        RandomStream random = RandomStream.of(seed, "integrate");
        RegimeModel model = Vectors.randomModel(2, dimension, random);
        double[] row = new double[dimension];
        for (int i = 0; i < dimension; i++) {
            row[i] = random.nextNormal();
        }
        boolean[] missing = new boolean[dimension];
        missing[column] = true;
        Observations gap = Observations.withMissingCells(dimension, row, missing);
        for (int k = 0; k < 2; k++) {
            // the trapezoidal rule on a normal is good to rounding once its step is well below the spread
            double step = model.emission().standardDeviation(k, column) / 2000;
            double sum = 0;
            for (int n = -40_000; n <= 40_000; n++) {
                row[column] = model.emission().mean(k, column) + n * step;
                Observations full = Observations.of(dimension, row, new boolean[1]);
                sum += step * StrictMath.exp(model.emission().logDensity(full, 0, k));
            }
            assertThat(model.emission().logDensity(gap, 0, k)).isCloseTo(StrictMath.log(sum), within(1e-11));
        }
    }

    @ParameterizedTest
    @CsvSource({"2,2,6,1", "3,3,6,2", "2,4,6,3"})
    void missingNumbersAgreeWithSummingAllPaths(int states, int dimension, int rows, long seed) {
        RandomStream random = RandomStream.of(seed, "paths");
        HiddenMarkov model = Vectors.randomModel(states, dimension, random);
        boolean[] missing = new boolean[rows * dimension];
        for (int e = 0; e < missing.length; e++) {
            missing[e] = random.nextDouble() < 0.3 || e / dimension == 2; // row 2 altogether
        }
        Observations x = Vectors.without(Vectors.simulate(model, rows, random), missing);
        double total = 0;
        for (int code = 0; code < StrictMath.pow(states, rows); code++) {
            double p = 1;
            int before = -1;
            for (int t = 0, rest = code; t < rows; t++, rest /= states) {
                int state = rest % states;
                p *= t == 0 ? model.initial(state) : model.transition(before, state);
                p *= x.missing(t) ? 1 : StrictMath.exp(model.emission().logDensity(x, t, state));
                before = state;
            }
            total += p;
        }
        assertThat(FilterState.after(model, x).logLikelihood()).isCloseTo(StrictMath.log(total), within(1e-11));
        VectorWindow window = VectorWindow.of(x);
        VectorSums sums = new VectorSums(states, dimension);
        assertThat(new VectorExpectation(window, states).fill(Vectors.standardised(model, window), sums))
                .isTrue();
        double units = 0;
        for (int e = 0; e < missing.length; e++) {
            units += missing[e] ? 0 : StrictMath.log(window.scale(e % dimension));
        }
        assertThat(sums.chain.logLikelihood - units).isCloseTo(StrictMath.log(total), within(1e-10));
        Smoothed smoothed = Smoothed.of(model, x);
        for (int k = 0; k < states; k++) {
            assertThat(sums.count[k]).isCloseTo(PosteriorMoments.weight(smoothed, x, k), within(1e-11));
            assertThat(sums.chain.initial[k]).isCloseTo(smoothed.at(0, k), within(1e-12));
            for (int j = 0; j < states; j++) {
                assertThat(sums.chain.transitions[k * states + j])
                        .isCloseTo(smoothed.expectedTransitions(k, j), within(1e-11));
            }
        }
    }

    @Test
    void matchingOfSeveralNumbersIsThatOfOneWhereColumnsAreIndependent() {
        // the affinity 1 - H^2 of independent columns is the product of theirs
        MultivariateNormal a = MultivariateNormal.diagonal(2, new double[] {0.1, -3}, new double[] {0.5, 4});
        MultivariateNormal b = MultivariateNormal.diagonal(2, new double[] {-0.3, 1}, new double[] {0.8, 3});
        double affinity = 1;
        for (int i = 0; i < 2; i++) {
            Normal first = Normal.of(new double[] {a.mean(0, i)}, new double[] {a.standardDeviation(0, i)});
            Normal second = Normal.of(new double[] {b.mean(0, i)}, new double[] {b.standardDeviation(0, i)});
            affinity *= 1 - Matching.squaredHellinger(first, 0, second, 0);
        }
        assertThat(Matching.squaredHellinger(a, 0, b, 0)).isCloseTo(1 - affinity, within(1e-14));
        assertThat(Matching.squaredHellinger(a, 0, a, 0)).isCloseTo(0, within(1e-15));
    }

    @Test
    void matchingOfCorrelatedNumbersIntegratesTheRootOfBothDensities() {
        RandomStream random = RandomStream.of(8, "affinity");
        MultivariateNormal normal =
                (MultivariateNormal) Vectors.randomModel(2, 2, random).emission();
        double affinity = 0;
        double step = 0.02; // a fraction of the smaller spread; the sum reaches 20 spreads of the wider state
        for (int i = -1500; i <= 1500; i++) {
            for (int j = -1500; j <= 1500; j++) {
                Observations x = Observations.of(2, new double[] {i * step, j * step}, new boolean[1]);
                double logs = normal.logDensity(x, 0, 0) + normal.logDensity(x, 0, 1);
                affinity += step * step * StrictMath.exp(logs / 2);
            }
        }
        assertThat(Matching.squaredHellinger(normal, 0, normal, 1)).isCloseTo(1 - affinity, within(1e-9));
    }

    @Test
    void whatIsNoCovarianceIsRefused() {
        assertThatIllegalArgumentException()
                .isThrownBy(() -> MultivariateNormal.full(2, new double[2], new double[] {1, 1, 1, 1}))
                .withMessageContaining("state 0 is not positive definite");
        assertThatIllegalArgumentException()
                .isThrownBy(() -> MultivariateNormal.full(2, new double[2], new double[] {1, 0.5, 0.4, 1}))
                .withMessageContaining("not symmetric: 0.5 and 0.4");
        assertThatIllegalArgumentException()
                .isThrownBy(() -> MultivariateNormal.full(2, new double[3], new double[4]))
                .withMessageContaining("3 means");
        assertThatIllegalArgumentException()
                .isThrownBy(() -> MultivariateNormal.diagonal(2, new double[2], new double[] {1, 0}))
                .withMessageContaining("standard deviation of state 0");
        MultivariateNormal fine = MultivariateNormal.diagonal(2, new double[2], new double[] {1, 2});
        Observations none = Observations.of(2, new double[2], new boolean[] {true});
        assertThatIllegalArgumentException()
                .isThrownBy(() -> fine.logDensity(none, 0, 0))
                .withMessageContaining("row 0 is missing");
    }

    private static RegimeModel model(CheckValues check) {
        MultivariateNormal normal =
                MultivariateNormal.full(2, Vectors.flat(check.input("mean")), Vectors.flat(check.input("covariance")));
        return HiddenMarkov.of(CheckValues.doubles(check.input("delta")), Vectors.flat(check.input("A")), normal);
    }

    private static Observations observations(CheckValues check) {
        double[] x = Vectors.flat(check.input("x"));
        return Observations.of(2, x, new boolean[x.length / 2]);
    }
}
