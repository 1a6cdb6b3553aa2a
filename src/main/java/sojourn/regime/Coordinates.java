package sojourn.regime;

import sojourn.numeric.Digamma;

/**
 * Free coordinates of a model, in which the likelihood is close to quadratic and a maximum at an edge is an ordinary one. Of a row of
 * probabilities they are the square roots of the ratios to its largest, v_j = sqrt(A_j / A_b), so that A_j = v_j^2 / (1 + sum v^2):
 * a probability that goes to 0 is a v that goes through 0. Then the means, the logs of the variances, and of the degrees of freedom w
 * with nu = 1 / (1/200 + w^2). The initial distribution of a chain is no part of them: it stands in a corner, or follows from the steps.
 *
 * <p>The gradient is that of the expected complete log-likelihood, which is the log-likelihood's own (Fisher's identity; Louis 1982, J.
 * R. Statistical Society B 44, 226-233). The information is the diagonal of what complete data would hold.
 */
final class Coordinates {
    private static final double LEAST_INVERSE = 1 / EmissionFamily.MOST_DEGREES_OF_FREEDOM;
    private static final double MOST_TAIL = Math.sqrt(1 / EmissionFamily.LEAST_DEGREES_OF_FREEDOM - LEAST_INVERSE);
    /** Longest steps of one go: of a root ratio, of a mean, of the log of a variance, of w. */
    private static final double LONGEST_ROOT = 0.25;

    private static final double LONGEST_IN_DEVIATIONS = 0.7;
    private static final double LONGEST_LOG = 0.7;
    private static final double LONGEST_TAIL = 0.2;
    private static final double LARGEST_ROOT = 2;

    /** Keeps the information of a state without rows positive. */
    private static final double LEAST_ROWS = 1;
    /** Degrees of freedom of a normal, for the information alone. */
    private static final double NORMAL = 1e9;

    private static final double LOG_FLOOR = StrictMath.log(Maximisation.FLOOR);

    private final EmissionFamily family;
    private final InitialDistribution initial;
    private final int states;
    private final boolean chain;
    private final int rows;
    private final int[] base;
    private final int firstMean;
    private final int firstVariance;
    private final int firstTail;
    private final int size;

    /** Those for models like {@code p}, which is not modified. */
    Coordinates(Parameters p, EmissionFamily family, InitialDistribution initial) {
        this.family = family;
        this.initial = initial;
        states = p.states();
        chain = p.kind() == ModelKind.HIDDEN_MARKOV;
        rows = chain ? states : 1;
        base = new int[rows];
        for (int i = 0; i < rows; i++) {
            for (int j = 1; j < states; j++) {
                base[i] = p.at(entry(p, i, j)) > p.at(entry(p, i, base[i])) ? j : base[i];
            }
        }
        firstMean = rows * (states - 1);
        firstVariance = firstMean + (family.estimatesMeans() ? states : 0);
        firstTail = firstVariance + (tied() ? 1 : states);
        boolean tails = family.fatTailed() && family.fixedDegreesOfFreedom().isEmpty();
        size = firstTail + (tails ? states : 0);
    }

    private boolean tied() {
        return family.form() == EmissionFamily.Form.NORMAL_TIED;
    }

    private int entry(Parameters p, int row, int j) {
        return chain ? p.transition(row, j) : p.initial(j);
    }

    /** The coordinate of probability {@code j} of a row, which is not the base. */
    private int root(int row, int j) {
        return row * (states - 1) + (j < base[row] ? j : j - 1);
    }

    int size() {
        return size;
    }

    /** Where {@code p} stands. */
    double[] of(Parameters p) {
        double[] at = new double[size];
        for (int i = 0; i < rows; i++) {
            for (int j = 0; j < states; j++) {
                if (j != base[i]) {
                    at[root(i, j)] = Math.sqrt(p.at(entry(p, i, j)) / p.at(entry(p, i, base[i])));
                }
            }
        }
        for (int k = 0; k < states; k++) {
            if (family.estimatesMeans()) {
                at[firstMean + k] = p.at(p.mean(k));
            }
            if (firstVariance + k < firstTail) {
                at[firstVariance + k] = StrictMath.log(p.at(p.variance(k)));
            }
            if (firstTail < size) {
                at[firstTail + k] = Math.sqrt(Math.max(0, 1 / p.at(p.degreesOfFreedom(k)) - LEAST_INVERSE));
            }
        }
        return at;
    }

    /** The model there, variances and degrees of freedom within their bounds; what is no coordinate is as in {@code like}. */
    Parameters model(double[] at, Parameters like) {
        Parameters p = like.copy();
        for (int i = 0; i < rows; i++) {
            double total = total(at, i);
            for (int j = 0; j < states; j++) {
                double v = j == base[i] ? 1 : at[root(i, j)];
                p.set(entry(p, i, j), v * v / total);
            }
        }
        for (int k = 0; k < states; k++) {
            if (family.estimatesMeans()) {
                p.set(p.mean(k), at[firstMean + k]);
            }
            double log = at[firstVariance + (tied() ? 0 : k)];
            p.set(p.variance(k), log > LOG_FLOOR ? StrictMath.exp(log) : Maximisation.FLOOR);
            if (firstTail < size) {
                double w = Math.min(MOST_TAIL, Math.abs(at[firstTail + k]));
                p.set(p.degreesOfFreedom(k), 1 / (LEAST_INVERSE + w * w));
            }
        }
        return p;
    }

    private double total(double[] at, int row) {
        double total = 1;
        for (int j = 0; j < states; j++) {
            if (j != base[row]) {
                total += at[root(row, j)] * at[root(row, j)];
            }
        }
        return total;
    }

    /** The gradient of the log-likelihood at {@code at}, of which {@code p} is the model and {@code sums} what it expects. */
    double[] gradient(double[] at, Parameters p, ExpectedSums sums) {
        double[] gradient = new double[size];
        double[] steps = steps(p, sums);
        for (int i = 0; i < rows; i++) {
            double n = 0;
            for (int j = 0; j < states; j++) {
                n += steps[i * states + j];
            }
            for (int j = 0; j < states; j++) {
                if (j != base[i]) {
                    double v = at[root(i, j)];
                    double excess = steps[i * states + j] - n * p.at(entry(p, i, j));
                    gradient[root(i, j)] = v == 0 ? 0 : 2 * excess / v;
                }
            }
        }
        for (int k = 0; k < states; k++) {
            emission(at, p, sums, gradient, k);
        }
        return gradient;
    }

    /** Expected steps by row, the pull of a stationary start included; counts of a mixture. */
    private double[] steps(Parameters p, ExpectedSums sums) {
        if (!chain) {
            return sums.count;
        }
        return initial == InitialDistribution.STATIONARY ? StationaryStart.pulled(p, sums) : sums.transitions;
    }

    private void emission(double[] at, Parameters p, ExpectedSums sums, double[] gradient, int k) {
        double variance = p.at(p.variance(k));
        double mean = p.at(p.mean(k));
        double weight = family.fatTailed() ? sums.weights[k] : sums.count[k];
        if (family.estimatesMeans()) {
            gradient[firstMean + k] = (sums.sum[k] - weight * mean) / variance;
        }
        double squares = (sums.squares[k] - mean * (2 * sums.sum[k] - mean * weight)) / variance;
        double excess = 0.5 * (squares - sums.count[k]);
        boolean floored = variance <= Maximisation.FLOOR && excess < 0;
        if (tied()) {
            gradient[firstVariance] += floored ? 0 : excess;
        } else {
            gradient[firstVariance + k] = floored ? 0 : excess;
        }
        if (firstTail < size) {
            gradient[firstTail + k] = tail(at[firstTail + k], p.at(p.degreesOfFreedom(k)), sums, squares, k);
        }
    }

    /** d ln f / d nu = (psi((nu + 1)/2) - psi(nu/2) - 1/nu - ln(1 + d^2/nu) + u d^2/nu) / 2, times d nu / d w = -2 w nu^2. */
    private static double tail(double w, double nu, ExpectedSums sums, double squares, int k) {
        double n = sums.count[k];
        double logs = n * StrictMath.log((nu + 1) / nu) - sums.logWeights[k] - sums.weights[k];
        double slope = 0.5 * (n * (Digamma.of(0.5 * (nu + 1)) - Digamma.of(0.5 * nu) - 1 / nu) - logs + squares / nu);
        boolean bound = Math.abs(w) >= MOST_TAIL && slope < 0;
        return bound ? 0 : -2 * w * nu * nu * slope;
    }

    /** The diagonal of the complete data's information at {@code at}, all positive. */
    double[] information(double[] at, Parameters p, ExpectedSums sums) {
        double[] information = new double[size];
        for (int i = 0; i < rows; i++) {
            double n = LEAST_ROWS;
            for (int j = 0; j < states; j++) {
                n += chain ? sums.transitions[i * states + j] : sums.count[j];
            }
            for (int j = 0; j < states; j++) {
                if (j != base[i]) {
                    information[root(i, j)] = 4 * n / total(at, i);
                }
            }
        }
        for (int k = 0; k < states; k++) {
            double n = sums.count[k] + LEAST_ROWS;
            double nu = family.fatTailed() ? p.at(p.degreesOfFreedom(k)) : NORMAL;
            if (family.estimatesMeans()) {
                information[firstMean + k] = n * (nu + 1) / (nu + 3) / p.at(p.variance(k));
            }
            information[firstVariance + (tied() ? 0 : k)] += 0.5 * n * nu / (nu + 3);
            if (firstTail < size) {
                double w = at[firstTail + k];
                information[firstTail + k] = n * 14 * Math.max(0.03, w * w) * nu / (nu + 4.5);
            }
        }
        return information;
    }

    /** Whether the base of a row has become much smaller than another of its probabilities: time for other coordinates. */
    boolean outgrown(double[] at) {
        for (int i = 0; i < firstMean; i++) {
            if (StrictMath.abs(at[i]) > LARGEST_ROOT) {
                return true;
            }
        }
        return false;
    }

    /** The largest part, up to 1, of {@code step} that changes no coordinate by more than its kind should in one go. */
    double within(double[] step, Parameters p) {
        double part = 1;
        for (int i = 0; i < size; i++) {
            double longest = longest(i, p);
            part = StrictMath.min(part, longest / StrictMath.max(longest, StrictMath.abs(step[i])));
        }
        return part;
    }

    private double longest(int i, Parameters p) {
        if (i < firstMean) {
            return LONGEST_ROOT;
        }
        if (i < firstVariance) {
            return LONGEST_IN_DEVIATIONS * Math.sqrt(p.at(p.variance(i - firstMean)));
        }
        return i < firstTail ? LONGEST_LOG : LONGEST_TAIL;
    }
}
