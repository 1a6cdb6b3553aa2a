package sojourn.document;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.databind.node.ObjectNode;

/** Jackson's nodes, made short. */
final class Json {
    private static final double EXACT_WHOLE_NUMBERS = 1e15;

    private Json() {}

    static ObjectNode object() {
        return JsonNodeFactory.instance.objectNode();
    }

    static ObjectNode typed(String type) {
        return object().put("type", type);
    }

    static ArrayNode array() {
        return JsonNodeFactory.instance.arrayNode();
    }

    static JsonNode text(String text) {
        return JsonNodeFactory.instance.textNode(text);
    }

    static JsonNode number(double value) {
        return JsonNodeFactory.instance.numberNode(value);
    }

    static JsonNode number(long value) {
        return JsonNodeFactory.instance.numberNode(value);
    }

    /** A bound as people write it: 0 rather than 0.0. */
    static JsonNode bound(double value) {
        boolean whole = value == Math.rint(value) && Math.abs(value) < EXACT_WHOLE_NUMBERS;
        return whole ? number((long) value) : number(value);
    }

    static String shown(double bound) {
        return JsonText.compact(bound(bound));
    }
}
