package sojourn.walk;

import java.util.Optional;
import sojourn.regime.VolatilityThresholdSettings;

/**
 * What the section {@code regimes} says that only some models have.
 *
 * @param threshold of the model volatility-threshold
 */
public record Particulars(Optional<VolatilityThresholdSettings> threshold) {
    /** None of it. */
    public static final Particulars NONE = new Particulars(Optional.empty());
}
