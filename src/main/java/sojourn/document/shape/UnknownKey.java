package sojourn.document.shape;

import java.util.Collection;
import java.util.Optional;
import sojourn.document.Nearest;
import sojourn.document.Place;
import sojourn.document.Problems;
import sojourn.document.Wording;

/** The message about a key that means nothing. */
final class UnknownKey {
    private UnknownKey() {}

    /** Adds the message; returns the key of {@code missing} that was probably meant. */
    static Optional<String> tell(
            String key, Place keyPlace, Collection<String> missing, Collection<String> known, Problems problems) {
        problems.add(
                keyPlace,
                "unknown key '" + Wording.shortened(key) + "'",
                Nearest.hint(key, missing) + "known keys: " + String.join(", ", known));
        return Nearest.to(key, missing);
    }
}
