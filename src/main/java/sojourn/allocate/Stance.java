package sojourn.allocate;

import java.util.Optional;

/**
 * What a policy remembers from one close to the next. States are numbers that the rule gives meaning to (a regime, or in and out);
 * {@link #NONE} is none yet.
 *
 * @param lived the state that confirmation and hysteresis have led to, close by close
 * @param candidate the state that {@code run} counts for
 * @param run closes running that spoke for {@code candidate}
 * @param decided the state behind the last decision
 * @param switchedOn the bar at which a decision last changed the state; {@link #NONE} before that
 * @param wanted the rule's own weights at the last decision, before steps and limits; empty before the first decision
 * @param trailing the probabilities averaged so far; empty for a rule that does not smooth them, and before the first reading
 */
public record Stance(
        int lived,
        int candidate,
        int run,
        int decided,
        int switchedOn,
        Optional<Weights> wanted,
        Optional<Trailing> trailing) {
    /** No state, no bar. */
    public static final int NONE = -1;

    private static final Stance FIRST = new Stance(NONE, NONE, 0, NONE, NONE, Optional.empty(), Optional.empty());

    /** Nothing seen, nothing decided. */
    public static Stance first() {
        return FIRST;
    }

    /** Whether no decision has been taken yet. */
    public boolean undecided() {
        return wanted.isEmpty();
    }

    /** After one more close, for a rule that smooths its probabilities. */
    Stance averaging(Trailing average) {
        return new Stance(lived, candidate, run, decided, switchedOn, wanted, Optional.of(average));
    }

    /** After one more close. */
    Stance living(int state, int forState, int closes) {
        return state == lived && forState == candidate && closes == run
                ? this
                : new Stance(state, forState, closes, decided, switchedOn, wanted, trailing);
    }

    /** After a decision at {@code bar} for {@code state}. The first decision switches nothing. */
    Stance deciding(int state, Weights weights, int bar) {
        boolean switches = !undecided() && state != decided;
        int switched = switches ? bar : switchedOn;
        return state == decided && wanted.isPresent() && wanted.get().equals(weights)
                ? this
                : new Stance(lived, candidate, run, state, switched, Optional.of(weights), trailing);
    }
}
