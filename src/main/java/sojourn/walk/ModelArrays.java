package sojourn.walk;

import java.util.Arrays;
import sojourn.regime.Gauge;
import sojourn.regime.WindowMoments;

/** A fit's parameters laid out flat, as readings hold them. */
final class ModelArrays {
    private ModelArrays() {}

    /** Transition probabilities of an accepted fit, row-major. */
    static double[] transition(FitRecord record) {
        Gauge gauge = record.fit().gauge().orElseThrow();
        int states = gauge.states();
        double[] flat = new double[states * states];
        for (int i = 0; i < states; i++) {
            for (int j = 0; j < states; j++) {
                flat[i * states + j] = gauge.transition(i, j);
            }
        }
        return flat;
    }

    /** The same covariances, every mean set to {@code mean}. */
    static WindowMoments withMeans(WindowMoments moments, double mean) {
        int states = moments.states();
        int assets = moments.assets();
        double[] means = new double[states * assets];
        Arrays.fill(means, mean);
        double[] covariances = new double[states * assets * assets];
        for (int k = 0; k < states; k++) {
            for (int a = 0; a < assets; a++) {
                for (int b = 0; b < assets; b++) {
                    covariances[(k * assets + a) * assets + b] = moments.covariance(k, a, b);
                }
            }
        }
        double[] shares = new double[states];
        Arrays.setAll(shares, moments::share);
        return WindowMoments.of(states, assets, shares, means, covariances);
    }
}
