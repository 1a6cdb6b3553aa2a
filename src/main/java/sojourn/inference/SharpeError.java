package sojourn.inference;

import java.util.function.Function;
import sojourn.numeric.Check;

/**
 * Standard errors of the Sharpe ratio per period, SR = m / s, of excess returns e_1..e_T, where s has the divisor T (the ratio as
 * displayed divides by T - 1 instead; the two differ by the factor sqrt(T / (T - 1))). All are undefined for fewer than two returns
 * and for returns that do not vary. To annualise an error, multiply it as the ratio is multiplied.
 */
public final class SharpeError {
    private SharpeError() {}

    /** SR = m / s with divisor T in s. {@code excess} is not modified. */
    public static Estimate ratio(double[] excess) {
        return ofVarying(excess, moments -> Estimate.of(sharpe(moments)));
    }

    /**
     * For independent normal returns: sqrt((1 + SR^2 / 2) / T). Lo (2002), Financial Analysts Journal 58(4), 36-52, equation (9).
     *
     * @param sharpe per period
     * @param observations T, at least 1
     */
    public static Estimate normal(double sharpe, int observations) {
        Check.finite(sharpe, "sharpe");
        Check.within(observations, 1, Integer.MAX_VALUE, "observations");
        return Estimate.root((1 + sharpe * sharpe / 2) / observations, "the variance of the ratio");
    }

    /** For independent normal returns, from the returns themselves. {@code excess} is not modified. */
    public static Estimate normal(double[] excess) {
        return ofVarying(excess, moments -> normal(sharpe(moments), moments.count()));
    }

    /**
     * For independent returns of any shape: sqrt((1 - g3 SR + (g4 - 1) SR^2 / 4) / T). Undefined when the quantity under the root is
     * not above 0, which moments of one and the same sample allow only for two-valued returns. Mertens (2002), Comments on variance of the
     * IID estimator in Lo (2002), University of Basel; Opdyke (2007), Journal of Asset Management 8, 308-336.
     *
     * @param sharpe SR per period
     * @param skewness g3, divisor T
     * @param rawKurtosis g4, divisor T, 3 for a normal
     * @param observations T, at least 1
     */
    public static Estimate mertens(double sharpe, double skewness, double rawKurtosis, int observations) {
        Check.finite(sharpe, "sharpe");
        Check.finite(skewness, "skewness");
        Check.finite(rawKurtosis, "rawKurtosis");
        Check.within(observations, 1, Integer.MAX_VALUE, "observations");
        double scaled = 1 - skewness * sharpe + (rawKurtosis - 1) / 4 * sharpe * sharpe;
        return Estimate.root(scaled / observations, "the variance of the ratio");
    }

    /** For independent returns of any shape, from the returns themselves. {@code excess} is not modified. */
    public static Estimate mertens(double[] excess) {
        return ofVarying(excess, moments -> {
            Estimate skewness = moments.skewness();
            Estimate kurtosis = moments.excessKurtosis();
            if (skewness instanceof Estimate.Value g3 && kurtosis instanceof Estimate.Value g4) {
                return mertens(sharpe(moments), g3.amount(), g4.amount() + 3, moments.count());
            }
            return skewness instanceof Estimate.Undefined ? skewness : kurtosis;
        });
    }

    /**
     * For dependent returns of any shape, by the delta method: sqrt(Psi / T), Psi the Bartlett long-run variance with L lags of
     * psi_t = z_t - (SR / 2)(z_t^2 - 1), z_t = (e_t - m) / s. With L = 0 this is Mertens' error: the mean of psi^2 is
     * 1 - g3 SR + (g4 - 1) SR^2 / 4. Lo (2002); Ledoit and Wolf (2008), J. Empirical Finance 15, 850-859.
     *
     * @param excess not modified
     * @param lags L >= 0
     */
    public static Estimate hac(double[] excess, int lags) {
        Check.within(lags, 0, Integer.MAX_VALUE - 1, "lags");
        return ofVarying(excess, moments -> hac(excess, lags, moments));
    }

    /** {@link #hac(double[], int)} with {@link LongRunVariance#defaultLags}. {@code excess} is not modified. */
    public static Estimate hac(double[] excess) {
        return ofVarying(excess, moments -> hac(excess, LongRunVariance.defaultLags(excess.length), moments));
    }

    private static Estimate hac(double[] excess, int lags, Moments moments) {
        double mean = moments.mean();
        double deviation = Math.sqrt(moments.populationVariance());
        double sharpe = mean / deviation;
        double[] psi = new double[excess.length];
        for (int t = 0; t < psi.length; t++) {
            double z = (excess[t] - mean) / deviation;
            psi[t] = z - sharpe / 2 * (z * z - 1);
        }
        Estimate longRun = LongRunVariance.bartlett(psi, lags);
        return longRun instanceof Estimate.Value variance
                ? Estimate.root(variance.amount() / psi.length, "the variance of the ratio")
                : longRun;
    }

    private static double sharpe(Moments moments) {
        return moments.mean() / Math.sqrt(moments.populationVariance());
    }

    private static Estimate ofVarying(double[] excess, Function<Moments, Estimate> statistic) {
        if (excess.length < 2) {
            return Estimate.tooFew(excess.length, 2);
        }
        Moments moments = Moments.of(excess);
        if (!Double.isFinite(moments.populationVariance())) {
            return Estimate.of(moments.populationVariance());
        }
        return moments.constant() ? Estimate.zeroVariance() : statistic.apply(moments);
    }
}
