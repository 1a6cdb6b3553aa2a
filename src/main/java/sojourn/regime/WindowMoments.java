package sojourn.regime;

import java.util.Arrays;

/**
 * Mean and covariance of the simple returns of every asset in every regime, over the rows of one fit's window, weighted by the
 * window's posterior probabilities: mean_k = sum_t g_t(k) r_t / sum_t g_t(k), cov_k with the same weights and divisor. One
 * estimator for all entries, so each covariance matrix is positive semi-definite.
 */
public final class WindowMoments {
    private final int states;
    private final int assets;
    private final double[] means;
    private final double[] covariances;

    private WindowMoments(int states, int assets, double[] means, double[] covariances) {
        this.states = states;
        this.assets = assets;
        this.means = means;
        this.covariances = covariances;
    }

    /**
     * Copies its arrays. Neither modified.
     *
     * @param means states × assets, row-major, per bar
     * @param covariances states × assets × assets, row-major, per bar
     */
    public static WindowMoments of(int states, int assets, double[] means, double[] covariances) {
        if (means.length != states * assets || covariances.length != states * assets * assets) {
            throw new IllegalArgumentException(means.length + " means and " + covariances.length + " covariances for "
                    + states + " states and " + assets + " assets");
        }
        return new WindowMoments(states, assets, means.clone(), covariances.clone());
    }

    /** The same covariances, every mean set to {@code mean}. */
    public WindowMoments withMeans(double mean) {
        double[] same = new double[means.length];
        Arrays.fill(same, mean);
        return new WindowMoments(states, assets, same, covariances);
    }

    /** Number of regimes. */
    public int states() {
        return states;
    }

    /** Number of assets. */
    public int assets() {
        return assets;
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
