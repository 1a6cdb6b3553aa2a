package sojourn.allocate;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.groups.Tuple.tuple;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;
import sojourn.CheckValues;
import sojourn.GivenPrices;
import sojourn.GivenProbabilities;
import sojourn.numeric.RandomStream;

class TableAndBlendTest {
    private static final List<String> REGIMES = List.of("calm", "stormy");
    private static final Map<String, Map<String, Double>> ALL_OR_NOTHING =
            Map.of("calm", Map.of("a", 1.0), "stormy", Map.of("a", 0.0));

    @Test
    void tableTakesTheMostLikelyRegimesWeightsAndBlendAveragesThem() {
        CheckValues check = CheckValues.byId("blend_and_table");
        double[][] p = CheckValues.matrix(check.input("probabilities"));
        Map<String, Map<String, Double>> weights = weights(CheckValues.matrix(check.input("weights_by_regime")));
        check.assertExpected("most_likely", targets(new Table(weights, ProbabilityKind.FILTERED, 1, 1), p));
        check.assertExpected("blend", targets(new Blend(weights, ProbabilityKind.FILTERED, 1, 1), p));
    }

    @Test
    void blendIsTableWhenOneRegimeIsCertain() {
        RandomStream random = RandomStream.of(7, "unit vectors");
        double[][] p = new double[40][3];
        for (double[] one : p) {
            one[random.nextInt(3)] = 1;
        }
        Map<String, Map<String, Double>> weights = weights(new double[][] {{0.8, 0.1}, {0.5, 0.4}, {0.1, 0.7}});
        assertThat(targets(new Blend(weights, ProbabilityKind.FILTERED, 1, 1), p))
                .isDeepEqualTo(targets(new Table(weights, ProbabilityKind.FILTERED, 1, 1), p));
    }

    @Test
    void tableTakesOverANewRegimeOnlyOnceConfirmed() {
        Table rule = new Table(ALL_OR_NOTHING, ProbabilityKind.FILTERED, 3, 1);
        Played played = played(rule, 0.9, 0.9, 0.2, 0.2, 0.9, 0.2, 0.2, 0.2, 0.9);
        assertThat(played.weight(0)).as("the first is taken at once").containsExactly(0, 0, 0, 0, 0, 0, 0, 1, 1);
        assertThat(played.switches()).containsExactly(7);
        assertThat(played.because(3))
                .isEqualTo("calm 0.80 is the most likely regime for 2 of 3 closes, stays with stormy");
        assertThat(played.because(7))
                .isEqualTo("calm 0.80 is the most likely regime for 3 closes running; the bar before it was 0.80");
    }

    @Test
    void blendKeepsItsLastTargetUntilConfirmed() {
        Blend rule = new Blend(ALL_OR_NOTHING, ProbabilityKind.FILTERED, 2, 1);
        Played played = played(rule, 0.4, 0.3, 0.75, 0.25, 0.125, 0.75, 0.875);
        assertThat(played.weight(0)).containsExactly(0.6, 0.7, 0.7, 0.7, 0.875, 0.875, 0.125);
        assertThat(played.switches()).as("a continuous rule switches nothing").isEmpty();
        assertThat(played.because(1))
                .isEqualTo("weights averaged by calm 0.70, stormy 0.30; the bar before by calm 0.60, stormy 0.40");
        assertThat(played.because(2))
                .isEqualTo("stormy is the most likely regime for 1 of 2 closes, the last target stands");
    }

    @Test
    void blendByPredictedProbabilitiesSaysSo() {
        Played played = played(new Blend(ALL_OR_NOTHING, ProbabilityKind.PREDICTED, 1, 1), 0.0);
        assertThat(played.weight(0)).containsExactly(0.9);
        assertThat(played.because(0)).isEqualTo("weights averaged by predicted calm 0.90, stormy 0.10; first decision");
    }

    @Test
    void everyRegimeNeedsWeightsAndNoOtherMayHaveThem() {
        Map<String, Map<String, Double>> weights = new LinkedHashMap<>();
        weights.put("calm", Map.of("a", 1.0));
        weights.put("st/ormy", Map.of("b", 0.0));
        for (Rule rule : List.of(
                new Table(weights, ProbabilityKind.FILTERED, 1, 1),
                new Blend(weights, ProbabilityKind.FILTERED, 1, 1))) {
            String base = "/" + rule.word() + "/weights";
            assertThat(rule.misfits(REGIMES, List.of("a")))
                    .extracting(Misfit::pointer, Misfit::what)
                    .containsExactly(
                            tuple(base + "/st~1ormy", "no regime is called 'st/ormy'"),
                            tuple(base + "/st~1ormy/b", "no asset is called 'b'"));
            assertThatThrownBy(() -> rule.mechanism(REGIMES, List.of("a", "b"), Limits.longOnly()))
                    .isInstanceOf(IllegalArgumentException.class)
                    .hasMessageContaining("stormy");
        }
    }

    @Test
    void stayAtLeastIsRefusedForARuleWithoutStates() {
        Blend blend = new Blend(ALL_OR_NOTHING, ProbabilityKind.FILTERED, 1, 1);
        Table table = new Table(ALL_OR_NOTHING, ProbabilityKind.FILTERED, 1, 1);
        assertThat(Pacing.misfits(blend, 1)).isEmpty();
        assertThat(Pacing.misfits(table, 5)).isEmpty();
        assertThat(Pacing.misfits(blend, 5)).extracting(Misfit::pointer).containsExactly("/stay-at-least");
        assertThat(Pacing.misfits(blend, 5).get(0).what()).contains("5").contains("blend");
    }

    private static Played played(Rule rule, double... stormy) {
        RulePolicy policy =
                RulePolicy.of(rule, Limits.longOnly(), Schedule.AT_EVERY_CLOSE, 1, 0, REGIMES, List.of("a"));
        return Played.of(policy, GivenPrices.flat(stormy.length, 1).table(), GivenProbabilities.stormy(stormy));
    }

    private static double[][] targets(Rule rule, double[][] probabilities) {
        GivenProbabilities signal = GivenProbabilities.of(probabilities);
        RulePolicy policy = RulePolicy.of(
                rule, Limits.longOnly(), Schedule.AT_EVERY_CLOSE, 1, 0, signal.regimes(), List.of("a", "b"));
        Played played =
                Played.of(policy, GivenPrices.flat(probabilities.length, 2).table(), signal);
        double[][] targets = new double[probabilities.length][];
        for (int bar = 0; bar < targets.length; bar++) {
            targets[bar] = new double[] {played.target(0)[bar], played.target(1)[bar]};
        }
        return targets;
    }

    private static Map<String, Map<String, Double>> weights(double[][] rows) {
        Map<String, Map<String, Double>> weights = new LinkedHashMap<>();
        for (int k = 0; k < rows.length; k++) {
            weights.put("r" + k, Map.of("a", rows[k][0], "b", rows[k][1]));
        }
        return weights;
    }
}
