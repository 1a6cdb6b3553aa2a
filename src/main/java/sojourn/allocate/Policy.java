package sojourn.allocate;

/**
 * Whatever decides at each close: a rule of the strategy file, or a yardstick. Implementations are pure: the decision depends on
 * the situation, the stance and what the policy was made with, so that any bar can be decided again.
 */
public interface Policy {
    /** The decision at the close of {@code situation.bar()}; called at every close, in order. */
    Decision at(Situation situation, Stance stance);
}
