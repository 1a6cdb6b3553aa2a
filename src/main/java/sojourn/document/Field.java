package sojourn.document;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.List;
import java.util.Optional;
import sojourn.document.shape.Belonging;

/**
 * One key of a map and the shape of its value.
 *
 * @param <T> what {@link Fields#get} gives for it
 */
@SuppressWarnings("UnusedTypeParameter") // T types the answer of Fields.get, nothing inside
public final class Field<T> {
    private final String key;
    private final Shape<?> shape;
    private final Kind kind;
    private final Optional<Node> whenMissing;
    private final String help;
    private final Optional<Belonging> belonging;

    /** How a key may be missing. */
    public enum Kind {
        REQUIRED,
        DEFAULTED,
        MAYBE
    }

    private Field(
            String key,
            Shape<?> shape,
            Kind kind,
            Optional<Node> whenMissing,
            String help,
            Optional<Belonging> belonging) {
        this.key = key;
        this.shape = shape;
        this.kind = kind;
        this.whenMissing = whenMissing;
        this.help = help;
        this.belonging = belonging;
    }

    /** A key that must be there. {@code help} is one sentence, with the unit. */
    public static <T> Field<T> required(String key, Shape<T> shape, String help) {
        return new Field<>(key, shape, Kind.REQUIRED, Optional.empty(), help, Optional.empty());
    }

    /**
     * A key that, when missing, counts as if {@code yamlDefault} were written; the same shape reads it.
     *
     * @throws IllegalArgumentException if the shape refuses the default
     */
    public static <T> Field<T> defaulted(String key, Shape<T> shape, String yamlDefault, String help) {
        Problems faults = new Problems();
        Optional<Node> tree = Composer.compose("default of '" + key + "'", yamlDefault, faults);
        tree.ifPresent(node -> shape.read(node, faults));
        if (!faults.isEmpty()) {
            throw new IllegalArgumentException(faults.list().get(0).toString());
        }
        return new Field<>(key, shape, Kind.DEFAULTED, tree, help, Optional.empty());
    }

    /** A key that may be missing. */
    public static <T> Field<Optional<T>> maybe(String key, Shape<T> shape, String help) {
        return new Field<>(key, shape, Kind.MAYBE, Optional.empty(), help, Optional.empty());
    }

    /**
     * The same key, which belongs to some words of another key of its map: with any other word it is refused when written, and its
     * default is not written out. Only a key that may be missing can belong to a word.
     *
     * @param other the key whose word decides; it has a default
     * @param words the words that this key belongs to
     */
    public Field<T> onlyWith(Field<?> other, List<String> words) {
        if (kind == Kind.REQUIRED) {
            throw new IllegalArgumentException("'" + key + "' is required whatever '" + other.key + "' is");
        }
        return new Field<>(key, shape, kind, whenMissing, help, Optional.of(new Belonging(other, words)));
    }

    /** The key. */
    public String key() {
        return key;
    }

    /** One sentence on it. */
    public String help() {
        return help;
    }

    public Kind kind() {
        return kind;
    }

    /** Refuses the key where it is written in {@code map} beside a word that it does not belong to. */
    public boolean belongs(MapNode map, Problems problems) {
        return belonging.map(b -> b.check(key, map, problems)).orElse(true);
    }

    /** Whether the key's shape reads the node without fault. */
    public boolean reads(Node node) {
        return shape.read(node, new Problems()).isPresent();
    }

    /** The word that holds when the key is missing, if its default is one. */
    public Optional<String> defaultWord() {
        return whenMissing.flatMap(Belonging::word);
    }

    /** What {@link Fields#get} gives; empty if the value is at fault, or missing and required. */
    public Optional<?> value(Optional<Node> written, Problems problems) {
        Optional<?> value = written.or(() -> whenMissing).flatMap(node -> shape.read(node, problems));
        if (kind != Kind.MAYBE) {
            return value;
        }
        return written.isEmpty() || value.isPresent() ? Optional.of(value) : Optional.empty();
    }

    /** The value, or its default where the key belongs, written out; empty if there is neither. */
    public Optional<JsonNode> resolved(MapNode map) {
        boolean counts = belonging.map(b -> b.holds(map)).orElse(true);
        return map.get(key).or(() -> counts ? whenMissing : Optional.empty()).map(shape::resolved);
    }

    /** The schema of the value, with the help text first and the default last. */
    public ObjectNode schema() {
        ObjectNode schema = Json.object().put("description", help);
        schema.setAll(shape.schema());
        whenMissing.ifPresent(node -> schema.set("default", shape.resolved(node)));
        return schema;
    }
}
