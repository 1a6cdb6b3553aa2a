package sojourn.measure;

import java.util.Arrays;
import sojourn.numeric.Check;
import sojourn.numeric.CompensatedSum;

/**
 * The bad tail of past returns, as positive losses, from the order statistics x_(1) <= … <= x_(n). Acerbi and Tasche (2002), J. Banking and
 * Finance 26, 1487-1503. Below 1 / level returns the tail is the worst return alone. All are undefined for no returns. Cost: one sort.
 */
public final class Tail {
    /** n a is 3 when n = 60 and a = 0.05, whatever the product in binary is. */
    private static final double ROUNDING = 1e-12;

    private final double[] ascending;
    private final double level;

    private Tail(double[] ascending, double level) {
        this.ascending = ascending;
        this.level = level;
    }

    /**
     * The tail holding a share of the returns.
     *
     * @param returns finite simple returns. Not modified.
     * @param level a in (0, 1), such as 0.05
     */
    public static Tail of(double[] returns, double level) {
        Check.above(level, 0, "level");
        Check.that(level < 1, "level is " + level + ", must be below 1");
        double[] ascending = returns.clone();
        for (double one : ascending) {
            Check.finite(one, "a return");
        }
        Arrays.sort(ascending);
        return new Tail(ascending, level);
    }

    /** -x_(ceil(n a)). */
    public Measured valueAtRisk() {
        if (ascending.length == 0) {
            return Measured.tooFew(0, 1);
        }
        int rank = Math.max(1, (int) Math.ceil(ascending.length * level - ROUNDING));
        return Measured.of(-ascending[rank - 1]);
    }

    /** The loss at the interpolated quantile at position 1 + (n - 1) a (type 7 of Hyndman and Fan 1996, American Statistician 50). */
    public Measured interpolatedValueAtRisk() {
        if (ascending.length == 0) {
            return Measured.tooFew(0, 1);
        }
        double position = (ascending.length - 1) * level;
        int below = (int) Math.floor(position + ROUNDING);
        int above = Math.min(below + 1, ascending.length - 1);
        double part = Math.max(0, position - below);
        return Measured.of(-(ascending[below] + part * (ascending[above] - ascending[below])));
    }

    /** -(1 / (n a)) [sum_{i <= floor(n a)} x_(i) + (n a - floor(n a)) x_(floor(n a) + 1)], the mean of the worst share a. */
    public Measured expectedShortfall() {
        if (ascending.length == 0) {
            return Measured.tooFew(0, 1);
        }
        double size = ascending.length * level;
        int whole = (int) Math.floor(size + ROUNDING);
        CompensatedSum sum = new CompensatedSum();
        for (int i = 0; i < whole; i++) {
            sum.add(ascending[i]);
        }
        if (whole < ascending.length) {
            sum.add(Math.max(0, size - whole) * ascending[whole]);
        }
        return Measured.of(-sum.value() / size);
    }
}
