package sojourn.regime;

import java.util.Arrays;

/**
 * What one pass over a window expects under given parameters, all that the maximisation step needs: how often each state comes
 * first, how often each step is made, and each state's count, sum and sum of squares of the standardised observations. For
 * Student-t emissions each row counts in sum and squares with its weight u, and the sums of u and of ln u - u are kept beside.
 */
final class ExpectedSums {
    final double[] initial;
    /** Likelihood of the whole window given that it starts in each state, up to a common factor; all 0 where not known. */
    final double[] likelihoodFrom;

    final double[] transitions;
    final double[] count;
    final double[] sum;
    final double[] squares;
    /** Student-t only: sum of the weights u. */
    final double[] weights;
    /** Student-t only: sum of ln u - u. */
    final double[] logWeights;

    double logLikelihood;

    ExpectedSums(int states) {
        initial = new double[states];
        likelihoodFrom = new double[states];
        transitions = new double[states * states];
        count = new double[states];
        sum = new double[states];
        squares = new double[states];
        weights = new double[states];
        logWeights = new double[states];
    }

    /** The same with states in another order: state k of the result is state {@code order[k]} of this. Neither modified. */
    ExpectedSums ordered(int[] order) {
        ExpectedSums result = new ExpectedSums(order.length);
        result.logLikelihood = logLikelihood;
        for (int k = 0; k < order.length; k++) {
            int from = order[k];
            result.initial[k] = initial[from];
            result.likelihoodFrom[k] = likelihoodFrom[from];
            result.count[k] = count[from];
            result.sum[k] = sum[from];
            result.squares[k] = squares[from];
            result.weights[k] = weights[from];
            result.logWeights[k] = logWeights[from];
            for (int j = 0; j < order.length; j++) {
                result.transitions[k * order.length + j] = transitions[from * order.length + order[j]];
            }
        }
        return result;
    }

    /** Sets everything to 0. */
    void clear() {
        Arrays.fill(transitions, 0);
        Arrays.fill(count, 0);
        Arrays.fill(sum, 0);
        Arrays.fill(squares, 0);
        Arrays.fill(weights, 0);
        Arrays.fill(logWeights, 0);
        Arrays.fill(initial, 0);
        Arrays.fill(likelihoodFrom, 0);
        logLikelihood = 0;
    }
}
