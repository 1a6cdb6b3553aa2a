package sojourn.walk;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import sojourn.GivenPrices;
import sojourn.regime.EmissionFamily;
import sojourn.regime.Fit;
import sojourn.regime.ModelKind;
import sojourn.regime.WindowMoments;

/**
 * A series that is published late: closes of the last bars, which nobody knew yet, change nothing that a fit says, whether the
 * series orders the regimes or not. Expected: the invariant itself.
 */
class LateSeriesTest {
    private static final int BARS = 251;
    private static final int LATE = 3;
    private static final RefitSettings REFIT = Walks.expanding(200, Walks.every(1));

    private static RegimeSettings regimes(String orderBy, Observation... observed) {
        return new RegimeSettings(
                ModelKind.HIDDEN_MARKOV,
                List.of(observed),
                List.of("calm", "stormy"),
                EmissionFamily.NORMAL,
                Optional.of(orderBy),
                Optional.empty());
    }

    /** The last fit's order and moments, as numbers, on prices whose b is {@code factor} times as high from a bar on. */
    private static List<Double> said(RegimeSettings regimes, int from, double factor) {
        GivenPrices honest = Walks.weathers(41, BARS, 2);
        double[][] closes = new double[2][BARS];
        for (int bar = 0; bar < BARS; bar++) {
            closes[0][bar] = honest.close(0, bar);
            closes[1][bar] = honest.close(1, bar) * (bar >= from ? factor : 1);
        }
        RegimeTimeline timeline = Walks.forward(GivenPrices.closes(closes), regimes, REFIT);
        Fit last = timeline.fits().get(timeline.fits().size() - 1).fit();
        WindowMoments moments = last.moments().orElseThrow();
        return List.of(
                timeline.probability(BARS - 1, 1),
                last.orderBy()[0],
                last.orderBy()[1],
                moments.mean(0, 1),
                moments.covariance(1, 0, 1),
                moments.covariance(1, 1, 1));
    }

    @ParameterizedTest
    @ValueSource(strings = {"a", "b"})
    void closesNotPublishedYetSayNothing(String orderBy) {
        RegimeSettings regimes = regimes(orderBy, new LogReturn("a"), new KnownAfter(new LogReturn("b"), LATE));
        List<Double> honest = said(regimes, BARS, 1);
        for (int late = 1; late <= LATE; late++) {
            assertThat(said(regimes, BARS - late, 1.2))
                    .as("changed for %d bars", late)
                    .isEqualTo(honest);
        }
        assertThat(said(regimes, BARS - LATE - 1, 1.2)).isNotEqualTo(honest);
    }

    @Test
    void anAssetThatIsAlsoObservedAtOnceIsNotLate() {
        RegimeSettings regimes = regimes("b", new LogReturn("b"), new KnownAfter(new AbsoluteReturn("b"), LATE));
        assertThat(said(regimes, BARS - 1, 1.2)).isNotEqualTo(said(regimes, BARS, 1));
    }
}
