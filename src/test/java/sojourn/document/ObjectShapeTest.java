package sojourn.document;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;

class ObjectShapeTest {
    private record Levels(int high, double low, Optional<String> note) {}

    private static final Field<Integer> HIGH = Field.required("high", Shapes.integer(), "the upper level");
    private static final Field<Double> LOW = Field.defaulted("low", Shapes.number(), "1", "the lower level");
    private static final Field<Optional<String>> NOTE = Field.maybe("note", Shapes.text(), "a remark");
    private static final Shape<Levels> LEVELS =
            Shapes.object("levels", f -> new Levels(f.get(HIGH), f.get(LOW), f.get(NOTE)), HIGH, LOW, NOTE);

    private static String resolved(String text, Shape<?> shape) {
        Reading<?> reading = Reading.of(text, shape);
        assertThat(reading.problems()).isEmpty();
        return JsonText.compact(shape.resolved(reading.document().orElseThrow().root()));
    }

    @Test
    void defaultsCountAsIfWritten() {
        assertThat(Reading.of("high: 3", LEVELS).value()).contains(new Levels(3, 1.0, Optional.empty()));
        assertThat(Reading.of("high: 3\nlow: 2\nnote: n", LEVELS).value())
                .contains(new Levels(3, 2.0, Optional.of("n")));
    }

    @Test
    void resolvedHasKeysInDeclaredOrderDefaultsIncludedAndAbsentOnesLeftOut() {
        assertThat(resolved("high: 3", LEVELS)).isEqualTo("{\"high\":3,\"low\":1.0}");
        assertThat(resolved("note: n\nlow: 2\nhigh: 3", LEVELS)).isEqualTo("{\"high\":3,\"low\":2.0,\"note\":\"n\"}");
    }

    @Test
    void aDefaultMayBeAMapOrAListWithDefaultsOfItsOwn() {
        Field<Levels> levels = Field.defaulted("levels", LEVELS, "{high: 9}", "the levels");
        Field<List<Integer>> steps = Field.defaulted("steps", Shapes.list(Shapes.integer(), 1, 3), "[1, 2]", "steps");
        Shape<String> shape = Shapes.object("outer", f -> f.get(levels) + " " + f.get(steps), levels, steps);
        assertThat(resolved("{}", shape)).isEqualTo("{\"levels\":{\"high\":9,\"low\":1.0},\"steps\":[1,2]}");
        assertThat(Reading.of("{}", shape).value()).contains(new Levels(9, 1.0, Optional.empty()) + " [1, 2]");
        assertThat(shape.schema().at("/properties/levels/default")).hasToString("{\"high\":9,\"low\":1.0}");
    }

    @Test
    void aMisspeltRequiredKeyIsNotCalledMissingAsWell() {
        assertThat(Reading.of("hihg: 3", LEVELS).problems())
                .containsExactly("t.yaml:1:1: unknown key 'hihg'; did you mean 'high'? known keys: high, low, note");
    }

    @Test
    void aKeyThatIsAlreadyThereIsNotSuggested() {
        assertThat(Reading.of("high: 3\nhihg: 3", LEVELS).problems())
                .containsExactly("t.yaml:2:1: unknown key 'hihg'; known keys: high, low, note");
    }

    @Test
    void aRuleMayNameTheKeyAtFaultAndFallsBackToTheMap() {
        Shape<Levels> ordered = LEVELS.refuse(l -> l.low() > l.high()
                ? Optional.of(new Refusal("low", "low " + l.low() + " lies above high " + l.high(), "swap them"))
                : Optional.empty());
        assertThat(Reading.of("high: 3\nlow: 4", ordered).problems())
                .containsExactly("t.yaml:2:6: low 4.0 lies above high 3; swap them");
        assertThat(Reading.of("# first\nhigh: 0", ordered).problems())
                .containsExactly("t.yaml:2:1: low 1.0 lies above high 0; swap them");
    }

    @Test
    void aRuleIsNotAskedAboutAValueThatHasTheWrongShape() {
        Shape<Levels> never = LEVELS.refuse(l -> Optional.of(new Refusal("", "never", "never")));
        assertThat(Reading.of("high: x", never).problems())
                .containsExactly("t.yaml:1:7: 'high' is \"x\"; give a whole number");
    }

    private static final Field<String> KIND =
            Field.defaulted("kind", Shapes.word(List.of("round", "square", "flat"), word -> word), "round", "the kind");
    private static final Field<Double> RADIUS = Field.defaulted("radius", Shapes.number(), "1", "of something round")
            .onlyWith(KIND, List.of("round"));
    private static final Field<Optional<Double>> SIDE =
            Field.maybe("side", Shapes.number(), "of something with corners").onlyWith(KIND, List.of("square", "flat"));
    private static final Shape<String> FORM =
            Shapes.object("form", f -> f.get(KIND) + " " + f.get(RADIUS) + " " + f.get(SIDE), KIND, RADIUS, SIDE);

    @Test
    void aKeyThatBelongsToAWordIsReadAndWrittenOutBesideItOnly() {
        assertThat(resolved("{}", FORM)).isEqualTo("{\"kind\":\"round\",\"radius\":1.0}");
        assertThat(resolved("kind: square\nside: 2", FORM)).isEqualTo("{\"kind\":\"square\",\"side\":2.0}");
        assertThat(Reading.of("kind: flat\nside: 2", FORM).value()).contains("flat 1.0 Optional[2.0]");
    }

    @Test
    void aKeyBesideAWordItDoesNotBelongToIsRefusedWhereItStands() {
        assertThat(Reading.of("side: 2", FORM).problems())
                .containsExactly(
                        "t.yaml:1:1: 'side' belongs to kind: square or flat, not to round; leave it out, or change"
                                + " 'kind'");
        assertThat(Reading.of("kind: flat\nradius: 3", FORM).problems())
                .containsExactly(
                        "t.yaml:2:1: 'radius' belongs to kind: round, not to flat; leave it out, or change 'kind'");
    }

    @Test
    void besideAWordThatMeansNothingOnlyTheWordIsTold() {
        assertThat(Reading.of("kind: sqare\nradius: 3", FORM).problems())
                .hasSize(1)
                .allSatisfy(told -> assertThat(told).startsWith("t.yaml:1:7: 'kind' is \"sqare\"; "));
    }

    @Test
    void onlyAKeyThatMayBeMissingBelongsToAWordAndOnlyToOneThatHolds() {
        assertThatThrownBy(() -> HIGH.onlyWith(KIND, List.of("flat"))).hasMessageContaining("'high' is required");
        assertThatThrownBy(() -> LOW.onlyWith(NOTE, List.of("n"))).hasMessageContaining("'note' has no word");
    }

    @Test
    void mistakesInADeclarationAreRefused() {
        assertThatThrownBy(() -> Field.defaulted("low", Shapes.number().atMost(1), "2", "a level"))
                .isInstanceOf(IllegalArgumentException.class)
                .hasMessageContaining("default of 'low'")
                .hasMessageContaining("is 2; give a number at most 1");
        assertThatThrownBy(() -> Field.defaulted("low", Shapes.number(), "[1", "a level"))
                .hasMessageContaining("is not closed");
        assertThatThrownBy(() -> Shapes.object("twice", f -> f.get(HIGH), HIGH, HIGH))
                .hasMessageContaining("declares key 'high' twice");
        Shape<Double> undeclared = Shapes.object("levels", f -> f.get(LOW), HIGH);
        assertThatThrownBy(() -> Reading.of("high: 1", undeclared)).hasMessageContaining("does not declare key 'low'");
    }
}
