package sojourn.walk;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;
import sojourn.GivenPrices;
import sojourn.regime.Fit;
import sojourn.regime.WindowMoments;

/** Whatever regimes were found, their means and shares make up the window's own mean. */
class WindowMeansTest {
    private static final GivenPrices PRICES = Walks.weathers(43, 300, 2);
    /** Means of a few per thousand over a few hundred rows. */
    private static final double ROUNDING = 1e-15;

    private final Fit fit = Walks.forward(PRICES, Walks.twoRegimes(), Walks.expanding(250, Walks.every(1000)))
            .fits()
            .get(0)
            .fit();
    private final WindowMoments moments = fit.moments().orElseThrow();

    @Test
    void theOverallMeanIsThePlainMeanOfTheWindow() {
        for (int asset = 0; asset < 2; asset++) {
            double sum = 0;
            for (int bar = 1; bar <= 250; bar++) {
                sum += PRICES.close(asset, bar) / PRICES.close(asset, bar - 1) - 1;
            }
            assertThat(moments.overallMean(asset)).isCloseTo(sum / 250, within(ROUNDING));
            assertThat(moments.mean(0, asset)).isNotCloseTo(moments.mean(1, asset), within(1e-5));
        }
    }

    @Test
    void sharesAreOccupancies() {
        assertThat(moments.share(0)).isCloseTo(fit.occupancy()[0], within(1e-12));
        assertThat(moments.share(0) + moments.share(1)).isCloseTo(1, within(1e-12));
    }

    @Test
    void shrinkingAllTheWayLeavesOneMeanAndTheSameCovariances() {
        WindowMoments half = moments.shrinkingMeans(0.5);
        WindowMoments all = moments.shrinkingMeans(1);
        for (int k = 0; k < 2; k++) {
            assertThat(all.mean(k, 1)).isCloseTo(moments.overallMean(1), within(ROUNDING));
            assertThat(half.mean(k, 1)).isCloseTo((moments.mean(k, 1) + moments.overallMean(1)) / 2, within(ROUNDING));
            assertThat(all.covariance(k, 0, 1)).isEqualTo(moments.covariance(k, 0, 1));
        }
        assertThat(half.overallMean(0)).isCloseTo(moments.overallMean(0), within(ROUNDING));
    }
}
