package sojourn.document;

import java.time.LocalDate;
import java.util.List;
import java.util.Map;
import java.util.function.Function;

/** The kinds of shape. STUB: to be built by the owner of this package with these signatures. */
@SuppressWarnings("DoNotCallSuggester")
public final class Shapes {
    private Shapes() {}

    /** Any finite number. Bounds by {@link NumberShape#atLeast} and its like. */
    public static NumberShape number() {
        throw new UnsupportedOperationException();
    }

    /** A whole number that fits an int. */
    public static IntegerShape integer() {
        throw new UnsupportedOperationException();
    }

    /** A whole number that fits a long (seeds). */
    public static Shape<Long> longInteger() {
        throw new UnsupportedOperationException();
    }

    /** true or false. */
    public static Shape<Boolean> flag() {
        throw new UnsupportedOperationException();
    }

    /** Any non-empty text. */
    public static Shape<String> text() {
        throw new UnsupportedOperationException();
    }

    /** Text that matches {@code pattern} whole; {@code expected} says it in words. */
    public static Shape<String> textLike(String pattern, String expected) {
        throw new UnsupportedOperationException();
    }

    /** An ISO date. */
    public static Shape<LocalDate> date() {
        throw new UnsupportedOperationException();
    }

    /** One of some words; order is kept in messages. */
    public static <T> Shape<T> word(Map<String, T> meanings) {
        throw new UnsupportedOperationException();
    }

    /** A list of {@code atLeast} to {@code atMost} items. */
    public static <T> Shape<List<T>> list(Shape<T> item, int atLeast, int atMost) {
        throw new UnsupportedOperationException();
    }

    /** A map with free keys, at least one, in the order written. */
    public static <T> Shape<Map<String, T>> named(Shape<String> key, Shape<T> value) {
        throw new UnsupportedOperationException();
    }

    /** A map with exactly one of the given keys: a choice between variants. */
    public static <T> Shape<T> oneKey(Map<String, Shape<? extends T>> variants) {
        throw new UnsupportedOperationException();
    }

    /** The first of {@code alternatives} whose {@link Shape#mayBe} accepts the node. */
    @SafeVarargs
    public static <T> Shape<T> either(Shape<? extends T>... alternatives) {
        throw new UnsupportedOperationException();
    }

    /** A map with fixed keys. {@code name} is what messages call it. */
    public static <T> Shape<T> object(String name, Function<Fields, T> build, Field<?>... fields) {
        throw new UnsupportedOperationException();
    }
}
