package sojourn.regime;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import sojourn.numeric.Check;

/**
 * Takes from a window what given probabilities say of returns: moments of every asset in each regime, and how regimes followed one
 * another ({@link ForetoldTransitions}). Nothing is estimated, and the regimes keep their order; volatilities that do not ascend are an event.
 *
 * @param states number of regimes, 1 to 6
 */
public record GivenProbabilitiesSettings(int states) implements GaugeSettings {
    /** Refuses a number of regimes out of range. */
    public GivenProbabilitiesSettings {
        Check.within(states, 1, FitSettings.MOST_STATES, "states");
    }

    @Override
    public int leastObservations() {
        return 1;
    }

    @Override
    public Fit fit(FitRequest request, StartRunner runner) {
        Observations x = request.observations();
        Check.within(x.dimension(), states, states, "dimension of the observations");
        Optional<String> refusal = Fitter.nothingToDescribe(request);
        if (refusal.isPresent()) {
            return Fit.failed(refusal.get(), Fit.Search.NONE, x.present());
        }
        RowWeights weights = RowWeights.of(states, rows(x));
        ForetoldTransitions transitions = ForetoldTransitions.search(weights);
        Described described = Described.of(GivenProbabilities.of(states, transitions.matrix()), weights, request);
        List<String> events = new ArrayList<>(transitions.events());
        events.addAll(StateEvents.ofGauge(described, Optional.empty()));
        return Fit.of(
                Outcome.GIVEN,
                "the probabilities were given, computed elsewhere",
                Fit.Search.NONE,
                x.present(),
                described,
                events);
    }

    /** The probabilities at each row, those of the row before where there are none. */
    private double[] rows(Observations x) {
        double[] rows = new double[x.size() * states];
        GaugeFilter filter =
                GivenProbabilities.of(states, new double[states * states]).filter();
        for (int row = 0; row < x.size(); row++) {
            filter = filter.step(x, row);
            System.arraycopy(filter.probabilities(), 0, rows, row * states, states);
        }
        return rows;
    }
}
