package sojourn.trade;

import sojourn.numeric.Check;

/**
 * The terms of trade: when orders fill, what they cost, the capital to begin with, in the currency of the prices, at which prices
 * quantities are settled, and the lots that they come in.
 */
public record Terms(FillRule fill, Costs costs, double capital, SizeAt sizeAt, Lots lots) {
    /** Refuses capital that is not positive. */
    public Terms {
        Check.above(capital, 0, "capital");
    }

    /** Quantities are settled at the fill, in fractions of a unit. */
    public Terms(FillRule fill, Costs costs, double capital) {
        this(fill, costs, capital, SizeAt.FILL, Lots.FRACTIONS);
    }
}
