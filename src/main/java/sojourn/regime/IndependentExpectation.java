package sojourn.regime;

/** The expectation step of an independent mixture: g_t(k) = w_k f_k(z_t) / sum_j w_j f_j(z_t); missing rows count for nothing. */
final class IndependentExpectation implements Expectation {
    private static final double LEAST = 1e-250;

    private final int states;
    private final Window window;
    private final Densities densities;
    private final double[] b;

    IndependentExpectation(int states, Window window) {
        this.states = states;
        this.window = window;
        this.densities = new Densities(states, window);
        this.b = new double[window.size() * states];
    }

    @Override
    public boolean fill(Parameters p, ExpectedSums sums) {
        sums.clear();
        double shift = densities.fill(p, b);
        double logs = 0;
        double product = 1;
        for (int t = 0; t < window.size(); t++) {
            if (window.present()[t] == 0) {
                continue;
            }
            double total = row(p, sums, t);
            if (!(total > LEAST)) {
                return false;
            }
            product *= total;
            if (product < 1e-50) { // one logarithm for many rows
                logs += StrictMath.log(product);
                product = 1;
            }
        }
        sums.logLikelihood = shift + logs + StrictMath.log(product);
        for (int k = 0; k < states; k++) {
            sums.initial[k] = sums.count[k] / window.count();
        }
        return true;
    }

    private double row(Parameters p, ExpectedSums sums, int t) {
        double total = 0;
        for (int k = 0; k < states; k++) {
            total += p.at(k) * b[t * states + k];
        }
        double z = window.values()[t];
        for (int k = 0; k < states; k++) {
            double g = p.at(k) * b[t * states + k] / total;
            sums.count[k] += g;
            sums.sum[k] += g * z;
            sums.squares[k] += g * z * z;
        }
        return total;
    }
}
