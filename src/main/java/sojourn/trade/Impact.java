package sojourn.trade;

import java.util.Optional;
import sojourn.document.Field;
import sojourn.document.Shape;
import sojourn.document.Shapes;
import sojourn.numeric.Check;

/**
 * Square-root market impact: an order of value a loses the fraction Y sigma sqrt(a / A) of it, with Y the coefficient, sigma the
 * standard deviation of simple returns a bar and A the mean traded value a bar (volume × close), both over bars that end before
 * the bar of the fill. Y is about 1: Barra, Market Impact Model Handbook (1997); Tóth et al. (2011), Physical Review X 1, 021006.
 *
 * @param coefficient Y
 * @param volumeBars bars of the trailing mean traded value
 * @param volatilityBars returns of the trailing volatility
 * @param participationPercent the most that one order trades of an asset on one bar, percent of A; the rest is carried
 */
public record Impact(double coefficient, int volumeBars, int volatilityBars, Optional<Double> participationPercent) {
    private static final double MOST_COEFFICIENT = 100;
    private static final int LONGEST = 2_500;

    private static final Field<Double> COEFFICIENT = Field.defaulted(
            "coefficient",
            Shapes.number().atLeast(0).atMost(MOST_COEFFICIENT),
            "1",
            "an order of as much as trades on one bar loses this many times the volatility of a bar");
    private static final Field<Integer> VOLUME_BARS = Field.defaulted(
            "volume-bars",
            Shapes.integer().atLeast(1).atMost(LONGEST),
            "21",
            "bars, the last one before the fill, over which the traded value (volume x close) is averaged");
    private static final Field<Integer> VOLATILITY_BARS = Field.defaulted(
            "volatility-bars",
            Shapes.integer().atLeast(2).atMost(LONGEST),
            "21",
            "returns, the last one before the fill, over which volatility is taken");
    private static final Field<Optional<Double>> PARTICIPATION = Field.maybe(
            "participation-percent",
            Shapes.number().above(0).atMost(100),
            "the most that is traded of an asset on one bar, percent of the average traded value; the rest is carried to the"
                    + " next bar");

    /** Reads the map {@code impact}. */
    public static final Shape<Impact> SHAPE = Shapes.object(
            "impact",
            f -> new Impact(f.get(COEFFICIENT), f.get(VOLUME_BARS), f.get(VOLATILITY_BARS), f.get(PARTICIPATION)),
            COEFFICIENT,
            VOLUME_BARS,
            VOLATILITY_BARS,
            PARTICIPATION);

    /** Refuses a negative coefficient, empty windows, and a participation outside (0, 100]. */
    public Impact {
        Check.atLeast(coefficient, 0, "coefficient");
        Check.within(volumeBars, 1, Integer.MAX_VALUE, "volumeBars");
        Check.within(volatilityBars, 2, Integer.MAX_VALUE, "volatilityBars");
        participationPercent.ifPresent(percent -> {
            Check.above(percent, 0, "participationPercent");
            Check.within(percent, 0, 100, "participationPercent");
        });
    }

    /** Y sigma / sqrt(A): what multiplies the power 1.5 of an order's value to give the money that it loses. */
    static double factor(double coefficient, double volatility, double tradedValue) {
        return coefficient * volatility / Math.sqrt(tradedValue);
    }
}
