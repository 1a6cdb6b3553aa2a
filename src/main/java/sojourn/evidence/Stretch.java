package sojourn.evidence;

import java.util.List;
import java.util.OptionalInt;
import sojourn.walk.FitRecord;

/**
 * The bars that one accepted fit was in force.
 *
 * @param record the fit
 * @param windowStart the bar of its window's first observation
 * @param from the bar it was made on
 * @param end one past its last bar: the next accepted fit's bar, or the end of the walk
 */
public record Stretch(FitRecord record, int windowStart, int from, int end) {
    /** The fit's state of each of those regimes; empty for one that the chosen number of regimes has none of. */
    List<OptionalInt> states(List<String> regimes) {
        return regimes.stream().map(record::state).toList();
    }
}
