package sojourn.walk;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import java.util.OptionalInt;
import org.junit.jupiter.api.Test;
import sojourn.GivenPrices;

/** At a fit bar a reading knows what the fit before it says: checked against a walk that skips that refit. */
class WithoutRefitTest {
    private static final GivenPrices PRICES = Walks.weathers(11, 262, 2);
    private static final RegimeSettings REGIMES = Walks.twoRegimes();

    @Test
    void itEqualsAWalkWithoutThatRefitToTheBit() {
        RegimeTimeline often = Walks.forward(PRICES, REGIMES, Walks.expanding(200, Walks.every(20)));
        RegimeTimeline seldom = Walks.forward(PRICES, REGIMES, Walks.expanding(200, Walks.every(40)));
        int refit = Walks.fitBars(often).get(1);
        assertThat(Walks.fitBars(seldom)).doesNotContain(refit);
        Reading unmoved = often.reading(refit).orElseThrow().withoutRefit().orElseThrow();
        Reading expected = seldom.reading(refit).orElseThrow();
        assertThat(unmoved.filtered()).isEqualTo(expected.filtered());
        assertThat(unmoved.predicted(3)).isEqualTo(expected.predicted(3));
        assertThat(unmoved.forecast(2).covariance(0, 1))
                .isEqualTo(expected.forecast(2).covariance(0, 1));
        assertThat(unmoved.fit()).isEqualTo(1);
    }

    @Test
    void onlyAcceptedRefitsHaveOne() {
        RegimeTimeline timeline = Walks.forward(PRICES, REGIMES, Walks.expanding(200, Walks.every(20)));
        List<Integer> fits = Walks.fitBars(timeline);
        for (int bar = fits.get(0); bar < timeline.endBar(); bar++) {
            boolean refit = fits.indexOf(bar) > 0;
            assertThat(timeline.reading(bar).orElseThrow().withoutRefit().isPresent())
                    .as("bar %d", bar)
                    .isEqualTo(refit);
        }
    }

    @Test
    void everyReadingButTheFirstKnowsTheOneBefore() {
        RegimeTimeline timeline = Walks.forward(PRICES, REGIMES, Walks.expanding(200, Walks.every(20)));
        OptionalInt first = timeline.firstBar();
        assertThat(timeline.reading(first.orElseThrow()).orElseThrow().before()).isEmpty();
        for (int bar = first.orElseThrow() + 1; bar < timeline.endBar(); bar++) {
            assertThat(timeline.reading(bar).orElseThrow().before())
                    .containsSame(timeline.reading(bar - 1).orElseThrow());
        }
    }
}
