package sojourn.evidence;

import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import sojourn.walk.FitRecord;

/**
 * One accepted fit, seen beside the accepted fit before it.
 *
 * @param record the fit
 * @param regimes each regime of the timeline, in its order
 * @param before what compares it with the fit before; empty for the first and where the two do not compare
 */
public record LineageStep(FitRecord record, List<OneRegime> regimes, Optional<Before> before) {
    /** Copies the list. */
    public LineageStep {
        regimes = List.copyOf(regimes);
    }

    /**
     * One regime of the fit.
     *
     * @param deviation posterior-weighted standard deviation of the order-by returns, per bar; empty where the fit chose a number of
     *     regimes that has none of it
     * @param stay expected bars of a stay; empty where it is never left, and there
     */
    public record OneRegime(OptionalDouble deviation, OptionalDouble stay) {}

    /**
     * The fit beside the one before.
     *
     * @param fit the number of the fit before
     * @param cost total squared Hellinger distance of the regimes so matched
     * @param ancestor for each regime of the fit the one of the fit before that it is matched to
     * @param distance for each regime its squared Hellinger distance to that
     * @param moved largest |p_new - p_old| of any regime over the last 60 bars up to the fit; empty without such bars
     */
    public record Before(int fit, double cost, List<Integer> ancestor, List<Double> distance, OptionalDouble moved) {
        /** Copies the lists. */
        public Before {
            ancestor = List.copyOf(ancestor);
            distance = List.copyOf(distance);
        }

        /** Whether a regime is matched to another role. */
        public boolean swapped() {
            for (int k = 0; k < ancestor.size(); k++) {
                if (ancestor.get(k) != k) {
                    return true;
                }
            }
            return false;
        }

        /** How many regimes are further from what they are matched to than a normal from one of twice its deviation. */
        public long births() {
            return distance.stream().filter(one -> one > Lineage.BIRTH).count();
        }
    }
}
