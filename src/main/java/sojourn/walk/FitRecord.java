package sojourn.walk;

import java.time.LocalDate;
import java.util.List;
import sojourn.regime.Fit;

/**
 * One fit of a walk, accepted or refused.
 *
 * @param number counted from 1
 * @param bar the bar at whose close it was made, and from which it is in force if accepted
 * @param fittedOn that bar's date
 * @param windowStart date of the window's first observation
 * @param fit the outcome, regimes in role order
 * @param events what was noticed, with the regimes' names
 * @param explanation why it did not end at a maximum, with the regimes' names; empty where it did
 */
public record FitRecord(
        int number,
        int bar,
        LocalDate fittedOn,
        LocalDate windowStart,
        Fit fit,
        List<String> events,
        String explanation) {
    /** Copies its list. */
    public FitRecord {
        events = List.copyOf(events);
    }
}
