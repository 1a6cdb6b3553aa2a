package sojourn.allocate;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.Arrays;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import sojourn.CheckValues;
import sojourn.GivenPrices;
import sojourn.GivenProbabilities;

class SwitchTest {
    private static final List<String> REGIMES = List.of("calm", "stormy");
    private static final List<String> ASSETS = List.of("a");

    @Test
    void goesOutAtTheUpperLevelAndComesBackAtTheLowerOne() {
        CheckValues check = CheckValues.byId("hysteresis");
        check.assertExpected("weight", playedCase(check, 1).weight(0));
    }

    /**
     * The worked case of a minimum stay folds it into hysteresis: a level crossed during the stay is forgotten. Here hysteresis
     * goes on as lived and the decision waits, so the two agree until the stay ends (bar 8): the probability has been at or below
     * 0.3 on bar 7, the rule is back in by then, and the decision follows at the first close allowed. From there the next stay
     * holds what bar 9 would have switched until bar 13, beyond the end.
     */
    @Test
    void stayAtLeastDelaysTheDecisionButNotTheHysteresis() {
        CheckValues check = CheckValues.byId("hysteresis_min_hold");
        Played played = playedCase(check, check.input("min_hold").asInt());
        double[] worked = CheckValues.doubles(check.expected("weight"));
        assertThat(played.weight(0)).startsWith(Arrays.copyOf(worked, 8));
        assertThat(played.weight(0)).containsExactly(1, 1, 1, 0.2, 0.2, 0.2, 0.2, 0.2, 1, 1, 1, 1, 1);
        assertThat(played.switches()).containsExactly(3, 8);
    }

    private static Played playedCase(CheckValues check, int stayAtLeast) {
        double[] p = CheckValues.doubles(check.input("stress_probability"));
        Switch rule = new Switch(
                "stormy",
                check.input("enter_stress").asDouble(),
                check.input("exit_stress").asDouble(),
                Map.of("a", check.input("weight_calm").asDouble()),
                Map.of("a", check.input("weight_stress").asDouble()),
                ProbabilityKind.FILTERED,
                1,
                1);
        return played(rule, Schedule.AT_EVERY_CLOSE, stayAtLeast, p);
    }

    @Test
    void aChangeIsTakenOnlyAfterAsManyClosesRunningAsConfirmSays() {
        Played played = played(
                rule(ProbabilityKind.FILTERED, 2, 1),
                Schedule.AT_EVERY_CLOSE,
                1,
                0.1,
                0.8,
                0.6,
                0.8,
                0.9,
                0.2,
                0.4,
                0.2,
                0.1,
                0.1);
        assertThat(played.weight(0)).containsExactly(1, 1, 1, 1, 0, 0, 0, 0, 1, 1);
        assertThat(played.because(1)).isEqualTo("stormy 0.80 is above 0.70 for 1 of 2 closes, stays in");
        assertThat(played.because(4))
                .isEqualTo("stormy 0.90 is above 0.70 for 2 closes running; it was 0.80 the bar before");
        assertThat(played.because(8))
                .isEqualTo("stormy 0.10 is below 0.30 for 2 closes running; it was 0.20 the bar before");
    }

    @Test
    void theReasonTellsTheProbabilityAndTheLevel() {
        Played played =
                played(rule(ProbabilityKind.FILTERED, 1, 1), Schedule.AT_EVERY_CLOSE, 1, 0.1, 0.81, 0.5, 0.3, 0.699999);
        assertThat(played.because(0)).isEqualTo("stormy 0.10 lies below 0.70, stays in; first decision");
        assertThat(played.because(1)).isEqualTo("stormy 0.81 rose above 0.70; it was 0.10 the bar before");
        assertThat(played.because(2)).isEqualTo("stormy 0.50 lies above 0.30, stays out");
        assertThat(played.because(3)).isEqualTo("stormy 0.30 fell to 0.30; it was 0.50 the bar before");
        assertThat(played.because(4)).isEqualTo("stormy 0.699999 lies below 0.70, stays in");
    }

    @Test
    void predictedProbabilityIsOneStepOfTheChainAhead() {
        // 0.9 stays, 0.1 leaves: 0.8 x 0.9 + 0.2 x 0.1 = 0.74; 0.75 x 0.9 + 0.25 x 0.1 = 0.70; 0.74 -> 0.692
        Played played = played(rule(ProbabilityKind.PREDICTED, 1, 1), Schedule.AT_EVERY_CLOSE, 1, 0.74, 0.8);
        assertThat(played.weight(0)).containsExactly(1, 0);
        assertThat(played.because(0)).isEqualTo("predicted stormy 0.69 lies below 0.70, stays in; first decision");
        assertThat(played.because(1)).isEqualTo("predicted stormy 0.74 rose above 0.70; it was 0.69 the bar before");
    }

    @Test
    void hysteresisIsLivedBetweenDecisionBars() {
        // 2001-01-01 is a Monday and the first bar of the file: decisions on bars 5 and 10
        Played played = played(
                rule(ProbabilityKind.FILTERED, 1, 1),
                Schedule.FIRST_OF_WEEK,
                1,
                0.1,
                0.9,
                0.5,
                0.5,
                0.5,
                0.5,
                0.2,
                0.2,
                0.5,
                0.5,
                0.5);
        assertThat(played.decisions().get(4).kind()).isEqualTo(Decision.Kind.NONE);
        assertThat(played.target(0)[5]).isEqualTo(0);
        assertThat(played.target(0)[10]).isEqualTo(1);
        assertThat(played.switches()).as("the first decision switches nothing").containsExactly(10);
        assertThat(played.because(10))
                .isEqualTo("stormy 0.50 lies below 0.70, stays in; first decision since the change to in");
    }

    @Test
    void hysteresisStartsInAndWithTheFirstReading() {
        GivenProbabilities signal =
                GivenProbabilities.stormy(0.9, 0.9, 0.5, 0.5).startingAt(2);
        Played played = Played.of(
                policy(rule(ProbabilityKind.FILTERED, 1, 1), Schedule.AT_EVERY_CLOSE, 1),
                GivenPrices.flat(4, 1).table(),
                signal);
        assertThat(played.decisions().get(1).kind()).isEqualTo(Decision.Kind.NONE);
        assertThat(played.because(1)).isEqualTo("there is no accepted fit at this close");
        assertThat(played.weight(0)).containsExactly(0, 0, 1, 1);
    }

    @Test
    void stepTowardGoesPartOfTheWayAtEachDecision() {
        Played played = played(rule(ProbabilityKind.FILTERED, 1, 0.5), Schedule.AT_EVERY_CLOSE, 1, 0, 0, 0, 1, 1);
        assertThat(played.weight(0)).containsExactly(0.5, 0.75, 0.875, 0.4375, 0.21875);
    }

    @Test
    void aKeptStateIsSaidSo() {
        Played played = played(rule(ProbabilityKind.FILTERED, 1, 1), Schedule.AT_EVERY_CLOSE, 3, 0, 1, 0);
        assertThat(played.because(2))
                .isEqualTo(
                        "stormy 0.00 fell below 0.30; it was 1.00 the bar before; stay-at-least 3 bars keeps it at out");
    }

    @Test
    void unknownNamesAreMisfitsWithTheirPlaceAndTheKnownOnes() {
        Switch rule =
                new Switch("strmy", 0.7, 0.3, Map.of("stoks", 1.0), Map.of("a", 0.0), ProbabilityKind.FILTERED, 1, 1);
        assertThat(rule.misfits(REGIMES, ASSETS))
                .containsExactly(
                        new Misfit(
                                "/switch/regime",
                                "no regime is called 'strmy'",
                                "did you mean 'stormy'? name one of calm, stormy, as under regimes, states"),
                        new Misfit(
                                "/switch/in/stoks",
                                Misfit.At.KEY,
                                "no asset is called 'stoks'",
                                "name one of a, or add it under prices"));
        assertThat(rule(ProbabilityKind.FILTERED, 1, 1).misfits(REGIMES, ASSETS))
                .isEmpty();
    }

    private static Switch rule(ProbabilityKind probability, int confirm, double stepToward) {
        return new Switch("stormy", 0.7, 0.3, Map.of("a", 1.0), Map.of("a", 0.0), probability, confirm, stepToward);
    }

    private static RulePolicy policy(Rule rule, Schedule schedule, int stayAtLeast) {
        return RulePolicy.of(rule, Limits.longOnly(), schedule, stayAtLeast, 0, REGIMES, ASSETS);
    }

    private static Played played(Rule rule, Schedule schedule, int stayAtLeast, double... stormy) {
        return Played.of(
                policy(rule, schedule, stayAtLeast),
                GivenPrices.flat(stormy.length, 1).table(),
                GivenProbabilities.stormy(stormy));
    }
}
