package sojourn.regime;

import sojourn.numeric.CompensatedSum;

/**
 * How regimes follow one another, found from probabilities alone: the transition matrix A that foretells the next row's
 * probabilities best, least sum_t |w_{t+1} - w_t A|^2, rows of A being distributions. Probabilities that were filtered by a chain
 * have E[w_{t+1} | what was known at t] = w_t A, whatever was observed, so that A is found without bias towards short stays; mean
 * products w_t(i) w_{t+1}(j) take every doubt for a change. Where each row belongs to one state alone these are the shares of the
 * counted changes. A state without weight is taken to stay. Our own choice, derived here from the tower rule; no source.
 *
 * <p>The minimum is found by moving probability within a row between two states at a time, each time by the exact best amount, until
 * nothing moves: the objective is convex and no bound ties two rows together.
 */
final class ForetoldTransitions {
    private static final int MOST_SWEEPS = 100_000;
    private static final double NOTHING_MOVES = 1e-13;

    private final int states;
    /** Sums of w_t(i) w_t(j), and of w_t(i) w_{t+1}(j), over all rows but the last; row-major. */
    private final double[] now;

    private final double[] next;
    private final double[] transitions;

    private ForetoldTransitions(RowWeights weights) {
        this.states = weights.states();
        this.now = products(weights, 0);
        this.next = products(weights, 1);
        this.transitions = new double[states * states];
        for (int i = 0; i < states; i++) {
            transitions[i * states + i] = 1;
        }
    }

    /** Row-major, each row summing to 1. */
    static double[] of(RowWeights weights) {
        ForetoldTransitions search = new ForetoldTransitions(weights);
        double moved = Double.POSITIVE_INFINITY;
        for (int sweep = 0; sweep < MOST_SWEEPS && moved > NOTHING_MOVES; sweep++) {
            moved = search.sweep();
        }
        return search.transitions;
    }

    private static double[] products(RowWeights weights, int later) {
        int states = weights.states();
        double[] products = new double[states * states];
        for (int entry = 0; entry < products.length; entry++) {
            CompensatedSum sum = new CompensatedSum();
            for (int t = 0; t + 1 < weights.size(); t++) {
                sum.add(weights.at(t, entry / states) * weights.at(t + later, entry % states));
            }
            products[entry] = sum.value();
        }
        return products;
    }

    /** Every row and pair of states once; the most that was moved. */
    private double sweep() {
        double most = 0;
        for (int i = 0; i < states; i++) {
            for (int from = 0; from < states; from++) {
                for (int to = from + 1; to < states; to++) {
                    most = StrictMath.max(most, StrictMath.abs(move(i, from, to)));
                }
            }
        }
        return most;
    }

    /** d minimises over -a_to <= d <= a_from: half slope (g_to - g_from) d + s_ii d^2, g = S A - C, S and C the sums. */
    private double move(int i, int from, int to) {
        double own = now[i * states + i];
        if (!(own > 0)) {
            return 0;
        }
        double best = (slope(i, from) - slope(i, to)) / (2 * own);
        int a = i * states + from;
        int b = i * states + to;
        double moved = StrictMath.max(-transitions[b], StrictMath.min(transitions[a], best));
        transitions[a] -= moved;
        transitions[b] += moved;
        return moved;
    }

    private double slope(int i, int j) {
        double slope = -next[i * states + j];
        for (int k = 0; k < states; k++) {
            slope += now[i * states + k] * transitions[k * states + j];
        }
        return slope;
    }
}
