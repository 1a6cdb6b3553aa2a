package sojourn.regime;

/**
 * The expectation step as written in the textbook, on the published filter and smoother: slow, but at home where densities
 * underflow. It serves when a fast one gives up, and is the yardstick of the fast ones in tests.
 */
final class PlainExpectation implements Expectation {
    private final Window window;
    private final EmissionFamily family;
    private final Observations standardised;

    PlainExpectation(Window window, EmissionFamily family) {
        this.window = window;
        this.family = family;
        boolean[] missing = new boolean[window.size()];
        for (int t = 0; t < missing.length; t++) {
            missing[t] = window.present()[t] == 0;
        }
        this.standardised = Observations.of(1, window.values(), missing);
    }

    @Override
    public boolean fill(Parameters p, ExpectedSums sums) {
        sums.clear();
        RegimeModel model = p.toModel(Window.UNIT, family);
        Smoothed smoothed = Smoothed.of(model, standardised);
        int states = p.states();
        for (int t = 0; t < window.size(); t++) {
            double z = window.values()[t];
            for (int k = 0; k < states; k++) {
                double g = smoothed.at(t, k) * window.present()[t];
                sums.count[k] += g;
                if (model.emission() instanceof StudentT student && g > 0) {
                    double u = student.weight(standardised, t, k);
                    sums.weights[k] += g * u;
                    sums.logWeights[k] += g * (StrictMath.log(u) - u);
                    g *= u;
                }
                sums.sum[k] += g * z;
                sums.squares[k] += g * z * z;
            }
        }
        for (int i = 0; i < states; i++) {
            sums.initial[i] = p.kind() == ModelKind.HIDDEN_MARKOV ? smoothed.at(0, i) : sums.count[i] / window.count();
            for (int j = 0; j < states; j++) {
                sums.transitions[i * states + j] = smoothed.expectedTransitions(i, j);
            }
        }
        sums.logLikelihood = smoothed.logLikelihood();
        return sums.logLikelihood > Double.NEGATIVE_INFINITY;
    }
}
