package sojourn.evidence;

import java.util.List;
import java.util.OptionalDouble;
import sojourn.inference.Estimate;
import sojourn.inference.WeightedMoments;

/**
 * Who one regime is.
 *
 * @param regime its name
 * @param lastFit what the last accepted fit says of its window, with hindsight within it
 * @param asLived what it was over the walk, as known at each close
 */
public record IdentityCard(String regime, LastFit lastFit, AsLived asLived) {

    /**
     * The last accepted fit's window.
     *
     * @param share of the window's observations, posterior-weighted
     * @param stay expected bars of a stay; empty where it is never left, or is none of the regimes that the last fit chose
     * @param returns of the asset, a bar, weighted by the probability of the regime given the whole window; of a gauge without a likelihood
     *     as its fit has them, without errors
     */
    public record LastFit(OptionalDouble share, OptionalDouble stay, WeightedMoments returns) {}

    /**
     * The walk.
     *
     * @param meanProbability mean filtered probability
     * @param mostLikely share of closes at which it was the most likely regime
     * @param stay mean number of bars in a row for which it was; undefined if it never was
     * @param stays how often that began
     * @param nextBar the asset's return on the bar after, weighted by the probability forecast for it
     * @param largest the largest returns in size on bars at whose close it was the most likely regime
     */
    public record AsLived(
            double meanProbability,
            double mostLikely,
            Estimate stay,
            int stays,
            WeightedMoments nextBar,
            List<Large> largest) {
        /** Copies the list. */
        public AsLived {
            largest = List.copyOf(largest);
        }
    }

    /**
     * A large bar.
     *
     * @param bar which
     * @param earned its return
     */
    public record Large(int bar, double earned) {}
}
