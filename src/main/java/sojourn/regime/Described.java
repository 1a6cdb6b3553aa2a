package sojourn.regime;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * A gauge with what a window says about its states: likelihood by the plain filter (minus infinity for a gauge without one), number
 * of observations, occupancy, volatility of the order-by series and moments of all assets, all weighted by how much each row
 * belongs to each state.
 */
record Described(
        Gauge gauge,
        double logLikelihood,
        int observations,
        StateWeights orderBy,
        WindowMoments moments,
        List<String> events) {
    /** Describes the model in the order in which it stands, by the window's smoothed probabilities. */
    static Described of(RegimeModel model, FitRequest request) {
        Smoothed smoothed = Smoothed.of(model, request.observations());
        return of(model, smoothed, smoothed.logLikelihood(), request);
    }

    /** Describes a gauge without a likelihood in the order in which it stands, by that membership of the window's rows. */
    static Described of(Gauge gauge, Membership membership, FitRequest request) {
        return of(gauge, membership, Double.NEGATIVE_INFINITY, request);
    }

    private static Described of(Gauge gauge, Membership membership, double logLikelihood, FitRequest request) {
        StateWeights weights = StateWeights.of(membership, request);
        List<String> events = new ArrayList<>();
        WindowMoments moments = PosteriorMoments.of(membership, request, events);
        int observations = request.observations().present();
        return new Described(gauge, logLikelihood, observations, weights, moments, List.copyOf(events));
    }

    /** Number of states. */
    int states() {
        return gauge.states();
    }

    /** The gauge, if it has a likelihood. */
    Optional<RegimeModel> model() {
        return gauge instanceof RegimeModel model ? Optional.of(model) : Optional.empty();
    }
}
