package sojourn.regime;

import sojourn.numeric.Check;

/** A hidden Markov model. Source: Rabiner (1989), Proc. IEEE 77, 257-286. */
public final class HiddenMarkov implements RegimeModel {
    private static final double SUM_TOLERANCE = 1e-9;

    private final double[] initial;
    private final double[] transition;
    private final Emission emission;
    private final InitialDistribution start;

    private HiddenMarkov(double[] initial, double[] transition, Emission emission, InitialDistribution start) {
        this.start = start;
        this.initial = initial;
        this.transition = transition;
        this.emission = emission;
    }

    /**
     * A chain that starts in its long run: its initial distribution is that of its transition matrix, which must have just one.
     * Copies {@code transition}; not modified.
     *
     * @param transition as in {@link #of}
     */
    public static HiddenMarkov stationary(double[] transition, Emission emission) {
        int states = emission.states();
        Check.that(
                transition.length == states * states,
                transition.length + " transition probabilities for " + states + " states");
        double[] initial = LongRun.stationary(transition, states)
                .orElseThrow(
                        () -> new IllegalArgumentException("the chain has several closed classes, so no one long run"));
        HiddenMarkov free = of(initial, transition, emission);
        return new HiddenMarkov(free.initial, free.transition, emission, InitialDistribution.STATIONARY);
    }

    /**
     * A free initial distribution. Copies its arrays; neither modified.
     *
     * @param initial probability of each state at the first bar
     * @param transition states × states, row-major: probability of the next state (column) given this one (row)
     */
    public static HiddenMarkov of(double[] initial, double[] transition, Emission emission) {
        int states = emission.states();
        Check.that(
                initial.length == states && transition.length == states * states,
                initial.length + " initial and " + transition.length + " transition probabilities for " + states
                        + " states");
        checkDistribution(initial, 0, states, "initial distribution");
        for (int i = 0; i < states; i++) {
            checkDistribution(transition, i * states, states, "transition row " + i);
        }
        return new HiddenMarkov(initial.clone(), transition.clone(), emission, InitialDistribution.FREE);
    }

    /** Refuses unless the {@code length} entries from {@code start} are probabilities that sum to 1 within 1e-9. */
    static void checkDistribution(double[] values, int start, int length, String name) {
        double sum = 0;
        for (int k = 0; k < length; k++) {
            sum += Check.within(values[start + k], 0, 1, name, k);
        }
        if (!(StrictMath.abs(sum - 1) <= SUM_TOLERANCE)) {
            throw new IllegalArgumentException(name + " sums to " + sum + ", must sum to 1");
        }
    }

    /** Whether the initial distribution is free or that of the long run. */
    public InitialDistribution start() {
        return start;
    }

    @Override
    public int states() {
        return initial.length;
    }

    @Override
    public double initial(int k) {
        return initial[k];
    }

    @Override
    public double transition(int i, int j) {
        return transition[i * initial.length + j];
    }

    @Override
    public Emission emission() {
        return emission;
    }

    @Override
    public int parameterCount() {
        int states = initial.length;
        int initialParameters = start == InitialDistribution.FREE ? states - 1 : 0;
        return states * (states - 1) + initialParameters + emission.parameterCount();
    }

    @Override
    public HiddenMarkov ordered(int[] order) {
        return new HiddenMarkov(
                Order.apply(order, initial), Order.applyToSquare(order, transition), emission.ordered(order), start);
    }
}
