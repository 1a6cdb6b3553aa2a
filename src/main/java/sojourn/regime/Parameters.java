package sojourn.regime;

/**
 * The parameters of a model of a standardised window in one flat vector, for the search: initial distribution (weights of a
 * mixture), transition matrix (absent for a mixture), means, variances.
 */
final class Parameters {
    private final ModelKind kind;
    private final int states;
    private final double[] vector;

    private Parameters(ModelKind kind, int states, double[] vector) {
        this.kind = kind;
        this.states = states;
        this.vector = vector;
    }

    /** All zero. */
    static Parameters blank(ModelKind kind, int states) {
        int transitions = kind == ModelKind.HIDDEN_MARKOV ? states * states : 0;
        return new Parameters(kind, states, new double[3 * states + transitions]);
    }

    Parameters copy() {
        return new Parameters(kind, states, vector.clone());
    }

    ModelKind kind() {
        return kind;
    }

    int states() {
        return states;
    }

    /** Number of entries. */
    int size() {
        return vector.length;
    }

    double at(int entry) {
        return vector[entry];
    }

    void set(int entry, double value) {
        vector[entry] = value;
    }

    /** The entry of the initial probability, or weight, of state {@code k}. */
    int initial(int k) {
        return k;
    }

    /** The entry of the probability that {@code j} follows {@code i}; hidden Markov only. */
    int transition(int i, int j) {
        return states + i * states + j;
    }

    /** The entry of the mean of state {@code k}. */
    int mean(int k) {
        return vector.length - 2 * states + k;
    }

    /** The entry of the variance of state {@code k}. */
    int variance(int k) {
        return vector.length - states + k;
    }

    /** The first entry that is not a probability. */
    int firstMean() {
        return vector.length - 2 * states;
    }

    /** The model in the unit of the observations. */
    RegimeModel toModel(Window window, EmissionFamily family) {
        double[] means = new double[states];
        double[] deviations = new double[states];
        double[] initial = new double[states];
        double[] transition = new double[states * states];
        for (int k = 0; k < states; k++) {
            means[k] = window.center() + window.scale() * vector[mean(k)];
            deviations[k] = window.scale() * Math.sqrt(vector[variance(k)]);
            initial[k] = vector[initial(k)];
        }
        Normal emission = family.estimatesMeans() ? Normal.of(means, deviations) : Normal.zeroMean(deviations);
        if (kind != ModelKind.HIDDEN_MARKOV) {
            return Mixture.of(initial, emission);
        }
        System.arraycopy(vector, states, transition, 0, states * states);
        return HiddenMarkov.of(initial, transition, emission);
    }
}
