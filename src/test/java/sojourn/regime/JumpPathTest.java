package sojourn.regime;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import sojourn.CheckValues;
import sojourn.numeric.RandomStream;

/** The cheapest path against a worked case and against trying every path. */
class JumpPathTest {
    private static final double ROUNDING = 1e-12;

    @Test
    void pathObjectiveAndMeansAreThoseOfTheWorkedCase() {
        CheckValues check = CheckValues.byId("jump_path");
        Observations x = Observations.univariate(CheckValues.doubles(check.input("x")));
        JumpCentres centres = JumpCentres.of(2, CheckValues.doubles(check.input("centroids")), new double[] {1});
        JumpPath path = JumpPath.of(centres, check.input("jump_penalty").asDouble(), x);
        assertThat(path.states()).isEqualTo(CheckValues.ints(check.expected("path")));
        check.assertExpected("objective", path.objective());
        JumpCentres means = centres.means(x, path.states());
        check.assertExpected("updated_centroids", new double[] {means.centre(0, 0), means.centre(1, 0)});
    }

    @ParameterizedTest
    @CsvSource({"2, 1, 9, 0.5", "2, 2, 9, 2", "3, 1, 7, 1", "3, 2, 7, 0", "4, 1, 6, 0.8", "2, 1, 9, 1000"})
    void itIsTheCheapestOfAllPaths(int states, int dimension, int rows, double penalty) {
        for (int seed = 0; seed < 20; seed++) {
            RandomStream random = RandomStream.of(seed, "jump path");
            JumpCentres centres = centres(states, dimension, random);
            Observations x = observations(rows, dimension, random);
            int[] cheapest = cheapestOfAll(centres, penalty, x);
            JumpPath path = JumpPath.of(centres, penalty, x);
            assertThat(path.states()).as("seed " + seed).isEqualTo(cheapest); // no ties among random numbers
            assertThat(path.objective()).isCloseTo(cost(cheapest, centres, penalty, x), within(ROUNDING));
        }
    }

    /** What a bar knows is the last state of the best path through the bars so far, not the state the whole path has there. */
    @ParameterizedTest
    @CsvSource({"2, 1, 0.5", "2, 2, 3", "3, 1, 1"})
    void theFilterIsTheLastStateOfTheCheapestPathSoFar(int states, int dimension, double penalty) {
        int revised = 0;
        for (int seed = 0; seed < 20; seed++) {
            RandomStream random = RandomStream.of(seed, "jump filter");
            JumpCentres centres = centres(states, dimension, random);
            Observations x = observations(8, dimension, random);
            GaugeFilter filter = Jump.of(centres, penalty, even(states)).filter();
            int[] whole = JumpPath.of(centres, penalty, x).states();
            for (int row = 0; row < x.size(); row++) {
                filter = filter.step(x, row);
                int last = cheapestOfAll(centres, penalty, x.range(0, row + 1))[row];
                for (int k = 0; k < states; k++) {
                    assertThat(filter.probability(k)).isEqualTo(k == last ? 1 : 0);
                    assertThat(filter.probabilities()[k]).isEqualTo(k == last ? 1 : 0);
                }
                revised += whole[row] == last ? 0 : 1;
            }
            assertThat(filter.lastLogDensity()).isEmpty();
        }
        assertThat(revised).isPositive(); // hindsight is another thing
    }

    @Test
    void aMissingRowChangesNothingAndAMissingNumberAddsNothing() {
        JumpCentres centres = JumpCentres.of(2, new double[] {0, 0, 1, 5}, new double[] {1, 2});
        Observations x =
                Observations.withMissingCells(2, new double[] {0.2, 0.1, 0, 0, 0.9, 0, 1.1, 5.2}, new boolean[] {
                    false, false, true, true, false, true, false, false
                });
        assertThat(centres.distances(x, 2)).containsExactly(0.9 * 0.9, (0.9 - 1) * (0.9 - 1));
        assertThat(centres.distances(x, 3)[0]).isCloseTo(1.21 + 2.6 * 2.6, within(ROUNDING));
        Observations without = Observations.withMissingCells(
                2, new double[] {0.2, 0.1, 0.9, 0, 1.1, 5.2}, new boolean[] {false, false, false, true, false, false});
        JumpPath gappy = JumpPath.of(centres, 0.3, x);
        JumpPath plain = JumpPath.of(centres, 0.3, without);
        assertThat(gappy.objective()).isEqualTo(plain.objective());
        assertThat(gappy.states()[3]).isEqualTo(plain.states()[2]);
        Jump jump = Jump.of(centres, 0.3, even(2));
        assertThat(jump.filterAfter(x).probabilities())
                .isEqualTo(jump.filterAfter(without).probabilities());
    }

    @Test
    void tiesStayAndThoseOfTheEndGoToTheLowest() {
        JumpCentres centres = JumpCentres.of(2, new double[] {0, 1}, new double[] {1});
        Observations halfway = Observations.univariate(new double[] {1, 0.5, 0.5, 0.5});
        assertThat(JumpPath.of(centres, 0.25, halfway).states()).containsExactly(1, 1, 1, 1);
        assertThat(JumpPath.of(centres, 0.25, Observations.univariate(new double[] {0.5, 0.5}))
                        .states())
                .containsExactly(0, 0);
        assertThat(JumpPath.of(centres, 1, Observations.univariate(new double[] {0, 1}))
                        .states())
                .containsExactly(0, 0); // staying costs 1, as does changing
    }

    private static double[] even(int states) {
        double[] transition = new double[states * states];
        Arrays.fill(transition, 1.0 / states);
        return transition;
    }

    private static JumpCentres centres(int states, int dimension, RandomStream random) {
        double[] centres = new double[states * dimension];
        for (int i = 0; i < centres.length; i++) {
            centres[i] = 2 * random.nextNormal();
        }
        double[] scales = new double[dimension];
        for (int j = 0; j < dimension; j++) {
            scales[j] = 0.5 + random.nextDouble();
        }
        return JumpCentres.of(states, centres, scales);
    }

    private static Observations observations(int rows, int dimension, RandomStream random) {
        double[] values = new double[rows * dimension];
        for (int i = 0; i < values.length; i++) {
            values[i] = 2 * random.nextNormal();
        }
        return Observations.of(dimension, values, new boolean[rows]);
    }

    static int[] cheapestOfAll(JumpCentres centres, double penalty, Observations x) {
        int states = centres.states();
        int[] best = new int[x.size()];
        double least = Double.POSITIVE_INFINITY;
        for (long code = 0; code < Math.round(Math.pow(states, x.size())); code++) {
            int[] path = decode(code, states, x.size());
            double cost = cost(path, centres, penalty, x);
            if (cost < least) {
                least = cost;
                best = path;
            }
        }
        return best;
    }

    static int[] decode(long code, int states, int rows) {
        int[] path = new int[rows];
        long left = code;
        for (int row = 0; row < rows; row++) {
            path[row] = (int) (left % states);
            left /= states;
        }
        return path;
    }

    static double cost(int[] path, JumpCentres centres, double penalty, Observations x) {
        double cost = 0;
        for (int row = 0; row < path.length; row++) {
            for (int j = 0; j < x.dimension(); j++) {
                cost += Math.pow((x.at(row, j) - centres.centre(path[row], j)) / centres.scale(j), 2);
            }
            cost += row > 0 && path[row] != path[row - 1] ? penalty : 0;
        }
        return cost;
    }
}
