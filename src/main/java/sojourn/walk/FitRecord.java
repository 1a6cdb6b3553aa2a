package sojourn.walk;

import java.time.LocalDate;
import java.util.List;
import java.util.OptionalInt;
import sojourn.regime.Fit;

/**
 * One fit of a walk, accepted or refused.
 *
 * @param number counted from 1
 * @param bar the bar at whose close it was made, and from which it is in force if accepted
 * @param fittedOn that bar's date
 * @param windowStart date of the window's first observation
 * @param regimes the names of the regimes that were fitted; all of the timeline's, unless their number was chosen
 * @param fit the outcome, regimes in role order
 * @param events what was noticed, with the regimes' names
 * @param explanation why it did not end at a maximum, with the regimes' names; empty where it did
 * @param candidates the numbers of regimes it was chosen among, itself included
 * @param withoutIt filtered probability of each of the timeline's regimes at this close by the fit in force before; empty where
 *     there was none
 */
public record FitRecord(
        int number,
        int bar,
        LocalDate fittedOn,
        LocalDate windowStart,
        List<String> regimes,
        Fit fit,
        List<String> events,
        String explanation,
        List<CandidateFit> candidates,
        List<Double> withoutIt) {
    /** Copies its lists. */
    public FitRecord {
        regimes = List.copyOf(regimes);
        candidates = List.copyOf(candidates);
        events = List.copyOf(events);
        withoutIt = List.copyOf(withoutIt);
    }

    /** Which state of the fit carries that name; empty where the chosen number of regimes has none of it. */
    public OptionalInt state(String regime) {
        int state = regimes.indexOf(regime);
        return state < 0 ? OptionalInt.empty() : OptionalInt.of(state);
    }
}
