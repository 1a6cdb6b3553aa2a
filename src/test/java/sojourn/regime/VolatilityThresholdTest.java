package sojourn.regime;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collections;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import sojourn.numeric.RandomStream;

/** The threshold against its definition written out once more, the plain way: every volatility from all observations before it. */
class VolatilityThresholdTest {
    private static final int ROWS = 400;
    /** Two orders of summing the same squares. */
    private static final double ROUNDING = 1e-12;

    private static final VolatilityThresholdSettings WEIGHTED =
            new VolatilityThresholdSettings(new RecentVolatility.Exponential(0.9), 0.8, 0.6);
    private static final VolatilityThresholdSettings ROLLING =
            new VolatilityThresholdSettings(new RecentVolatility.Rolling(10), 0.75, 0.75);

    @ParameterizedTest
    @ValueSource(longs = {1, 2, 3, 4})
    void levelsStatesTransitionsAndOccupancyFollowFromTheDefinition(long seed) {
        Observations x = gappy(seed);
        for (VolatilityThresholdSettings settings : List.of(WEIGHTED, ROLLING)) {
            Fit fit = fit(settings, x);
            assertThat(fit.outcome()).isEqualTo(Outcome.CONVERGED);
            VolatilityThreshold gauge = (VolatilityThreshold) fit.gauge().orElseThrow();
            List<Double> volatilities = new ArrayList<>();
            for (int row = 0; row < ROWS; row++) {
                double now = volatility(settings.volatility(), x, row);
                if (now >= 0 && !x.missing(row)) {
                    volatilities.add(now);
                }
            }
            double storm = quantile(volatilities, settings.stormAbove());
            double calm = quantile(volatilities, settings.calmBelow());
            assertThat(gauge.levels().stormAbove()).isCloseTo(storm, within(ROUNDING));
            assertThat(gauge.levels().calmBelow()).isCloseTo(calm, within(ROUNDING));
            int[] path = new int[ROWS];
            GaugeFilter filter = gauge.filter();
            for (int row = 0; row < ROWS; row++) {
                int before = row == 0 ? 0 : path[row - 1];
                double now = volatility(settings.volatility(), x, row);
                path[row] = x.missing(row) || now < 0
                        ? before
                        : before == 0 ? (now > storm ? 1 : 0) : (now <= calm ? 0 : 1);
                filter = filter.step(x, row);
                assertThat(filter.probabilities())
                        .as("row " + row)
                        .containsExactly(path[row] == 0 ? 1 : 0, path[row] == 1 ? 1 : 0);
                assertThat(filter.lastLogDensity()).isEmpty();
            }
            int first = 0;
            while (x.missing(first) || volatility(settings.volatility(), x, first) < 0) {
                first++;
            }
            assertCounts(gauge, fit, path, first, x);
        }
    }

    /** Counts begin at the first row that has a volatility: nobody could have told a regime before. */
    private static void assertCounts(VolatilityThreshold gauge, Fit fit, int[] path, int first, Observations x) {
        int[][] moves = new int[2][2];
        int stormy = 0;
        int judged = 0;
        for (int row = first; row < ROWS; row++) {
            if (row + 1 < ROWS) {
                moves[path[row]][path[row + 1]]++;
            }
            stormy += x.missing(row) ? 0 : path[row];
            judged += x.missing(row) ? 0 : 1;
        }
        for (int i = 0; i < 2; i++) {
            for (int j = 0; j < 2; j++) {
                assertThat(gauge.transition(i, j))
                        .isCloseTo(moves[i][j] / (double) (moves[i][0] + moves[i][1]), within(ROUNDING));
            }
        }
        assertThat(fit.occupancy()[1]).isCloseTo(stormy / (double) judged, within(ROUNDING));
        assertThat(fit.orderBy()[1]).isGreaterThan(fit.orderBy()[0]);
        assertThat(fit.model()).isEmpty();
        assertThat(fit.moments()).isPresent();
    }

    /** 251 returns of 3 % before there is a volatility, then none above 2 %: no regime's returns may deviate by more than that. */
    @Test
    void rowsBeforeTheFirstVolatilityBelongToNoRegime() {
        double[] x = new double[500];
        for (int row = 0; row < x.length; row++) {
            double size = row < 251 ? 0.03 : row % 2 == 0 ? 0.004 : 0.02;
            x[row] = row / 2 % 2 == 0 ? size : -size;
        }
        VolatilityThresholdSettings slow = new VolatilityThresholdSettings(new RecentVolatility.Rolling(252), 0.8, 0.6);
        Fit fit = fit(slow, Observations.univariate(x));
        assertThat(fit.outcome()).isEqualTo(Outcome.CONVERGED);
        assertThat(Arrays.stream(fit.orderBy()).max().orElseThrow()).isLessThanOrEqualTo(0.02);
        assertThat(fit.moments().orElseThrow().covariance(0, 0, 0)).isLessThanOrEqualTo(0.02 * 0.02);
        assertThat(fit.moments().orElseThrow().covariance(1, 0, 0)).isLessThanOrEqualTo(0.02 * 0.02);
    }

    /** Twice the returns, twice the levels, the same storms. */
    @Test
    void theUnitOfTheReturnsDoesNotMatter() {
        double[] x = weathers(7);
        double[] large = Arrays.stream(x).map(v -> 1024 * v).toArray(); // a power of two: exact
        Fit one = fit(WEIGHTED, Observations.univariate(x));
        Fit other = fit(WEIGHTED, Observations.univariate(large));
        assertThat(levels(other).stormAbove()).isEqualTo(1024 * levels(one).stormAbove());
        assertThat(other.occupancy()).isEqualTo(one.occupancy());
    }

    @Test
    void anotherOrderOfStatesIsTheSameGaugeWithItsNamesChanged() {
        Observations x = Observations.univariate(weathers(3));
        Gauge gauge = fit(WEIGHTED, x).gauge().orElseThrow();
        Gauge turned = gauge.ordered(new int[] {1, 0});
        for (int rows = 0; rows <= ROWS; rows += 25) {
            double[] plain = gauge.filterAfter(x.range(0, rows)).probabilities();
            assertThat(turned.filterAfter(x.range(0, rows)).probabilities()).containsExactly(plain[1], plain[0]);
        }
        assertThat(turned.transition(0, 1)).isEqualTo(gauge.transition(1, 0));
        assertThat(turned.ordered(new int[] {1, 0}).filterAfter(x).probabilities())
                .isEqualTo(gauge.filterAfter(x).probabilities());
    }

    @Test
    void aConstantSeriesHasOneVolatility() {
        double[] x = new double[300];
        Arrays.fill(x, 0.01);
        for (VolatilityThresholdSettings settings : List.of(WEIGHTED, ROLLING)) {
            Fit fit = fit(settings, Observations.univariate(x));
            assertThat(fit.outcome()).isEqualTo(Outcome.FAILED);
            assertThat(fit.explanation()).contains("same throughout");
            assertThat(fit.gauge()).isEmpty();
        }
    }

    @Test
    void tooFewObservationsAreRefusedWithTheNumberThatIsNeeded() {
        Fit fit = fit(ROLLING, Observations.univariate(weathers(1)).range(0, 28));
        assertThat(fit.outcome()).isEqualTo(Outcome.FAILED);
        assertThat(fit.explanation()).contains("28 observations").contains("at least 29"); // 9 before the first of 20
        assertThat(fit(ROLLING, Observations.univariate(weathers(1)).range(0, 29))
                        .explanation())
                .doesNotContain("at least");
    }

    @Test
    void aQuantileSoFarOutThatHardlyARowIsStormyIsDegenerate() {
        VolatilityThresholdSettings far =
                new VolatilityThresholdSettings(new RecentVolatility.Rolling(5), 0.999, 0.999);
        Fit fit = fit(far, Observations.univariate(weathers(2)));
        assertThat(fit.outcome()).isEqualTo(Outcome.DEGENERATE);
        assertThat(fit.explanation()).contains("{1} accounts for 1 of 396 observations, fewer than the 5 it needs");
    }

    @Test
    void aRangeBeyondDoublePrecisionAndAWindowOfNothingAreRefused() {
        double[] x = weathers(1);
        x[200] = 1e200;
        assertThat(fit(WEIGHTED, Observations.univariate(x)).explanation()).contains("too large to square");
        boolean[] missing = new boolean[50];
        Arrays.fill(missing, true);
        assertThat(fit(WEIGHTED, Observations.of(1, new double[50], missing)).explanation())
                .contains("no observation");
    }

    @Test
    void levelsTheWrongWayRoundAreRefused() {
        RecentVolatility any = new RecentVolatility.Rolling(5);
        assertThatThrownBy(() -> new VolatilityThresholdSettings(any, 0.5, 0.6)).hasMessageContaining("0.6");
        assertThatThrownBy(() -> new VolatilityThresholdSettings(any, 1, 0.6)).hasMessageContaining("1.0");
        assertThatThrownBy(() -> new VolatilityThresholdSettings(any, Double.NaN, Double.NaN))
                .hasMessageContaining("NaN");
        assertThatThrownBy(() -> new VolatilityThreshold.Levels(0.1, 0.2)).hasMessageContaining("0.2");
    }

    private static VolatilityThreshold.Levels levels(Fit fit) {
        return ((VolatilityThreshold) fit.gauge().orElseThrow()).levels();
    }

    private static Fit fit(VolatilityThresholdSettings settings, Observations x) {
        double[] returns = new double[x.size()];
        for (int row = 0; row < returns.length; row++) {
            returns[row] = x.missing(row) ? 0 : x.at(row, 0);
        }
        FitRequest request = FitRequest.of(x, returns, Companions.of(1, returns), 1, Fixtures.DATE);
        return settings.fit(request, StartRunner.sequential());
    }

    /** The volatility at a row from the definition; -1 where there is none. */
    private static double volatility(RecentVolatility kind, Observations x, int row) {
        List<Double> seen = new ArrayList<>();
        for (int t = 0; t <= row; t++) {
            if (!x.missing(t)) {
                seen.add(x.at(t, 0));
            }
        }
        if (kind instanceof RecentVolatility.Rolling rolling) {
            int n = rolling.observations();
            if (seen.size() < n) {
                return -1;
            }
            List<Double> last = seen.subList(seen.size() - n, seen.size());
            double mean = last.stream().mapToDouble(v -> v).sum() / n;
            return Math.sqrt(
                    last.stream().mapToDouble(v -> (v - mean) * (v - mean)).sum() / (n - 1));
        }
        double decay = ((RecentVolatility.Exponential) kind).decay();
        if (seen.isEmpty()) {
            return -1;
        }
        double sum = Math.pow(decay, seen.size() - 1) * seen.get(0) * seen.get(0); // the recursion written out
        for (int back = 0; back + 1 < seen.size(); back++) {
            double v = seen.get(seen.size() - 1 - back);
            sum += (1 - decay) * Math.pow(decay, back) * v * v;
        }
        return Math.sqrt(sum);
    }

    /** The value below which a share q of the steps between ascending values lies. */
    private static double quantile(List<Double> values, double q) {
        List<Double> ascending = new ArrayList<>(values);
        Collections.sort(ascending);
        double step = 1.0 / (ascending.size() - 1);
        int i = 0;
        while ((i + 1) * step < q) {
            i++;
        }
        double share = (q - i * step) / step;
        return (1 - share) * ascending.get(i) + share * ascending.get(i + 1);
    }

    private static Observations gappy(long seed) {
        boolean[] missing = new boolean[ROWS];
        for (int row = 0; row < ROWS; row++) {
            missing[row] = row % 11 == 4;
        }
        return Observations.of(1, weathers(seed), missing);
    }

    private static double[] weathers(long seed) {
        RandomStream random = RandomStream.of(seed, "threshold");
        double[] x = new double[ROWS];
        for (int row = 0; row < ROWS; row++) {
            x[row] = ((row / 50) % 2 == 0 ? 0.006 : 0.02) * random.nextNormal();
        }
        return x;
    }
}
