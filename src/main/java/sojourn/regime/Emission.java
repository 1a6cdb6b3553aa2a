package sojourn.regime;

/** What observations look like in each regime. Immutable. */
public sealed interface Emission permits Normal, StudentT, MultivariateNormal {
    /** Number of regimes. */
    int states();

    /** Numbers an observation has. */
    int dimension();

    /**
     * Natural log of the density of row {@code row}, which is not missing, in regime {@code state}; of the numbers that are there
     * where some are missing.
     */
    double logDensity(Observations x, int row, int state);

    /** Mean of one column in one regime. */
    double mean(int state, int column);

    /** Standard deviation of one column in one regime. */
    double standardDeviation(int state, int column);

    /** Number of free parameters over all regimes. */
    int parameterCount();

    /** The same regimes in another order: regime k of the result is regime {@code order[k]} of this. Not modified. */
    Emission ordered(int[] order);
}
