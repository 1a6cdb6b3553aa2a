package sojourn.document.shape;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.Map;
import java.util.Optional;
import sojourn.document.Json;
import sojourn.document.Nearest;
import sojourn.document.Node;
import sojourn.document.Problems;
import sojourn.document.ScalarNode;
import sojourn.document.Shape;
import sojourn.document.Wording;

/** One of some words; the map's own order is that of messages and schema. */
public record WordShape<T>(Map<String, T> meanings) implements Shape<T> {
    @Override
    public Optional<T> read(Node node, Problems problems) {
        Optional<T> meaning =
                mayBe(node) ? Optional.ofNullable(meanings.get(((ScalarNode) node).text())) : Optional.empty();
        return meaning.isPresent() ? meaning : Wording.mismatch(this, node, problems);
    }

    @Override
    public JsonNode resolved(Node node) {
        return Json.text(((ScalarNode) node).text());
    }

    @Override
    public ObjectNode schema() {
        ObjectNode schema = Json.typed("string");
        ArrayNode words = schema.putArray("enum");
        meanings.keySet().forEach(words::add);
        return schema;
    }

    @Override
    public String expected() {
        return meanings.size() == 1
                ? "the word " + meanings.keySet().iterator().next()
                : "one of " + String.join(", ", meanings.keySet());
    }

    @Override
    public boolean mayBe(Node node) {
        return TextShape.isText(node);
    }

    @Override
    public String hint(Node node) {
        return mayBe(node) ? Nearest.hint(((ScalarNode) node).text(), meanings.keySet()) : "";
    }
}
