package sojourn.regime;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import org.junit.jupiter.api.Test;
import sojourn.numeric.RandomStream;

/** What a window of given probabilities says: against the definitions, written out plainly. */
class GivenProbabilitiesTest {
    private static final double ROUNDING = 1e-14;
    private static final int ROWS = 60;

    private final double[] stormy = new double[ROWS];
    private final double[] returns = new double[ROWS];
    private final boolean[] missing = new boolean[ROWS];

    GivenProbabilitiesTest() {
        RandomStream random = RandomStream.of(5, "given");
        for (int t = 0; t < ROWS; t++) {
            stormy[t] = random.nextDouble();
            returns[t] = 0.01 * random.nextNormal();
        }
    }

    @Test
    void meansAndVariancesAreTheReturnsWeightedByTheProbabilities() {
        Fit fit = fit();
        for (int k = 0; k < 2; k++) {
            double weight = 0;
            double first = 0;
            for (int t = 0; t < ROWS; t++) {
                weight += p(t, k);
                first += p(t, k) * returns[t];
            }
            double mean = first / weight;
            double second = 0;
            for (int t = 0; t < ROWS; t++) {
                second += p(t, k) * (returns[t] - mean) * (returns[t] - mean);
            }
            WindowMoments moments = fit.moments().orElseThrow();
            assertThat(moments.mean(k, 0)).isCloseTo(mean, within(ROUNDING));
            assertThat(moments.covariance(k, 0, 0)).isCloseTo(second / weight, within(ROUNDING));
            assertThat(fit.occupancy()[k]).isCloseTo(weight / ROWS, within(ROUNDING));
        }
    }

    @Test
    void theFitIsGivenNotSearchedForAndHasNoLikelihood() {
        Fit fit = fit();
        assertThat(fit.outcome()).isEqualTo(Outcome.GIVEN);
        assertThat(fit.starts()).isZero();
        assertThat(fit.model()).isEmpty();
        assertThat(fit.gauge().orElseThrow().filter().lastLogDensity()).isEmpty();
    }

    @Test
    void theFilterRepeatsTheRowsAndGoesOnWithTheLastWhereOneIsMissing() {
        missing[7] = true;
        Observations x = observations();
        GaugeFilter filter = fit().gauge().orElseThrow().filter();
        for (int t = 0; t < 9; t++) {
            filter = filter.step(x, t);
            int there = t == 7 ? 6 : t;
            assertThat(filter.probabilities()).containsExactly(1 - stormy[there], stormy[there]);
            assertThat(filter.lastLogDensity()).isEmpty();
        }
    }

    /** Names belong to columns: the regimes are not put in another order, however volatile, and that is told. */
    @Test
    void theRegimesKeepTheOrderOfTheirColumns() {
        for (int t = 0; t < ROWS; t++) {
            stormy[t] = t < ROWS / 2 ? 0 : 1;
            returns[t] *= t < ROWS / 2 ? 3 : 0.3;
        }
        Fit fit = fit();
        assertThat(fit.orderBy()[0]).isGreaterThan(fit.orderBy()[1]);
        assertThat(fit.events()).contains("not-ascending {0}/{1}");
        assertThat(fit.gauge().orElseThrow().filterAfter(observations()).probabilities())
                .containsExactly(0, 1);
    }

    @Test
    void inAnotherOrderItSaysTheSameUnderOtherNumbers() {
        Gauge gauge = fit().gauge().orElseThrow();
        Gauge turned = gauge.ordered(new int[] {1, 0});
        assertThat(turned.transition(0, 1)).isEqualTo(gauge.transition(1, 0));
        assertThat(turned.filterAfter(observations()).probability(0))
                .isEqualTo(gauge.filterAfter(observations()).probability(1));
    }

    @Test
    void aRegimeThatNeverIsHasTheMomentsOfTheWindow() {
        Arrays.fill(stormy, 0);
        Fit fit = fit();
        WindowMoments moments = fit.moments().orElseThrow();
        assertThat(fit.outcome()).isEqualTo(Outcome.GIVEN);
        assertThat(moments.mean(1, 0)).isEqualTo(moments.mean(0, 0));
        assertThat(fit.gauge().orElseThrow().transition(1, 1)).isEqualTo(1);
        assertThat(fit.events()).contains("moments-of-window {1}");
    }

    private double p(int row, int state) {
        return state == 1 ? stormy[row] : 1 - stormy[row];
    }

    private Observations observations() {
        double[] cells = new double[2 * ROWS];
        boolean[] gaps = new boolean[2 * ROWS];
        for (int t = 0; t < ROWS; t++) {
            cells[2 * t] = 1 - stormy[t];
            cells[2 * t + 1] = stormy[t];
            Arrays.fill(gaps, 2 * t, 2 * t + 2, missing[t]);
        }
        return Observations.withMissingCells(2, cells, gaps);
    }

    private Fit fit() {
        FitRequest request =
                FitRequest.of(observations(), returns, Companions.of(1, returns, new boolean[ROWS]), 1, "2020-01-01");
        return new GivenProbabilitiesSettings(2).fit(request, StartRunner.sequential());
    }
}
