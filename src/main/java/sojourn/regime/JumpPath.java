package sojourn.regime;

import java.util.Arrays;
import sojourn.numeric.CompensatedSum;

/** The cheapest path of a jump model through a window, by dynamic programming: hindsight, for the window's own fit. */
final class JumpPath {
    private final int[] path;
    private final double objective;

    private JumpPath(int[] path, double objective) {
        this.path = path;
        this.objective = objective;
    }

    /** The cheapest path; a missing row costs nothing. Ties stay, those of the last row go to the lowest state. */
    static JumpPath of(JumpCentres centres, double penalty, Observations x) {
        int rows = x.size();
        int states = centres.states();
        int[] from = new int[rows * states];
        JumpCosts costs = JumpCosts.before(states, penalty);
        for (int row = 0; row < rows; row++) {
            boolean missing = x.missing(row);
            for (int k = 0; k < states; k++) {
                from[row * states + k] = missing ? k : costs.from(k);
            }
            costs = missing ? costs : costs.after(centres.distances(x, row));
        }
        int[] path = new int[rows];
        int state = costs.cheapest();
        for (int row = rows - 1; row >= 0; row--) {
            path[row] = state;
            state = from[row * states + state];
        }
        return new JumpPath(path, objective(path, centres, penalty, x));
    }

    private static double objective(int[] path, JumpCentres centres, double penalty, Observations x) {
        CompensatedSum sum = new CompensatedSum();
        for (int row = 0; row < path.length; row++) {
            sum.add(x.missing(row) ? 0 : centres.distances(x, row)[path[row]]);
            sum.add(row > 0 && path[row] != path[row - 1] ? penalty : 0);
        }
        return sum.value();
    }

    /** One state a row, a copy. */
    int[] states() {
        return path.clone();
    }

    /** What it costs. */
    double objective() {
        return objective;
    }

    boolean sameAs(JumpPath other) {
        return Arrays.equals(path, other.path);
    }
}
