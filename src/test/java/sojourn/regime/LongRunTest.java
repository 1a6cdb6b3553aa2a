package sojourn.regime;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import org.junit.jupiter.api.Test;
import sojourn.numeric.RandomStream;

/** Closed forms and the definition pi = pi A. */
class LongRunTest {
    private static HiddenMarkov chain(double... transition) {
        int states = (int) Math.sqrt(transition.length);
        double[] initial = new double[states];
        initial[0] = 1;
        double[] deviations = new double[states];
        Arrays.fill(deviations, 1);
        return HiddenMarkov.of(initial, transition, Normal.zeroMean(deviations));
    }

    @Test
    void twoStatesSplitAsTheirRatesOfLeaving() {
        HiddenMarkov model = chain(0.95, 0.05, 0.10, 0.90);
        double[] pi = LongRun.stationary(model).orElseThrow();
        assertThat(pi[0]).isCloseTo(2.0 / 3, within(1e-15)); // a10 / (a01 + a10)
        assertThat(LongRun.expectedStay(model, 0)).hasValue(1 / 0.05);
        assertThat(LongRun.expectedStay(model, 1)).hasValue(1 / 0.10);
    }

    @Test
    void isLeftUnchangedByOneStep() {
        for (int states = 1; states <= 6; states++) {
            RegimeModel model = Fixtures.randomModel(states, RandomStream.of(states, "stationary"));
            double[] pi = LongRun.stationary(model).orElseThrow();
            for (int j = 0; j < states; j++) {
                double next = 0;
                for (int i = 0; i < states; i++) {
                    next += pi[i] * model.transition(i, j);
                }
                assertThat(next).isCloseTo(pi[j], within(1e-15));
            }
        }
    }

    @Test
    void statesThatAreLeftForGoodHaveNoShare() {
        HiddenMarkov model = chain(0.9, 0.1, 0, 0, 0.5, 0.5, 0, 0.5, 0.5);
        assertThat(LongRun.stationary(model).orElseThrow()).containsExactly(0, 0.5, 0.5);
    }

    @Test
    void twoClosedClassesHaveNone() {
        assertThat(LongRun.stationary(chain(1, 0, 0, 1))).isEmpty();
        assertThat(LongRun.stationary(chain(0.8, 0.1, 0.1, 0, 1, 0, 0, 0, 1))).isEmpty();
    }

    @Test
    void anAbsorbingStateIsStayedInForEver() {
        HiddenMarkov model = chain(0.9, 0.1, 0, 1);
        assertThat(LongRun.expectedStay(model, 1)).isEmpty();
        assertThat(LongRun.stationary(model).orElseThrow()).containsExactly(0, 1);
        RegimeModel single = OneRegime.of(Normal.zeroMean(new double[] {1}));
        assertThat(LongRun.expectedStay(single, 0)).isEmpty();
        assertThat(LongRun.stationary(single).orElseThrow()).containsExactly(1);
    }

    @Test
    void aMixtureSplitsAsItsWeights() {
        RegimeModel mixture = Mixture.of(new double[] {0.7, 0.3}, Normal.zeroMean(new double[] {1, 2}));
        double[] pi = LongRun.stationary(mixture).orElseThrow();
        assertThat(pi[0]).isCloseTo(0.7, within(1e-15));
        assertThat(LongRun.expectedStay(mixture, 1).orElseThrow()).isCloseTo(1 / 0.7, within(1e-15));
    }
}
