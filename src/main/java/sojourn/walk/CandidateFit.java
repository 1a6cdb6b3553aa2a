package sojourn.walk;

import java.util.List;
import java.util.OptionalDouble;
import sojourn.regime.Fit;
import sojourn.regime.InformationCriterion;
import sojourn.regime.RegimeModel;

/**
 * One number of regimes as it stood at one fit; where there is no choice, the only one.
 *
 * @param regimes the names of its regimes, from lowest to highest volatility
 * @param fit of that number, accepted or refused
 * @param scores its total log score since the first accepted fit of each candidate, in the order of the candidates; 0 while one of
 *     the two has none
 * @param compared the total log score that was compared at this fit; empty where none was
 */
public record CandidateFit(List<String> regimes, Fit fit, List<Double> scores, OptionalDouble compared) {
    /** Copies its lists. */
    public CandidateFit {
        regimes = List.copyOf(regimes);
        scores = List.copyOf(scores);
    }

    /** The information criterion of Bayes on the window, the smaller the better; empty for a refused fit. */
    public OptionalDouble bic() {
        if (!fit.outcome().accepted() || fit.model().isEmpty()) {
            return OptionalDouble.empty();
        }
        RegimeModel model = fit.model().get();
        return OptionalDouble.of(
                InformationCriterion.BAYES.of(fit.logLikelihood(), model.parameterCount(), fit.observations()));
    }
}
