package sojourn.inference;

import sojourn.numeric.Check;
import sojourn.numeric.CompensatedSum;

/**
 * Mean m = sum w x / sum w and standard deviation s = sqrt(sum w (x - m)^2 / sum w) of a weighted series, with standard errors that allow for
 * serial correlation and changing variance: that of m is sqrt(n S(w (x - m))) / sum w, that of s is sqrt(n S(w ((x - m)^2 - s^2))) / (2 s sum w), S the
 * long-run variance with Bartlett's weights and the usual number of lags (Newey and West 1987). The weights are taken as known. Undefined where
 * the weights sum to less than two, or nothing varies.
 *
 * @param count number of values, whatever their weights
 * @param weight sum w
 * @param mean m
 * @param meanError standard error of m
 * @param deviation s
 * @param deviationError standard error of s
 */
public record WeightedMoments(
        int count, double weight, Estimate mean, Estimate meanError, Estimate deviation, Estimate deviationError) {
    private static final double LEAST_WEIGHT = 2;

    /** The moments. Neither array is modified. */
    public static WeightedMoments of(double[] weights, double[] values) {
        Check.that(weights.length == values.length, weights.length + " weights for " + values.length + " values");
        double weight = 0;
        CompensatedSum sum = new CompensatedSum();
        for (int t = 0; t < weights.length; t++) {
            weight += Check.atLeast(weights[t], 0, "weight");
            sum.add(weights[t] * Check.finite(values[t], "value"));
        }
        if (weight < LEAST_WEIGHT) {
            Estimate none = new Estimate.Undefined(
                    Estimate.Reason.TOO_FEW_OBSERVATIONS, "it accounts for fewer than two observations");
            return new WeightedMoments(values.length, weight, none, none, none, none);
        }
        double mean = sum.value() / weight;
        CompensatedSum squares = new CompensatedSum();
        for (int t = 0; t < weights.length; t++) {
            squares.add(weights[t] * (values[t] - mean) * (values[t] - mean));
        }
        double variance = squares.value() / weight;
        double[] ofMean = new double[weights.length];
        double[] ofVariance = new double[weights.length];
        for (int t = 0; t < weights.length; t++) {
            double d = values[t] - mean;
            ofMean[t] = weights[t] * d;
            ofVariance[t] = weights[t] * (d * d - variance);
        }
        double deviation = Math.sqrt(variance);
        Estimate varianceError = error(ofVariance, weight);
        Estimate deviationError = varianceError instanceof Estimate.Value value
                ? Estimate.of(value.amount() / (2 * deviation))
                : varianceError;
        return new WeightedMoments(
                values.length,
                weight,
                Estimate.of(mean),
                error(ofMean, weight),
                Estimate.of(deviation),
                deviationError);
    }

    private static Estimate error(double[] influence, double weight) {
        int n = influence.length;
        double longRun = LongRunVariance.bartlett(influence, LongRunVariance.defaultLags(n))
                .number()
                .orElseThrow();
        return longRun > 0 ? Estimate.of(Math.sqrt(n * longRun) / weight) : Estimate.zeroVariance();
    }
}
