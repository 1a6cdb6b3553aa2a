package sojourn.walk;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.Optional;
import org.junit.jupiter.api.Test;
import sojourn.GivenPrices;
import sojourn.regime.Fit;

/** Which asset's volatility gives the regimes their order. */
class OrderByTest {
    private static final GivenPrices PRICES = Walks.weathers(41, 300, 2);
    private static final RefitSettings REFIT = Walks.expanding(250, Walks.every(1000));

    @Test
    void theObservedAssetOrdersTheRegimesUnlessAnotherIsNamed() {
        Fit fit = only(Walks.forward(PRICES, Walks.twoRegimes(), REFIT));
        assertThat(deviation(fit, 0)).isLessThan(deviation(fit, 1));
        assertThat(fit.orderBy()[0]).isLessThan(fit.orderBy()[1]);
    }

    @Test
    void anotherAssetThatIsWildInCalmTurnsTheOrderRound() {
        RegimeSettings byA = Walks.twoRegimes();
        RegimeSettings byB = new RegimeSettings(
                byA.model(), byA.observe(), byA.states(), byA.emission(), Optional.of("b"), Optional.empty());
        RegimeTimeline own = Walks.forward(PRICES, byA, REFIT);
        RegimeTimeline other = Walks.forward(PRICES, byB, REFIT);
        Fit first = only(own);
        Fit second = only(other);
        assertThat(second.orderBy()[0]).isLessThan(second.orderBy()[1]);
        assertThat(deviation(second, 0)).isEqualTo(deviation(first, 1));
        assertThat(deviation(second, 1)).isEqualTo(deviation(first, 0));
        for (int bar = 250; bar < 300; bar++) {
            assertThat(other.probability(bar, 0)).isEqualTo(own.probability(bar, 1));
        }
    }

    private static Fit only(RegimeTimeline timeline) {
        assertThat(timeline.fits()).hasSize(1);
        return timeline.fits().get(0).fit();
    }

    private static double deviation(Fit fit, int state) {
        return fit.model().orElseThrow().emission().standardDeviation(state, 0);
    }
}
