package sojourn.inference;

import sojourn.numeric.Check;

/**
 * The variance of sqrt(n) times the mean of a dependent series, with Bartlett's weights: S = c_0 + 2 sum_{j=1..L} (1 - j/(L+1)) c_j,
 * c_j = (1/n) sum_t d_t d_{t-j}, d the deviations from the mean. Never negative but for rounding. No small-sample factor. Newey and
 * West (1987), Econometrica 55, 703-708. Cost: n (L + 1) products.
 */
public final class LongRunVariance {
    /** An exact power, such as (51200/100)^(2/9) = 4, must not be lost to the rounding of 2/9. */
    private static final double ROUNDING = 1e-9;

    private LongRunVariance() {}

    /** The usual number of lags: floor(4 (n / 100)^(2/9)), at most n - 1. Newey and West (1994), Rev. Econ. Studies 61, 631-653. */
    public static int defaultLags(int observations) {
        Check.within(observations, 1, Integer.MAX_VALUE, "observations");
        double lags = 4 * StrictMath.pow(observations / 100.0, 2.0 / 9.0);
        return Math.min(observations - 1, (int) Math.floor(lags + ROUNDING));
    }

    /**
     * S of a series. Undefined for an empty one.
     *
     * @param series finite values. Not modified.
     * @param lags L >= 0; lags beyond n - 1 have no products and add nothing, but still set the weights
     */
    public static Estimate bartlett(double[] series, int lags) {
        Check.within(lags, 0, Integer.MAX_VALUE - 1, "lags");
        int n = series.length;
        if (n == 0) {
            return Estimate.tooFew(0, 1);
        }
        double mean = Moments.of(series).mean();
        double[] deviations = series.clone();
        for (int t = 0; t < n; t++) {
            deviations[t] -= mean;
        }
        double sum = Autocorrelation.laggedProducts(deviations, 0);
        for (int j = 1; j <= Math.min(lags, n - 1); j++) {
            double weight = 1 - j / (lags + 1.0);
            sum += 2 * weight * Autocorrelation.laggedProducts(deviations, j);
        }
        return Estimate.of(Math.max(0, sum / n));
    }
}
