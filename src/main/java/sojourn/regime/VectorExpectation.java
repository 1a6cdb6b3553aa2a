package sojourn.regime;

import java.util.List;

/**
 * The expectation step of EM over one window of several numbers a row. A missing number counts with its mean given the others of
 * its row and the state; to its square and products the covariance that is left is added (Little and Rubin 2002, Statistical
 * Analysis with Missing Data, 2nd edition, 11.2). Has working arrays of its own: one object belongs to one start.
 */
final class VectorExpectation {
    private final VectorWindow window;
    private final int states;
    private final ChainPosterior posterior;
    private final double[] row;

    VectorExpectation(VectorWindow window, int states) {
        this.window = window;
        this.states = states;
        this.posterior = new ChainPosterior(window.size(), states);
        this.row = new double[window.dimension()];
    }

    /**
     * Fills {@code sums} for those parameters, log-likelihood included (of the standardised observations). False, with
     * {@code sums} of no use, when they make a row impossible.
     */
    boolean fill(VectorParameters p, VectorSums sums) {
        sums.clear();
        List<Pattern> patterns = window.patterns();
        Conditional[] seen = new Conditional[patterns.size() * states];
        for (int q = 0; q < patterns.size(); q++) {
            for (int k = 0; k < states; k++) {
                seen[q * states + k] = new Conditional(patterns.get(q), p, k);
            }
        }
        densities(seen);
        if (!posterior.fill(p.chain(), sums.chain)) {
            return false;
        }
        double[] weights = new double[seen.length];
        moments(seen, weights, sums);
        together(weights, sums);
        int square = window.dimension() * window.dimension();
        for (int e = 0; e < seen.length; e++) {
            seen[e].addRest(weights[e], sums.products, e % states * square, window.dimension());
        }
        if (p.chain().kind() != ModelKind.HIDDEN_MARKOV) {
            System.arraycopy(sums.count, 0, sums.chain.initial, 0, states);
        }
        return true;
    }

    private void densities(Conditional[] seen) {
        double[] values = window.values();
        double[] log = posterior.log();
        for (int t = 0; t < window.size(); t++) {
            int pattern = window.patternOf(t) * states;
            for (int k = 0; k < states; k++) {
                log[t * states + k] = seen[pattern + k].logDensity(values, t * window.dimension());
            }
        }
    }

    /** Sums of rows and products, the lower triangle only; {@code weights} gets the count of each pattern and state. */
    private void moments(Conditional[] seen, double[] weights, VectorSums sums) {
        int d = window.dimension();
        double[] values = window.values();
        double[] gamma = posterior.gamma();
        for (int t = 0; t < window.size(); t++) {
            Pattern pattern = window.patterns().get(window.patternOf(t));
            if (pattern.present().isEmpty()) {
                continue;
            }
            boolean complete = pattern.absent().isEmpty();
            System.arraycopy(values, t * d, row, 0, d);
            for (int k = 0; k < states; k++) {
                double g = gamma[t * states + k];
                int index = window.patternOf(t) * states + k;
                weights[index] += g;
                if (!complete) {
                    seen[index].complete(row);
                }
                add(g, k, sums);
            }
        }
    }

    /** How many rows of each state hold both numbers of a pair, not modified but for {@code sums}. */
    private void together(double[] weights, VectorSums sums) {
        int d = window.dimension();
        for (int e = 0; e < weights.length; e++) {
            Pattern pattern = window.patterns().get(e / states);
            for (int i : pattern.present()) {
                for (int j : pattern.present()) {
                    sums.together[((e % states) * d + i) * d + j] += weights[e];
                }
            }
        }
    }

    private void add(double g, int k, VectorSums sums) {
        int d = row.length;
        sums.count[k] += g;
        for (int i = 0; i < d; i++) {
            double weighted = g * row[i];
            sums.sum[k * d + i] += weighted;
            int line = (k * d + i) * d;
            for (int j = 0; j <= i; j++) {
                sums.products[line + j] += weighted * row[j];
            }
        }
    }
}
