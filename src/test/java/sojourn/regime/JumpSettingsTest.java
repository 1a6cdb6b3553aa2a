package sojourn.regime;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collections;
import java.util.List;
import java.util.function.Supplier;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import sojourn.numeric.RandomStream;

class JumpSettingsTest {
    private static final double ROUNDING = 1e-10;

    /** Over all 2^15 paths, each with the means it makes for centres: the best descent ends at the cheapest. */
    @ParameterizedTest
    @ValueSource(longs = {1, 2, 3, 4, 5, 6})
    void theBestDescentEndsAtTheCheapestOfAllPathsWithTheirMeans(long seed) {
        double[] sizes = sizes(seed, 15, 5);
        Observations x = Observations.univariate(sizes);
        double[] unit = {0.8};
        double best = Double.POSITIVE_INFINITY;
        for (JumpCentres start : new JumpStarts(2, unit, x).all(request(x, sizes), 30)) {
            JumpDescent end = JumpDescent.from(start, 1.5, x);
            assertThat(end.settled()).isTrue();
            best = Math.min(best, end.objective());
        }
        JumpCentres any = JumpCentres.of(2, new double[2], unit);
        double least = Double.POSITIVE_INFINITY;
        for (long code = 0; code < 1 << 15; code++) {
            int[] path = JumpPathTest.decode(code, 2, 15);
            least = Math.min(least, JumpPathTest.cost(path, any.means(x, path), 1.5, x));
        }
        assertThat(best).isCloseTo(least, within(ROUNDING));
    }

    @Test
    void aDescentNeverRisesAndEndsWhereNeitherHalfChangesAnything() {
        double[] sizes = sizes(21, 200, 20);
        Observations x = Observations.univariate(sizes);
        for (JumpCentres start : new JumpStarts(3, new double[] {1}, x).all(request(x, sizes), 20)) {
            JumpDescent end = JumpDescent.from(start, 2, x);
            assertThat(end.objective())
                    .isLessThanOrEqualTo(JumpPath.of(start, 2, x).objective());
            int[] path = end.path().states();
            assertThat(end.centres().means(x, path).toString())
                    .isEqualTo(end.centres().toString());
            assertThat(JumpPath.of(end.centres(), 2, x).states()).isEqualTo(path);
        }
    }

    @Test
    void centresScalesTransitionsAndOccupancyAreThoseOfThePath() {
        double[] sizes = sizes(8, 400, 40);
        Observations x = Observations.univariate(sizes);
        Fit fit = new JumpSettings(2, 5, 5).fit(request(x, sizes), StartRunner.sequential());
        assertThat(fit.outcome()).isEqualTo(Outcome.CONVERGED);
        Jump jump = (Jump) fit.gauge().orElseThrow();
        int[] path = JumpPath.of(jump.centres(), 5, x).states();
        double[] sums = new double[2];
        int[] counts = new int[2];
        int[][] moves = new int[2][2];
        for (int row = 0; row < 400; row++) {
            sums[path[row]] += sizes[row];
            counts[path[row]]++;
            if (row > 0) {
                moves[path[row - 1]][path[row]]++;
            }
        }
        double mean = Arrays.stream(sizes).average().orElseThrow();
        double square =
                Arrays.stream(sizes).map(v -> (v - mean) * (v - mean)).average().orElseThrow();
        assertThat(jump.centres().scale(0)).isCloseTo(Math.sqrt(square), within(ROUNDING));
        for (int i = 0; i < 2; i++) {
            assertThat(jump.centres().centre(i, 0)).isCloseTo(sums[i] / counts[i], within(ROUNDING));
            assertThat(fit.occupancy()[i]).isCloseTo(counts[i] / 400.0, within(ROUNDING));
            for (int j = 0; j < 2; j++) {
                assertThat(jump.transition(i, j))
                        .isCloseTo(moves[i][j] / (double) (moves[i][0] + moves[i][1]), within(ROUNDING));
            }
        }
        assertThat(fit.model()).isEmpty();
        assertThat(jump.centres().centre(0, 0)).isLessThan(jump.centres().centre(1, 0));
    }

    /** The order-by series decides, not the observed one: here the regime of small observations has the larger returns. */
    @Test
    void regimesAreOrderedByTheVolatilityOfReturns() {
        double[] sizes = sizes(9, 300, 30);
        Observations x = Observations.univariate(sizes);
        double[] returns = new double[300];
        for (int row = 0; row < 300; row++) {
            returns[row] = (row % 2 == 0 ? 0.01 : -0.01) / (0.2 + sizes[row]);
        }
        Fit fit = new JumpSettings(2, 5, 5)
                .fit(FitRequest.of(x, returns, Companions.of(1, returns), 1, Fixtures.DATE), StartRunner.sequential());
        Jump jump = (Jump) fit.gauge().orElseThrow();
        assertThat(jump.centres().centre(0, 0)).isGreaterThan(jump.centres().centre(1, 0));
        assertThat(fit.orderBy()[0]).isLessThan(fit.orderBy()[1]);
    }

    /** Whatever the unit and the origin of each series: a power of two and a shift that loses no digit of them. */
    @Test
    void unitsDoNotMatter() {
        double[] sizes = sizes(10, 300, 30);
        double[] other = Arrays.stream(sizes).map(v -> 4096 * v).toArray();
        Fit one =
                new JumpSettings(3, 4, 5).fit(request(Observations.univariate(sizes), sizes), StartRunner.sequential());
        Fit two =
                new JumpSettings(3, 4, 5).fit(request(Observations.univariate(other), sizes), StartRunner.sequential());
        assertThat(two.occupancy()).isEqualTo(one.occupancy());
        for (int k = 0; k < 3; k++) {
            assertThat(((Jump) two.gauge().orElseThrow()).centres().centre(k, 0))
                    .isEqualTo(
                            4096 * ((Jump) one.gauge().orElseThrow()).centres().centre(k, 0));
        }
    }

    @Test
    void severalSeriesWithGapsAreFittedTogether() {
        double[] first = sizes(11, 300, 30);
        double[] second = sizes(12, 300, 30);
        double[] values = new double[600];
        boolean[] missing = new boolean[600];
        for (int row = 0; row < 300; row++) {
            values[2 * row] = first[row];
            values[2 * row + 1] = 100 * second[row];
            missing[2 * row + 1] = row % 5 == 0;
            missing[2 * row] = row % 15 == 0; // then the whole row
        }
        Observations x = Observations.withMissingCells(2, values, missing);
        Fit fit = new JumpSettings(2, 5, 10).fit(request(x, first), StartRunner.sequential());
        assertThat(fit.outcome()).isEqualTo(Outcome.CONVERGED);
        assertThat(fit.observations()).isEqualTo(280);
        JumpCentres centres = ((Jump) fit.gauge().orElseThrow()).centres();
        assertThat(centres.dimension()).isEqualTo(2);
        assertThat(centres.centre(1, 0)).isGreaterThan(centres.centre(0, 0));
        assertThat(centres.centre(1, 1)).isGreaterThan(centres.centre(0, 1));
        assertThat(centres.scale(1)).isBetween(50 * centres.scale(0), 200 * centres.scale(0));
    }

    @Test
    void neitherThreadsNorTheRunnersOrderNorTheSeedChangeAClearFit() {
        double[] sizes = sizes(13, 400, 40);
        Observations x = Observations.univariate(sizes);
        StartRunner backwards = new StartRunner() {
            @Override
            public <T> List<T> run(List<Supplier<T>> starts) {
                List<T> results = new ArrayList<>(Collections.nCopies(starts.size(), null));
                for (int i = starts.size() - 1; i >= 0; i--) {
                    results.set(i, starts.get(i).get());
                }
                return results;
            }
        };
        Fit plain = new JumpSettings(2, 5, 8).fit(request(x, sizes), StartRunner.sequential());
        Fit turned = new JumpSettings(2, 5, 8).fit(request(x, sizes), backwards);
        assertSame(plain, turned);
        int agreeing = 0;
        for (long seed = 1; seed <= 20; seed++) {
            Fit other = new JumpSettings(2, 5, 8)
                    .fit(
                            FitRequest.of(x, sizes, Companions.of(1, sizes), seed, Fixtures.DATE),
                            StartRunner.sequential());
            assertSame(plain, other);
            agreeing += other.startsAgreeing();
        }
        assertThat(agreeing).isGreaterThan(20);
    }

    /** Against every descent run again one by one. */
    @Test
    void theRunnerUpIsTheLowestOfTheDescentsThatEndedHigher() {
        double[] sizes = sizes(21, 200, 20);
        Observations x = Observations.univariate(sizes);
        FitRequest request = request(x, sizes);
        Fit fit = new JumpSettings(3, 2, 20).fit(request, StartRunner.sequential());
        double[] scale = {((Jump) fit.gauge().orElseThrow()).centres().scale(0)};
        double[] objectives = new JumpStarts(3, scale, x)
                .all(request, 20).stream()
                        .mapToDouble(start -> JumpDescent.from(start, 2, x).objective())
                        .sorted()
                        .toArray();
        int second = fit.startsAgreeing();
        assertThat(objectives[second - 1]).isCloseTo(objectives[0], within(ROUNDING));
        RunnerUp next = fit.runnerUp().orElseThrow();
        assertThat(next.gap())
                .isCloseTo(objectives[second] - objectives[0], within(ROUNDING))
                .isGreaterThan(ROUNDING);
        assertThat(next.starts()).isEqualTo((int) Arrays.stream(objectives)
                .filter(one -> Math.abs(one - objectives[second]) < ROUNDING)
                .count());
    }

    @Test
    void aDescentThatDidNotSettleIsUsableAndSaysSo() {
        double[] sizes = sizes(21, 200, 20);
        Observations x = Observations.univariate(sizes);
        FitRequest request = request(x, sizes);
        JumpCentres start =
                new JumpStarts(2, new double[] {1}, x).all(request, 2).get(1);
        JumpDescent broken = JumpDescent.from(start, 2, x, 1);
        assertThat(broken.settled()).isFalse();
        Fit fit = new JumpSettings(2, 2, 1).choose(request, List.of(broken));
        assertThat(fit.outcome()).isEqualTo(Outcome.ITERATION_LIMIT);
        assertThat(fit.explanation()).contains("still changing").contains("usable");
    }

    private static void assertSame(Fit expected, Fit got) {
        JumpCentres a = ((Jump) expected.gauge().orElseThrow()).centres();
        JumpCentres b = ((Jump) got.gauge().orElseThrow()).centres();
        assertThat(b.toString()).isEqualTo(a.toString());
        assertThat(got.occupancy()).isEqualTo(expected.occupancy());
    }

    @Test
    void theFitBeforeIsOneMoreStartAndIsMatchedTo() {
        double[] sizes = sizes(14, 300, 30);
        Observations x = Observations.univariate(sizes);
        FitRequest cold = request(x, sizes);
        Fit first = new JumpSettings(2, 5, 3).fit(cold, StartRunner.sequential());
        Fit second = new JumpSettings(2, 5, 3).fit(cold.after(first), StartRunner.sequential());
        assertThat(first.starts()).isEqualTo(3);
        assertThat(second.starts()).isEqualTo(4);
        assertThat(second.events()).noneMatch(event -> event.startsWith("swap"));
        double[] against = Arrays.stream(sizes).map(v -> 0.01 / (0.2 + v)).toArray();
        for (int row = 0; row < 300; row += 2) {
            against[row] = -against[row];
        }
        FitRequest turned = FitRequest.of(x, against, Companions.of(1, sizes), 1, Fixtures.DATE);
        assertThat(new JumpSettings(2, 5, 3)
                        .fit(turned.after(first), StartRunner.sequential())
                        .events())
                .contains("swap {0}->{1}", "swap {1}->{0}");
    }

    @Test
    void awkwardDataGiveAReason() {
        double[] constant = new double[300];
        Arrays.fill(constant, 0.01);
        assertThat(explanation(constant, 2)).contains("equal");
        assertThat(explanation(new double[] {1, 2, 3, 4, 5, 6, 7, 8, 9}, 2))
                .contains("9 observations")
                .contains("10");
        double[] huge = sizes(1, 100, 10);
        huge[3] = 1e300;
        assertThat(explanation(huge, 2)).contains("too large");
        double[] few = new double[100];
        few[50] = 1; // two values, one of them once
        Fit degenerate = fit(few, 2);
        assertThat(degenerate.outcome()).isEqualTo(Outcome.DEGENERATE);
        assertThat(degenerate.explanation()).contains("of 100 observations, fewer than the 5 it needs");
        Fit dear = new JumpSettings(2, 1e6, 3).fit(Fixtures.request(sizes(1, 100, 10)), StartRunner.sequential());
        assertThat(dear.explanation()).endsWith("; the penalty keeps the path in one regime, lower it");
        assertThat(degenerate.explanation()).doesNotContain("penalty");
        assertThat(fit(few, 1).outcome()).isEqualTo(Outcome.CONVERGED);
        boolean[] never = {true, false, true, false, true, false, true, false, true, false, true, false};
        double[] two = new double[24];
        boolean[] missing = new boolean[24];
        for (int cell = 0; cell < 24; cell++) {
            two[cell] = cell;
            missing[cell] = never[cell / 2] == (cell % 2 == 0); // the two series are never there together
        }
        Observations apart = Observations.withMissingCells(2, two, missing);
        assertThat(new JumpSettings(2, 5, 3)
                        .fit(request(apart, new double[12]), StartRunner.sequential())
                        .explanation())
                .contains("no row")
                .contains("every series");
    }

    @Test
    void whatNoDataCouldFitIsRefused() {
        assertThatThrownBy(() -> new JumpSettings(0, 1, 1)).hasMessageContaining("states");
        assertThatThrownBy(() -> new JumpSettings(2, -1, 1)).hasMessageContaining("penalty");
        assertThatThrownBy(() -> new JumpSettings(2, Double.NaN, 1)).hasMessageContaining("penalty");
        assertThatThrownBy(() -> new JumpSettings(2, 1, 0)).hasMessageContaining("starts");
    }

    private static String explanation(double[] x, int states) {
        Fit fit = fit(x, states);
        assertThat(fit.outcome()).isEqualTo(Outcome.FAILED);
        return fit.explanation();
    }

    private static Fit fit(double[] x, int states) {
        return new JumpSettings(states, 5, 5)
                .fit(request(Observations.univariate(x), new double[x.length]), StartRunner.sequential());
    }

    private static FitRequest request(Observations x, double[] returns) {
        return FitRequest.of(x, returns, Companions.of(1, returns), 1, Fixtures.DATE);
    }

    /** Sizes of moves that are small and large by turns, so many rows each. */
    private static double[] sizes(long seed, int rows, int turn) {
        RandomStream random = RandomStream.of(seed, "sizes");
        double[] x = new double[rows];
        for (int row = 0; row < rows; row++) {
            x[row] = ((row / turn) % 2 == 0 ? 0.5 : 2) * Math.abs(random.nextNormal());
        }
        return x;
    }
}
