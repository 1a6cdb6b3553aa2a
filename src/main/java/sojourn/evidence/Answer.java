package sojourn.evidence;

import java.util.Optional;
import java.util.function.Function;

/**
 * What a question came to: something found, or nothing and why.
 *
 * @param <T> what was asked for
 */
public sealed interface Answer<T> {
    /** What was found, if anything. */
    Optional<T> found();

    /** Why there is nothing, a clause in plain words; empty where there is something. */
    String because();

    /** Something made of what was found; nothing for the same reason otherwise. */
    <U> Answer<U> map(Function<? super T, ? extends U> change);

    /** Found. */
    static <T> Answer<T> of(T value) {
        return new Found<>(value);
    }

    /** Nothing, because. */
    static <T> Answer<T> none(String because) {
        return new None<>(because);
    }

    /** Found. */
    record Found<T>(T value) implements Answer<T> {
        @Override
        public Optional<T> found() {
            return Optional.of(value);
        }

        @Override
        public String because() {
            return "";
        }

        @Override
        public <U> Answer<U> map(Function<? super T, ? extends U> change) {
            return new Found<>(change.apply(value));
        }
    }

    /** Nothing. */
    record None<T>(String because) implements Answer<T> {
        @Override
        public Optional<T> found() {
            return Optional.empty();
        }

        @Override
        public <U> Answer<U> map(Function<? super T, ? extends U> change) {
            return new None<>(because);
        }
    }
}
