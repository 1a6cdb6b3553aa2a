package sojourn.trade;

import sojourn.document.Field;
import sojourn.document.Shape;
import sojourn.document.Shapes;
import sojourn.numeric.Check;

/**
 * A half-spread that moves with the market: {@code share} times the standard deviation of the last {@code bars} simple returns, the
 * last one before the bar of the fill. It comes on top of the constant half-spread. That spreads widen with volatility is common
 * practice; the proportional form is our own choice, no source.
 */
public record SpreadOfVolatility(double share, int bars) {
    private static final int LONGEST = 2_500;

    private static final Field<Double> SHARE = Field.required(
            "share", Shapes.number().atLeast(0).atMost(1), "half-spread as a fraction of the volatility of a bar");
    private static final Field<Integer> BARS = Field.defaulted(
            "bars",
            Shapes.integer().atLeast(2).atMost(LONGEST),
            "21",
            "returns, the last one before the fill, over which volatility is taken");

    /** Reads the map {@code spread-by-volatility}. */
    public static final Shape<SpreadOfVolatility> SHAPE =
            Shapes.object("spread-by-volatility", f -> new SpreadOfVolatility(f.get(SHARE), f.get(BARS)), SHARE, BARS);

    /** Refuses a negative share and fewer than two returns. */
    public SpreadOfVolatility {
        Check.atLeast(share, 0, "share");
        Check.within(bars, 2, Integer.MAX_VALUE, "bars");
    }
}
