package sojourn.inference;

import sojourn.numeric.Check;

/**
 * Whether the first lags' autocorrelations are zero: Q = n (n + 2) sum_{k=1..L} rho_k^2 / (n - k), chi-squared with L degrees of freedom in large
 * samples. Undefined unless the series is longer than L and varies. Ljung and Box (1978), Biometrika 65, 297-303.
 */
public final class LjungBox {
    private LjungBox() {}

    /** The test on lags 1 to {@code lags}, at least 1. {@code series} is not modified. */
    public static TestResult of(double[] series, int lags) {
        Check.within(lags, 1, Integer.MAX_VALUE - 1, "lags");
        Autocorrelation rho = Autocorrelation.of(series);
        double n = series.length;
        double sum = 0;
        for (int k = 1; k <= lags; k++) {
            Estimate one = rho.at(k);
            if (!(one instanceof Estimate.Value value)) {
                return TestResult.undefined(one);
            }
            sum += value.amount() * value.amount() / (n - k);
        }
        return TestResult.chiSquare(n * (n + 2) * sum, lags);
    }
}
