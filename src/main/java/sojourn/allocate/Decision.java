package sojourn.allocate;

import java.util.Optional;

/**
 * What a policy makes of one close.
 *
 * @param kind whether it decided, and whether it orders
 * @param target the weights decided on; empty exactly if there was no decision
 * @param next the stance to carry on with
 * @param because the reason
 * @param change whether the decision changed the rule's state
 */
public record Decision(Kind kind, Optional<Weights> target, Stance next, Because because, Change change) {
    /** What a close leads to. */
    public enum Kind {
        /** Nothing is decided at this close; weights drift. */
        NONE,
        /** A decision was due and the rule found no weights; nothing is ordered, weights drift. */
        UNDEFINED,
        /** A target is decided, and what is held is near enough to it. */
        KEEP,
        /** A target is decided and ordered. */
        ORDER
    }

    /** What a decision does to the state of a rule that has states. */
    public enum Change {
        /** The state stays, or the rule has none, or this is the first decision. */
        SAME,
        /** The state is another than at the decision before. */
        SWITCHED
    }

    /** No decision at this close. */
    public static Decision none(Stance next, Because because) {
        return new Decision(Kind.NONE, Optional.empty(), next, because, Change.SAME);
    }

    /** A decision was due and there are no weights to decide on. */
    public static Decision undefined(Stance next, Because because) {
        return new Decision(Kind.UNDEFINED, Optional.empty(), next, because, Change.SAME);
    }

    /** Decided, and near enough to leave things as they are. */
    public static Decision keep(Weights target, Stance next, Because because, Change change) {
        return new Decision(Kind.KEEP, Optional.of(target), next, because, change);
    }

    /** Decided and ordered. */
    public static Decision order(Weights target, Stance next, Because because, Change change) {
        return new Decision(Kind.ORDER, Optional.of(target), next, because, change);
    }
}
