package sojourn.walk;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import sojourn.GivenPrices;
import sojourn.market.Known;
import sojourn.regime.StartRunner;

/** An observation so far out that its density is 0 in every regime: told, not scored, and the prediction stays. */
class ImpossibleObservationTest {
    private static final int BARS = 300;
    private static final int ODD = 270;
    private static final GivenPrices PRICES = Walks.weathers(41, BARS, 1);
    private static final RefitSettings REFIT = Walks.expanding(250, Walks.every(1000));

    /** The log return, on one bar a number whose square is beyond double precision. */
    private record Odd() implements Observation {
        @Override
        public OptionalDouble at(Known known) {
            return known.bar() == ODD ? OptionalDouble.of(1e200) : new LogReturn("a").at(known);
        }

        @Override
        public String asset() {
            return "a";
        }

        @Override
        public String word() {
            return "odd";
        }

        @Override
        public String column() {
            return "odd_a";
        }
    }

    @Test
    void itIsNamedAndThePredictedProbabilitiesStay() {
        RegimeTimeline timeline = Walks.forward(PRICES, Walks.observing(new Odd(), "calm", "stormy"), REFIT);
        assertThat(timeline.impossible()).containsExactly(ODD);
        assertThat(timeline.logScore(ODD)).isEmpty();
        double[] predicted = timeline.reading(ODD - 1).orElseThrow().predicted(1);
        assertThat(timeline.probability(ODD, 0)).isEqualTo(predicted[0]);
        assertThat(timeline.probability(ODD, 1)).isEqualTo(predicted[1]);
        assertThat(timeline.logScore(ODD + 1)).isPresent();
    }

    @Test
    void aTimelineThatGrowsRemembersIt() {
        RegimeSettings regimes = Walks.observing(new Odd(), "calm", "stormy");
        RegimeTimeline earlier = Walks.forward(PRICES.first(ODD + 5), regimes, REFIT);
        RegimeTimeline grown =
                Walk.onward(earlier, PRICES.table(), regimes, REFIT, StartRunner.sequential(), bar -> {});
        assertThat(grown.impossible()).containsExactly(ODD);
    }

    @Test
    void ordinaryObservationsArePossible() {
        assertThat(Walks.forward(PRICES, Walks.twoRegimes(), REFIT).impossible())
                .isEmpty();
    }
}
