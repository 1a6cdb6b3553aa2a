package sojourn.compare;

import sojourn.allocate.Because;
import sojourn.allocate.Decision;
import sojourn.allocate.Policy;
import sojourn.allocate.Situation;
import sojourn.allocate.Stance;
import sojourn.allocate.Weights;

/**
 * Orders its weights at every close, even where they are held to the last bit: the order fills a bar later, when they have moved.
 */
final class ConstantMix implements Policy {
    private static final Because REBALANCES = Because.of("brought back to the constant mix");

    private final Weights weights;

    ConstantMix(Weights weights) {
        this.weights = weights;
    }

    @Override
    public Decision at(Situation situation, Stance stance) {
        return Decision.order(weights, stance, REBALANCES, Decision.Change.SAME);
    }
}
