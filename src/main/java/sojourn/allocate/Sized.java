package sojourn.allocate;

import java.util.List;

/**
 * A {@link Sizing} rule at work. It has one state. With {@code confirm} above 1 the target moves only at decisions where the same
 * regime has been the most likely for that many closes running; until then the last one stands.
 */
record Sized(Sizing rule, List<String> regimes, Sizer sizer) implements Mechanism {
    private static final int ONLY_STATE = 0;

    @Override
    public Stance live(double[] probabilities, Stance before) {
        Stance most = MostLikely.live(probabilities, Integer.MAX_VALUE, before);
        return before.living(ONLY_STATE, most.candidate(), most.run());
    }

    @Override
    public Wish weights(Situation situation, double[] probabilities, int state, Stance lived) {
        return waits(lived) ? lived.wanted().orElseThrow() : sizer.weights(situation, probabilities, lived);
    }

    @Override
    public String sentence(Close close) {
        Stance lived = close.lived();
        return waits(lived)
                ? regimes.get(lived.candidate()) + " is the most likely regime for " + lived.run() + " of "
                        + rule.confirm() + " closes, the last target stands"
                : sizer.sentence(close);
    }

    @Override
    public String name(int state) {
        return rule.word();
    }

    private boolean waits(Stance lived) {
        return lived.run() < rule.confirm() && !lived.undecided();
    }
}
