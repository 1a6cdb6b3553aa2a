package sojourn.walk;

import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Optional;
import sojourn.document.Field;
import sojourn.document.Fields;
import sojourn.document.Refusal;
import sojourn.document.Shape;
import sojourn.document.Shapes;
import sojourn.regime.RecentVolatility;
import sojourn.regime.VolatilityThresholdSettings;

/** How a strategy file says of {@code model: volatility-threshold} what it measures and where it draws the line. */
final class ThresholdKeys {
    private static final String STORM_ABOVE_KEY = "storm-above";
    private static final String CALM_BELOW_KEY = "calm-below";

    private static final Field<RecentVolatility> VOLATILITY = Field.required(
            "volatility",
            volatility(),
            "what is measured at each close, that bar's return included, e.g. {ewma: 0.94}");
    private static final Field<Double> STORM_ABOVE = Field.required(
            STORM_ABOVE_KEY,
            Shapes.number().above(0).below(1),
            "quantile of the volatilities of the fit's window above which it storms, e.g. 0.8");
    private static final Field<Optional<Double>> CALM_BELOW = Field.maybe(
            CALM_BELOW_KEY,
            Shapes.number().above(0).below(1),
            "quantile at or below which it is calm again, e.g. 0.6; the same as storm-above if left out");

    static final Shape<VolatilityThresholdSettings> SHAPE = Shapes.<Written>object(
                    "threshold", Written::new, VOLATILITY, STORM_ABOVE, CALM_BELOW)
            .refuse(Written::crossed)
            .as(Written::settings);

    private ThresholdKeys() {}

    /** The keys as written, before it is known whether they go together. */
    private record Written(RecentVolatility volatility, double stormAbove, double calmBelow) {
        Written(Fields f) {
            this(f.get(VOLATILITY), f.get(STORM_ABOVE), f.get(CALM_BELOW).orElse(f.get(STORM_ABOVE)));
        }

        Optional<Refusal> crossed() {
            return calmBelow <= stormAbove
                    ? Optional.empty()
                    : Optional.of(new Refusal(
                            CALM_BELOW_KEY,
                            "calm-below " + calmBelow + " lies above storm-above " + stormAbove,
                            "the lower of the two is where it is calm again; swap them"));
        }

        VolatilityThresholdSettings settings() {
            return new VolatilityThresholdSettings(volatility, stormAbove, calmBelow);
        }
    }

    private static Shape<RecentVolatility> volatility() {
        Map<String, Shape<? extends RecentVolatility>> kinds = new LinkedHashMap<>();
        kinds.put(
                "rolling",
                Shapes.integer()
                        .atLeast(2)
                        .as(RecentVolatility.Rolling::new)
                        .described("standard deviation of the last so many observations, divisor one less"));
        kinds.put(
                "ewma",
                Shapes.number()
                        .above(0)
                        .below(1)
                        .as(RecentVolatility.Exponential::new)
                        .described(
                                "root of exponentially weighted squares, the last square weighing 1 less this decay"));
        return Shapes.oneKey(kinds);
    }
}
