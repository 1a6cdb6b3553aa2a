package sojourn.allocate;

/**
 * The reason for a decision. Kept as the numbers behind it, because a comparison decides millions of times and puts few of its
 * reasons into words.
 */
@FunctionalInterface
public interface Because {
    /** One plain sentence, without a full stop: "stormy 0.81 rose to or above 0.70". */
    String sentence();

    /** A reason that needs no numbers. */
    static Because of(String sentence) {
        return new Plain(sentence);
    }

    /** This reason, and after a semicolon a second one. */
    default Because and(String more) {
        return new Twofold(this, more);
    }

    /** A sentence as it stands. */
    record Plain(String sentence) implements Because {}

    /** Two reasons. */
    record Twofold(Because first, String second) implements Because {
        @Override
        public String sentence() {
            return first.sentence() + "; " + second;
        }
    }
}
