package sojourn.regime;

import java.util.OptionalDouble;

/** The filter of a model with a likelihood: {@link FilterState}, its model beside it. */
record ModelFilter(RegimeModel model, FilterState state, OptionalDouble lastLogDensity, boolean impossible)
        implements GaugeFilter {
    static ModelFilter before(RegimeModel model) {
        return new ModelFilter(model, FilterState.before(model), OptionalDouble.empty(), false);
    }

    @Override
    public ModelFilter step(Observations x, int row) {
        FilterState next = state.step(model, x, row);
        boolean impossible = next.lastLogDensity() == Double.NEGATIVE_INFINITY;
        boolean scored = !x.missing(row) && !impossible;
        OptionalDouble score = scored ? OptionalDouble.of(next.lastLogDensity()) : OptionalDouble.empty();
        return new ModelFilter(model, next, score, impossible);
    }

    @Override
    public double probability(int k) {
        return state.probability(k);
    }

    @Override
    public double[] probabilities() {
        return state.probabilities();
    }
}
