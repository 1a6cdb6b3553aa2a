package sojourn.allocate;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import sojourn.GivenPrices;
import sojourn.GivenProbabilities;
import sojourn.numeric.RandomStream;

class SmoothingTest {
    private static final List<String> REGIMES = List.of("calm", "stormy");
    private static final Map<String, Map<String, Double>> ALL_OR_NOTHING =
            Map.of("calm", Map.of("a", 1.0), "stormy", Map.of("a", 0.0));
    /** Sums of some hundred terms below 1. */
    private static final double ROUNDING = 1e-12;

    @Test
    void theAverageIsTheWeightedSumOfAllClosesSoFar() {
        RandomStream random = RandomStream.of(3, "stormy");
        double[] stormy = new double[120];
        for (int bar = 0; bar < stormy.length; bar++) {
            stormy[bar] = random.nextDouble();
        }
        double halfLife = 7;
        double[] calm = played(blend(halfLife), stormy).weight(0);
        for (int bar = 0; bar < stormy.length; bar++) {
            assertThat(1 - calm[bar]).isCloseTo(summed(stormy, bar, halfLife), within(ROUNDING));
        }
    }

    /** Close by close: a (1-a)^age for each close after the first, (1-a)^bar for the first, a = 1 - 2^(-1/h). */
    private static double summed(double[] p, int bar, double halfLife) {
        double sum = p[0] * Math.pow(2, -bar / halfLife);
        for (int j = 1; j <= bar; j++) {
            sum += p[j] * (1 - Math.pow(2, -1 / halfLife)) * Math.pow(2, -(bar - j) / halfLife);
        }
        return sum;
    }

    @Test
    void aJumpIsHalfTakenInAfterOneHalfLife() {
        double[] weight = played(blend(2), 0, 1, 1, 1, 1).weight(0);
        assertThat(weight[0]).isEqualTo(1);
        assertThat(weight[2]).isCloseTo(0.5, within(ROUNDING));
        assertThat(weight[4]).isCloseTo(0.25, within(ROUNDING));
    }

    @Test
    void itComesBeforeConfirmationAndHysteresisAndAtEveryCloseDecisionOrNot() {
        Switch rule = new Switch(
                "stormy",
                0.7,
                0.3,
                Map.of("a", 1.0),
                Map.of("a", 0.0),
                ProbabilityKind.FILTERED,
                Optional.of(new Smoothing(1)),
                2,
                1);
        // half-life 1 averages to 0, 0.5, 0.75, 0.875, 0.4375: at or above 0.7 for the second close running on bar 3
        Played daily = played(policy(rule, Schedule.AT_EVERY_CLOSE), 0, 1, 1, 1, 0);
        assertThat(daily.weight(0)).containsExactly(1, 1, 1, 0, 0);
        assertThat(daily.because(3))
                .isEqualTo("trailing stormy 0.88 is above 0.70 for 2 closes running; it was 0.75 the bar before");
        // Monday is bar 5: the storm of bars 1 to 3 was lived through without a decision, and is averaged out again
        Played weekly = played(policy(rule, Schedule.FIRST_OF_WEEK), 0, 1, 1, 1, 1, 1);
        assertThat(weekly.weight(0)[5]).isZero();
        assertThat(weekly.decisions().get(4).next().trailing()).contains(Trailing.of(new double[] {0.0625, 0.9375}));
    }

    @Test
    void predictedProbabilitiesAreAveragedAsPredicted() {
        Blend rule = new Blend(ALL_OR_NOTHING, ProbabilityKind.PREDICTED, Optional.of(new Smoothing(1)), 1, 1);
        Played played = played(policy(rule, Schedule.AT_EVERY_CLOSE), 0, 1);
        // predicted stormy is 0.1, then 0.9, by the stay probability of 0.9
        assertThat(played.weight(0)[1]).isCloseTo(0.5, within(ROUNDING));
        assertThat(played.because(1)).startsWith("weights averaged by trailing predicted calm 0.50");
    }

    @Test
    void aRuleThatDoesNotSmoothRemembersNoAverage() {
        Played played = played(
                policy(new Blend(ALL_OR_NOTHING, ProbabilityKind.FILTERED, 1, 1), Schedule.AT_EVERY_CLOSE), 0, 1);
        assertThat(played.decisions().get(1).next().trailing()).isEmpty();
        assertThat(played.weight(0)).containsExactly(1, 0);
    }

    @Test
    void aHalfLifeOfNothingIsRefused() {
        assertThatThrownBy(() -> new Smoothing(0))
                .hasMessageContaining("halfLife")
                .hasMessageContaining("0");
    }

    private static RulePolicy blend(double halfLife) {
        return policy(
                new Blend(ALL_OR_NOTHING, ProbabilityKind.FILTERED, Optional.of(new Smoothing(halfLife)), 1, 1),
                Schedule.AT_EVERY_CLOSE);
    }

    private static RulePolicy policy(Rule rule, Schedule schedule) {
        return RulePolicy.of(rule, Limits.longOnly(), schedule, 1, 0, REGIMES, List.of("a"));
    }

    private static Played played(RulePolicy policy, double... stormy) {
        return Played.of(policy, GivenPrices.flat(stormy.length, 1).table(), GivenProbabilities.stormy(stormy));
    }
}
