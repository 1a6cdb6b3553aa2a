package sojourn.inference;

import sojourn.numeric.Check;
import sojourn.numeric.CompensatedSum;

/**
 * The factor eta(q) that carries a Sharpe ratio per period to one per q periods when returns are serially correlated: SR(q) = eta(q) SR,
 * eta(q) = q / sqrt(q + 2 sum_{k<q} (q - k) rho_k), which is sqrt(q) when all rho_k are 0. Lo (2002), Financial Analysts Journal 58(4),
 * 36-52, equation (20).
 */
public final class SharpeAggregation {
    private SharpeAggregation() {}

    /**
     * eta(q) of given autocorrelations. Undefined when the quantity under the root is not above 0.
     *
     * @param periods q >= 1
     * @param rho rho_1, rho_2, … of which the first q - 1 are used; fewer are refused. Not modified.
     */
    public static Estimate eta(int periods, double... rho) {
        Check.within(periods, 1, Integer.MAX_VALUE, "periods");
        Check.that(
                rho.length >= periods - 1,
                rho.length + " autocorrelations for " + periods + " periods, which need " + (periods - 1));
        CompensatedSum variance = new CompensatedSum();
        variance.add(periods);
        for (int k = 1; k < periods; k++) {
            variance.add(2.0 * (periods - k) * Check.finite(rho[k - 1], "autocorrelation " + k));
        }
        Estimate root = Estimate.root(variance.value(), "the variance of the aggregated return");
        return root instanceof Estimate.Value deviation ? Estimate.of(periods / deviation.amount()) : root;
    }

    /** eta(q) of a series' own autocorrelations. Undefined too when the series is not longer than q - 1 or does not vary. */
    public static Estimate eta(int periods, Autocorrelation series) {
        Check.within(periods, 1, Integer.MAX_VALUE, "periods");
        double[] rho = new double[periods - 1];
        for (int k = 1; k < periods; k++) {
            Estimate one = series.at(k);
            if (one instanceof Estimate.Undefined) {
                return one;
            }
            rho[k - 1] = one.number().orElseThrow();
        }
        return eta(periods, rho);
    }
}
