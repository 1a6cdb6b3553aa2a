package sojourn.inference;

import java.util.Arrays;
import sojourn.numeric.Check;
import sojourn.numeric.CompensatedSum;

/**
 * Whether the next bar's difference of losses can be told from the last one's: with Z_t = (1, d_{t-1}) d_t over the t = 2..n whose bar follows that of t - 1, the statistic is
 * m Zbar' Om^{-1} Zbar, m the number of such t, Om = Z'Z / m not centred, chi-squared with 2 degrees of freedom. For forecasts one bar ahead. It is about forecasts
 * as they were made, estimation included, and asks for windows of bounded length. Undefined for fewer than three such t or where
 * Om is singular. Giacomini and White (2006), Econometrica 74, 1545-1578.
 */
public final class GiacominiWhite {
    private static final int LEAST = 4;
    /** Share of the product of the diagonal below which the determinant counts as 0. */
    private static final double SINGULAR = 1e-12;

    private GiacominiWhite() {}

    /** The test on differences of which each follows the one before. Not modified. */
    public static TestResult of(double... difference) {
        int[] bars = new int[difference.length];
        Arrays.setAll(bars, t -> t);
        return of(difference, bars);
    }

    /** The test where {@code bars}, ascending, are those of the differences: none is told from one that lies across a gap. Not modified. */
    public static TestResult of(double[] difference, int[] bars) {
        Check.that(bars.length == difference.length, bars.length + " bars of " + difference.length + " differences");
        int pairs = 0;
        CompensatedSum first = new CompensatedSum();
        CompensatedSum second = new CompensatedSum();
        CompensatedSum squares = new CompensatedSum();
        CompensatedSum cross = new CompensatedSum();
        CompensatedSum lagged = new CompensatedSum();
        for (int t = 1; t < difference.length; t++) {
            if (bars[t] != bars[t - 1] + 1) {
                continue;
            }
            pairs++;
            double a = difference[t];
            double b = difference[t - 1] * difference[t];
            first.add(a);
            second.add(b);
            squares.add(a * a);
            cross.add(a * b);
            lagged.add(b * b);
        }
        if (pairs + 1 < LEAST) {
            return TestResult.undefined(Estimate.tooFew(Math.min(difference.length, pairs + 1), LEAST));
        }
        double m = pairs;
        double aa = squares.value() / m;
        double ab = cross.value() / m;
        double bb = lagged.value() / m;
        double determinant = aa * bb - ab * ab;
        if (!(determinant > SINGULAR * aa * bb)) {
            return TestResult.undefined(Estimate.zeroVariance());
        }
        double x = first.value() / m;
        double y = second.value() / m;
        double statistic = m * (bb * x * x - 2 * ab * x * y + aa * y * y) / determinant;
        return TestResult.chiSquare(statistic, 2);
    }
}
