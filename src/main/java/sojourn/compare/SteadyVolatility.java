package sojourn.compare;

import java.util.OptionalDouble;
import sojourn.allocate.Because;
import sojourn.allocate.Decision;
import sojourn.allocate.Limits;
import sojourn.allocate.Pacing;
import sojourn.allocate.Policy;
import sojourn.allocate.Situation;
import sojourn.allocate.Stance;
import sojourn.allocate.Weights;

/**
 * As much of a mix as brings its volatility of the last 21 bars to its volatility over all bars so far: w = min(c, so far / recent)
 * m, with c the largest scale that the limits allow. No regimes: what sizing by recent volatility alone comes to. The cap where
 * recent volatility is 0; the mix itself, within the cap, while there is no volatility yet.
 */
final class SteadyVolatility implements Policy {
    private static final Because SCALED = Because.of("the mix scaled to its own volatility so far");
    private static final int ONLY_STATE = 0;

    private final Weights mix;
    private final Pacing pacing;
    private final TrailingVolatility volatility;
    private final double most;

    /** Of a mix that is long and not empty. */
    SteadyVolatility(Weights mix, Pacing pacing, TrailingVolatility volatility) {
        this.mix = mix;
        this.pacing = pacing;
        this.volatility = volatility;
        this.most = most(mix, pacing.limits());
    }

    private static double most(Weights mix, Limits limits) {
        double most = limits.gross() / mix.gross();
        for (int asset = 0; asset < mix.size(); asset++) {
            most = mix.at(asset) > 0 ? Math.min(most, limits.high() / mix.at(asset)) : most;
        }
        return most;
    }

    @Override
    public Decision at(Situation situation, Stance stance) {
        if (!pacing.decides(situation)) {
            return Decision.none(stance, SCALED);
        }
        double scale = scale(situation.bar());
        Weights wanted = Weights.each(mix.size(), asset -> scale * mix.at(asset));
        return pacing.decide(situation, stance, ONLY_STATE, wanted, SCALED);
    }

    private double scale(int bar) {
        OptionalDouble recent = volatility.recent(bar);
        OptionalDouble level = volatility.soFar(bar);
        if (recent.isEmpty() || level.isEmpty()) {
            return Math.min(most, 1);
        }
        // dividing first could overflow, so the cap is asked for first
        return recent.getAsDouble() * most <= level.getAsDouble() ? most : level.getAsDouble() / recent.getAsDouble();
    }
}
