package sojourn.inference;

import java.util.Arrays;
import sojourn.numeric.Check;

/**
 * Whether values are uniform on [0, 1]: D = max_i max(i/n - u_(i), u_(i) - (i-1)/n), the largest distance between their distribution
 * and the diagonal. p = 2 sum_{k&gt;=1} (-1)^{k-1} exp(-2 k^2 s^2), s = (sqrt n + 0.12 + 0.11 / sqrt n) D, Kolmogorov's limit with the correction for
 * small n of Stephens (1970), J. Royal Statistical Society B 32, 115-122. Undefined for no values. Cost: one sort.
 */
public final class KolmogorovSmirnov {
    private static final int TERMS = 100;
    /** Below it the series hardly falls, and p is 1 to 15 digits. */
    private static final double NEAR = 0.2;

    private KolmogorovSmirnov() {}

    /** The test. {@code values} lie in [0, 1]. Not modified. */
    public static TestResult uniform(double... values) {
        int n = values.length;
        if (n == 0) {
            return TestResult.undefined(Estimate.tooFew(0, 1));
        }
        double[] sorted = values.clone();
        Arrays.sort(sorted);
        double distance = 0;
        for (int i = 0; i < n; i++) {
            double u = Check.within(sorted[i], 0, 1, "value");
            distance = Math.max(distance, Math.max((i + 1.0) / n - u, u - (double) i / n));
        }
        double root = Math.sqrt(n);
        return TestResult.of(distance, beyond((root + 0.12 + 0.11 / root) * distance));
    }

    private static double beyond(double s) {
        if (s < NEAR) {
            return 1;
        }
        double sum = 0;
        for (int k = TERMS; k >= 1; k--) {
            double term = StrictMath.exp(-2.0 * k * k * s * s);
            sum += k % 2 == 1 ? term : -term;
        }
        return Math.min(1, Math.max(0, 2 * sum));
    }
}
