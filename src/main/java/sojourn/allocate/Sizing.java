package sojourn.allocate;

import java.util.Map;
import java.util.Optional;
import sojourn.walk.Forecast;
import sojourn.walk.Reading;

/** A rule that works weights out at every decision, from forecasts say, rather than choosing among stated ones. */
public sealed interface Sizing extends Rule permits VolatilityTarget, Choosing, Formula {
    /** What it shares with every rule. */
    Manner manner();

    @Override
    default ProbabilityKind probability() {
        return manner().probability();
    }

    @Override
    default Optional<Smoothing> smooth() {
        return manner().smooth();
    }

    @Override
    default int confirm() {
        return manner().confirm();
    }

    @Override
    default double stepToward() {
        return manner().stepToward();
    }

    /** None, unless it scales a mix that is stated. */
    @Override
    default Map<String, Map<String, Double>> statedWeights() {
        return Map.of();
    }

    @Override
    default Motion motion() {
        return Motion.CONTINUOUS;
    }

    /**
     * Moments of the first whole bar that an order decided now would be held for, regimes mixed by probabilities carried forward
     * to that bar. {@code probabilities} are of this rule's kind, smoothed if it smooths. Not modified.
     */
    default Forecast forecast(Situation situation, double[] probabilities) {
        return forecast(situation.reading().orElseThrow(), situation.barsAhead(), probabilities);
    }

    /** The same by another reading, {@code barsAhead} bars from its close. */
    default Forecast forecast(Reading reading, int barsAhead, double[] probabilities) {
        return reading.forecast(probabilities, barsAhead - probability().barsAhead());
    }
}
