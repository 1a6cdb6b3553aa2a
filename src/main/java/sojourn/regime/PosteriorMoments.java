package sojourn.regime;

import java.util.List;
import sojourn.numeric.CompensatedSum;

/** Takes the moments of all assets in each state, weighted by how much each row belongs to it. */
final class PosteriorMoments {
    /** A state with less posterior weight than this many rows has no moments of its own. */
    static final double LEAST_WEIGHT = 1e-6;

    private PosteriorMoments() {}

    /**
     * mean_k = sum_t g_t(k) r_t / sum_t g_t(k), covariance with the same weights and divisor, over the rows whose observation
     * and returns are present. A state with practically no weight gets the moments of the whole window, which adds an event.
     * There must be such a row.
     */
    static WindowMoments of(Membership membership, FitRequest request, List<String> events) {
        Companions returns = request.companions();
        int states = membership.states();
        int assets = returns.assets();
        double[] shares = shares(membership, request);
        double[] means = new double[states * assets];
        double[] covariances = new double[states * assets * assets];
        double[] weights = new double[returns.size()];
        for (int k = 0; k < states; k++) {
            double total = weights(membership, request, k, weights);
            if (total < LEAST_WEIGHT) {
                total = evenWeights(request, weights);
                events.add("moments-of-window {" + k + "}");
            }
            for (int a = 0; a < assets; a++) {
                means[k * assets + a] = weightedMean(returns, a, weights, total);
            }
            for (int a = 0; a < assets; a++) {
                for (int b = 0; b <= a; b++) {
                    double covariance = weightedProduct(
                            returns, a, b, means[k * assets + a], means[k * assets + b], weights, total);
                    covariances[(k * assets + a) * assets + b] = covariance;
                    covariances[(k * assets + b) * assets + a] = covariance;
                }
            }
        }
        return WindowMoments.of(states, assets, shares, means, covariances);
    }

    private static double[] shares(Membership membership, FitRequest request) {
        double[] shares = new double[membership.states()];
        double[] weights = new double[request.companions().size()];
        double all = evenWeights(request, weights);
        for (int k = 0; k < shares.length; k++) {
            shares[k] = weights(membership, request, k, weights) / all;
        }
        return shares;
    }

    /** Posterior weight of a state over the rows whose observation is present. */
    static double weight(Membership membership, Observations x, int k) {
        CompensatedSum total = new CompensatedSum();
        for (int t = 0; t < x.size(); t++) {
            if (!x.missing(t)) {
                total.add(membership.at(t, k));
            }
        }
        return total.value();
    }

    private static double weights(Membership membership, FitRequest request, int k, double[] weights) {
        CompensatedSum total = new CompensatedSum();
        for (int t = 0; t < weights.length; t++) {
            weights[t] = usable(request, t) ? membership.at(t, k) : 0;
            total.add(weights[t]);
        }
        return total.value();
    }

    private static double evenWeights(FitRequest request, double[] weights) {
        double total = 0;
        for (int t = 0; t < weights.length; t++) {
            weights[t] = usable(request, t) ? 1 : 0;
            total += weights[t];
        }
        return total;
    }

    /** Whether the window holds a row with an observation and the returns of all assets. */
    static boolean possible(FitRequest request) {
        for (int t = 0; t < request.companions().size(); t++) {
            if (usable(request, t)) {
                return true;
            }
        }
        return false;
    }

    private static boolean usable(FitRequest request, int row) {
        return !request.observations().missing(row) && !request.companions().missing(row);
    }

    private static double weightedMean(Companions returns, int a, double[] weights, double total) {
        CompensatedSum sum = new CompensatedSum();
        for (int t = 0; t < weights.length; t++) {
            if (weights[t] > 0) {
                sum.add(weights[t] * returns.at(t, a));
            }
        }
        return sum.value() / total;
    }

    private static double weightedProduct(
            Companions returns, int a, int b, double meanA, double meanB, double[] weights, double total) {
        CompensatedSum sum = new CompensatedSum();
        for (int t = 0; t < weights.length; t++) {
            if (weights[t] > 0) {
                sum.add(weights[t] * (returns.at(t, a) - meanA) * (returns.at(t, b) - meanB));
            }
        }
        return sum.value() / total;
    }
}
