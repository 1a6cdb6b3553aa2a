package sojourn.allocate;

import java.util.List;
import java.util.Optional;
import sojourn.market.Known;
import sojourn.numeric.Check;
import sojourn.walk.Reading;

/**
 * All that a decision at one close may depend on, besides the stance.
 *
 * @param known the market up to this close
 * @param reading what the regimes were thought to be; empty while there is no accepted fit
 * @param regimes their names, from lowest to highest volatility
 * @param weights held at this close, as if every pending order had filled
 * @param barsAhead from this close to the end of the first whole bar that an order decided now would be held for: 2 for a fill at
 *     the next close
 */
public record Situation(Known known, Optional<Reading> reading, List<String> regimes, Weights weights, int barsAhead) {
    /** Refuses a bar ahead of less than 1 and weights that do not belong to the assets. */
    public Situation {
        Check.within(barsAhead, 1, Integer.MAX_VALUE, "barsAhead");
        if (weights.size()
                != known.assets().size()) { // no message is put together on the millions of closes that are in order
            throw new IllegalArgumentException(
                    weights.size() + " weights for " + known.assets().size() + " assets");
        }
    }

    /** The same close with another reading of the regimes. */
    Situation reading(Reading other) {
        return new Situation(known, Optional.of(other), regimes, weights, barsAhead);
    }

    /** Names of the assets, in the order of the weights. */
    public List<String> assets() {
        return known.assets();
    }

    /** The bar of this close. */
    public int bar() {
        return known.bar();
    }
}
