package sojourn.evidence;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import sojourn.regime.EmissionFamily;
import sojourn.regime.ModelKind;
import sojourn.regime.RecentVolatility;
import sojourn.regime.VolatilityThresholdSettings;
import sojourn.walk.KnownAfter;
import sojourn.walk.LogRealisedVolatility;
import sojourn.walk.LogReturn;
import sojourn.walk.Observation;
import sojourn.walk.Particulars;
import sojourn.walk.RegimeSettings;
import sojourn.walk.SimpleReturn;

/** The gauges that a strategy's own is held against: every kind but its own, fitted by the same schedule; those
 * with a likelihood see the same, the others the volatility of the asset that orders the regimes. */
final class Rivals {
    private static final List<String> TWO = List.of("lower", "higher");

    /** Decay of the volatility that the threshold looks at. Common practice, no source. */
    private static final double DECAY = 0.94;
    /** It storms in the upper fifth of the window's volatilities, until they leave the upper two fifths. */
    private static final double STORM_ABOVE = 0.8;

    private static final double CALM_BELOW = 0.6;

    /** Bars of the volatility that the jump model looks at: a week of days. Our own choice, no source. */
    private static final int JUMP_BARS = 5;
    /** What a change of regime costs it, in squared deviations. Our own choice, no source. */
    private static final double PENALTY = 50;

    private Rivals() {}

    /** The section of each rival. */
    static List<RegimeSettings> of(RegimeSettings own) {
        List<RegimeSettings> rivals = new ArrayList<>();
        for (ModelKind kind : ModelKind.values()) {
            if (kind != own.model() && kind.hasLikelihood()) {
                rivals.add(new RegimeSettings(
                        kind, seen(own), states(kind, own), own.emission(), own.orderBy(), Optional.empty()));
            }
        }
        if (own.model() != ModelKind.VOLATILITY_THRESHOLD) {
            rivals.add(threshold(own));
        }
        if (own.model() != ModelKind.JUMP) {
            rivals.add(jump(own));
        }
        return List.copyOf(rivals);
    }

    /** What the strategy's own gauge sees; the asset's return where its probabilities were computed elsewhere. */
    private static List<Observation> seen(RegimeSettings own) {
        return own.given().isPresent() ? List.of(new LogReturn(own.orderedBy())) : own.observe();
    }

    /** As late as the strategy itself sees that asset. */
    private static Observation asKnown(RegimeSettings own, Observation observation) {
        int bars = own.barsLate(observation.asset());
        return bars == 0 ? observation : new KnownAfter(observation, bars);
    }

    /** Two regimes told by the recent volatility of the asset itself, as a desk without a model would. */
    private static RegimeSettings threshold(RegimeSettings own) {
        VolatilityThresholdSettings settings =
                new VolatilityThresholdSettings(new RecentVolatility.Exponential(DECAY), STORM_ABOVE, CALM_BELOW);
        return new RegimeSettings(
                ModelKind.VOLATILITY_THRESHOLD,
                List.of(asKnown(own, new SimpleReturn(own.orderedBy()))),
                TWO,
                EmissionFamily.NORMAL,
                Optional.empty(),
                Optional.of(own.orderedBy()),
                Optional.empty(),
                Particulars.threshold(settings));
    }

    /** The nearest of as many centres of the asset's recent volatility, which is slow to change its mind. */
    private static RegimeSettings jump(RegimeSettings own) {
        return new RegimeSettings(
                ModelKind.JUMP,
                List.of(asKnown(own, new LogRealisedVolatility(own.orderedBy(), JUMP_BARS))),
                states(ModelKind.JUMP, own),
                EmissionFamily.NORMAL,
                Optional.empty(),
                Optional.of(own.orderedBy()),
                Optional.empty(),
                Particulars.penalty(PENALTY));
    }

    /** As many regimes as the strategy's own, the most that it chooses among, two if it has but one. */
    private static List<String> states(ModelKind kind, RegimeSettings own) {
        if (kind == ModelKind.ONE_REGIME) {
            return List.of("any");
        }
        List<String> most = own.particulars()
                .choose()
                .map(choice -> choice.regimes().get(choice.regimes().size() - 1))
                .orElseGet(own::states);
        return most.size() > 1 ? most : TWO;
    }
}
