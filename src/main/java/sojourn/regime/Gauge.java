package sojourn.regime;

/**
 * A gauge of what regime a series is in, with its parameters: whatever can be in force between two fits. It starts a filter, which
 * says at each bar how probable each regime is, and it says how regimes follow one another. Immutable.
 */
public sealed interface Gauge permits RegimeModel, VolatilityThreshold, Jump, GivenProbabilities {
    /** Number of regimes. */
    int states();

    /** Probability that regime {@code j} follows regime {@code i}. */
    double transition(int i, int j);

    /** The same gauge with its regimes in another order: regime k of the result is regime {@code order[k]} of this. Not modified. */
    Gauge ordered(int[] order);

    /** Its filter before any bar. */
    GaugeFilter filter();

    /** Its filter after all rows of {@code x}. */
    default GaugeFilter filterAfter(Observations x) {
        GaugeFilter filter = filter();
        for (int row = 0; row < x.size(); row++) {
            filter = filter.step(x, row);
        }
        return filter;
    }
}
