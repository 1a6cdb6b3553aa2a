package sojourn.regime;

import java.util.Arrays;
import sojourn.numeric.Exp;

/**
 * The probability of each state at each row given the whole window, and the expected steps between states, from log densities: the
 * forward pass p_t(j) proportional to sum_i p_{t-1}(i) A_ij f_j(x_t), the backward pass of {@link Smoothed}. For any emission, in
 * a search only; published probabilities come from the plain filter. Has working arrays of its own.
 */
final class ChainPosterior {
    /** Below this the largest density of a row is taken among the states that the row can be in. */
    private static final double LEAST = 1e-150;
    /** Row totals are multiplied until they fall below this, and their logarithm is taken then. */
    private static final double FLUSH = 1e-100;

    private final int rows;
    private final int states;
    private final double[] log;
    private final double[] gamma;
    private final double[] predicted;
    private final double[] ratio;
    private final double[] transition;

    ChainPosterior(int rows, int states) {
        this.rows = rows;
        this.states = states;
        this.log = new double[rows * states];
        this.gamma = new double[rows * states];
        this.predicted = new double[states];
        this.ratio = new double[states];
        this.transition = new double[states * states];
    }

    /** Log densities, rows × states, row-major, to be filled before {@link #fill}; 0 throughout a missing row. */
    double[] log() {
        return log;
    }

    /** Probabilities given the whole window, rows × states, row-major; not to be modified. */
    double[] gamma() {
        return gamma;
    }

    /**
     * Sets log-likelihood, steps and first row of {@code sums}. False, with {@code sums} of no use, when no state can have made a
     * row.
     */
    boolean fill(Parameters chain, ExpectedSums sums) {
        boolean markov = chain.kind() == ModelKind.HIDDEN_MARKOV;
        for (int i = 0; i < states; i++) {
            for (int j = 0; j < states; j++) {
                transition[i * states + j] = chain.at(markov ? chain.transition(i, j) : chain.initial(j));
            }
        }
        sums.logLikelihood = forward(chain);
        if (sums.logLikelihood == Double.NEGATIVE_INFINITY) {
            return false;
        }
        if (markov) {
            backward(sums);
        }
        return true;
    }

    private double forward(Parameters chain) {
        for (int k = 0; k < states; k++) {
            predicted[k] = chain.at(chain.initial(k));
        }
        double sum = 0;
        double product = 1;
        for (int t = 0; t < rows; t++) {
            if (t > 0) {
                predict(t - 1);
            }
            int row = t * states;
            double highest = log[row];
            for (int k = 1; k < states; k++) {
                highest = Math.max(highest, log[row + k]);
            }
            double total = weigh(row, highest);
            if (!(total > LEAST)) {
                highest = highestReachable(row);
                total = weighByLogarithms(row, highest);
            }
            if (!(total > 0)) {
                return Double.NEGATIVE_INFINITY;
            }
            for (int k = 0; k < states; k++) {
                gamma[row + k] /= total;
            }
            sum += highest;
            product *= total;
            if (product < FLUSH || product > 1 / FLUSH) {
                sum += StrictMath.log(product);
                product = 1;
            }
        }
        return sum + StrictMath.log(product);
    }

    /** Sets a row to its probabilities times a common factor; returns their sum. */
    private double weigh(int row, double shift) {
        double total = 0;
        for (int k = 0; k < states; k++) {
            double weight = predicted[k] * Exp.of(log[row + k] - shift);
            gamma[row + k] = weight;
            total += weight;
        }
        return total;
    }

    /** The same where predictions or densities reach the ends of double precision. */
    private double weighByLogarithms(int row, double shift) {
        double total = 0;
        for (int k = 0; k < states; k++) {
            double weight = predicted[k] > 0 ? Exp.of(StrictMath.log(predicted[k]) + log[row + k] - shift) : 0;
            gamma[row + k] = weight;
            total += weight;
        }
        return total;
    }

    /** The shift that makes the largest of a row's weights 1: max ln predicted_k + l_k. */
    private double highestReachable(int row) {
        double highest = Double.NEGATIVE_INFINITY;
        for (int k = 0; k < states; k++) {
            if (predicted[k] > 0) {
                highest = Math.max(highest, StrictMath.log(predicted[k]) + log[row + k]);
            }
        }
        return highest;
    }

    private void predict(int from) {
        Arrays.fill(predicted, 0);
        for (int i = 0; i < states; i++) {
            double here = gamma[from * states + i];
            for (int j = 0; j < states; j++) {
                predicted[j] += here * transition[i * states + j];
            }
        }
    }

    private void backward(ExpectedSums sums) {
        Arrays.fill(sums.transitions, 0);
        Arrays.fill(sums.likelihoodFrom, 1);
        for (int t = rows - 2; t >= 0; t--) {
            predict(t);
            for (int j = 0; j < states; j++) {
                ratio[j] = predicted[j] > 0 ? gamma[(t + 1) * states + j] / predicted[j] : 0;
            }
            for (int i = 0; i < states; i++) {
                double here = gamma[t * states + i];
                double beta = 0;
                for (int j = 0; j < states; j++) {
                    sums.transitions[i * states + j] += here * ratio[j];
                    beta += transition[i * states + j] * ratio[j];
                }
                gamma[t * states + i] = here * beta;
                sums.likelihoodFrom[i] = beta;
            }
        }
        double highest = log[0];
        for (int k = 0; k < states; k++) {
            highest = Math.max(highest, log[k]);
        }
        for (int k = 0; k < states; k++) {
            sums.initial[k] = gamma[k];
            sums.likelihoodFrom[k] *= Exp.of(log[k] - highest);
        }
        for (int e = 0; e < sums.transitions.length; e++) {
            sums.transitions[e] *= transition[e];
        }
    }
}
