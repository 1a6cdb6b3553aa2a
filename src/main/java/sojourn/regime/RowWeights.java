package sojourn.regime;

import sojourn.numeric.Check;
import sojourn.numeric.CompensatedSum;

/** Weights of a window's rows that were found row by row, without a model of how regimes follow one another. Immutable. */
final class RowWeights implements Membership {
    private final int states;
    private final double[] weights;

    private RowWeights(int states, double[] weights) {
        this.states = states;
        this.weights = weights;
    }

    /** Rows × states, row-major, each row summing to 1. Copied; not modified. */
    static RowWeights of(int states, double[] rowMajor) {
        Check.that(rowMajor.length % states == 0, rowMajor.length + " weights of " + states + " states");
        for (int row = 0; row < rowMajor.length / states; row++) {
            HiddenMarkov.checkDistribution(rowMajor, row * states, states, "weights of a row");
        }
        return new RowWeights(states, rowMajor.clone());
    }

    /** Each row belongs to one state alone. Not modified. */
    static RowWeights path(int states, int[] path) {
        double[] weights = new double[path.length * states];
        for (int row = 0; row < path.length; row++) {
            weights[row * states + path[row]] = 1;
        }
        return new RowWeights(states, weights);
    }

    /** The same with its states in another order: state k of the result is state {@code order[k]} of this. */
    RowWeights ordered(int[] order) {
        double[] turned = new double[weights.length];
        for (int i = 0; i < turned.length; i++) {
            turned[i] = weights[i - i % states + order[i % states]];
        }
        return new RowWeights(states, turned);
    }

    @Override
    public int size() {
        return weights.length / states;
    }

    @Override
    public int states() {
        return states;
    }

    @Override
    public double at(int row, int k) {
        return weights[row * states + k];
    }

    /**
     * How regimes followed one another in the window, row-major: sum_t w_t(i) w_{t+1}(j) / sum_t w_t(i), t running over all rows but
     * the last: counts, where each row belongs to one state alone. A state without weight there is taken to stay.
     */
    double[] transitions() {
        double[] transitions = new double[states * states];
        for (int i = 0; i < states; i++) {
            CompensatedSum from = new CompensatedSum();
            for (int t = 0; t + 1 < size(); t++) {
                from.add(at(t, i));
            }
            for (int j = 0; j < states; j++) {
                CompensatedSum both = new CompensatedSum();
                for (int t = 0; t + 1 < size(); t++) {
                    both.add(at(t, i) * at(t + 1, j));
                }
                boolean visited = from.value() > 0;
                transitions[i * states + j] = visited ? both.value() / from.value() : i == j ? 1 : 0;
            }
        }
        return transitions;
    }
}
