package sojourn.compare;

import sojourn.allocate.Because;
import sojourn.allocate.Decision;
import sojourn.allocate.Limits;
import sojourn.allocate.Pacing;
import sojourn.allocate.Policy;
import sojourn.allocate.Schedule;
import sojourn.allocate.Situation;
import sojourn.allocate.Stance;
import sojourn.allocate.Weights;

/** Brings its weights back at every close. */
final class ConstantMix implements Policy {
    private static final Because REBALANCES = Because.of("brought back to the constant mix");
    private static final int ONLY_STATE = 0;
    private static final double WIDE = 1e6;

    /** No limit, no band: whatever was held on average may be held. */
    static final Pacing EVERY_CLOSE = new Pacing(Schedule.AT_EVERY_CLOSE, 1, 1, new Limits(WIDE, -WIDE, WIDE), 0);

    private final Weights weights;

    ConstantMix(Weights weights) {
        this.weights = weights;
    }

    @Override
    public Decision at(Situation situation, Stance stance) {
        return EVERY_CLOSE.decide(situation, stance, ONLY_STATE, weights, REBALANCES);
    }
}
