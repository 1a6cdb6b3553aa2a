package sojourn.regime;

/**
 * The parameters of a model of a standardised window in one flat vector, for the search: initial distribution (weights of a
 * mixture), transition matrix (absent for a mixture), means, variances (of Student-t the squared scales), and for Student-t the
 * degrees of freedom.
 */
final class Parameters {
    private final ModelKind kind;
    private final int states;
    private final Tails tails;
    private final double[] vector;

    /** Whether there are degrees of freedom. */
    private enum Tails {
        NORMAL,
        FAT
    }

    private Parameters(ModelKind kind, int states, Tails tails, double[] vector) {
        this.kind = kind;
        this.states = states;
        this.tails = tails;
        this.vector = vector;
    }

    /** All zero, for normal emissions. */
    static Parameters blank(ModelKind kind, int states) {
        return blank(kind, states, EmissionFamily.NORMAL);
    }

    /** All zero. */
    static Parameters blank(ModelKind kind, int states, EmissionFamily family) {
        int transitions = kind == ModelKind.HIDDEN_MARKOV ? states * states : 0;
        int emissions = family.fatTailed() ? 3 * states : 2 * states;
        Tails tails = family.fatTailed() ? Tails.FAT : Tails.NORMAL;
        return new Parameters(kind, states, tails, new double[states + transitions + emissions]);
    }

    Parameters copy() {
        return new Parameters(kind, states, tails, vector.clone());
    }

    /** The same model with its states in another order: state k of the result is state {@code order[k]} of this. Not modified. */
    Parameters ordered(int[] order) {
        Parameters result = copy();
        for (int k = 0; k < states; k++) {
            result.set(initial(k), at(initial(order[k])));
            for (int e = firstMean(); e < size(); e += states) {
                result.set(e + k, at(e + order[k]));
            }
            for (int j = 0; kind == ModelKind.HIDDEN_MARKOV && j < states; j++) {
                result.set(transition(k, j), at(transition(order[k], order[j])));
            }
        }
        return result;
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
        return firstMean() + k;
    }

    /** The entry of the variance of state {@code k}. */
    int variance(int k) {
        return firstMean() + states + k;
    }

    /** The entry of the degrees of freedom of state {@code k}; Student-t only. */
    int degreesOfFreedom(int k) {
        return firstMean() + 2 * states + k;
    }

    /** The first entry that is not a probability. */
    int firstMean() {
        return vector.length - (tails == Tails.FAT ? 3 : 2) * states;
    }

    /** The model in the unit of the observations, its initial distribution free. */
    RegimeModel toModel(Window window, EmissionFamily family) {
        return toModel(window, family, InitialDistribution.FREE);
    }

    /** The model in the unit of the observations. */
    RegimeModel toModel(Window window, EmissionFamily family, InitialDistribution start) {
        double[] means = new double[states];
        double[] deviations = new double[states];
        double[] degreesOfFreedom = new double[states];
        double[] initial = new double[states];
        double[] transition = new double[states * states];
        for (int k = 0; k < states; k++) {
            means[k] = window.center() + window.scale() * vector[mean(k)];
            deviations[k] = window.scale() * Math.sqrt(vector[variance(k)]);
            degreesOfFreedom[k] = tails == Tails.FAT ? vector[degreesOfFreedom(k)] : 0;
            initial[k] = vector[initial(k)];
        }
        Emission emission = family.emission(means, deviations, degreesOfFreedom);
        if (kind != ModelKind.HIDDEN_MARKOV) {
            return Mixture.of(initial, emission);
        }
        System.arraycopy(vector, states, transition, 0, states * states);
        return start == InitialDistribution.STATIONARY
                ? HiddenMarkov.stationary(transition, emission)
                : HiddenMarkov.of(initial, transition, emission);
    }
}
