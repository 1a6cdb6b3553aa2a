package sojourn.regime;

import java.util.ArrayList;
import java.util.List;
import sojourn.numeric.Cholesky;

/**
 * Matches the states of a new fit to those of an earlier one: the assignment with the least total squared Hellinger distance
 * between emissions, by trying all orders (at most 720). H^2 = 1 - sqrt(2 s1 s2 / (s1^2 + s2^2)) exp(-(m1 - m2)^2 / (4 (s1^2 +
 * s2^2))) for two normals of one number; of several 1 - |S1|^(1/4) |S2|^(1/4) / |S|^(1/2) exp(-D' S^-1 D / 8), S = (S1 + S2)/2 and D the
 * difference of the means.
 */
public final class Matching {
    private final int[] newForOld;
    private final double cost;

    private Matching(int[] newForOld, double cost) {
        this.newForOld = newForOld;
        this.cost = cost;
    }

    /** How far a new state lies from an old one. */
    interface Distance {
        double between(int before, int now);
    }

    /** The best assignment, ties to the one that comes first in dictionary order. Both have the same number of states. */
    public static Matching of(Emission before, Emission now) {
        return least(before.states(), (old, state) -> squaredHellinger(before, old, now, state));
    }

    /** The assignment with the least total distance, ties to the one that comes first in dictionary order. */
    static Matching least(int states, Distance distance) {
        double least = Double.POSITIVE_INFINITY;
        int[] best = new int[0];
        for (int[] order : permutations(states)) {
            double cost = 0;
            for (int k = 0; k < states; k++) {
                cost += distance.between(k, order[k]);
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
        if (a instanceof MultivariateNormal many && b instanceof MultivariateNormal others) {
            return squaredHellinger(many, i, others, j);
        }
        double s1 = a.standardDeviation(i, 0);
        double s2 = b.standardDeviation(j, 0);
        double larger = StrictMath.max(s1, s2); // ratios do not overflow
        double u = s1 / larger;
        double v = s2 / larger;
        double d = (a.mean(i, 0) - b.mean(j, 0)) / larger;
        double squares = u * u + v * v;
        return 1 - Math.sqrt(2 * u * v / squares) * StrictMath.exp(-d * d / (4 * squares));
    }

    private static double squaredHellinger(MultivariateNormal a, int i, MultivariateNormal b, int j) {
        int d = a.dimension();
        double[] scales = new double[d]; // in these units no entry overflows
        double[] difference = new double[d];
        for (int r = 0; r < d; r++) {
            scales[r] = StrictMath.max(a.standardDeviation(i, r), b.standardDeviation(j, r));
            difference[r] = (a.mean(i, r) - b.mean(j, r)) / scales[r];
        }
        double[] first = new double[d * d];
        double[] second = new double[d * d];
        double[] middle = new double[d * d];
        for (int e = 0; e < d * d; e++) {
            double unit = scales[e / d] * scales[e % d];
            first[e] = a.covariance(i, e / d, e % d) / unit;
            second[e] = b.covariance(j, e / d, e % d) / unit;
            middle[e] = 0.5 * (first[e] + second[e]);
        }
        Cholesky between = Cholesky.of(middle, d).orElseThrow();
        double log = 0.25 * (logDeterminant(first, d) + logDeterminant(second, d)) - 0.5 * between.logDeterminant();
        return 1 - StrictMath.exp(log - between.squaredDistance(difference) / 8);
    }

    private static double logDeterminant(double[] covariance, int dimension) {
        return Cholesky.of(covariance, dimension).orElseThrow().logDeterminant();
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
