package sojourn.document.shape;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.function.Function;
import sojourn.document.Field;
import sojourn.document.Fields;
import sojourn.document.Json;
import sojourn.document.MapNode;
import sojourn.document.Node;
import sojourn.document.Problems;
import sojourn.document.Shape;
import sojourn.document.Wording;

/** A map with fixed keys. */
public record ObjectShape<T>(String name, Function<Fields, T> build, List<Field<?>> fields) implements Shape<T> {
    public ObjectShape {
        Set<String> seen = new HashSet<>();
        for (Field<?> field : fields) {
            if (!seen.add(field.key())) {
                throw new IllegalArgumentException(name + " declares key '" + field.key() + "' twice");
            }
        }
        fields = List.copyOf(fields);
    }

    @Override
    public Optional<T> read(Node node, Problems problems) {
        if (!(node instanceof MapNode map)) {
            return Wording.mismatch(this, node, problems);
        }
        Set<String> misspelt = tellUnknownKeys(map, problems);
        boolean clean = map.keys().stream().allMatch(keys()::contains);
        Map<Field<?>, Object> values = new HashMap<>();
        for (Field<?> field : fields) {
            Optional<Node> written = map.get(field.key());
            if (written.isEmpty() && field.kind() == Field.Kind.REQUIRED && !misspelt.contains(field.key())) {
                problems.add(node, "key '" + field.key() + "' is missing", "add it: " + field.help());
            }
            Optional<?> value = field.value(written, problems);
            clean &= field.belongs(map, problems) && value.isPresent();
            value.ifPresent(v -> values.put(field, v));
        }
        return clean ? Optional.of(build.apply(new ReadFields(name, values))) : Optional.empty();
    }

    /**
     * What the map says without its keys that stand beside a word they do not belong to, so that rules on the whole can be told in
     * one go with those; empty if anything else is at fault.
     */
    Optional<T> withoutMisplaced(Node node) {
        if (!(node instanceof MapNode map) || !keys().containsAll(map.keys())) {
            return Optional.empty();
        }
        Problems told = new Problems();
        Map<Field<?>, Object> values = new HashMap<>();
        for (Field<?> field : fields) {
            boolean misplaced = !field.belongs(map, told);
            Optional<?> value = field.value(misplaced ? Optional.empty() : map.get(field.key()), told);
            if (value.isEmpty()) {
                return Optional.empty();
            }
            values.put(field, value.get());
        }
        return Optional.of(build.apply(new ReadFields(name, values)));
    }

    /** Returns the keys that the unknown ones were probably meant to be, which need not be called missing as well. */
    private Set<String> tellUnknownKeys(MapNode map, Problems problems) {
        List<String> missing = new ArrayList<>(keys());
        missing.removeAll(map.keys());
        Set<String> misspelt = new HashSet<>();
        map.entries().forEach((key, entry) -> {
            if (!keys().contains(key)) {
                UnknownKey.tell(key, entry.keyPlace(), missing, keys(), problems)
                        .ifPresent(misspelt::add);
            }
        });
        return misspelt;
    }

    private List<String> keys() {
        return fields.stream().<String>map(Field::key).toList();
    }

    @Override
    public JsonNode resolved(Node node) {
        ObjectNode resolved = Json.object();
        for (Field<?> field : fields) {
            field.resolved((MapNode) node).ifPresent(value -> resolved.set(field.key(), value));
        }
        return resolved;
    }

    @Override
    public ObjectNode schema() {
        ObjectNode schema = Json.typed("object");
        ObjectNode properties = schema.putObject("properties");
        fields.forEach(field -> properties.set(field.key(), field.schema()));
        List<Field<?>> required =
                fields.stream().filter(f -> f.kind() == Field.Kind.REQUIRED).toList();
        if (!required.isEmpty()) {
            ArrayNode names = schema.putArray("required");
            required.forEach(f -> names.add(f.key()));
        }
        return schema.put("additionalProperties", false);
    }

    @Override
    public String expected() {
        List<String> required = fields.stream()
                .filter(f -> f.kind() == Field.Kind.REQUIRED)
                .<String>map(Field::key)
                .toList();
        List<String> told = required.isEmpty() ? keys() : required;
        return "a map (" + name + ")" + (told.isEmpty() ? "" : " with " + Wording.all(told));
    }

    @Override
    public boolean mayBe(Node node) {
        return node instanceof MapNode;
    }
}
