package sojourn.allocate;

/** Orders its weights at the first close it is asked about, and never decides again: what doing nothing means. */
public final class HoldFromStart implements Policy {
    private static final int ONLY_STATE = 0;
    private static final Because BUYS = Because.of("bought once, to be held");
    private static final Because HOLDS = Because.of("holds what was bought");

    private final Weights weights;

    /** Of weights that nothing limits further. */
    public HoldFromStart(Weights weights) {
        this.weights = weights;
    }

    @Override
    public Decision at(Situation situation, Stance stance) {
        if (!stance.undecided()) {
            return Decision.none(stance, HOLDS);
        }
        Stance next = stance.deciding(ONLY_STATE, weights, situation.bar());
        return weights.strictlyOutside(0, situation.weights())
                ? Decision.order(weights, next, BUYS, Decision.Change.SAME)
                : Decision.keep(weights, next, BUYS, Decision.Change.SAME);
    }
}
