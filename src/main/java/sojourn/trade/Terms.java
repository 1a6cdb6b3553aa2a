package sojourn.trade;

import sojourn.numeric.Check;

/** The terms of trade: when orders fill, what they cost, and the capital to begin with, in the currency of the prices. */
public record Terms(FillRule fill, Costs costs, double capital) {
    /** Refuses capital that is not positive. */
    public Terms {
        Check.above(capital, 0, "capital");
    }
}
