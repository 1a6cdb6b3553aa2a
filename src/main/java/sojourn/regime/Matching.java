package sojourn.regime;

import java.util.ArrayList;
import java.util.List;

/**
 * Matches the states of a new fit to those of an earlier one: the assignment with the least total squared Hellinger distance
 * between emissions, by trying all orders (at most 720). H^2 = 1 - sqrt(2 s1 s2 / (s1^2 + s2^2)) exp(-(m1 - m2)^2 / (4 (s1^2 +
 * s2^2))) for two normals.
 */
public final class Matching {
    private final int[] newForOld;
    private final double cost;

    private Matching(int[] newForOld, double cost) {
        this.newForOld = newForOld;
        this.cost = cost;
    }

    /** The best assignment, ties to the one that comes first in dictionary order. Both have the same number of states. */
    public static Matching of(Emission before, Emission now) {
        int states = before.states();
        double least = Double.POSITIVE_INFINITY;
        int[] best = new int[0];
        for (int[] order : permutations(states)) {
            double cost = 0;
            for (int k = 0; k < states; k++) {
                cost += squaredHellinger(before, k, now, order[k]);
            }
            if (cost < least) {
                least = cost;
                best = order;
            }
        }
        return new Matching(best, least);
    }

    /** Squared Hellinger distance of one state of each, between 0 and 1. */
    public static double squaredHellinger(Emission a, int i, Emission b, int j) {
        double s1 = a.standardDeviation(i, 0);
        double s2 = b.standardDeviation(j, 0);
        double larger = StrictMath.max(s1, s2); // ratios do not overflow
        double u = s1 / larger;
        double v = s2 / larger;
        double d = (a.mean(i, 0) - b.mean(j, 0)) / larger;
        double squares = u * u + v * v;
        return 1 - Math.sqrt(2 * u * v / squares) * StrictMath.exp(-d * d / (4 * squares));
    }

    /** The new state that continues each old one, a copy. */
    public int[] newForOld() {
        return newForOld.clone();
    }

    /** Total squared Hellinger distance. */
    public double cost() {
        return cost;
    }

    private static List<int[]> permutations(int n) {
        List<int[]> result = new ArrayList<>();
        extend(new int[n], 0, new boolean[n], result);
        return result;
    }

    private static void extend(int[] order, int length, boolean[] used, List<int[]> result) {
        if (length == order.length) {
            result.add(order.clone());
            return;
        }
        for (int k = 0; k < order.length; k++) {
            if (!used[k]) {
                used[k] = true;
                order[length] = k;
                extend(order, length + 1, used, result);
                used[k] = false;
            }
        }
    }
}
