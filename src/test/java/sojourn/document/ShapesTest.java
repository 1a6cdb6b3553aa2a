package sojourn.document;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.time.LocalDate;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.Test;

class ShapesTest {
    private static <T> T value(String yaml, Shape<T> shape) {
        Reading<T> reading = Reading.ofValue(yaml, shape);
        assertThat(reading.problems()).isEmpty();
        return reading.value().orElseThrow();
    }

    private static String problem(String yaml, Shape<?> shape) {
        Reading<?> reading = Reading.ofValue(yaml, shape);
        assertThat(reading.value()).isEmpty();
        assertThat(reading.problems()).hasSize(1);
        return reading.problems().get(0).replace("t.yaml:1:4: 'x' is ", "");
    }

    private static String resolved(String yaml, Shape<?> shape) {
        Reading<?> reading = Reading.ofValue(yaml, shape);
        assertThat(reading.problems()).isEmpty();
        return JsonText.compact(
                shape.resolved(reading.document().orElseThrow().at("/x").orElseThrow()));
    }

    @Test
    void numbersAreDoublesAndZeroIsNeverNegative() {
        assertThat(value("5", Shapes.number())).isEqualTo(5.0);
        assertThat(value("-2.5e-3", Shapes.number())).isEqualTo(-0.0025);
        assertThat(Double.doubleToRawLongBits(value("-0", Shapes.number()))).isZero();
        assertThat(resolved("5", Shapes.number())).isEqualTo("5.0");
        assertThat(resolved("-0.0", Shapes.number())).isEqualTo("0.0");
        assertThat(resolved("0.0001", Shapes.number())).isEqualTo("1.0E-4");
    }

    @Test
    void boundsBelongToTheRangeOrDoNot() {
        NumberShape closed = Shapes.number().atLeast(0).atMost(1);
        assertThat(value("0", closed)).isZero();
        assertThat(value("1", closed)).isEqualTo(1);
        NumberShape open = Shapes.number().above(0).below(1);
        assertThat(problem("0", open)).isEqualTo("0; give a number above 0 and below 1");
        assertThat(problem("1", open)).isEqualTo("1; give a number above 0 and below 1");
        assertThat(value("1e-300", open)).isEqualTo(1e-300);
    }

    @Test
    void numbersSayWhatIsExpected() {
        assertThat(Shapes.number().expected()).isEqualTo("a number");
        assertThat(Shapes.number().atLeast(-0.5).expected()).isEqualTo("a number at least -0.5");
        assertThat(Shapes.number().below(1).expected()).isEqualTo("a number below 1");
        assertThat(Shapes.number().atLeast(0).below(1).expected()).isEqualTo("a number at least 0 and below 1");
        assertThat(Shapes.number().above(0).atMost(1).expected()).isEqualTo("a number above 0 and at most 1");
        assertThat(Shapes.integer().expected()).isEqualTo("a whole number");
        assertThat(Shapes.integer().atMost(3).expected()).isEqualTo("a whole number at most 3");
        assertThatThrownBy(() -> Shapes.number().atLeast(Double.NaN)).hasMessageContaining("bound is NaN");
    }

    @Test
    void wholeNumbersMayBeWrittenWithAPointOrAnExponent() {
        assertThat(value("5", Shapes.integer())).isEqualTo(5);
        assertThat(value("5.0", Shapes.integer())).isEqualTo(5);
        assertThat(value("-0.0", Shapes.integer())).isZero();
        assertThat(value("12e2", Shapes.integer())).isEqualTo(1200);
        assertThat(resolved("5.0", Shapes.integer())).isEqualTo("5");
        assertThat(problem("1e-300", Shapes.integer())).isEqualTo("1e-300; give a whole number");
        assertThat(problem("1e300", Shapes.integer()))
                .isEqualTo("1e300; stay between -2147483648 and 2147483647 and give a whole number");
        assertThat(value("2147483647", Shapes.integer())).isEqualTo(Integer.MAX_VALUE);
        assertThat(value("9223372036854775807", Shapes.longInteger())).isEqualTo(Long.MAX_VALUE);
        assertThat(resolved("9007199254740993", Shapes.longInteger())).isEqualTo("9007199254740993");
    }

    @Test
    void flagsTextAndDates() {
        assertThat(value("true", Shapes.flag())).isTrue();
        assertThat(resolved("false", Shapes.flag())).isEqualTo("false");
        assertThat(problem("'true'", Shapes.flag()))
                .isEqualTo("\"true\"; did you mean true, without quotes? give true or false");
        assertThat(value("'5'", Shapes.text())).isEqualTo("5");
        assertThat(value("off", Shapes.text())).isEqualTo("off");
        assertThat(problem("true", Shapes.text())).isEqualTo("true; did you mean \"true\", in quotes? give text");
        assertThat(value("2020-02-29", Shapes.date())).isEqualTo(LocalDate.of(2020, 2, 29));
        assertThat(resolved("2020-02-29", Shapes.date())).isEqualTo("\"2020-02-29\"");
    }

    @Test
    void textMustMatchItsPatternWhole() {
        Shape<String> ab = Shapes.textLike("a|b", "a or b");
        assertThat(value("b", ab)).isEqualTo("b");
        assertThat(problem("ab", ab)).isEqualTo("\"ab\"; give a or b");
        assertThat(new SchemaJudge(ab).accepts(Json.text("ab"))).isFalse();
    }

    @Test
    void longTextIsShortenedInMessages() {
        assertThat(problem("'" + "abcdefghij".repeat(7) + "'", Shapes.number()))
                .isEqualTo("\"" + "abcdefghij".repeat(6) + "…\"; give a number");
    }

    @Test
    void wordsHaveMeaningsInTheOrderDeclared() {
        Map<String, Integer> meanings = new LinkedHashMap<>();
        meanings.put("weekly", 52);
        meanings.put("daily", 252);
        Shape<Integer> word = Shapes.word(meanings);
        assertThat(value("daily", word)).isEqualTo(252);
        assertThat(resolved("daily", word)).isEqualTo("\"daily\"");
        assertThat(problem("Dialy", word)).isEqualTo("\"Dialy\"; did you mean 'daily'? give one of weekly, daily");
        assertThat(problem("hourly", word)).isEqualTo("\"hourly\"; give one of weekly, daily");
    }

    @Test
    void aMapWithoutOrderIsTakenAlphabetically() {
        Map<String, Integer> hashed = new HashMap<>(Map.of("zebra", 1, "ant", 2, "mouse", 3));
        assertThat(Shapes.word(hashed).expected()).isEqualTo("one of ant, mouse, zebra");
        assertThat(Shapes.word(Map.of("b", 1, "a", 2)).expected()).isEqualTo("one of a, b");
        assertThatThrownBy(() -> Shapes.word(Map.of())).hasMessageContaining("at least one choice");
    }

    @Test
    void listsKeepTheirOrderAndTellEveryBadItem() {
        Shape<List<Integer>> list = Shapes.list(Shapes.integer(), 0, 3);
        assertThat(value("[3, 1, 2]", list)).containsExactly(3, 1, 2);
        assertThat(value("[]", list)).isEmpty();
        assertThat(Reading.ofValue("[a, 1, b, c]", list).problems())
                .containsExactly(
                        "t.yaml:1:4: 'x' has 4 items; give a list of at most 3 items, each a whole number",
                        "t.yaml:1:5: item 1 of 'x' is \"a\"; give a whole number",
                        "t.yaml:1:11: item 3 of 'x' is \"b\"; give a whole number",
                        "t.yaml:1:14: item 4 of 'x' is \"c\"; give a whole number");
        Shape<List<List<Integer>>> nested = Shapes.list(Shapes.list(Shapes.integer(), 1, 1), 1, Integer.MAX_VALUE);
        assertThat(Reading.ofValue("[[1], [a]]", nested).problems())
                .containsExactly("t.yaml:1:11: item 1 of item 2 of 'x' is \"a\"; give a whole number");
        assertThat(nested.expected())
                .isEqualTo("a list of at least 1 item, each a list of 1 item, each a whole number");
        assertThatThrownBy(() -> Shapes.list(Shapes.text(), 2, 1)).hasMessageContaining("2 to 1");
    }

    @Test
    void namedMapsKeepTheOrderWritten() {
        Shape<Map<String, Double>> weights = Shapes.named(Shapes.text(), Shapes.number());
        assertThat(value("{zebra: 1, ant: 2}", weights).keySet()).containsExactly("zebra", "ant");
        assertThat(resolved("{zebra: 1, ant: 2}", weights)).isEqualTo("{\"zebra\":1.0,\"ant\":2.0}");
    }

    @Test
    void aRuleOnAKeyIsToldAtTheKey() {
        Shape<String> key = Shapes.text()
                .refuse(k -> k.equals("cash")
                        ? Optional.of(new Refusal("", "'cash' cannot be an asset's name", "choose another"))
                        : Optional.empty());
        assertThat(Reading.ofValue("{stocks: 1, cash: 2}", Shapes.named(key, Shapes.number()))
                        .problems())
                .containsExactly("t.yaml:1:16: 'cash' cannot be an asset's name; choose another");
    }

    @Test
    void oneKeyChooses() {
        Map<String, Shape<? extends Object>> variants = new LinkedHashMap<>();
        variants.put("every", Shapes.integer());
        variants.put("named", Shapes.text());
        Shape<Object> shape = Shapes.oneKey(variants);
        assertThat(value("{named: x}", shape)).isEqualTo("x");
        assertThat(resolved("{every: 5.0}", shape)).isEqualTo("{\"every\":5}");
        assertThat(Reading.ofValue("{every: a, named: 5, nmed: 3}", shape).problems())
                .containsExactly(
                        "t.yaml:1:12: 'every' is \"a\"; give a whole number",
                        "t.yaml:1:15: 'x' has every and named at once; keep exactly one of them",
                        "t.yaml:1:22: 'named' is 5; did you mean \"5\", in quotes? give text",
                        "t.yaml:1:25: unknown key 'nmed'; did you mean 'named'? known keys: every, named");
    }

    @Test
    void eitherTakesTheFirstThatReadsWithoutFault() {
        Shape<String> shape = Shapes.either(
                Shapes.integer().atMost(9).as(i -> "whole " + i),
                Shapes.number().as(d -> "number " + d),
                Shapes.date().as(d -> "date " + d),
                Shapes.text().as(t -> "text " + t));
        assertThat(value("9", shape)).isEqualTo("whole 9");
        assertThat(value("10", shape)).isEqualTo("number 10.0");
        assertThat(value("2020-01-01", shape)).isEqualTo("date 2020-01-01");
        assertThat(value("2020-13-01", shape)).isEqualTo("text 2020-13-01");
        assertThat(resolved("9", shape)).isEqualTo("9");
        assertThat(resolved("10", shape)).isEqualTo("10.0");
    }

    @Test
    void eitherOfTwoMapsTellsTheFaultsOfTheCloserOne() {
        Field<String> csv = Field.required("csv", Shapes.text(), "a file");
        Field<Double> percent = Field.required("percent-per-year", Shapes.number(), "a rate");
        Shape<String> cash = Shapes.either(
                Shapes.object("cash file", f -> f.get(csv), csv),
                Shapes.object("cash rate", f -> "rate " + f.get(percent), percent));
        assertThat(value("{percent-per-year: 2}", cash)).isEqualTo("rate 2.0");
        assertThat(Reading.ofValue("{percent-per-yaer: 2}", cash).problems())
                .containsExactly("t.yaml:1:5: unknown key 'percent-per-yaer'; did you mean 'percent-per-year'? "
                        + "known keys: percent-per-year");
        assertThat(Reading.ofValue("{percent-per-year: x}", cash).problems())
                .containsExactly("t.yaml:1:23: 'percent-per-year' is \"x\"; give a number");
    }

    @Test
    void aRuleWithinEitherKeepsItsOwnWords() {
        Shape<Integer> odd = Shapes.integer()
                .refuse(i -> i % 2 == 0
                        ? Optional.of(new Refusal("", i + " is even", "give an odd one"))
                        : Optional.empty());
        Shape<Object> shape = Shapes.either(odd, Shapes.text());
        assertThat(Reading.ofValue("4", shape).problems()).containsExactly("t.yaml:1:4: 4 is even; give an odd one");
    }

    @Test
    void aBrokenValueIsToldOnce() {
        for (Shape<?> shape : List.of(
                Shapes.number(),
                Shapes.text(),
                Shapes.list(Shapes.text(), 0, 1),
                Shapes.named(Shapes.text(), Shapes.text()),
                Shapes.either(Shapes.text(), Shapes.number()))) {
            assertThat(Reading.ofValue("0x1F", shape).problems())
                    .as(shape.expected())
                    .hasSize(1);
        }
    }

    @Test
    void aPercentageWhereAFractionBelongsIsToldAsOne() {
        NumberShape fraction = Shapes.number().atLeast(0).atMost(1);
        assertThat(remedy("30%", fraction)).startsWith("did you mean 0.3? give");
        assertThat(remedy("'2.50 %'", fraction)).startsWith("did you mean 0.025? give");
        assertThat(remedy("70", fraction)).startsWith("did you mean 0.7? give");
        assertThat(remedy("1.5", fraction)).as("may be a slip of another kind").startsWith("give");
        assertThat(remedy("101", fraction)).as("no fraction even then").startsWith("give");
        assertThat(remedy("-5", fraction)).startsWith("give");
        assertThat(remedy("5%", Shapes.number())).startsWith("leave out the %");
        assertThat(remedy("many%", Shapes.number())).startsWith("give");
    }

    @Test
    void aSingleItemAndAnImpossibleDayAreToldAsSuch() {
        assertThat(remedy("calm", Shapes.list(Shapes.text(), 1, 3))).startsWith("put it in [ ]");
        assertThat(remedy("5", Shapes.list(Shapes.text(), 1, 3))).startsWith("give");
        assertThat(remedy("2021-02-29", Shapes.date())).startsWith("there is no such day");
        assertThat(remedy("29.02.2021", Shapes.date())).startsWith("give");
    }

    @Test
    void oneValueMayBeRefusedForSeveralReasons() {
        Shape<String> shape = Shapes.text()
                .refuseEach(text -> List.of(
                        new Refusal("", text + " is long", "shorten it"),
                        new Refusal("", text + " is odd", "even it")));
        Reading<String> reading = Reading.ofValue("abc", shape);
        assertThat(reading.value()).isEmpty();
        assertThat(reading.problems())
                .containsExactly("t.yaml:1:4: abc is long; shorten it", "t.yaml:1:4: abc is odd; even it");
        assertThat(Reading.ofValue("abc", Shapes.text().refuseEach(text -> List.of()))
                        .value())
                .contains("abc");
    }

    @Test
    void aDescriptionStandsInTheSchemaAndChangesNothingElse() {
        Shape<String> shape = Shapes.text().described("a word of one's own");
        assertThat(shape.schema().path("description").asText()).isEqualTo("a word of one's own");
        assertThat(Reading.ofValue("abc", shape).value()).contains("abc");
        assertThat(remedy("5", shape)).isEqualTo(remedy("5", Shapes.text()));
    }

    @Test
    void quotedTextStandsOnOneLineAndIsCutShort() {
        assertThat(Quoted.of("a\nb")).isEqualTo("'a\\nb'");
        assertThat(Quoted.of("x".repeat(1000))).hasSizeLessThan(100).endsWith("…'");
    }

    private static String remedy(String yaml, Shape<?> shape) {
        List<String> problems = Reading.ofValue(yaml, shape).problems();
        assertThat(problems).hasSize(1);
        return problems.get(0).substring(problems.get(0).indexOf("; ") + 2);
    }
}
