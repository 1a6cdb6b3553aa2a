package sojourn.regime;

import java.util.ArrayList;
import java.util.List;
import sojourn.numeric.CompensatedSum;

/**
 * How regimes follow one another, found from probabilities alone: the transition matrix A that foretells the next row's
 * probabilities best, least sum_t |w_{t+1} - w_t A|^2, rows of A being distributions. Probabilities that were filtered by a chain
 * have E[w_{t+1} | what was known at t] = w_t A, whatever was observed, so that A is found without bias towards short stays; mean
 * products w_t(i) w_{t+1}(j) take every doubt for a change. Where each row belongs to one state alone these are the shares of the
 * counted changes. A state without weight is taken to stay. Our own choice, derived here from the tower rule; no source.
 *
 * <p>The minimum is found by moving probability within a row between two states at a time, each time by the exact best amount, until
 * nothing moves: the objective is convex and no bound ties two rows together. Where probabilities hardly vary, or always vary together, many matrices foretell
 * about as well, and the search stays near where it begins, at regimes that last for ever: an event, as is a search that ran out of sweeps.
 */
final class ForetoldTransitions {
    private static final int MOST_SWEEPS = 100_000;
    private static final double NOTHING_MOVES = 1e-13;
    /** Part of a state's mean square probability that the other states' do not tell: a variation of one in a hundred. Our own choice, no source. */
    private static final double HARDLY = 1e-4;

    private final int states;
    /** Sums of w_t(i) w_t(j), and of w_t(i) w_{t+1}(j), over all rows but the last; row-major. */
    private final double[] now;

    private final double[] next;
    private final double[] transitions;
    /** The most that the last sweep moved. */
    private double moved = Double.POSITIVE_INFINITY;

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
        return search(weights, MOST_SWEEPS).matrix();
    }

    /** The search, ended. */
    static ForetoldTransitions search(RowWeights weights) {
        return search(weights, MOST_SWEEPS);
    }

    /** The search, ended after at most so many sweeps. */
    static ForetoldTransitions search(RowWeights weights, int mostSweeps) {
        ForetoldTransitions search = new ForetoldTransitions(weights);
        for (int sweep = 0; sweep < mostSweeps && search.moved > NOTHING_MOVES; sweep++) {
            search.moved = search.sweep();
        }
        return search;
    }

    /** Row-major, each row summing to 1. */
    double[] matrix() {
        return transitions.clone();
    }

    /** What is amiss with it, if anything. */
    List<String> events() {
        List<String> events = new ArrayList<>();
        if (undetermined()) {
            events.add("transitions-undetermined");
        }
        if (moved > NOTHING_MOVES) {
            events.add("transitions-unfinished");
        }
        return events;
    }

    /** Whether a Cholesky pivot of the sums of w_t(i) w_t(j), states without weight left out, is hardly anything of its diagonal. */
    private boolean undetermined() {
        double[] left = now.clone();
        boolean hardly = false;
        for (int k = 0; k < states; k++) {
            double own = now[k * states + k];
            double pivot = left[k * states + k];
            hardly |= own > 0 && pivot <= HARDLY * own;
            for (int i = k + 1; pivot > 0 && i < states; i++) {
                double part = left[i * states + k] / pivot;
                for (int j = k + 1; j < states; j++) {
                    left[i * states + j] -= part * left[k * states + j];
                }
            }
        }
        return hardly;
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
