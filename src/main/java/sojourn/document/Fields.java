package sojourn.document;

/** The values that a map's fields were read into. */
public interface Fields {
    /** The value of {@code field}: its default, or an empty optional, when the key is missing. */
    <T> T get(Field<T> field);
}
