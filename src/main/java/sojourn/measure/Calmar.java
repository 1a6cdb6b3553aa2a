package sojourn.measure;

/**
 * The Calmar ratio: growth per year / |worst drawdown|, both over the whole window (Young 1991, Futures 20, used 36 months). Undefined where growth
 * is and where wealth never fell by more than rounding, 1e-12.
 */
public final class Calmar {
    private static final double NOTHING = 1e-12;

    private Calmar() {}

    /** From growth per year and the worst drawdown, a number in [-1, 0]. */
    public static Measured of(Measured growthPerYear, double worstDrawdown) {
        return Math.abs(worstDrawdown) < NOTHING
                ? Measured.undefined(Measured.Reason.NO_DRAWDOWN, "wealth never fell below an earlier peak")
                : growthPerYear.times(1 / Math.abs(worstDrawdown));
    }
}
