package sojourn.evidence;

import java.util.OptionalDouble;
import sojourn.regime.WindowMoments;
import sojourn.walk.Forecast;
import sojourn.walk.Reading;

/**
 * What a gauge said at each close of the asset's next simple return, on equal ground for every gauge: regimes mixed by their probabilities one bar
 * on, each with the mean and variance of its fit's window. A bar's numbers stand at that bar and were known at the close before.
 *
 * @param secondMoment E[r^2] = variance + squared mean of the mixture, what the squared return is held to
 * @param logScore ln sum_k q_k N(r; m_k, v_k), q the probabilities one bar on: the density given to the return that came
 */
record ReturnForecasts(PerBar secondMoment, PerBar logScore) {
    private static final double HALF_LN_TWO_PI = 0.9189385332046727;

    /** Of a gauge walked over the subject's prices. */
    static ReturnForecasts of(WalkedRegimes subject) {
        int bars = subject.table().size();
        return new ReturnForecasts(
                PerBar.of(bars, bar -> secondMoment(subject, bar)), PerBar.of(bars, bar -> logScore(subject, bar)));
    }

    private static OptionalDouble secondMoment(WalkedRegimes subject, int bar) {
        if (!subject.returns().has(bar) || !subject.known(bar - 1)) {
            return OptionalDouble.empty();
        }
        int asset = subject.asset();
        Forecast next = subject.timeline().reading(bar - 1).orElseThrow().forecast(1);
        double square = next.covariance(asset, asset) + next.mean(asset) * next.mean(asset);
        return square > 0 ? OptionalDouble.of(square) : OptionalDouble.empty();
    }

    private static OptionalDouble logScore(WalkedRegimes subject, int bar) {
        if (!subject.returns().has(bar) || !subject.known(bar - 1)) {
            return OptionalDouble.empty();
        }
        Reading before = subject.timeline().reading(bar - 1).orElseThrow();
        double score = logDensity(
                subject.returns().at(bar).orElseThrow(), before.predicted(1), before.moments(), subject.asset());
        return Double.isFinite(score) ? OptionalDouble.of(score) : OptionalDouble.empty();
    }

    /** ln of the mixture's density; regimes without variance or probability have no part in it. */
    private static double logDensity(double earned, double[] probabilities, WindowMoments moments, int asset) {
        double[] logs = new double[probabilities.length];
        double most = Double.NEGATIVE_INFINITY;
        for (int k = 0; k < logs.length; k++) {
            double variance = moments.covariance(k, asset, asset);
            double d = earned - moments.mean(k, asset);
            logs[k] = probabilities[k] > 0 && variance > 0
                    ? StrictMath.log(probabilities[k])
                            - HALF_LN_TWO_PI
                            - 0.5 * StrictMath.log(variance)
                            - 0.5 * d * d / variance
                    : Double.NEGATIVE_INFINITY;
            most = Math.max(most, logs[k]);
        }
        if (most == Double.NEGATIVE_INFINITY) {
            return most;
        }
        double sum = 0;
        for (double log : logs) {
            sum += StrictMath.exp(log - most);
        }
        return most + StrictMath.log(sum);
    }
}
