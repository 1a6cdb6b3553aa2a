package sojourn.regime;

import java.util.Arrays;

/**
 * Mean and covariance of the simple returns of every asset in every regime, over the rows of one fit's window, weighted by the
 * window's posterior probabilities: mean_k = sum_t g_t(k) r_t / sum_t g_t(k), cov_k with the same weights and divisor. One
 * estimator for all entries, so each covariance matrix is positive semi-definite. The share of a regime is its part of all weight.
 */
public final class WindowMoments {
    private final int states;
    private final int assets;
    private final double[] shares;
    private final double[] means;
    private final double[] covariances;

    private WindowMoments(int states, int assets, double[] shares, double[] means, double[] covariances) {
        this.states = states;
        this.assets = assets;
        this.shares = shares;
        this.means = means;
        this.covariances = covariances;
    }

    /**
     * Copies its arrays. Neither modified.
     *
     * @param shares of the window's weight, one a state, at least 0, adding up to about 1
     * @param means states × assets, row-major, per bar
     * @param covariances states × assets × assets, row-major, per bar
     */
    public static WindowMoments of(int states, int assets, double[] shares, double[] means, double[] covariances) {
        if (shares.length != states
                || means.length != states * assets
                || covariances.length != states * assets * assets) {
            throw new IllegalArgumentException(shares.length + " shares, " + means.length + " means and "
                    + covariances.length + " covariances for " + states + " states and " + assets + " assets");
        }
        return new WindowMoments(states, assets, shares.clone(), means.clone(), covariances.clone());
    }

    /** The same covariances, every mean set to {@code mean}. */
    public WindowMoments withMeans(double mean) {
        double[] same = new double[means.length];
        Arrays.fill(same, mean);
        return new WindowMoments(states, assets, shares, same, covariances);
    }

    /** Number of regimes. */
    public int states() {
        return states;
    }

    /** Number of assets. */
    public int assets() {
        return assets;
    }

    /** The part of the window's weight that a regime has. */
    public double share(int state) {
        return shares[state];
    }

    /** Mean simple return per bar over the whole window, all regimes together: sum_k share_k mean_k. */
    public double overallMean(int asset) {
        double mean = 0;
        for (int k = 0; k < states; k++) {
            mean += shares[k] * means[k * assets + asset];
        }
        return mean;
    }

    /** The same with every regime's means moved by {@code part} of the way to the overall mean, in [0, 1]. */
    public WindowMoments shrinkingMeans(double part) {
        double[] moved = new double[means.length];
        for (int a = 0; a < assets; a++) {
            double overall = overallMean(a);
            for (int k = 0; k < states; k++) {
                moved[k * assets + a] = means[k * assets + a] + part * (overall - means[k * assets + a]);
            }
        }
        return new WindowMoments(states, assets, shares, moved, covariances);
    }

    /** Mean simple return per bar. */
    public double mean(int state, int asset) {
        return means[state * assets + asset];
    }

    /** Covariance of simple returns per bar. */
    public double covariance(int state, int a, int b) {
        return covariances[(state * assets + a) * assets + b];
    }
}
