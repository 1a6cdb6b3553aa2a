package sojourn.allocate;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import sojourn.document.Document;
import sojourn.document.Problem;
import sojourn.document.Problems;
import sojourn.document.Shape;

class ReadingRulesTest {
    @Test
    void aSwitchIsReadWithItsDefaults() {
        Rule rule = read(Rules.SHAPE, """
                switch:
                  regime: stormy
                  leave-above: 0.70
                  re-enter-below: 0.30
                  in: {stocks: 1.0}
                  out: {stocks: 0}
                """);
        assertThat(rule)
                .isEqualTo(new Switch(
                        "stormy",
                        0.7,
                        0.3,
                        Map.of("stocks", 1.0),
                        Map.of("stocks", 0.0),
                        ProbabilityKind.FILTERED,
                        1,
                        1));
    }

    @Test
    void tableAndBlendAreReadWithEveryKey() {
        String body = """
                  weights:
                    calm: {stocks: 0.9, bonds: 0.1}
                    stormy: {bonds: 0.5}
                  probability: predicted
                  confirm: 3
                  step-toward: 0.5
                """;
        Map<String, Map<String, Double>> weights =
                Map.of("calm", Map.of("stocks", 0.9, "bonds", 0.1), "stormy", Map.of("bonds", 0.5));
        assertThat(read(Rules.SHAPE, "table:\n" + body))
                .isEqualTo(new Table(weights, ProbabilityKind.PREDICTED, 3, 0.5));
        assertThat(read(Rules.SHAPE, "blend:\n" + body))
                .isEqualTo(new Blend(weights, ProbabilityKind.PREDICTED, 3, 0.5));
    }

    @Test
    void crossedLevelsAreRefusedAtTheirPlaceWithBothNumbers() {
        Problem problem = onlyProblem(Rules.SHAPE, """
                switch:
                  regime: stormy
                  leave-above: 0.7
                  re-enter-below: 0.8
                  in: {stocks: 1}
                  out: {stocks: 0}
                """);
        assertThat(problem.line()).isEqualTo(4);
        assertThat(problem.what()).contains("0.8").contains("0.7");
        assertThat(problem.remedy()).contains("at or below 0.7");
    }

    @Test
    void levelsAndCountsOutOfRangeAreRefusedTogether() {
        Problems problems = new Problems();
        Optional<Rule> rule = tryRead(Rules.SHAPE, """
                switch:
                  regime: stormy
                  leave-above: 70
                  re-enter-below: -0.3
                  in: {stocks: 1}
                  out: {stocks: 0}
                  confirm: 0
                  step-toward: 0
                  probability: smoothed
                """, problems);
        assertThat(rule).isEmpty();
        assertThat(problems.list()).extracting(Problem::line).containsExactly(3, 4, 7, 8, 9);
    }

    @Test
    void exactlyOneRuleIsAccepted() {
        assertThat(onlyProblem(Rules.SHAPE, "momentum: {}\n").toString())
                .contains("momentum")
                .contains("blend");
    }

    @Test
    void limitsAreReadWithTheirDefaults() {
        assertThat(read(Limits.SHAPE, "gross: 1.5\n")).isEqualTo(new Limits(1.5, 0, 1));
        assertThat(read(Limits.SHAPE, "per-asset: [-0.5, 0.5]\n")).isEqualTo(new Limits(1, -0.5, 0.5));
    }

    @Test
    void aRangeOfWeightsMustHoldZero() {
        Problem problem = onlyProblem(Limits.SHAPE, "gross: 1\nper-asset: [0.2, 1]\n");
        assertThat(problem.line()).isEqualTo(2);
        assertThat(problem.what()).contains("[0.2, 1]");
    }

    private static <T> T read(Shape<T> shape, String yaml) {
        Problems problems = new Problems();
        Optional<T> value = tryRead(shape, yaml, problems);
        assertThat(problems.list()).isEmpty();
        return value.orElseThrow();
    }

    private static <T> Problem onlyProblem(Shape<T> shape, String yaml) {
        Problems problems = new Problems();
        assertThat(tryRead(shape, yaml, problems)).isEmpty();
        assertThat(problems.list()).hasSize(1);
        return problems.list().get(0);
    }

    private static <T> Optional<T> tryRead(Shape<T> shape, String yaml, Problems problems) {
        Document document = Document.parse("strategy.yaml", yaml, problems).orElseThrow();
        return shape.read(document.root(), problems);
    }
}
