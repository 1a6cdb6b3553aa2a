package sojourn.document.shape;

import com.fasterxml.jackson.databind.JsonNode;
import java.util.Map;
import java.util.Optional;
import sojourn.document.MapNode;
import sojourn.document.ScalarNode;
import sojourn.document.Shape;

/** A key that stands beside the one it belongs inside: {@code {word: a, more: 1}} where {@code {word: {of: a, more: 1}}} is meant. */
final class MisplacedKey {
    private MisplacedKey() {}

    /** What to write instead; empty unless the map has one of the known keys, with a single value, that also takes a map with {@code key}. */
    static <T> Optional<String> in(MapNode map, String key, Map<String, Shape<? extends T>> variants) {
        Optional<String> more = text(map, key);
        for (Map.Entry<String, Shape<? extends T>> variant : variants.entrySet()) {
            Optional<String> one = text(map, variant.getKey());
            JsonNode schema = variant.getValue().schema();
            JsonNode required = schema.findPath("required");
            if (one.isPresent() && more.isPresent() && required.size() == 1 && schema.findValue(key) != null) {
                return Optional.of("write {" + variant.getKey() + ": {"
                        + required.path(0).asText() + ": " + one.get() + ", " + key + ": " + more.get() + "}}");
            }
        }
        return Optional.empty();
    }

    /** The single value of a key, as written. */
    private static Optional<String> text(MapNode map, String key) {
        return Optional.ofNullable(map.entries().get(key))
                .map(MapNode.Entry::value)
                .flatMap(node -> node instanceof ScalarNode one ? Optional.of(one.text()) : Optional.empty());
    }
}
