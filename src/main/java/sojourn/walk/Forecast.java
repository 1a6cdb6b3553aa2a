package sojourn.walk;

import sojourn.regime.WindowMoments;

/**
 * Mean and covariance of the simple returns of one coming bar, regimes mixed by their probabilities q:
 * m = sum_k q_k mu_k, cov = sum_k q_k (Sigma_k + (mu_k - m)(mu_k - m)'). Per bar, not annualised.
 */
public final class Forecast {
    private final int assets;
    private final double[] mean;
    private final double[] covariance;

    private Forecast(int assets, double[] mean, double[] covariance) {
        this.assets = assets;
        this.mean = mean;
        this.covariance = covariance;
    }

    /** The mixture of the regimes' moments. {@code probabilities} is not modified. */
    public static Forecast mixing(double[] probabilities, WindowMoments moments) {
        int assets = moments.assets();
        double[] mean = new double[assets];
        for (int k = 0; k < probabilities.length; k++) {
            for (int a = 0; a < assets; a++) {
                mean[a] += probabilities[k] * moments.mean(k, a);
            }
        }
        double[] covariance = new double[assets * assets];
        for (int k = 0; k < probabilities.length; k++) {
            for (int a = 0; a < assets; a++) {
                for (int b = 0; b < assets; b++) {
                    double dispersion = (moments.mean(k, a) - mean[a]) * (moments.mean(k, b) - mean[b]);
                    covariance[a * assets + b] += probabilities[k] * (moments.covariance(k, a, b) + dispersion);
                }
            }
        }
        return new Forecast(assets, mean, covariance);
    }

    /** Expected simple return of the bar. */
    public double mean(int asset) {
        return mean[asset];
    }

    /** Covariance of the bar's simple returns. */
    public double covariance(int a, int b) {
        return covariance[a * assets + b];
    }

    /** Standard deviation of the bar's simple return. */
    public double volatility(int asset) {
        return Math.sqrt(covariance[asset * assets + asset]);
    }
}
