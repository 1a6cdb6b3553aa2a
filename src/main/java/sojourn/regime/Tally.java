package sojourn.regime;

import java.util.Arrays;

/**
 * What a recursion on {@link Ratios} has summed, by place, the widest state last. What is not summed is what is left: the last
 * place's moments of the window's totals, and each state's stays of its rows less its changes. The stays are mostly the larger part, so
 * that little is lost to subtraction; a negative remainder is a rounding error, and 0.
 */
final class Tally {
    /** A count below this is made of rounding errors. */
    private static final double LEAST_COUNT = 1e-9;

    private final int states;
    private final Window window;
    /** Probabilities in the first and in the last row. */
    final double[] first;

    final double[] last;
    /** Sums of probabilities, missing rows included; not of the last place. */
    final double[] rows;
    /** Moments of the observations that are present; not of the last place. */
    final double[] count;

    final double[] sum;
    final double[] squares;
    /** Expected changes of state, row-major; the diagonal is ignored. */
    final double[] changes;

    Tally(int states, Window window) {
        this.states = states;
        this.window = window;
        first = new double[states];
        last = new double[states];
        rows = new double[states];
        count = new double[states];
        sum = new double[states];
        squares = new double[states];
        changes = new double[states * states];
    }

    void clear() {
        Arrays.fill(rows, 0);
        Arrays.fill(count, 0);
        Arrays.fill(sum, 0);
        Arrays.fill(squares, 0);
        Arrays.fill(changes, 0);
    }

    /** Adds to place {@code i} what a block has summed, times {@code factor}. */
    void add(int i, double factor, double rowsMore, double countMore, double sumMore, double squaresMore) {
        rows[i] += rowsMore * factor;
        count[i] += countMore * factor;
        sum[i] += sumMore * factor;
        squares[i] += squaresMore * factor;
    }

    /** Turns sums of alpha times ratio times beta into steps: each is multiplied by its transition probability. */
    void multiplyChanges(double[] transitions) {
        for (int e = 0; e < changes.length; e++) {
            changes[e] *= transitions[e];
        }
    }

    /** Fills all but the likelihoods of {@code sums}, which is modified. */
    void into(ExpectedSums sums, Ratios ratios) {
        rest();
        for (int i = 0; i < states; i++) {
            int k = ratios.state(i);
            sums.initial[k] = first[i];
            sums.count[k] = count[i];
            sums.sum[k] = sum[i];
            sums.squares[k] = squares[i];
            double stays = rows[i] - last[i];
            for (int j = 0; j < states; j++) {
                stays -= i == j ? 0 : changes[i * states + j];
                sums.transitions[k * states + ratios.state(j)] = changes[i * states + j];
            }
            sums.transitions[k * states + k] = StrictMath.max(0, stays);
        }
    }

    private void rest() {
        int end = states - 1;
        rows[end] = window.size();
        count[end] = window.count();
        sum[end] = window.sum();
        squares[end] = window.squares();
        for (int i = 0; i < end; i++) {
            rows[end] -= rows[i];
            count[end] -= count[i];
            sum[end] -= sum[i];
            squares[end] -= squares[i];
        }
        if (!(count[end] > LEAST_COUNT)) {
            count[end] = 0;
            sum[end] = 0;
            squares[end] = 0;
        }
    }
}
