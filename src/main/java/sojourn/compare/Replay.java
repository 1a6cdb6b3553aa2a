package sojourn.compare;

import java.util.List;
import java.util.Optional;
import sojourn.allocate.Because;
import sojourn.allocate.Decision;
import sojourn.allocate.Pacing;
import sojourn.allocate.Policy;
import sojourn.allocate.Situation;
import sojourn.allocate.Stance;
import sojourn.allocate.Weights;

/**
 * Decides what it is told, bar by bar, in a strategy's own manner of trading: its decision bars, steps, limits and band, and in cash
 * wherever the strategy stands aside. Told the strategy's own decisions, it trades as the strategy did, to the bit.
 */
final class Replay implements Policy {
    /** No decision of the rule falls on a bar. */
    static final int NOTHING = -1;

    private static final Because TOLD = Because.of("as it was told");

    private final Pacing pacing;
    private final Pacing aside;
    private final List<Wanted> choices;
    private final int firstBar;
    private final int[] chosen;

    /**
     * What is wanted at a decision.
     *
     * @param state of a rule that has states; any one number otherwise
     * @param weights empty where the rule found none
     */
    record Wanted(int state, Optional<Weights> weights) {}

    /** With the index of what is wanted on each bar from {@code firstBar} on, or {@link #NOTHING}. Takes over {@code chosen}. */
    Replay(Pacing pacing, List<Wanted> choices, int firstBar, int[] chosen) {
        this.pacing = pacing;
        this.aside = new Pacing(pacing.schedule(), 1, 1, pacing.limits(), 0);
        this.choices = choices;
        this.firstBar = firstBar;
        this.chosen = chosen;
    }

    @Override
    public Decision at(Situation situation, Stance stance) {
        int choice = chosen[situation.bar() - firstBar];
        if (choice == NOTHING) {
            return situation.reading().isEmpty() && pacing.decides(situation)
                    ? aside.decide(situation, stance, stance.decided(), cash(situation), TOLD)
                    : Decision.none(stance, TOLD);
        }
        Wanted wanted = choices.get(choice);
        if (wanted.weights().isEmpty()) {
            // on the first bar of all there must be a decision, so that all paths begin together
            return stance.undecided()
                    ? pacing.decide(situation, stance, wanted.state(), cash(situation), TOLD)
                    : Decision.none(stance, TOLD);
        }
        return pacing.decide(situation, stance, wanted.state(), wanted.weights().get(), TOLD);
    }

    private static Weights cash(Situation situation) {
        return Weights.none(situation.assets().size());
    }
}
