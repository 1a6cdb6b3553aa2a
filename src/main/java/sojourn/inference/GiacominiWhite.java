package sojourn.inference;

import sojourn.numeric.CompensatedSum;

/**
 * Whether the next bar's difference of losses can be told from the last one's: with Z_t = (1, d_{t-1}) d_t over t = 2..n, the statistic is
 * m Zbar' Om^{-1} Zbar, m = n - 1, Om = Z'Z / m not centred, chi-squared with 2 degrees of freedom. For forecasts one bar ahead. It is about forecasts
 * as they were made, estimation included, and asks for windows of bounded length. Undefined for fewer than four differences or where
 * Om is singular. Giacomini and White (2006), Econometrica 74, 1545-1578.
 */
public final class GiacominiWhite {
    private static final int LEAST = 4;
    /** Share of the product of the diagonal below which the determinant counts as 0. */
    private static final double SINGULAR = 1e-12;

    private GiacominiWhite() {}

    /** The test. {@code difference} is not modified. */
    public static TestResult of(double... difference) {
        if (difference.length < LEAST) {
            return TestResult.undefined(Estimate.tooFew(difference.length, LEAST));
        }
        CompensatedSum first = new CompensatedSum();
        CompensatedSum second = new CompensatedSum();
        CompensatedSum squares = new CompensatedSum();
        CompensatedSum cross = new CompensatedSum();
        CompensatedSum lagged = new CompensatedSum();
        for (int t = 1; t < difference.length; t++) {
            double a = difference[t];
            double b = difference[t - 1] * difference[t];
            first.add(a);
            second.add(b);
            squares.add(a * a);
            cross.add(a * b);
            lagged.add(b * b);
        }
        double m = difference.length - 1.0;
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
