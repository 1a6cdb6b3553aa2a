package sojourn.regime;

import java.util.Locale;
import java.util.Optional;

/** The fit of a gauge without a likelihood, once the gauge and what it makes of its window are known. */
final class PlainFit {
    private PlainFit() {}

    /** Converged, unless a state stands on fewer observations than it needs: then degenerate. */
    static Fit of(Described described, Fit.Search search, int dimension, Optional<Matching> matching) {
        return of(described, search, dimension, matching, "");
    }

    /** The same; {@code hint} says after a refusal what to do about it. */
    static Fit of(Described described, Fit.Search search, int dimension, Optional<Matching> matching, String hint) {
        return ended(Outcome.CONVERGED, "", described, search, dimension, matching, hint);
    }

    /** Stopped at the limit of its search, because of {@code explanation}, unless degenerate. */
    static Fit unfinished(
            Described described, Fit.Search search, int dimension, Optional<Matching> matching, String explanation) {
        return ended(Outcome.ITERATION_LIMIT, explanation, described, search, dimension, matching, "");
    }

    private static Fit ended(
            Outcome end,
            String because,
            Described described,
            Fit.Search search,
            int dimension,
            Optional<Matching> matching,
            String hint) {
        int observations = described.observations();
        double[] occupancy = described.orderBy().occupancy();
        int least = 0;
        for (int k = 1; k < occupancy.length; k++) {
            least = occupancy[k] < occupancy[least] ? k : least;
        }
        double count = occupancy[least] * observations;
        int needed = Soundness.leastCount(dimension);
        boolean sound = count > needed - 0.5; // a whole number but for rounding
        String explanation = sound
                ? because
                : String.format(
                        Locale.ROOT,
                        "{%d} accounts for %.0f of %d observations, fewer than the %d it needs%s",
                        least,
                        count,
                        observations,
                        needed,
                        hint);
        return Fit.of(
                sound ? end : Outcome.DEGENERATE,
                explanation,
                search,
                observations,
                described,
                StateEvents.ofGauge(described, matching));
    }
}
