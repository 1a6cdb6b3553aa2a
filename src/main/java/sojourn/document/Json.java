package sojourn.document;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.databind.node.ObjectNode;

/** Jackson's nodes, made short. */
public final class Json {
    private static final double EXACT_WHOLE_NUMBERS = 1e15;

    private Json() {}

    public static ObjectNode object() {
        return JsonNodeFactory.instance.objectNode();
    }

    public static ObjectNode typed(String type) {
        return object().put("type", type);
    }

    public static ArrayNode array() {
        return JsonNodeFactory.instance.arrayNode();
    }

    public static JsonNode text(String text) {
        return JsonNodeFactory.instance.textNode(text);
    }

    public static JsonNode number(double value) {
        return JsonNodeFactory.instance.numberNode(value);
    }

    public static JsonNode number(long value) {
        return JsonNodeFactory.instance.numberNode(value);
    }

    /** A bound as people write it: 0 rather than 0.0. */
    public static JsonNode bound(double value) {
        boolean whole = value == Math.rint(value) && Math.abs(value) < EXACT_WHOLE_NUMBERS;
        return whole ? number((long) value) : number(value);
    }

    public static String shown(double bound) {
        return JsonText.compact(bound(bound));
    }
}
