package sojourn.regime;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import sojourn.numeric.RandomStream;

/** Transitions from probabilities alone: against counts, a brute-force search of the objective, and a chain that is known. */
class ForetoldTransitionsTest {
    private static final int ROWS = 80;

    @Test
    void rowsOfOneStateEachAreCounted() {
        int[] path = {0, 0, 1, 1, 1, 2, 0, 0, 2, 2, 2, 1, 0, 0, 0};
        double[] found = ForetoldTransitions.of(RowWeights.path(3, path));
        double[] counted = RowWeights.path(3, path).transitions();
        assertThat(found).containsExactly(counted, within(1e-12)); // the search stops at steps of 1e-13
        assertThat(counted[0]).isEqualTo(4.0 / 6);
    }

    @Test
    void noMatrixOfAFineGridForetellsBetter() {
        double[] weights = random(2, 3);
        double[] found = ForetoldTransitions.of(RowWeights.of(2, weights));
        double least = missed(2, weights, found);
        for (int a = 0; a <= 200; a++) {
            for (int b = 0; b <= 200; b++) {
                double[] other = {a / 200.0, 1 - a / 200.0, b / 200.0, 1 - b / 200.0};
                assertThat(missed(2, weights, other)).isGreaterThanOrEqualTo(least - 1e-12);
            }
        }
    }

    @ParameterizedTest
    @ValueSource(ints = {1, 3, 4, 6})
    void noOtherMatrixForetellsBetter(int states) {
        double[] weights = random(states, 7);
        double[] found = ForetoldTransitions.of(RowWeights.of(states, weights));
        double least = missed(states, weights, found);
        RandomStream random = RandomStream.of(1, "others");
        for (int i = 0; i < states; i++) {
            double sum = 0;
            for (int j = 0; j < states; j++) {
                assertThat(found[i * states + j]).isBetween(0.0, 1.0);
                sum += found[i * states + j];
            }
            assertThat(sum).isCloseTo(1, within(1e-12));
        }
        for (int trial = 0; trial < 500; trial++) {
            double[] other = rows(states, states, random);
            double part = StrictMath.pow(10, -4 * random.nextDouble());
            for (int e = 0; e < other.length; e++) {
                other[e] = found[e] + part * (other[e] - found[e]);
            }
            assertThat(missed(states, weights, other)).isGreaterThanOrEqualTo(least - 1e-12);
        }
    }

    /** Probabilities that never move fit every matrix that keeps them where they are: what was found is no finding, and it is told. */
    @Test
    void probabilitiesThatHardlyVaryAreAnEvent() {
        double[] weights = new double[2 * ROWS];
        for (int t = 0; t < ROWS; t++) {
            weights[2 * t] = 0.3 + 1e-6 * (t % 7);
            weights[2 * t + 1] = 1 - weights[2 * t];
        }
        assertThat(ForetoldTransitions.search(RowWeights.of(2, weights)).events())
                .contains("transitions-undetermined");
        assertThat(ForetoldTransitions.search(RowWeights.of(2, random(2, 3))).events())
                .isEmpty();
        int[] path = {0, 0, 2, 2, 0};
        assertThat(ForetoldTransitions.search(RowWeights.path(3, path)).events())
                .isEmpty();
    }

    @Test
    void aSearchThatRanOutOfSweepsIsAnEvent() {
        assertThat(ForetoldTransitions.search(RowWeights.of(3, random(3, 7)), 1).events())
                .containsExactly("transitions-unfinished");
    }

    /** A chain that stays 100 and 25 bars, filtered by its own parameters from observations that overlap. */
    @Test
    void aChainSeenThroughItsFilterIsFoundAndMeanProductsWouldNotFindIt() {
        HiddenMarkov chain = HiddenMarkov.of(
                new double[] {0.8, 0.2},
                new double[] {0.99, 0.01, 0.04, 0.96},
                Normal.of(new double[] {0, 0}, new double[] {1, 1.8}));
        RandomStream random = RandomStream.of(11, "chain");
        int rows = 20_000;
        double[] weights = new double[2 * rows];
        FilterState filter = FilterState.before(chain);
        int state = 0;
        for (int t = 0; t < rows; t++) {
            state = random.nextDouble() < chain.transition(state, 1) ? 1 : 0;
            double x = random.nextNormal() * (state == 0 ? 1 : 1.8);
            filter = filter.step(chain, Observations.univariate(new double[] {x}), 0);
            weights[2 * t] = filter.probability(0);
            weights[2 * t + 1] = filter.probability(1);
        }
        double[] found = ForetoldTransitions.of(RowWeights.of(2, weights));
        // 20,000 bars hold about 160 stays of each kind: a standard error of about 8 % of the share of bars that leave
        assertThat(found[1]).isCloseTo(0.01, within(0.003));
        assertThat(found[2]).isCloseTo(0.04, within(0.012));
        assertThat(RowWeights.of(2, weights).transitions()[2]).isGreaterThan(0.1);
    }

    private static double missed(int states, double[] weights, double[] matrix) {
        double sum = 0;
        for (int t = 0; t + 1 < weights.length / states; t++) {
            for (int j = 0; j < states; j++) {
                double foretold = 0;
                for (int i = 0; i < states; i++) {
                    foretold += weights[t * states + i] * matrix[i * states + j];
                }
                double off = weights[(t + 1) * states + j] - foretold;
                sum += off * off;
            }
        }
        return sum;
    }

    private static double[] random(int states, long seed) {
        return rows(ROWS, states, RandomStream.of(seed, "weights"));
    }

    private static double[] rows(int rows, int states, RandomStream random) {
        double[] weights = new double[rows * states];
        for (int t = 0; t < rows; t++) {
            double sum = 0;
            for (int k = 0; k < states; k++) {
                weights[t * states + k] = random.nextDouble();
                sum += weights[t * states + k];
            }
            for (int k = 0; k < states; k++) {
                weights[t * states + k] /= sum;
            }
        }
        return weights;
    }
}
