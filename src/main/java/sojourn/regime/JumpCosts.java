package sojourn.regime;

/**
 * The cost of the cheapest path that ends in each state, less that of the cheapest of all: V_t(k) = d_t(k) + min(V_{t-1}(k),
 * min_j V_{t-1}(j) + penalty), which lies between 0 and the penalty but for the last distance. Ties stay; those of the cheapest
 * state go to the lowest. Immutable.
 */
final class JumpCosts {
    private final double[] costs;
    private final double penalty;

    private JumpCosts(double[] costs, double penalty) {
        this.costs = costs;
        this.penalty = penalty;
    }

    /** Before any row: every state costs nothing. */
    static JumpCosts before(int states, double penalty) {
        return new JumpCosts(new double[states], penalty);
    }

    /** After one more row at those distances from the centres. Not modified. */
    JumpCosts after(double[] distances) {
        double[] next = new double[costs.length];
        double least = Double.POSITIVE_INFINITY;
        for (int k = 0; k < next.length; k++) {
            next[k] = distances[k] + costs[from(k)] + (from(k) == k ? 0 : penalty);
            least = StrictMath.min(least, next[k]);
        }
        for (int k = 0; k < next.length; k++) {
            next[k] -= least;
        }
        return new JumpCosts(next, penalty);
    }

    /** The state before the next row on the cheapest path that then ends in {@code k}. */
    int from(int k) {
        int cheapest = cheapest();
        return costs[k] <= costs[cheapest] + penalty ? k : cheapest;
    }

    /** The state in which the cheapest path ends. */
    int cheapest() {
        int best = 0;
        for (int k = 1; k < costs.length; k++) {
            best = costs[k] < costs[best] ? k : best;
        }
        return best;
    }
}
