package sojourn.latest;

import java.util.List;
import java.util.Optional;
import sojourn.inference.Probability;
import sojourn.latest.TippingReturns.Interval;
import sojourn.regime.Emission;
import sojourn.regime.RegimeModel;
import sojourn.regime.StudentT;
import sojourn.walk.FitRecord;
import sojourn.walk.LogReturn;
import sojourn.walk.Observation;
import sojourn.walk.Reading;
import sojourn.walk.SimpleReturn;

/**
 * How probable it is by the forecast that the next return of an asset tips the decision: the mixture sum_k q_k F_k with q the
 * predicted probabilities. F_k is the fitted distribution where the gauge observes just this return (its logarithm counts as such);
 * otherwise normal with the regime's own mean and variance of simple returns. Beyond what was looked at, an interval goes on.
 */
final class TippingChance {
    private final Standing standing;
    private final Reading reading;

    TippingChance(Standing standing, Reading reading) {
        this.standing = standing;
        this.reading = reading;
    }

    /** The probability of a return outside {@code calm}; kept within [0, 1], which rounding may leave. */
    double outside(String asset, List<Interval> calm) {
        double inside = 0;
        double[] predicted = reading.predicted(1);
        for (int k = 0; k < predicted.length; k++) {
            for (Interval one : calm) {
                double above = one.openAbove() ? 1 : below(asset, k, one.high());
                double under = one.openBelow() ? 0 : below(asset, k, one.low());
                inside += predicted[k] * (above - under);
            }
        }
        return Math.max(0, Math.min(1, 1 - inside));
    }

    private double below(String asset, int regime, double simpleReturn) {
        List<Observation> observed = standing.strategy().regimes().observe();
        FitRecord fit = standing.timeline().fits().get(reading.fit() - 1);
        int state = fit.state(standing.timeline().regimes().get(regime)).orElse(-1);
        Optional<RegimeModel> model = fit.fit().model();
        for (int column = 0; column < observed.size() && model.isPresent() && state >= 0; column++) {
            Observation one = observed.get(column);
            if (one.equals(new LogReturn(asset))) {
                return below(model.get().emission(), state, column, StrictMath.log1p(simpleReturn));
            }
            if (one.equals(new SimpleReturn(asset))) {
                return below(model.get().emission(), state, column, simpleReturn);
            }
        }
        int index = standing.table().asset(asset);
        double deviation = Math.sqrt(reading.moments().covariance(regime, index, index));
        double from = simpleReturn - reading.moments().mean(regime, index);
        return deviation > 0 ? Probability.normalBelow(from / deviation) : from >= 0 ? 1 : 0;
    }

    private static double below(Emission emission, int state, int column, double x) {
        double from = x - emission.mean(state, column);
        return emission instanceof StudentT student
                ? Probability.studentBelow(from / student.scale(state), student.degreesOfFreedom(state))
                : Probability.normalBelow(from / emission.standardDeviation(state, column));
    }
}
