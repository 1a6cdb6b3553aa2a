package sojourn.document;

import java.time.LocalDate;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.function.Function;
import java.util.regex.Pattern;
import sojourn.document.shape.DateShape;
import sojourn.document.shape.DoubleShape;
import sojourn.document.shape.EitherShape;
import sojourn.document.shape.FlagShape;
import sojourn.document.shape.IntShape;
import sojourn.document.shape.KeyedShape;
import sojourn.document.shape.ListShape;
import sojourn.document.shape.LongShape;
import sojourn.document.shape.NamedShape;
import sojourn.document.shape.ObjectShape;
import sojourn.document.shape.OneKeyShape;
import sojourn.document.shape.TextShape;
import sojourn.document.shape.WordShape;

/** The kinds of shape. */
public final class Shapes {
    private Shapes() {}

    /** Any finite number. Bounds by {@link NumberShape#atLeast} and its like. */
    public static NumberShape number() {
        return DoubleShape.ANY;
    }

    /** A whole number that fits an int. */
    public static IntegerShape integer() {
        return IntShape.ANY;
    }

    /** A whole number that fits a long (seeds). */
    public static Shape<Long> longInteger() {
        return new LongShape();
    }

    /** true or false. */
    public static Shape<Boolean> flag() {
        return new FlagShape();
    }

    /** Any non-empty text. */
    public static Shape<String> text() {
        return new TextShape(Optional.empty(), "text");
    }

    /**
     * Text that matches {@code pattern} whole; {@code expected} says it in words, with its article: "a name of …". The pattern
     * also stands in the JSON Schema, so it keeps to what Java and ECMAScript read alike.
     */
    public static Shape<String> textLike(String pattern, String expected) {
        return new TextShape(Optional.of(Pattern.compile(pattern)), expected);
    }

    /** An ISO date. */
    public static Shape<LocalDate> date() {
        return new DateShape();
    }

    /** One of some words; order is kept in messages (a map that has no order of its own is taken alphabetically). */
    public static <T> Shape<T> word(Map<String, T> meanings) {
        return new WordShape<>(ordered(meanings));
    }

    /** One of the values that have a word each, an enum's constants say: {@code word(List.of(values()), E::word)}. */
    public static <T> Shape<T> word(List<T> values, Function<T, String> word) {
        Map<String, T> meanings = new LinkedHashMap<>();
        values.forEach(value -> meanings.put(word.apply(value), value));
        return word(meanings);
    }

    /** A list of {@code atLeast} to {@code atMost} items; {@code Integer.MAX_VALUE} means any number. */
    public static <T> Shape<List<T>> list(Shape<T> item, int atLeast, int atMost) {
        if (atLeast < 0 || atMost < atLeast) {
            throw new IllegalArgumentException("a list of " + atLeast + " to " + atMost + " items");
        }
        return new ListShape<>(item, atLeast, atMost);
    }

    /** A map with free keys, at least one, in the order written. */
    public static <T> Shape<Map<String, T>> named(Shape<String> key, Shape<T> value) {
        return new NamedShape<>(key, value);
    }

    /**
     * A map with exactly one of the given keys: a choice between variants; order is kept in messages (a map that has no order
     * of its own is taken alphabetically).
     */
    public static <T> Shape<T> oneKey(Map<String, Shape<? extends T>> variants) {
        return new OneKeyShape<>(ordered(variants));
    }

    /**
     * The first of {@code alternatives} that reads the node without fault, among those whose {@link Shape#mayBe} accepts it;
     * if none does, the one with the fewest faults tells them.
     */
    @SafeVarargs
    @SuppressWarnings("varargs") // the array is copied at once
    public static <T> Shape<T> either(Shape<? extends T>... alternatives) {
        return new EitherShape<>(List.of(alternatives));
    }

    /** A map that is read by {@code with} where {@code key} stands in it, else by {@code without}. Both must be of maps. */
    public static <T> Shape<T> keyed(String key, Shape<? extends T> with, Shape<? extends T> without) {
        return new KeyedShape<>(key, with, without);
    }

    /** A map with fixed keys. {@code name} is what messages call it. */
    public static <T> Shape<T> object(String name, Function<Fields, T> build, Field<?>... fields) {
        return new ObjectShape<>(name, build, List.of(fields));
    }

    /** A copy in a fixed order: the map's own, unless it is of a kind whose order changes from run to run. */
    private static <V> Map<String, V> ordered(Map<String, V> map) {
        if (map.isEmpty()) {
            throw new IllegalArgumentException("there must be at least one choice");
        }
        boolean hasOrder = map instanceof LinkedHashMap || map instanceof SortedMap;
        return Collections.unmodifiableMap(hasOrder ? new LinkedHashMap<>(map) : new TreeMap<>(map));
    }
}
