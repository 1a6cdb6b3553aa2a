package sojourn.regime;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import sojourn.numeric.RandomStream;

/** Oracle: the sum over all K^T paths, written with nothing but products. */
class BruteForceTest {
    /** The sum has up to 4^6 positive terms, so it is good to about 1e-13. */
    private static final double TOLERANCE = 1e-11;

    @ParameterizedTest
    @CsvSource({"1,5,1", "2,7,2", "2,9,3", "3,6,4", "3,7,5", "4,6,6"})
    void filterSmootherAndPathAgreeWithSummingAllPaths(int states, int rows, long seed) {
        RandomStream random = RandomStream.of(seed, "brute force");
        HiddenMarkov model = Fixtures.randomModel(states, random);
        double[] values = Fixtures.simulate(model, rows, random);
        boolean[] missing = new boolean[rows];
        missing[rows / 2] = seed % 2 == 0;
        Observations x = Observations.of(1, values, missing);

        double total = 0;
        double best = -1;
        int[] bestPath = new int[rows];
        double[][] marginal = new double[rows][states];
        double[] steps = new double[states * states];
        int paths = (int) StrictMath.round(StrictMath.pow(states, rows));
        for (int code = 0; code < paths; code++) {
            int[] path = decode(code, states, rows);
            double p = probability(model, x, path);
            total += p;
            for (int t = 0; t < rows; t++) {
                marginal[t][path[t]] += p;
                if (t > 0) {
                    steps[path[t - 1] * states + path[t]] += p;
                }
            }
            if (p > best) {
                best = p;
                bestPath = path;
            }
        }
        Smoothed smoothed = Smoothed.of(model, x);
        FilterState last = FilterState.after(model, x);
        assertThat(last.logLikelihood()).isCloseTo(StrictMath.log(total), within(TOLERANCE));
        for (int k = 0; k < states; k++) {
            assertThat(last.probability(k)).isCloseTo(marginal[rows - 1][k] / total, within(TOLERANCE));
            for (int t = 0; t < rows; t++) {
                assertThat(smoothed.at(t, k)).isCloseTo(marginal[t][k] / total, within(TOLERANCE));
            }
            for (int j = 0; j < states; j++) {
                assertThat(smoothed.expectedTransitions(k, j))
                        .isCloseTo(steps[k * states + j] / total, within(TOLERANCE * rows));
            }
        }
        Viterbi viterbi = Viterbi.of(model, x);
        assertThat(viterbi.path()).isEqualTo(bestPath);
        assertThat(viterbi.logProbability()).isCloseTo(StrictMath.log(best), within(TOLERANCE));
    }

    private static int[] decode(int code, int states, int rows) {
        int[] path = new int[rows];
        int rest = code;
        for (int t = 0; t < rows; t++) {
            path[t] = rest % states;
            rest /= states;
        }
        return path;
    }

    private static double probability(RegimeModel model, Observations x, int[] path) {
        double p = 1;
        for (int t = 0; t < path.length; t++) {
            p *= t == 0 ? model.initial(path[0]) : model.transition(path[t - 1], path[t]);
            if (!x.missing(t)) {
                double sd = model.emission().standardDeviation(path[t], 0);
                double z = (x.at(t, 0) - model.emission().mean(path[t], 0)) / sd;
                p *= StrictMath.exp(-z * z / 2) / (sd * Math.sqrt(2 * Math.PI));
            }
        }
        return p;
    }
}
