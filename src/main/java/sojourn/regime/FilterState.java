package sojourn.regime;

/**
 * The filter after some bars: the probability of each regime given every observation so far, p_{t|t}, and the log-likelihood.
 * Every published probability comes from here. One step is
 * a_k = ln p_{t|t-1}(k) + ln f_k(x_t), m = max_k a_k, p_{t|t}(k) = exp(a_k - m) / sum_j exp(a_j - m); the shift m includes the
 * prediction, so that a state far from the observation never makes 0/0. Source: Hamilton (1989), Econometrica 57, 357-384.
 * Immutable; only {@code StrictMath}, so the same bits on every machine.
 */
public final class FilterState {
    private final double[] probabilities;
    private final boolean started;
    private final double sum;
    private final double compensation;
    private final double lastLogDensity;

    private FilterState(
            double[] probabilities, boolean started, double sum, double compensation, double lastLogDensity) {
        this.probabilities = probabilities;
        this.started = started;
        this.sum = sum;
        this.compensation = compensation;
        this.lastLogDensity = lastLogDensity;
    }

    /** The filter before any bar: the initial distribution. */
    public static FilterState before(RegimeModel model) {
        double[] initial = new double[model.states()];
        for (int k = 0; k < initial.length; k++) {
            initial[k] = model.initial(k);
        }
        return new FilterState(initial, false, 0, 0, 0);
    }

    /** The filter after all rows of {@code x}. */
    public static FilterState after(RegimeModel model, Observations x) {
        FilterState state = before(model);
        for (int row = 0; row < x.size(); row++) {
            state = state.step(model, x, row);
        }
        return state;
    }

    /**
     * The filter one bar on. A missing row is one transition without an emission. An observation that no reachable state can
     * have made (all densities 0 in double precision) makes the log-likelihood minus infinity and leaves the predicted
     * probabilities.
     */
    public FilterState step(RegimeModel model, Observations x, int row) {
        double[] predicted = predicted(model);
        if (x.missing(row)) {
            return new FilterState(predicted, true, sum, compensation, 0);
        }
        int states = predicted.length;
        double[] log = new double[states];
        double shift = Double.NEGATIVE_INFINITY;
        for (int k = 0; k < states; k++) {
            log[k] = StrictMath.log(predicted[k]) + model.emission().logDensity(x, row, k);
            shift = StrictMath.max(shift, log[k]);
        }
        if (shift == Double.NEGATIVE_INFINITY) {
            return new FilterState(predicted, true, shift, 0, shift);
        }
        double total = 0;
        for (int k = 0; k < states; k++) {
            log[k] = StrictMath.exp(log[k] - shift);
            total += log[k];
        }
        for (int k = 0; k < states; k++) {
            log[k] /= total;
        }
        return plus(log, shift + StrictMath.log(total));
    }

    /** Adds with Neumaier's compensation, so that long series keep their last digits. */
    private FilterState plus(double[] filtered, double logDensity) {
        double next = sum + logDensity;
        if (next == Double.NEGATIVE_INFINITY) {
            return new FilterState(filtered, true, next, 0, logDensity);
        }
        double lost = StrictMath.abs(sum) >= StrictMath.abs(logDensity)
                ? (sum - next) + logDensity
                : (logDensity - next) + sum;
        return new FilterState(filtered, true, next, compensation + lost, logDensity);
    }

    /** Probability of regime {@code k} given all observations so far. */
    public double probability(int k) {
        return probabilities[k];
    }

    /** Probability of each regime given all observations so far, a copy. */
    public double[] probabilities() {
        return probabilities.clone();
    }

    /** Probability of each regime at the next bar: p A; before any bar the initial distribution. */
    public double[] predicted(RegimeModel model) {
        if (!started) {
            return probabilities.clone();
        }
        int states = probabilities.length;
        double[] next = new double[states];
        for (int i = 0; i < states; i++) {
            for (int j = 0; j < states; j++) {
                next[j] += probabilities[i] * model.transition(i, j);
            }
        }
        return next;
    }

    /** Natural log of the likelihood of all observations so far; minus infinity after an impossible one. */
    public double logLikelihood() {
        return sum + compensation;
    }

    /** Natural log of the density of the last bar's observation given those before it; 0 for a missing row or no bar. */
    public double lastLogDensity() {
        return lastLogDensity;
    }
}
