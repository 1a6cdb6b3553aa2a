package sojourn.document;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import com.fasterxml.jackson.databind.node.ObjectNode;
import com.fasterxml.jackson.databind.node.POJONode;
import java.nio.charset.StandardCharsets;
import org.junit.jupiter.api.Test;

class WrittenTextTest {
    private static ObjectNode tree() {
        ObjectNode tree =
                Json.object().put("strategy", "Step aside").put("answer", "no").put("note", "a\nb");
        tree.putArray("states").add("calm").add("stormy");
        tree.putObject("levels")
                .put("high", 0.7)
                .put("tiny", 0.0001)
                .put("whole", 1.0)
                .put("count", 3);
        tree.putArray("observe").addObject().put("log-return", "stocks").put("lag", 1);
        tree.putObject("nothing");
        tree.put("date", "2020-01-01").put("digits", "5").put("quiet", true).putNull("none");
        return tree;
    }

    @Test
    void yamlQuotesWhateverCouldBeTakenForSomethingElse() {
        assertThat(YamlText.of(tree())).isEqualTo("""
                        strategy: Step aside
                        answer: 'no'
                        note: "a\\nb"
                        states: [calm, stormy]
                        levels:
                          high: 0.7
                          tiny: 1.0E-4
                          whole: 1.0
                          count: 3
                        observe:
                        - log-return: stocks
                          lag: 1
                        nothing: {}
                        date: "2020-01-01"
                        digits: "5"
                        quiet: true
                        none: null
                        """);
    }

    @Test
    void compactJsonKeepsTheOrderOfKeys() {
        String expected =
                "{\"strategy\":\"Step aside\",\"answer\":\"no\",\"note\":\"a\\nb\",\"states\":[\"calm\",\"stormy\"],"
                        + "\"levels\":{\"high\":0.7,\"tiny\":1.0E-4,\"whole\":1.0,\"count\":3},"
                        + "\"observe\":[{\"log-return\":\"stocks\",\"lag\":1}],\"nothing\":{},"
                        + "\"date\":\"2020-01-01\",\"digits\":\"5\",\"quiet\":true,\"none\":null}";
        assertThat(JsonText.compact(tree())).isEqualTo(expected);
        assertThat(JsonText.bytes(Json.object().put("sea", "ŝ🌊")))
                .isEqualTo("{\"sea\":\"ŝ🌊\"}".getBytes(StandardCharsets.UTF_8));
    }

    @Test
    void doublesDoNotDependOnTheJdk() {
        // JDK 17 writes 2.0E23 as 1.9999999999999998E23
        ObjectNode tree = Json.object().put("x", Double.parseDouble("2e23"));
        assertThat(JsonText.compact(tree)).isEqualTo("{\"x\":2.0E23}");
        assertThat(YamlText.of(tree)).isEqualTo("x: 2.0E23\n");
    }

    @Test
    void whatHasNoTextIsRefused() {
        ObjectNode notANumber = Json.object().put("x", Double.NaN);
        assertThatThrownBy(() -> JsonText.compact(notANumber)).hasMessageContaining("NaN");
        assertThatThrownBy(() -> YamlText.of(notANumber)).hasMessageContaining("NaN");
        ObjectNode odd = Json.object();
        odd.set("x", new POJONode(new Object()));
        assertThatThrownBy(() -> JsonText.compact(odd)).isInstanceOf(IllegalArgumentException.class);
        assertThatThrownBy(() -> YamlText.of(odd)).isInstanceOf(IllegalArgumentException.class);
    }
}
