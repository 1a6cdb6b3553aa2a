package sojourn.strategy;

import com.fasterxml.jackson.databind.JsonNode;
import java.util.ArrayList;
import java.util.List;

/**
 * The keys that a JSON Schema knows.
 *
 * @param name the key
 * @param path where its schema stands, for messages
 * @param schema what its value must be
 */
record SchemaKeys(String name, String path, JsonNode schema) {
    /** Every key under {@code properties}, at any depth. */
    static List<SchemaKeys> of(JsonNode schema) {
        List<SchemaKeys> found = new ArrayList<>();
        collect(schema, "", found);
        return found;
    }

    private static void collect(JsonNode schema, String path, List<SchemaKeys> found) {
        if (schema.isMissingNode()) {
            return;
        }
        schema.path("properties").properties().forEach(entry -> {
            String below = path + "/" + entry.getKey();
            found.add(new SchemaKeys(entry.getKey(), below, entry.getValue()));
            collect(entry.getValue(), below, found);
        });
        if (schema.path("additionalProperties").isObject()) {
            collect(schema.get("additionalProperties"), path + "/*", found);
        }
        if (schema.has("items")) {
            collect(schema.get("items"), path + "/-", found);
        }
        schema.path("anyOf").forEach(choice -> collect(choice, path, found));
        collect(schema.path("then"), path, found);
        collect(schema.path("else"), path, found);
    }
}
