package sojourn.walk;

import java.util.Optional;
import java.util.OptionalDouble;
import sojourn.market.GivenSource;
import sojourn.regime.Prior;
import sojourn.regime.VolatilityThresholdSettings;

/**
 * What the section {@code regimes} says that only some models have.
 *
 * @param threshold of the model volatility-threshold
 * @param penalty of the model jump
 * @param choose among which numbers of regimes each fit chooses, of the models hidden-markov and mixture
 * @param given the file of probabilities that were computed elsewhere, in place of a model
 * @param prior what is believed beforehand, of the model hidden-markov
 */
public record Particulars(
        Optional<VolatilityThresholdSettings> threshold,
        OptionalDouble penalty,
        Optional<StateChoice> choose,
        Optional<GivenSource> given,
        Optional<Prior> prior) {
    /** None of it. */
    public static final Particulars NONE = new Particulars(
            Optional.empty(), OptionalDouble.empty(), Optional.empty(), Optional.empty(), Optional.empty());

    /** Those of the model volatility-threshold. */
    public static Particulars threshold(VolatilityThresholdSettings threshold) {
        return new Particulars(
                Optional.of(threshold), OptionalDouble.empty(), Optional.empty(), Optional.empty(), Optional.empty());
    }

    /** Those of the model jump. */
    public static Particulars penalty(double penalty) {
        return new Particulars(
                Optional.empty(), OptionalDouble.of(penalty), Optional.empty(), Optional.empty(), Optional.empty());
    }

    /** The number of regimes is chosen at each fit. */
    public static Particulars choosing(StateChoice choose) {
        return new Particulars(
                Optional.empty(), OptionalDouble.empty(), Optional.of(choose), Optional.empty(), Optional.empty());
    }

    /** Probabilities come from a file. */
    public static Particulars given(GivenSource given) {
        return new Particulars(
                Optional.empty(), OptionalDouble.empty(), Optional.empty(), Optional.of(given), Optional.empty());
    }

    /** Something is believed beforehand. */
    public static Particulars prior(Prior prior) {
        return new Particulars(
                Optional.empty(), OptionalDouble.empty(), Optional.empty(), Optional.empty(), Optional.of(prior));
    }
}
