package sojourn.document.shape;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import sojourn.document.Json;
import sojourn.document.MapNode;
import sojourn.document.Node;
import sojourn.document.Place;
import sojourn.document.Problems;
import sojourn.document.Shape;
import sojourn.document.Wording;

/** A map with exactly one of some known keys, which says how its value is read. */
public record OneKeyShape<T>(Map<String, Shape<? extends T>> variants) implements Shape<T> {
    @Override
    public Optional<T> read(Node node, Problems problems) {
        if (!(node instanceof MapNode map)) {
            return Wording.mismatch(this, node, problems);
        }
        if (map.entries().isEmpty()) {
            problems.add(node, node.name() + " is empty", "give " + expected());
            return Optional.empty();
        }
        List<String> known = new ArrayList<>();
        List<Place> places = new ArrayList<>();
        Optional<T> value = Optional.empty();
        for (Map.Entry<String, MapNode.Entry> entry : map.entries().entrySet()) {
            Shape<? extends T> variant = variants.get(entry.getKey());
            if (variant == null) {
                MisplacedKey.in(map, entry.getKey(), variants)
                        .ifPresentOrElse(
                                remedy -> problems.add(
                                        entry.getValue().keyPlace(),
                                        "key '" + entry.getKey() + "' stands beside the key it belongs to",
                                        remedy),
                                () -> UnknownKey.tell(
                                        entry.getKey(),
                                        entry.getValue().keyPlace(),
                                        variants.keySet(),
                                        variants.keySet(),
                                        problems));
                continue;
            }
            known.add(entry.getKey());
            places.add(entry.getValue().keyPlace());
            value = variant.read(entry.getValue().value(), problems).map(v -> v);
        }
        if (known.size() > 1) {
            problems.add(
                    places.get(1), node.name() + " has " + Wording.all(known) + " at once", "keep exactly one of them");
        }
        return map.entries().size() == 1 ? value : Optional.empty();
    }

    @Override
    public JsonNode resolved(Node node) {
        ObjectNode resolved = Json.object();
        ((MapNode) node)
                .entries()
                .forEach((key, entry) -> resolved.set(key, variant(key).resolved(entry.value())));
        return resolved;
    }

    private Shape<? extends T> variant(String key) {
        Shape<? extends T> variant = variants.get(key);
        if (variant == null) {
            throw new IllegalArgumentException("key is '" + key + "', known: " + variants.keySet());
        }
        return variant;
    }

    @Override
    public ObjectNode schema() {
        ObjectNode schema = Json.typed("object").put("minProperties", 1).put("maxProperties", 1);
        ObjectNode properties = schema.putObject("properties");
        variants.forEach((key, variant) -> properties.set(key, variant.schema()));
        return schema.put("additionalProperties", false);
    }

    @Override
    public String expected() {
        return variants.size() == 1
                ? "a map with the key " + variants.keySet().iterator().next()
                : "a map with exactly one of the keys " + String.join(", ", variants.keySet());
    }

    @Override
    public boolean mayBe(Node node) {
        return node instanceof MapNode;
    }
}
