package sojourn.regime;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatIllegalArgumentException;

import org.junit.jupiter.api.Test;

/** Programmers' mistakes are refused at the door, with the value. */
class DoorTest {
    private static final Normal TWO = Normal.of(new double[] {0, 0}, new double[] {1, 2});

    @Test
    void observationsRefuseWhatIsNotANumber() {
        assertThatIllegalArgumentException()
                .isThrownBy(() -> Observations.univariate(new double[] {1, Double.NaN}))
                .withMessageContaining("row 1");
        assertThatIllegalArgumentException()
                .isThrownBy(() -> Observations.of(2, new double[3], new boolean[2]))
                .withMessageContaining("3 numbers");
        Observations gap = Observations.of(1, new double[] {1, Double.NaN}, new boolean[] {false, true});
        assertThat(gap.present()).isEqualTo(1);
        assertThatIllegalArgumentException().isThrownBy(() -> gap.at(1, 0)).withMessageContaining("row 1 is missing");
    }

    @Test
    void aRangeOfObservationsKeepsItsGaps() {
        Observations x = Observations.of(2, new double[] {1, 2, 3, 4, 5, 6}, new boolean[] {false, true, false});
        Observations range = x.range(1, 3);
        assertThat(range.size()).isEqualTo(2);
        assertThat(range.dimension()).isEqualTo(2);
        assertThat(range.missing(0)).isTrue();
        assertThat(range.at(1, 1)).isEqualTo(6);
        assertThat(range.present()).isEqualTo(1);
        assertThatIllegalArgumentException().isThrownBy(() -> x.range(2, 4)).withMessageContaining("2 to 4");
    }

    @Test
    void aRowIsMissingWhenAllItsNumbersAre() {
        boolean[] missing = {false, false, true, false, true, true};
        Observations x = Observations.withMissingCells(2, new double[] {1, 2, Double.NaN, 4, 5, 6}, missing);
        assertThat(x.size()).isEqualTo(3);
        assertThat(x.present()).isEqualTo(2);
        assertThat(x.present(0)).isEqualTo(1);
        assertThat(x.present(1)).isEqualTo(2);
        assertThat(x.missing(1)).isFalse();
        assertThat(x.missing(1, 0)).isTrue();
        assertThat(x.missing(1, 1)).isFalse();
        assertThat(x.missing(2)).isTrue();
        assertThat(x.at(1, 1)).isEqualTo(4);
        assertThatIllegalArgumentException()
                .isThrownBy(() -> x.at(1, 0))
                .withMessageContaining("column 0 of row 1 is missing");
        assertThatIllegalArgumentException().isThrownBy(() -> x.at(2, 0)).withMessageContaining("row 2 is missing");
        assertThatIllegalArgumentException().isThrownBy(() -> x.missing(0, 2)).withMessageContaining("column");
        assertThat(x.range(1, 3).missing(0, 0)).isTrue();
        assertThat(x.range(1, 3).missing(1)).isTrue();
        assertThat(x.range(1, 3).present()).isEqualTo(1);
        assertThatIllegalArgumentException()
                .isThrownBy(() -> Observations.withMissingCells(2, new double[4], new boolean[2]))
                .withMessageContaining("4 numbers and 2 flags");
        assertThatIllegalArgumentException()
                .isThrownBy(() -> Observations.withMissingCells(2, new double[3], new boolean[3]))
                .withMessageContaining("3 numbers");
    }

    @Test
    void modelsRefuseWhatIsNoDistribution() {
        assertThatIllegalArgumentException()
                .isThrownBy(() -> HiddenMarkov.of(new double[] {0.5, 0.5}, new double[] {0.9, 0.2, 0, 1}, TWO))
                .withMessageContaining("transition row 0")
                .withMessageContaining("1.1");
        assertThatIllegalArgumentException()
                .isThrownBy(() -> Mixture.of(new double[] {-0.5, 1.5}, TWO))
                .withMessageContaining("-0.5");
        assertThatIllegalArgumentException().isThrownBy(() -> OneRegime.of(TWO)).withMessageContaining("2");
        assertThatIllegalArgumentException()
                .isThrownBy(() -> Normal.zeroMean(new double[] {0}))
                .withMessageContaining("standard deviation of state 0");
        assertThatIllegalArgumentException()
                .isThrownBy(() -> TWO.ordered(new int[] {0, 0}))
                .withMessageContaining("twice");
    }

    @Test
    void settingsRefuseImpossibleNumbersOfStates() {
        assertThatIllegalArgumentException()
                .isThrownBy(() -> new FitSettings(ModelKind.HIDDEN_MARKOV, 7, EmissionFamily.NORMAL, 1))
                .withMessageContaining("7");
        assertThatIllegalArgumentException()
                .isThrownBy(() -> new FitSettings(ModelKind.ONE_REGIME, 2, EmissionFamily.NORMAL, 1))
                .withMessageContaining("2 states");
    }

    @Test
    void requestsRefuseRowsThatDoNotMatch() {
        Observations x = Observations.univariate(new double[3]);
        assertThatIllegalArgumentException()
                .isThrownBy(() -> FitRequest.of(x, new double[2], Companions.of(1, new double[3]), 1, "2001-01-01"))
                .withMessageContaining("3 observations, 2 returns");
    }

    @Test
    void anImpossibleObservationLeavesThePrediction() {
        RegimeModel model = Mixture.of(new double[] {0.25, 0.75}, TWO);
        FilterState state = FilterState.before(model).step(model, Observations.univariate(new double[] {1e300}), 0);
        assertThat(state.logLikelihood()).isEqualTo(Double.NEGATIVE_INFINITY);
        assertThat(state.probabilities()).containsExactly(0.25, 0.75);
        FilterState next = state.step(model, Observations.univariate(new double[] {0}), 0);
        assertThat(next.logLikelihood()).isEqualTo(Double.NEGATIVE_INFINITY);
        assertThat(next.probability(0) + next.probability(1)).isEqualTo(1);
    }
}
