package sojourn.numeric;

/**
 * A quantile of values, interpolated at position 1 + (n - 1) q of the ascending ones. Type 7 of Hyndman and Fan (1996), American
 * Statistician 50, 361-365.
 */
public final class Quantile {
    private Quantile() {}

    /**
     * The quantile.
     *
     * @param ascending at least one value, in ascending order, none NaN. Not modified.
     * @param level in [0, 1]
     */
    public static double ofAscending(double[] ascending, double level) {
        Check.that(ascending.length > 0, "there are no values, a quantile needs at least one");
        double position = (ascending.length - 1) * Check.within(level, 0, 1, "level");
        int below = (int) Math.floor(position);
        int above = Math.min(below + 1, ascending.length - 1);
        return ascending[below] + (position - below) * (ascending[above] - ascending[below]);
    }
}
