package sojourn.regime;

/**
 * A regime model with its parameters: where the chain of regimes starts, how it moves, and what is observed in each regime.
 * Immutable.
 */
public sealed interface RegimeModel permits HiddenMarkov, Mixture, OneRegime {
    /** Number of regimes. */
    int states();

    /** Probability that the first bar is in regime {@code k}, before its observation. */
    double initial(int k);

    /** Probability that regime {@code j} follows regime {@code i}. */
    double transition(int i, int j);

    /** What is observed in each regime. */
    Emission emission();

    /** Number of free parameters: of the chain, its start and the emission. */
    int parameterCount();

    /** The same model with its regimes in another order: regime k of the result is regime {@code order[k]} of this. */
    RegimeModel ordered(int[] order);
}
