package sojourn.regime;

import java.util.ArrayList;
import java.util.List;

/**
 * A model with what a window says about its states: likelihood by the plain filter, occupancy, volatility of the order-by series
 * and moments of all assets, all weighted by the window's smoothed probabilities; and the number of observations.
 */
record Described(
        RegimeModel model,
        double logLikelihood,
        int observations,
        StateWeights orderBy,
        WindowMoments moments,
        List<String> events) {
    /** Describes the model in the order in which it stands. */
    static Described of(RegimeModel model, FitRequest request) {
        Smoothed smoothed = Smoothed.of(model, request.observations());
        StateWeights weights = StateWeights.of(smoothed, request);
        List<String> events = new ArrayList<>();
        WindowMoments moments = PosteriorMoments.of(smoothed, request, events);
        return new Described(
                model,
                smoothed.logLikelihood(),
                request.observations().present(),
                weights,
                moments,
                List.copyOf(events));
    }
}
