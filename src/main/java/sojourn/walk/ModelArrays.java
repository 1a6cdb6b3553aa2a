package sojourn.walk;

import java.util.List;
import sojourn.regime.Gauge;
import sojourn.regime.WindowMoments;

/**
 * A fit's numbers laid out for all regimes of its timeline, as readings hold them. A regime that the chosen number has none of has
 * probability 0, leads to itself if ever it were left, and has the moments of the whole window.
 */
final class ModelArrays {
    private ModelArrays() {}

    /** Probabilities of the fit's own states, spread over all regimes. Not modified. */
    static double[] spread(FitRecord record, double[] probabilities, List<String> regimes) {
        double[] spread = new double[regimes.size()];
        for (int k = 0; k < probabilities.length; k++) {
            spread[regimes.indexOf(record.regimes().get(k))] = probabilities[k];
        }
        return spread;
    }

    /** Transition probabilities of an accepted fit, row-major. */
    static double[] transition(FitRecord record, List<String> regimes) {
        Gauge gauge = record.fit().gauge().orElseThrow();
        int states = regimes.size();
        double[] flat = new double[states * states];
        for (int i = 0; i < states; i++) {
            int from = record.regimes().indexOf(regimes.get(i));
            for (int j = 0; j < states; j++) {
                int to = record.regimes().indexOf(regimes.get(j));
                boolean both = from >= 0 && to >= 0;
                flat[i * states + j] = both ? gauge.transition(from, to) : i == j ? 1 : 0;
            }
        }
        return flat;
    }

    /** Moments of an accepted fit. */
    static WindowMoments moments(FitRecord record, List<String> regimes) {
        WindowMoments own = record.fit().moments().orElseThrow();
        if (record.regimes().equals(regimes)) {
            return own;
        }
        double[] shares = new double[own.states()];
        for (int k = 0; k < shares.length; k++) {
            shares[k] = own.share(k);
        }
        Forecast whole = Forecast.mixing(shares, own);
        int assets = own.assets();
        double[] means = new double[regimes.size() * assets];
        double[] covariances = new double[means.length * assets];
        for (int k = 0; k < regimes.size(); k++) {
            int state = record.regimes().indexOf(regimes.get(k));
            for (int a = 0; a < assets; a++) {
                means[k * assets + a] = state < 0 ? whole.mean(a) : own.mean(state, a);
                for (int b = 0; b < assets; b++) {
                    covariances[(k * assets + a) * assets + b] =
                            state < 0 ? whole.covariance(a, b) : own.covariance(state, a, b);
                }
            }
        }
        return WindowMoments.of(regimes.size(), assets, spread(record, shares, regimes), means, covariances);
    }
}
