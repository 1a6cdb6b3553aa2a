package sojourn.regime;

/**
 * The parameters of a model of a standardised window of several numbers a row, for the search: the chain, and a mean vector and a
 * covariance matrix a state.
 */
final class VectorParameters {
    /** Kind, initial distribution and transitions; its emissions stand idle. */
    private final Parameters chain;

    private final int dimension;
    private final double[] means;
    private final double[] covariances;

    VectorParameters(Parameters chain, int dimension, double[] means, double[] covariances) {
        this.chain = chain;
        this.dimension = dimension;
        this.means = means;
        this.covariances = covariances;
    }

    /** Everything 0 but the chain. */
    static VectorParameters blank(Parameters chain, int dimension) {
        int states = chain.states();
        return new VectorParameters(
                chain, dimension, new double[states * dimension], new double[states * dimension * dimension]);
    }

    VectorParameters copy() {
        return new VectorParameters(chain.copy(), dimension, means.clone(), covariances.clone());
    }

    /** The chain, which may be modified. */
    Parameters chain() {
        return chain;
    }

    int states() {
        return chain.states();
    }

    int dimension() {
        return dimension;
    }

    /** States × dimension, row-major; may be modified. */
    double[] means() {
        return means;
    }

    /** States × dimension × dimension; may be modified. */
    double[] covariances() {
        return covariances;
    }

    /** The model in the unit of the observations. */
    RegimeModel toModel(VectorWindow window, EmissionFamily family, InitialDistribution start) {
        int d = dimension;
        double[] m = new double[means.length];
        double[] s = new double[covariances.length];
        double[] deviations = new double[means.length];
        for (int e = 0; e < m.length; e++) {
            m[e] = window.center(e % d) + window.scale(e % d) * means[e];
            deviations[e] = window.scale(e % d) * Math.sqrt(covariances[e * d + e % d]);
        }
        for (int e = 0; e < s.length; e++) {
            s[e] = window.scale(e % d) * window.scale(e / d % d) * covariances[e];
        }
        Emission emission = family.form() == EmissionFamily.Form.NORMAL_DIAGONAL
                ? MultivariateNormal.diagonal(d, m, deviations)
                : MultivariateNormal.full(d, m, s);
        double[] initial = new double[states()];
        double[] transition = new double[states() * states()];
        for (int i = 0; i < states(); i++) {
            initial[i] = chain.at(chain.initial(i));
            for (int j = 0; chain.kind() == ModelKind.HIDDEN_MARKOV && j < states(); j++) {
                transition[i * states() + j] = chain.at(chain.transition(i, j));
            }
        }
        if (chain.kind() != ModelKind.HIDDEN_MARKOV) {
            return Mixture.of(initial, emission);
        }
        return start == InitialDistribution.STATIONARY
                ? HiddenMarkov.stationary(transition, emission)
                : HiddenMarkov.of(initial, transition, emission);
    }
}
