package sojourn.regime;

import java.util.OptionalDouble;

/** The filter of a model with a likelihood: {@link FilterState}, its model beside it. */
record ModelFilter(RegimeModel model, FilterState state, OptionalDouble lastLogDensity) implements GaugeFilter {
    static ModelFilter before(RegimeModel model) {
        return new ModelFilter(model, FilterState.before(model), OptionalDouble.empty());
    }

    @Override
    public ModelFilter step(Observations x, int row) {
        FilterState next = state.step(model, x, row);
        boolean scored = !x.missing(row) && Double.isFinite(next.lastLogDensity());
        return new ModelFilter(model, next, scored ? OptionalDouble.of(next.lastLogDensity()) : OptionalDouble.empty());
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
