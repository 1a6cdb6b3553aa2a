package sojourn.inference;

import sojourn.numeric.Check;

/**
 * The line y = a + b x + u by least squares, with errors that allow for serial correlation and changing variance: V = (X'X)^{-1} S (X'X)^{-1},
 * S = G_0 + sum_{j=1..L} (1 - j/(L+1)) (G_j + G_j'), G_j = sum_t u_t u_{t-j} x_t x_{t-j}', no small-sample factor. Newey and West (1987),
 * Econometrica 55, 703-708. Immutable.
 */
public final class RegressionLine {
    private final double meanX;
    private final double level;
    private final double slope;
    /** Variances about the mean of x, where X'X is diagonal: of the level there, of level and slope together, of the slope. */
    private final double varianceOfLevel;

    private final double covariance;
    private final double varianceOfSlope;
    private final double explained;

    private RegressionLine(double meanX, double level, double slope, double[] variances, double explained) {
        this.meanX = meanX;
        this.level = level;
        this.slope = slope;
        this.varianceOfLevel = variances[0];
        this.covariance = variances[1];
        this.varianceOfSlope = variances[2];
        this.explained = explained;
    }

    /** What came of an attempt at a line. */
    public sealed interface Outcome {
        /** A line. */
        record Fitted(RegressionLine line) implements Outcome {}

        /** No line, and why. */
        record None(Estimate.Undefined because) implements Outcome {}
    }

    /**
     * The line through the points (x_t, y_t) in the order of time, errors with so many lags. None for fewer than three points or x that
     * does not vary. Neither array is modified.
     */
    public static Outcome through(double[] x, double[] y, int lags) {
        Check.that(x.length == y.length, x.length + " values of x and " + y.length + " of y");
        Check.within(lags, 0, Integer.MAX_VALUE - 1, "lags");
        int n = x.length;
        if (n < 3) {
            return new Outcome.None((Estimate.Undefined) Estimate.tooFew(n, 3));
        }
        Moments ofX = Moments.of(x);
        double sxx = ofX.populationVariance() * n;
        if (!(sxx > 1e-24 * ofX.mean() * ofX.mean() * n)) {
            return new Outcome.None((Estimate.Undefined) Estimate.zeroVariance());
        }
        double meanX = ofX.mean();
        double meanY = Moments.of(y).mean();
        double sxy = 0;
        double syy = 0;
        for (int t = 0; t < n; t++) {
            sxy += (x[t] - meanX) * (y[t] - meanY);
            syy += (y[t] - meanY) * (y[t] - meanY);
        }
        double slope = sxy / sxx;
        double[] u = new double[n];
        double left = 0;
        for (int t = 0; t < n; t++) {
            u[t] = y[t] - meanY - slope * (x[t] - meanX);
            left += u[t] * u[t];
        }
        double explained = syy > 0 ? 1 - left / syy : 0;
        return new Outcome.Fitted(new RegressionLine(meanX, meanY, slope, sandwich(x, meanX, u, lags, sxx), explained));
    }

    private static double[] sandwich(double[] x, double meanX, double[] u, int lags, double sxx) {
        int n = x.length;
        double[] meat = new double[3];
        for (int j = 0; j <= Math.min(lags, n - 1); j++) {
            double weight = j == 0 ? 1 : 2 * (1 - j / (lags + 1.0));
            for (int t = j; t < n; t++) {
                double product = weight * u[t] * u[t - j];
                double now = x[t] - meanX;
                double before = x[t - j] - meanX;
                meat[0] += product;
                meat[1] += 0.5 * product * (now + before);
                meat[2] += product * now * before;
            }
        }
        return new double[] {meat[0] / n / n, meat[1] / n / sxx, meat[2] / sxx / sxx};
    }

    /** a. */
    public double intercept() {
        return level - slope * meanX;
    }

    /** b. */
    public double slope() {
        return slope;
    }

    /** Standard error of a; undefined where the estimate of its variance is not above 0. */
    public Estimate interceptError() {
        return Estimate.root(
                varianceOfLevel - 2 * meanX * covariance + meanX * meanX * varianceOfSlope,
                "the variance of the intercept");
    }

    /** Standard error of b; undefined where the estimate of its variance is not above 0. */
    public Estimate slopeError() {
        return Estimate.root(varianceOfSlope, "the variance of the slope");
    }

    /** R^2, the share of the variance of y that the line explains; 0 for a constant y. */
    public double explained() {
        return explained;
    }

    /** Wald's test of a = {@code a} and b = {@code b} together, chi-squared with 2 degrees of freedom. Undefined where V is singular. */
    public TestResult against(double a, double b) {
        double apart = level - (a + b * meanX);
        double turned = slope - b;
        double determinant = varianceOfLevel * varianceOfSlope - covariance * covariance;
        if (!(determinant > 0)) {
            return TestResult.undefined(Estimate.root(determinant, "the determinant of the line's variance"));
        }
        double statistic =
                (varianceOfSlope * apart * apart - 2 * covariance * apart * turned + varianceOfLevel * turned * turned)
                        / determinant;
        return TestResult.chiSquare(statistic, 2);
    }
}
