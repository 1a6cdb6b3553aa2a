package sojourn.inference;

import sojourn.numeric.Check;
import sojourn.numeric.CompensatedSum;

/**
 * Autocorrelations of a series, rho_k = sum_{t>k} (x_t - m)(x_{t-k} - m) / sum_t (x_t - m)^2: both sums over all there is, one
 * mean (the 1/n convention of Box and Jenkins, which keeps the sequence positive semi-definite).
 */
public final class Autocorrelation {
    private final double[] deviations;
    private final boolean constant;

    private Autocorrelation(double[] deviations, boolean constant) {
        this.deviations = deviations;
        this.constant = constant;
    }

    /** Of a series of finite values. Not modified. */
    public static Autocorrelation of(double... series) {
        if (series.length == 0) {
            return new Autocorrelation(new double[0], true);
        }
        Moments moments = Moments.of(series);
        double[] deviations = series.clone();
        for (int t = 0; t < deviations.length; t++) {
            deviations[t] -= moments.mean();
        }
        return new Autocorrelation(deviations, moments.constant());
    }

    /** Length of the series. */
    public int count() {
        return deviations.length;
    }

    /** rho at {@code lag} >= 0. Undefined unless the series is longer than the lag, has two values and varies. */
    public Estimate at(int lag) {
        Check.within(lag, 0, Integer.MAX_VALUE - 1, "lag");
        int needed = Math.max(2, lag + 1);
        if (deviations.length < needed) {
            return Estimate.tooFew(deviations.length, needed);
        }
        return constant
                ? Estimate.zeroVariance()
                : Estimate.of(laggedProducts(deviations, lag) / laggedProducts(deviations, 0));
    }

    /** sum_{t>=lag} d_t d_{t-lag}. Not modified. */
    static double laggedProducts(double[] deviations, int lag) {
        CompensatedSum sum = new CompensatedSum();
        for (int t = lag; t < deviations.length; t++) {
            sum.add(deviations[t] * deviations[t - lag]);
        }
        return sum.value();
    }
}
