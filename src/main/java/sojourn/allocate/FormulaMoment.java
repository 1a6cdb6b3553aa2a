package sojourn.allocate;

import java.util.Optional;
import sojourn.walk.Forecast;

/** What a formula may ask about at one close; the forecast is made when it is first asked for. */
final class FormulaMoment {
    private final Formula rule;
    private final Situation situation;
    private final double[] probabilities;
    private final Stance lived;
    private Optional<Forecast> forecast = Optional.empty();

    /** {@code probabilities} is not modified. */
    FormulaMoment(Formula rule, Situation situation, double[] probabilities, Stance lived) {
        this.rule = rule;
        this.situation = situation;
        this.probabilities = probabilities;
        this.lived = lived;
    }

    Situation situation() {
        return situation;
    }

    double probability(int regime) {
        return probabilities[regime];
    }

    int mostLikely() {
        return MostLikely.of(probabilities);
    }

    /** Closes running, this one included, that the most likely regime has been it. */
    int barsInRegime() {
        return lived.run();
    }

    Forecast forecast() {
        if (forecast.isEmpty()) {
            forecast = Optional.of(rule.forecast(situation, probabilities));
        }
        return forecast.get();
    }
}
