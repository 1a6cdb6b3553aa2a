package sojourn.world;

import sojourn.document.Field;
import sojourn.document.Shape;
import sojourn.document.Shapes;
import sojourn.numeric.Check;

/**
 * How one asset's price moves in one state: mean and standard deviation of its log return, scaled to a year of
 * {@link World#barsPerYear} bars. A coupon is not part of it.
 *
 * @param driftPercentPerYear mean log return, percent a year
 * @param volatilityPercentPerYear standard deviation of the log return, percent a year, above 0
 */
public record Move(double driftPercentPerYear, double volatilityPercentPerYear) {
    private static final double LARGEST_DRIFT = 100;
    private static final double LARGEST_VOLATILITY = 200;

    private static final Field<Double> DRIFT = Field.required(
            "drift-percent-per-year",
            Shapes.number().atLeast(-LARGEST_DRIFT).atMost(LARGEST_DRIFT),
            "mean log return of the price, percent a year");
    private static final Field<Double> VOLATILITY = Field.required(
            "volatility-percent-per-year",
            Shapes.number().above(0).atMost(LARGEST_VOLATILITY),
            "standard deviation of the log return, percent a year");

    /** Reads {@code {drift-percent-per-year: 9, volatility-percent-per-year: 10}}. */
    public static final Shape<Move> SHAPE =
            Shapes.object("move", f -> new Move(f.get(DRIFT), f.get(VOLATILITY)), DRIFT, VOLATILITY);

    /** Checks the bounds. */
    public Move {
        Check.within(driftPercentPerYear, -LARGEST_DRIFT, LARGEST_DRIFT, "driftPercentPerYear");
        Check.above(volatilityPercentPerYear, 0, "volatilityPercentPerYear");
        Check.within(volatilityPercentPerYear, 0, LARGEST_VOLATILITY, "volatilityPercentPerYear");
    }

    /** Mean log return of one bar, as a fraction. */
    double meanPerBar(int barsPerYear) {
        return driftPercentPerYear / 100 / barsPerYear;
    }

    /** Standard deviation of the log return of one bar, as a fraction. */
    double volatilityPerBar(int barsPerYear) {
        return volatilityPercentPerYear / 100 / Math.sqrt(barsPerYear);
    }
}
