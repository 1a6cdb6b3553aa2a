package sojourn.measure;

import sojourn.numeric.Check;
import sojourn.numeric.CompensatedSum;

/**
 * How much was traded. The traded fraction of a bar is sum_i |w_i after - w_i before| over the risky assets, cash excluded: bought plus sold
 * (two-way). One-way turnover is half of it.
 */
public final class Turnover {
    private Turnover() {}

    /** Two-way traded fraction of one bar, from drifted weights before trading and weights after. Neither modified. */
    public static double tradedFraction(double[] before, double[] after) {
        Check.that(before.length == after.length, before.length + " weights before and " + after.length + " after");
        CompensatedSum sum = new CompensatedSum();
        for (int i = 0; i < before.length; i++) {
            sum.add(Math.abs(after[i] - before[i]));
        }
        return sum.value();
    }

    /** P times the mean per bar. Undefined for no bars. Not modified. */
    public static Measured perYear(double[] perBar, double periodsPerYear) {
        return perBar.length == 0
                ? Measured.tooFew(0, 1)
                : Measured.of(periodsPerYear * CompensatedSum.of(perBar) / perBar.length);
    }
}
