package sojourn.document;

import java.util.Optional;

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
    private final String yamlDefault;
    private final String help;

    /** How a key may be missing. */
    enum Kind {
        REQUIRED,
        DEFAULTED,
        MAYBE
    }

    private Field(String key, Shape<?> shape, Kind kind, String yamlDefault, String help) {
        this.key = key;
        this.shape = shape;
        this.kind = kind;
        this.yamlDefault = yamlDefault;
        this.help = help;
    }

    /** A key that must be there. {@code help} is one sentence, with the unit. */
    public static <T> Field<T> required(String key, Shape<T> shape, String help) {
        return new Field<>(key, shape, Kind.REQUIRED, "", help);
    }

    /** A key that, when missing, counts as if {@code yamlDefault} were written; the same shape reads it. */
    public static <T> Field<T> defaulted(String key, Shape<T> shape, String yamlDefault, String help) {
        return new Field<>(key, shape, Kind.DEFAULTED, yamlDefault, help);
    }

    /** A key that may be missing. */
    public static <T> Field<Optional<T>> maybe(String key, Shape<T> shape, String help) {
        return new Field<>(key, shape, Kind.MAYBE, "", help);
    }

    /** The key. */
    public String key() {
        return key;
    }

    /** One sentence on it. */
    public String help() {
        return help;
    }

    Shape<?> shape() {
        return shape;
    }

    Kind kind() {
        return kind;
    }

    String yamlDefault() {
        return yamlDefault;
    }
}
