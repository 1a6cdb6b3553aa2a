package sojourn.walk;

import java.util.Optional;
import java.util.OptionalDouble;
import sojourn.regime.VolatilityThresholdSettings;

/**
 * What the section {@code regimes} says that only some models have.
 *
 * @param threshold of the model volatility-threshold
 * @param penalty of the model jump
 */
public record Particulars(Optional<VolatilityThresholdSettings> threshold, OptionalDouble penalty) {
    /** None of it. */
    public static final Particulars NONE = new Particulars(Optional.empty(), OptionalDouble.empty());

    /** Those of the model volatility-threshold. */
    public static Particulars threshold(VolatilityThresholdSettings threshold) {
        return new Particulars(Optional.of(threshold), OptionalDouble.empty());
    }

    /** Those of the model jump. */
    public static Particulars penalty(double penalty) {
        return new Particulars(Optional.empty(), OptionalDouble.of(penalty));
    }
}
