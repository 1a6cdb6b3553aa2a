package sojourn.document;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.BooleanNode;
import com.fasterxml.jackson.databind.node.DoubleNode;
import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.databind.node.NullNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import com.fasterxml.jackson.databind.node.TextNode;
import java.math.BigInteger;

/** A located tree as the JSON that a schema validator sees: nothing filled in, nothing converted. */
public final class RawJson {
    private RawJson() {}

    /** The tree at {@code node}, which must hold nothing that was refused while it was read. */
    public static JsonNode of(Node node) {
        if (node instanceof MapNode map) {
            ObjectNode object = JsonNodeFactory.instance.objectNode();
            map.entries().forEach((key, entry) -> object.set(key, of(entry.value())));
            return object;
        }
        if (node instanceof ListNode list) {
            ArrayNode array = JsonNodeFactory.instance.arrayNode();
            list.items().forEach(item -> array.add(of(item)));
            return array;
        }
        if (!(node instanceof ScalarNode scalar)) {
            throw new IllegalArgumentException("a broken node has no JSON: " + node.place());
        }
        return switch (scalar.kind()) {
            case TEXT -> TextNode.valueOf(scalar.text());
            case FLAG -> BooleanNode.valueOf(scalar.text().equals("true"));
            case NOTHING -> NullNode.instance;
            case NUMBER -> number(scalar.text());
        };
    }

    private static JsonNode number(String text) {
        return text.matches("[-+]?[0-9]+")
                ? JsonNodeFactory.instance.numberNode(new BigInteger(text))
                : DoubleNode.valueOf(Double.parseDouble(text));
    }
}
