package sojourn.measure;

import java.util.Arrays;
import java.util.List;
import java.util.OptionalDouble;
import sojourn.numeric.Check;

/**
 * Where one number falls among those of random draws: the draws' quantiles and how many did worse. The quantile p of N draws is the
 * one in place p (N + 1), counted from the lowest, so that of 999 draws each of those told is a draw itself. Undefined, all of it,
 * where the number itself or that of any draw is.
 *
 * @param own the strategy's number
 * @param low quantile {@value #LOW} of the draws
 * @param middle their median
 * @param high quantile {@value #HIGH}
 * @param worse share of draws with a lower number
 * @param chance (1 + draws with at least this number) / (1 + draws): how often chance alone does as well, never 0. Davison and Hinkley
 *     (1997), Bootstrap Methods, section 4.2.
 */
public record Luck(Measured own, Measured low, Measured middle, Measured high, Measured worse, Measured chance) {
    /** The lower quantile. */
    public static final double LOW = 0.05;
    /** The upper quantile. */
    public static final double HIGH = 0.95;

    private static final double MEDIAN = 0.5;

    /** Of one number among those of {@code draws}, at least 19; higher is better. */
    public static Luck of(Measured own, List<Measured> draws) {
        if (own instanceof Measured.Undefined none) {
            return undefined(none);
        }
        double[] ascending = draws.stream()
                .map(Measured::number)
                .filter(OptionalDouble::isPresent)
                .mapToDouble(OptionalDouble::getAsDouble)
                .sorted()
                .toArray();
        if (ascending.length < draws.size()) {
            return undefined(new Measured.Undefined(
                    Measured.Reason.NOT_APPLICABLE,
                    draws.size() - ascending.length + " of " + draws.size() + " draws have no such number"));
        }
        double number = own.number().orElseThrow();
        double lower = Arrays.stream(ascending).filter(draw -> draw < number).count();
        return new Luck(
                own,
                Measured.of(ascending[place(LOW, ascending.length)]),
                Measured.of(ascending[place(MEDIAN, ascending.length)]),
                Measured.of(ascending[place(HIGH, ascending.length)]),
                Measured.of(lower / ascending.length),
                Measured.of((1 + ascending.length - lower) / (1 + ascending.length)));
    }

    /** The place of quantile {@code level} among so many draws in ascending order, from 0; the nearest where it lies between two. */
    public static int place(double level, int draws) {
        return (int) StrictMath.rint(Check.within(level, 0, 1, "level") * (draws + 1)) - 1;
    }

    private static Luck undefined(Measured.Undefined because) {
        return new Luck(because, because, because, because, because, because);
    }
}
