package sojourn.document.shape;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Optional;
import sojourn.document.Json;
import sojourn.document.MapNode;
import sojourn.document.Node;
import sojourn.document.Place;
import sojourn.document.Problems;
import sojourn.document.ScalarNode;
import sojourn.document.Shape;
import sojourn.document.Wording;

/** A map whose keys the user chooses; at least one. */
public record NamedShape<T>(Shape<String> key, Shape<T> value) implements Shape<Map<String, T>> {
    @Override
    public Optional<Map<String, T>> read(Node node, Problems problems) {
        if (!(node instanceof MapNode map)) {
            return Wording.mismatch(this, node, problems);
        }
        if (map.entries().isEmpty()) {
            problems.add(node, node.name() + " is empty", "give " + expected());
            return Optional.empty();
        }
        Map<String, T> values = new LinkedHashMap<>();
        map.entries().forEach((name, entry) -> {
            Optional<String> readKey = key.read(keyNode(name, entry.keyPlace()), problems);
            Optional<T> readValue = value.read(entry.value(), problems);
            if (readKey.isPresent() && readValue.isPresent()) {
                values.put(readKey.get(), readValue.get());
            }
        });
        return values.size() == map.entries().size()
                ? Optional.of(Collections.unmodifiableMap(values))
                : Optional.empty();
    }

    private static ScalarNode keyNode(String name, Place place) {
        Place named = new Place(place.file(), place.line(), place.column(), place.path(), "the key");
        return new ScalarNode(named, ScalarNode.Kind.TEXT, name);
    }

    @Override
    public JsonNode resolved(Node node) {
        ObjectNode values = Json.object();
        ((MapNode) node).entries().forEach((name, entry) -> values.set(name, value.resolved(entry.value())));
        return values;
    }

    @Override
    public ObjectNode schema() {
        ObjectNode schema = Json.typed("object").put("minProperties", 1);
        schema.set("propertyNames", key.schema());
        schema.set("additionalProperties", value.schema());
        return schema;
    }

    @Override
    public String expected() {
        return "a map of at least one entry, each value " + value.expected();
    }

    @Override
    public boolean mayBe(Node node) {
        return node instanceof MapNode;
    }
}
