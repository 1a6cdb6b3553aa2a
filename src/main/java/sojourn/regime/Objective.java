package sojourn.regime;

import java.util.Optional;

/**
 * What a search climbs: the log-likelihood of the standardised window, plus the log density of the prior where there is one, with the
 * expected sums beside it. Belongs to one start.
 */
final class Objective {
    private final Expectation fast;
    private final Expectation plain;
    private final InitialDistribution initial;
    private final Optional<PriorDensity> prior;
    private final ExpectedSums sums;
    private int evaluations;

    Objective(Parameters like, Window window, EmissionFamily family, InitialDistribution initial) {
        this(like, window, family, initial, Optional.empty());
    }

    Objective(
            Parameters like,
            Window window,
            EmissionFamily family,
            InitialDistribution initial,
            Optional<PriorDensity> prior) {
        this.fast = Expectation.of(like.kind(), like.states(), window, family);
        this.plain = new PlainExpectation(window, family);
        this.initial = initial;
        this.prior = prior;
        this.sums = new ExpectedSums(like.states());
    }

    /**
     * Fills the sums at those parameters and returns the objective there; minus infinity where they have none. A chain that starts in
     * its long run is put there: {@code parameters} is modified.
     */
    double at(Parameters parameters) {
        if (initial == InitialDistribution.STATIONARY && !StationaryStart.impose(parameters)) {
            return Double.NEGATIVE_INFINITY;
        }
        evaluations++;
        if (!fast.fill(parameters, sums) && !plain.fill(parameters, sums)) {
            return Double.NEGATIVE_INFINITY;
        }
        return prior.isPresent() ? sums.logLikelihood + prior.get().logAt(parameters) : sums.logLikelihood;
    }

    /** What is expected at the parameters that were last evaluated; overwritten by the next evaluation. */
    ExpectedSums sums() {
        return sums;
    }

    /** How often the likelihood was evaluated. */
    int evaluations() {
        return evaluations;
    }

    InitialDistribution initial() {
        return initial;
    }
}
