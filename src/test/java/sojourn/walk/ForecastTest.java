package sojourn.walk;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import sojourn.GivenPrices;
import sojourn.regime.EmissionFamily;
import sojourn.regime.ModelKind;
import sojourn.regime.Observations;
import sojourn.regime.RegimeModel;
import sojourn.regime.Smoothed;
import sojourn.regime.WindowMoments;

/** Moments of coming returns, from regimes' moments and probabilities. */
class ForecastTest {
    private static final double ROUNDING = 1e-15;

    @Test
    void forecastsSumOverEveryPathOfRegimes() {
        RegimeTimeline timeline =
                Walks.forward(Walks.weathers(31, 260, 2), Walks.twoRegimes(), Walks.expanding(200, Walks.every(40)));
        for (int bar = 200; bar < 260; bar += 7) {
            Reading reading = timeline.reading(bar).orElseThrow();
            FitRecord record = timeline.fits().get(reading.fit() - 1);
            for (int ahead = 1; ahead <= 4; ahead++) {
                double[] q = overPaths(reading, record.fit().model().orElseThrow(), ahead);
                assertMoments(reading.forecast(ahead), q, record.fit().moments().orElseThrow());
            }
        }
    }

    @Test
    void regimeMomentsOfEveryAssetAreWeightedByTheWindowsPosterior() {
        GivenPrices prices = Walks.weathers(32, 260, 3);
        RegimeTimeline timeline = Walks.forward(prices, Walks.twoRegimes(), Walks.rolling(150, 200, Walks.every(1000)));
        FitRecord record = timeline.fits().get(0);
        int start = record.bar() - 149;
        double[] x = new double[150];
        double[][] returns = new double[150][3];
        for (int row = 0; row < 150; row++) {
            x[row] = StrictMath.log(prices.close(0, start + row) / prices.close(0, start + row - 1));
            for (int a = 0; a < 3; a++) {
                returns[row][a] = prices.close(a, start + row) / prices.close(a, start + row - 1) - 1;
            }
        }
        RegimeModel model = record.fit().model().orElseThrow();
        Smoothed posterior = Smoothed.of(model, Observations.univariate(x));
        WindowMoments moments = record.fit().moments().orElseThrow();
        for (int k = 0; k < 2; k++) {
            for (int a = 0; a < 3; a++) {
                assertThat(moments.mean(k, a)).isCloseTo(weighted(posterior, k, returns, a, a, 1), within(1e-14));
                for (int b = 0; b < 3; b++) {
                    double product = weighted(posterior, k, returns, a, b, 2);
                    assertThat(moments.covariance(k, a, b))
                            .isCloseTo(product - moments.mean(k, a) * moments.mean(k, b), within(1e-14));
                }
            }
        }
        assertThat(moments.covariance(0, 1, 1)).isGreaterThan(moments.covariance(1, 1, 1)); // b rests in a's storms
    }

    @Test
    void aZeroMeanEmissionExpectsTheCashRateOfEachClose() {
        GivenPrices given = Walks.weathers(33, 260, 2);
        double[] cash = new double[260];
        for (int bar = 0; bar < 260; bar++) {
            cash[bar] = 1e-4 + 1e-6 * bar;
        }
        RegimeSettings zeroMean = new RegimeSettings(
                ModelKind.HIDDEN_MARKOV,
                List.of(new LogReturn("a")),
                List.of("calm", "stormy"),
                EmissionFamily.NORMAL_ZERO_MEAN,
                Optional.empty(),
                Optional.empty());
        RegimeTimeline timeline = Walks.forward(given.withCash(cash), zeroMean, Walks.expanding(200, Walks.every(40)));
        for (int bar = 200; bar < 260; bar++) {
            Reading reading = timeline.reading(bar).orElseThrow();
            WindowMoments moments =
                    timeline.fits().get(reading.fit() - 1).fit().moments().orElseThrow();
            double[] q = reading.predicted(1);
            for (int a = 0; a < 2; a++) {
                assertThat(reading.forecast(1).mean(a)).isCloseTo(cash[bar], within(ROUNDING));
                double variance = q[0] * moments.covariance(0, a, a) + q[1] * moments.covariance(1, a, a);
                assertThat(reading.forecast(1).volatility(a)).isCloseTo(Math.sqrt(variance), within(ROUNDING));
            }
        }
    }

    /** P(regime in {@code ahead} bars), each path of regimes weighed on its own. */
    private static double[] overPaths(Reading reading, RegimeModel model, int ahead) {
        double[] q = new double[2];
        for (int path = 0; path < 1 << (ahead + 1); path++) {
            double weight = reading.filtered(path & 1);
            for (int step = 1; step <= ahead; step++) {
                weight *= model.transition(path >> (step - 1) & 1, path >> step & 1);
            }
            q[path >> ahead & 1] += weight;
        }
        return q;
    }

    /** By raw moments: E[r_a], E[r_a r_b] - E[r_a] E[r_b]. */
    private static void assertMoments(Forecast forecast, double[] q, WindowMoments moments) {
        for (int a = 0; a < 2; a++) {
            double meanA = q[0] * moments.mean(0, a) + q[1] * moments.mean(1, a);
            assertThat(forecast.mean(a)).isCloseTo(meanA, within(ROUNDING));
            for (int b = 0; b < 2; b++) {
                double meanB = q[0] * moments.mean(0, b) + q[1] * moments.mean(1, b);
                double product = 0;
                for (int k = 0; k < 2; k++) {
                    product += q[k] * (moments.covariance(k, a, b) + moments.mean(k, a) * moments.mean(k, b));
                }
                assertThat(forecast.covariance(a, b)).isCloseTo(product - meanA * meanB, within(ROUNDING));
            }
            assertThat(forecast.volatility(a)).isEqualTo(Math.sqrt(forecast.covariance(a, a)));
        }
    }

    /** Mean of asset a's return (power 1) or of the product of a's and b's (power 2). */
    private static double weighted(Smoothed posterior, int k, double[][] returns, int a, int b, int power) {
        double sum = 0;
        double weight = 0;
        for (int row = 0; row < returns.length; row++) {
            sum += posterior.at(row, k) * returns[row][a] * (power == 2 ? returns[row][b] : 1);
            weight += posterior.at(row, k);
        }
        return sum / weight;
    }
}
