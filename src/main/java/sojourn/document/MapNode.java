package sojourn.document;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * A map whose keys know their places.
 *
 * @param place where it begins: its first key, or its opening brace
 * @param entries by key, in the order written
 */
public record MapNode(Place place, Map<String, Entry> entries) implements Node {
    /**
     * A key and its value.
     *
     * @param keyPlace where the key stands; its path is that of the value
     * @param value the value
     */
    public record Entry(Place keyPlace, Node value) {}

    /** Copies the entries, keeping their order. */
    public MapNode {
        entries = Collections.unmodifiableMap(new LinkedHashMap<>(entries));
    }

    /** The keys in the order written. */
    public List<String> keys() {
        return List.copyOf(entries.keySet());
    }

    /** The value of a key. */
    public Optional<Node> get(String key) {
        return Optional.ofNullable(entries.get(key)).map(Entry::value);
    }

    /** Where a key stands. */
    public Optional<Place> keyPlace(String key) {
        return Optional.ofNullable(entries.get(key)).map(Entry::keyPlace);
    }
}
