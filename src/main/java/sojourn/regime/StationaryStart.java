package sojourn.regime;

import java.util.Optional;

/**
 * A chain that starts in its long run: pi = pi A. The maximisation step then raises sum_ij n_ij ln A_ij + sum_k g_k ln pi_k(A), n
 * being the expected steps and g the smoothed probabilities of the first row (Bulla and Berzel 2008, Comput. Statistics 23, 1-18).
 * Setting its gradient to zero under unit row sums gives A_ij = (n_ij + pi_i A_ij (h_j - sum_l A_il h_l)) / n_i with (I - A + 1 pi) h =
 * g / pi (derivative of pi: Schweitzer 1968, J. Applied Probability 5, 401-413), iterated from A_ij = n_ij / n_i.
 */
final class StationaryStart {
    private static final int MOST_ITERATIONS = 50;
    private static final double SETTLED = 1e-15;
    /** An entry that an iteration would make negative is cut to this part of what it was. */
    private static final double CUT = 0.1;

    private static final int MOST_HALVINGS = 10;

    private StationaryStart() {}

    /** Sets the initial distribution to the stationary one; returns whether there is just one. {@code p} is modified. */
    static boolean impose(Parameters p) {
        Optional<double[]> pi = LongRun.stationary(rows(p), p.states());
        pi.ifPresent(found -> {
            for (int k = 0; k < found.length; k++) {
                p.set(p.initial(k), found[k]);
            }
        });
        return pi.isPresent();
    }

    /**
     * Sets transitions and initial distribution of {@code next} to ones that do not lower the objective below that of {@code old}: the
     * fixed point, or the farthest of ten halvings towards it, or those of {@code old}.
     */
    static void raise(Parameters next, Parameters old, ExpectedSums sums) {
        int states = next.states();
        double[] before = rows(old);
        double[] first = firstRow(sums);
        double[] after = fixedPoint(rows(next), sums.transitions, first, states);
        double least = objective(before, sums.transitions, first, states);
        int halvings = 0;
        while (!(objective(after, sums.transitions, first, states) >= least)) {
            boolean again = halvings++ < MOST_HALVINGS;
            for (int e = 0; e < after.length; e++) {
                after[e] = again ? 0.5 * (after[e] + before[e]) : before[e];
            }
            if (!again) {
                break;
            }
        }
        for (int i = 0; i < states; i++) {
            for (int j = 0; j < states; j++) {
                next.set(next.transition(i, j), after[i * states + j]);
            }
        }
        impose(next);
    }

    /**
     * The expected steps with what the start in the long run adds: n_ij + pi_i A_ij (h_j - sum_l A_il h_l), the gradient of the
     * objective in ln A_ij before rows are kept to sum 1. Plain steps where the long run does not allow the first row.
     */
    static double[] pulled(Parameters p, ExpectedSums sums) {
        int states = p.states();
        double[] at = rows(p);
        double[] first = firstRow(sums);
        double[] pulled = sums.transitions.clone();
        Optional<double[]> pi = LongRun.stationary(at, states);
        if (pi.isEmpty() || !supports(pi.get(), first)) {
            return pulled;
        }
        double[] potential = potential(at, pi.get(), first, states);
        for (int i = 0; i < states; i++) {
            double average = 0;
            for (int j = 0; j < states; j++) {
                average += at[i * states + j] * potential[j];
            }
            for (int j = 0; j < states; j++) {
                pulled[i * states + j] += pi.get()[i] * at[i * states + j] * (potential[j] - average);
            }
        }
        return pulled;
    }

    private static double[] firstRow(ExpectedSums sums) {
        double[] first = sums.initial.clone();
        double total = 0;
        for (double g : first) {
            total += g;
        }
        for (int k = 0; k < first.length; k++) {
            first[k] /= total;
        }
        return first;
    }

    private static double[] rows(Parameters p) {
        int states = p.states();
        double[] rows = new double[states * states];
        for (int i = 0; i < states; i++) {
            for (int j = 0; j < states; j++) {
                rows[i * states + j] = p.at(p.transition(i, j));
            }
        }
        return rows;
    }

    private static double[] fixedPoint(double[] start, double[] steps, double[] first, int states) {
        double[] at = start;
        for (int iteration = 0; iteration < MOST_ITERATIONS; iteration++) {
            Optional<double[]> pi = LongRun.stationary(at, states);
            if (pi.isEmpty() || !supports(pi.get(), first)) {
                return at;
            }
            double[] next = next(at, steps, pi.get(), potential(at, pi.get(), first, states), states);
            double change = 0;
            for (int e = 0; e < at.length; e++) {
                change = StrictMath.max(change, StrictMath.abs(next[e] - at[e]));
            }
            at = next;
            if (!(change > SETTLED)) {
                return at;
            }
        }
        return at;
    }

    private static boolean supports(double[] pi, double[] first) {
        for (int k = 0; k < pi.length; k++) {
            if (first[k] > 0 && !(pi[k] > 0)) {
                return false;
            }
        }
        return true;
    }

    private static double[] next(double[] at, double[] steps, double[] pi, double[] potential, int states) {
        double[] next = new double[at.length];
        for (int i = 0; i < states; i++) {
            double count = 0;
            double average = 0;
            for (int j = 0; j < states; j++) {
                count += steps[i * states + j];
                average += at[i * states + j] * potential[j];
            }
            double total = 0;
            for (int j = 0; j < states; j++) {
                int e = i * states + j;
                double pull = pi[i] * at[e] * (potential[j] - average);
                double value = count > 0 ? (steps[e] + pull) / count : at[e];
                next[e] = value >= 0 ? value : CUT * at[e];
                total += next[e];
            }
            for (int j = 0; j < states; j++) {
                next[i * states + j] /= total;
            }
        }
        return next;
    }

    /** h of (I - A + 1 pi) h = g / pi, by elimination with the largest pivot of the column. */
    private static double[] potential(double[] at, double[] pi, double[] first, int states) {
        int width = states + 1;
        double[] m = new double[states * width];
        for (int i = 0; i < states; i++) {
            for (int j = 0; j < states; j++) {
                m[i * width + j] = (i == j ? 1 : 0) - at[i * states + j] + pi[j];
            }
            m[i * width + states] = first[i] > 0 ? first[i] / pi[i] : 0;
        }
        for (int c = 0; c < states; c++) {
            swap(m, c, pivot(m, c, states), width);
            for (int r = c + 1; r < states; r++) {
                double ratio = m[r * width + c] / m[c * width + c];
                for (int j = c; j < width; j++) {
                    m[r * width + j] -= ratio * m[c * width + j];
                }
            }
        }
        double[] h = new double[states];
        for (int i = states - 1; i >= 0; i--) {
            double rest = m[i * width + states];
            for (int j = i + 1; j < states; j++) {
                rest -= m[i * width + j] * h[j];
            }
            h[i] = rest / m[i * width + i];
        }
        return h;
    }

    private static int pivot(double[] m, int column, int states) {
        int width = states + 1;
        int best = column;
        for (int r = column + 1; r < states; r++) {
            best = StrictMath.abs(m[r * width + column]) > StrictMath.abs(m[best * width + column]) ? r : best;
        }
        return best;
    }

    private static void swap(double[] m, int a, int b, int width) {
        for (int j = 0; j < width; j++) {
            double kept = m[a * width + j];
            m[a * width + j] = m[b * width + j];
            m[b * width + j] = kept;
        }
    }

    /** Minus infinity where a step that was made, or the first state, is impossible. */
    private static double objective(double[] at, double[] steps, double[] first, int states) {
        Optional<double[]> pi = LongRun.stationary(at, states);
        if (pi.isEmpty()) {
            return Double.NEGATIVE_INFINITY;
        }
        double sum = 0;
        for (int e = 0; e < at.length; e++) {
            sum += steps[e] > 0 ? steps[e] * StrictMath.log(at[e]) : 0;
        }
        for (int k = 0; k < states; k++) {
            sum += first[k] > 0 ? first[k] * StrictMath.log(pi.get()[k]) : 0;
        }
        return sum;
    }
}
