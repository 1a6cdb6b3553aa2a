package sojourn.allocate;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import sojourn.numeric.Check;

/**
 * How wanted weights become orders, whatever wanted them: when to decide, how long to stay, how far to step, what is allowed,
 * and what is too little to trade for.
 *
 * @param schedule the closes to decide at
 * @param stayAtLeast bars that a decided change of state is kept for, at least 1
 * @param stepToward the part of the way from held to wanted weights, in (0, 1]
 * @param limits what targets may be
 * @param noTradeBand nothing is traded while every weight is within this of its target, at least 0
 */
public record Pacing(Schedule schedule, int stayAtLeast, double stepToward, Limits limits, double noTradeBand) {
    /** Refuses numbers out of range. */
    public Pacing {
        Check.within(stayAtLeast, 1, Integer.MAX_VALUE, "stayAtLeast");
        Check.within(stepToward, Double.MIN_VALUE, 1, "stepToward");
        Check.atLeast(noTradeBand, 0, "noTradeBand");
    }

    /** A continuous rule has no states to stay in; the pointer is from {@code trade}. */
    public static List<Misfit> misfits(Rule rule, int stayAtLeast) {
        List<Misfit> misfits = new ArrayList<>();
        if (stayAtLeast > 1 && rule.motion() == Rule.Motion.CONTINUOUS) {
            misfits.add(new Misfit(
                    "/stay-at-least",
                    "stay-at-least " + stayAtLeast + " needs a rule that jumps between states, " + rule.word()
                            + " moves with the probabilities",
                    "remove it, or slow the rule by confirm, step-toward or no-trade-band"));
        }
        return misfits;
    }

    /** Whether this close is one to decide at. */
    public boolean decides(Situation situation) {
        return schedule.decides(situation.known());
    }

    /** The state a decision now may take: the lived one, or the decided one while that must still be kept. */
    int allowedState(Stance lived, int bar) {
        boolean mustStay = !lived.undecided()
                && lived.lived() != lived.decided()
                && lived.switchedOn() != Stance.NONE
                && bar - lived.switchedOn() < stayAtLeast;
        return mustStay ? lived.decided() : lived.lived();
    }

    /**
     * The decision for {@code wanted}: step, limits, band, order.
     *
     * @param state the state that wants these weights; any one number for policies without states
     */
    public Decision decide(Situation situation, Stance lived, int state, Weights wanted, Because because) {
        Weights held = situation.weights();
        Weights target = limits.bind(wanted.after(stepToward, held));
        Stance next = lived.deciding(state, wanted, situation.bar());
        Decision.Change change =
                !lived.undecided() && state != lived.decided() ? Decision.Change.SWITCHED : Decision.Change.SAME;
        Decision.Kind kind = target.strictlyOutside(noTradeBand, held) ? Decision.Kind.ORDER : Decision.Kind.KEEP;
        Optional<Weights> decided = target.equals(wanted) ? next.wanted() : Optional.of(target);
        return new Decision(kind, decided, next, because, change);
    }
}
