package sojourn.inference;

import sojourn.numeric.Check;

/**
 * Whether one forecast's losses are smaller than another's on average: DM = mean(d) / sqrt(v / n), d the difference of losses. For forecasts h
 * bars ahead v = c_0 + 2 sum_{k&lt;h} c_k; where that is not above 0, and in {@link #robust}, v has Bartlett's weights. The statistic is multiplied by
 * sqrt((n + 1 - 2h + h (h - 1) / n) / n) and held to Student's t with n - 1 degrees of freedom. Diebold and Mariano (1995), J. Business and Economic
 * Statistics 13, 253-263; Harvey, Leybourne and Newbold (1997), Int. J. Forecasting 13, 281-291.
 *
 * @param count n
 * @param mean mean difference; undefined for none
 * @param uncorrected DM
 * @param corrected with the small-sample factor, and its two-sided p-value
 */
public record DieboldMariano(int count, Estimate mean, Estimate uncorrected, TestResult corrected) {

    /**
     * Differences of forecasts {@code horizon} bars ahead, at least 1. Undefined for fewer than two differences or ones that do not
     * vary. {@code difference} is not modified.
     */
    public static DieboldMariano of(double[] difference, int horizon) {
        Check.within(horizon, 1, Integer.MAX_VALUE, "horizon");
        if (tooShort(difference, horizon)) {
            return undefined(difference, Estimate.tooFew(difference.length, least(horizon)));
        }
        double variance = rectangular(difference, horizon - 1);
        return variance > 0 ? with(difference, horizon, variance) : robust(difference, horizon);
    }

    /** The same with a variance that allows for serial correlation: Bartlett's weights, the usual number of lags. Not modified. */
    public static DieboldMariano robust(double[] difference, int horizon) {
        return robust(difference, horizon, LongRunVariance.defaultLags(Math.max(1, difference.length)));
    }

    /** The same with so many lags. Not modified. */
    public static DieboldMariano robust(double[] difference, int horizon, int lags) {
        if (tooShort(difference, horizon)) {
            return undefined(difference, Estimate.tooFew(difference.length, least(horizon)));
        }
        if (Moments.of(difference).constant()) {
            return undefined(difference, Estimate.zeroVariance());
        }
        double variance = LongRunVariance.bartlett(difference, lags).number().orElseThrow();
        return variance > 0 ? with(difference, horizon, variance) : undefined(difference, Estimate.zeroVariance());
    }

    private static DieboldMariano with(double[] difference, int horizon, double variance) {
        double n = difference.length;
        double h = horizon;
        double mean = Moments.of(difference).mean();
        double statistic = mean / Math.sqrt(variance / n);
        double corrected = statistic * Math.sqrt((n + 1 - 2 * h + h * (h - 1) / n) / n);
        TestResult test = Double.isFinite(corrected)
                ? TestResult.of(corrected, Probability.studentBeyond(corrected, n - 1))
                : TestResult.undefined(Estimate.of(corrected));
        return new DieboldMariano(difference.length, Estimate.of(mean), Estimate.of(statistic), test);
    }

    private static DieboldMariano undefined(double[] difference, Estimate because) {
        Estimate mean = difference.length == 0
                ? because
                : Estimate.of(Moments.of(difference).mean());
        return new DieboldMariano(difference.length, mean, because, TestResult.undefined(because));
    }

    private static boolean tooShort(double[] difference, int horizon) {
        return difference.length < least(horizon);
    }

    /** So many that the factor's radicand is above 0. */
    private static int least(int horizon) {
        return Math.max(2, 2 * horizon);
    }

    private static double rectangular(double[] difference, int lags) {
        double mean = Moments.of(difference).mean();
        if (Moments.of(difference).constant()) {
            return 0;
        }
        double[] deviations = difference.clone();
        for (int t = 0; t < deviations.length; t++) {
            deviations[t] -= mean;
        }
        double sum = Autocorrelation.laggedProducts(deviations, 0);
        for (int k = 1; k <= lags; k++) {
            sum += 2 * Autocorrelation.laggedProducts(deviations, k);
        }
        return sum / difference.length;
    }
}
