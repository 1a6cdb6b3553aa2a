package sojourn.regime;

/**
 * Parameters that are given, not estimated.
 *
 * @param model the model with those parameters
 */
public record GivenParameters(RegimeModel model) implements GaugeSettings {
    @Override
    public int leastObservations() {
        return 1;
    }

    @Override
    public Fit fit(FitRequest request, StartRunner runner) {
        return Fitter.given(model, request);
    }
}
