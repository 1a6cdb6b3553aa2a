package sojourn.compare;

import java.util.Optional;
import java.util.function.Supplier;

/**
 * What came of one piece of a batch: its result, or a fault of the program, which costs this piece only and is told at the end.
 *
 * @param <T> the result
 * @param result empty exactly if there is a fault
 * @param fault what was thrown
 */
public record Attempt<T>(Optional<T> result, Optional<RuntimeException> fault) {
    /** Runs {@code work}. Errors of the machine (no memory) are not caught. */
    public static <T> Attempt<T> at(Supplier<T> work) {
        try {
            return new Attempt<>(Optional.of(work.get()), Optional.empty());
        } catch (RuntimeException e) {
            return new Attempt<>(Optional.empty(), Optional.of(e));
        }
    }

    /** The reason of a failed row. */
    public String reason() {
        return "a fault of the program, not of your input: "
                + fault.map(RuntimeException::toString).orElse("none");
    }
}
