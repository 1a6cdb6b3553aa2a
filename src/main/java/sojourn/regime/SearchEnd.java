package sojourn.regime;

import java.util.List;
import java.util.OptionalInt;

/**
 * Where one start of a search ended.
 *
 * @param model in the unit of the observations, its states in no order
 * @param logLikelihood of the standardised window
 * @param objective what the search raised and starts are compared by: the log-likelihood, plus the log density of the prior where
 *     there is one
 * @param leastCount the smallest expected number of observations of a state
 * @param squeezed the first state whose spread is held by its lower bound
 * @param evaluations of the likelihood
 * @param converged whether it stopped because nothing was left to gain
 */
record SearchEnd(
        RegimeModel model,
        double logLikelihood,
        double objective,
        double leastCount,
        OptionalInt squeezed,
        int evaluations,
        boolean converged) {
    /** Objectives that differ by less than this times (1 + |l|) are tied; the earliest start wins. */
    private static final double TIE = 1e-9;

    /** The one with the highest objective. */
    static SearchEnd best(List<SearchEnd> ends) {
        double highest = Double.NEGATIVE_INFINITY;
        for (SearchEnd each : ends) {
            highest = StrictMath.max(highest, each.objective());
        }
        double tied = highest - TIE * (1 + StrictMath.abs(highest));
        return ends.stream()
                .filter(end -> end.objective() >= tied)
                .findFirst()
                .orElseThrow(() -> new IllegalStateException("no start has a likelihood; this is a bug"));
    }
}
