package sojourn.allocate;

import static org.assertj.core.api.Assertions.assertThat;

import org.junit.jupiter.api.Test;
import sojourn.GivenPrices;
import sojourn.GivenProbabilities;

class HoldFromStartTest {
    @Test
    void decidesOnceWithOrWithoutAReadingAndNeverAgain() {
        Played played = Played.of(
                new HoldFromStart(Weights.of(0.6)),
                GivenPrices.flat(4, 1).table(),
                GivenProbabilities.stormy(0, 1, 0, 1).startingAt(3));
        assertThat(played.decisions())
                .extracting(Decision::kind)
                .containsExactly(Decision.Kind.ORDER, Decision.Kind.NONE, Decision.Kind.NONE, Decision.Kind.NONE);
        assertThat(played.weight(0)).containsOnly(0.6);
    }

    @Test
    void nothingToHoldIsADecisionWithoutAnOrder() {
        Played played = Played.of(
                new HoldFromStart(Weights.none(1)), GivenPrices.flat(2, 1).table(), GivenProbabilities.stormy(0, 0));
        assertThat(played.decisions())
                .extracting(Decision::kind)
                .containsExactly(Decision.Kind.KEEP, Decision.Kind.NONE);
    }
}
