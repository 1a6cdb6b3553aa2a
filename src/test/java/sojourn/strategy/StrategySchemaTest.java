package sojourn.strategy;

import static org.assertj.core.api.Assertions.assertThat;

import com.fasterxml.jackson.core.JsonProcessingException;
import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;

/** The JSON Schema as the user of an editor meets it: explained keys, defaults, choices of words. */
class StrategySchemaTest {
    static final JsonNode SCHEMA = schema();

    private static JsonNode schema() {
        try {
            return new ObjectMapper().readTree(StrategyReader.schemaJson());
        } catch (JsonProcessingException e) {
            throw new AssertionError(e);
        }
    }

    @Test
    void everyKeyIsExplained() {
        assertThat(SchemaKeys.of(SCHEMA)).hasSizeGreaterThan(60).allSatisfy(key -> {
            String description = key.schema().path("description").asText();
            assertThat(description).as(key.path()).hasSizeGreaterThan(10);
            assertThat(description)
                    .as(key.path() + ": a phrase that can follow 'add it: '")
                    .matches("\\p{Ll}.*[^.]");
        });
    }

    @Test
    void aKeyThatMayBeLeftOutSaysWhatHoldsThen() {
        for (String pointer : List.of("/trade/delay", "/refit/starts", "/limits/gross", "/regimes/emission")) {
            assertThat(property(pointer).has("default")).as(pointer).isTrue();
        }
        assertThat(property("/trade/fill").get("default").asText()).isEqualTo("next-close");
        assertThat(property("/refit/window").get("default").asText()).isEqualTo("expanding");
        assertThat(property("/limits").get("default").toString()).isEqualTo("{\"gross\":1.0,\"per-asset\":[0.0,1.0]}");
        assertThat(property("/refit/seed").has("default")).isFalse();
    }

    @Test
    void requiredKeysAreNamedAndHaveNoDefault() {
        List<String> required = new ArrayList<>();
        SCHEMA.get("required").forEach(key -> required.add(key.asText()));
        assertThat(required).containsExactly("strategy", "prices", "regimes", "refit", "allocate", "judge");
        required.forEach(
                key -> assertThat(property("/" + key).has("default")).as(key).isFalse());
    }

    @Test
    void wordsAreOfferedInTheOrderOfTheMessages() {
        assertThat(property("/calendar/bars").get("enum").toString()).isEqualTo("[\"daily\",\"weekly\",\"monthly\"]");
        List<String> rules = new ArrayList<>();
        property("/allocate").get("properties").fieldNames().forEachRemaining(rules::add);
        assertThat(rules)
                .containsExactly(
                        "switch",
                        "table",
                        "blend",
                        "volatility-target",
                        "minimum-variance",
                        "mean-variance",
                        "formula");
    }

    @Test
    void unknownKeysAreRefusedInEveryMapOfFixedKeys() {
        assertThat(openMaps(SCHEMA, "")).isEmpty();
    }

    /** A pattern with Java's named classes would mean something else to an editor, whose patterns are ECMAScript's. */
    @Test
    void patternsKeepToWhatEveryEditorReads() {
        List<String> patterns = new ArrayList<>();
        SCHEMA.findValues("pattern").forEach(pattern -> patterns.add(pattern.asText()));
        assertThat(patterns)
                .hasSizeGreaterThanOrEqualTo(3)
                .allSatisfy(pattern -> assertThat(pattern)
                        .startsWith("^")
                        .endsWith("$")
                        .doesNotContain("\\p{", "\\P{", "(?i", "(?s", "\\A", "\\z", "\\Q", "[[:", "&&", "*+", "++"));
    }

    private static JsonNode property(String pointer) {
        JsonNode schema = SCHEMA;
        for (String key : pointer.substring(1).split("/", -1)) {
            schema = (schema.has("else") ? schema.get("else") : schema)
                    .path("properties")
                    .path(key);
        }
        assertThat(schema.isObject()).as(pointer).isTrue();
        return schema;
    }

    private static List<String> openMaps(JsonNode schema, String path) {
        List<String> open = new ArrayList<>();
        if (schema.has("properties") && schema.path("additionalProperties").asBoolean(true)) {
            open.add(path);
        }
        schema.properties().forEach(entry -> {
            if (entry.getValue().isContainerNode()) {
                open.addAll(openMaps(entry.getValue(), path + "/" + entry.getKey()));
            }
        });
        return open;
    }
}
