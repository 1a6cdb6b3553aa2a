package sojourn.market;

import java.time.LocalDate;
import java.util.List;

/**
 * One row of probabilities that were computed elsewhere.
 *
 * @param date the date that they are of
 * @param knownOn the date from which they count; not before {@code date}
 * @param probabilities one a regime, sum to 1
 * @param line where the row stands, 1-based
 */
record GivenRow(LocalDate date, LocalDate knownOn, List<Double> probabilities, int line) {
    GivenRow {
        probabilities = List.copyOf(probabilities);
    }

    /** Whether this row replaces {@code other} once both are known: it became known later, or is of a later date. */
    boolean replaces(GivenRow other) {
        return knownOn.equals(other.knownOn) ? date.isAfter(other.date) : knownOn.isAfter(other.knownOn);
    }
}
