package sojourn.regime;

import java.util.OptionalDouble;

/** What a gauge says after some bars, its parameters frozen. Immutable; the same bits on every machine. */
public interface GaugeFilter {
    /** The filter one bar on; a missing row is a bar without an observation. */
    GaugeFilter step(Observations x, int row);

    /** Probability of regime {@code k} given all observations so far. */
    double probability(int k);

    /** Probability of each regime given all observations so far, sums to 1. A copy. */
    double[] probabilities();

    /**
     * Natural log of the density of the last bar's observation given those before it. Empty where the gauge has no likelihood, the
     * row was missing, or the gauge held the observation for impossible.
     */
    OptionalDouble lastLogDensity();

    /**
     * Whether the last bar's observation was impossible: its density was 0 in every regime that could have been, so that its score is
     * minus infinity and the probabilities are those predicted before it. Never for a gauge without a likelihood.
     */
    default boolean impossible() {
        return false;
    }
}
