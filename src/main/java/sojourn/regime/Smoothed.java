package sojourn.regime;

/**
 * The probability of each regime at each bar given the whole series, past and future: hindsight, for the fit's own window and for
 * evidence, never for a decision. Backward pass of Kim (1994), J. Econometrics 60, 1-22:
 * xi_t(i,j) = p_{t|t}(i) A_ij gamma_{t+1}(j) / p_{t+1|t}(j), 0 where the prediction is 0; gamma_t(i) = sum_j xi_t(i,j).
 */
public final class Smoothed implements Membership {
    private final int states;
    private final double[] gamma;
    private final double[] transitions;
    private final double logLikelihood;

    private Smoothed(int states, double[] gamma, double[] transitions, double logLikelihood) {
        this.states = states;
        this.gamma = gamma;
        this.transitions = transitions;
        this.logLikelihood = logLikelihood;
    }

    /** Filters and smooths the whole series. */
    public static Smoothed of(RegimeModel model, Observations x) {
        int states = model.states();
        int rows = x.size();
        double[] gamma = new double[rows * states];
        FilterState filter = FilterState.before(model);
        for (int t = 0; t < rows; t++) {
            filter = filter.step(model, x, t);
            for (int k = 0; k < states; k++) {
                gamma[t * states + k] = filter.probability(k); // overwritten from the end
            }
        }
        double[] transitions = new double[states * states];
        for (int t = rows - 2; t >= 0; t--) {
            back(model, gamma, t, transitions);
        }
        return new Smoothed(states, gamma, transitions, filter.logLikelihood());
    }

    /** Row t of gamma holds p_{t|t} and becomes gamma_t; row t + 1 is smoothed already. Adds xi_t to the transitions. */
    private static void back(RegimeModel model, double[] gamma, int t, double[] transitions) {
        int states = model.states();
        double[] ratio = new double[states];
        for (int j = 0; j < states; j++) {
            double predicted = 0;
            for (int i = 0; i < states; i++) {
                predicted += gamma[t * states + i] * model.transition(i, j);
            }
            ratio[j] = predicted > 0 ? gamma[(t + 1) * states + j] / predicted : 0;
        }
        for (int i = 0; i < states; i++) {
            double total = 0;
            for (int j = 0; j < states; j++) {
                double xi = gamma[t * states + i] * model.transition(i, j) * ratio[j];
                transitions[i * states + j] += xi;
                total += xi;
            }
            gamma[t * states + i] = total;
        }
    }

    /** Number of bars. */
    @Override
    public int size() {
        return gamma.length / states;
    }

    /** Number of regimes. */
    @Override
    public int states() {
        return states;
    }

    /** Probability of regime {@code k} at {@code row} given the whole series. */
    @Override
    public double at(int row, int k) {
        return gamma[row * states + k];
    }

    /** Expected number of steps from regime {@code i} to regime {@code j} within the series. */
    public double expectedTransitions(int i, int j) {
        return transitions[i * states + j];
    }

    /** Natural log of the likelihood of the series. */
    public double logLikelihood() {
        return logLikelihood;
    }
}
