package sojourn.regime;

/**
 * A gauge with a likelihood: where the chain of regimes starts, how it moves, and what is observed in each regime. Immutable.
 */
public sealed interface RegimeModel extends Gauge permits HiddenMarkov, Mixture, OneRegime {
    /** Probability that the first bar is in regime {@code k}, before its observation. */
    double initial(int k);

    /** What is observed in each regime. */
    Emission emission();

    /** Number of free parameters: of the chain, its start and the emission. */
    int parameterCount();

    @Override
    RegimeModel ordered(int[] order);

    @Override
    default GaugeFilter filter() {
        return ModelFilter.before(this);
    }
}
