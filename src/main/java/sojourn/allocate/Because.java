package sojourn.allocate;

/**
 * The reason for a decision. Kept as what it was decided from, because a comparison decides millions of times and puts few of its
 * reasons into words.
 */
@FunctionalInterface
public interface Because {
    /** One plain sentence, without a full stop: "stormy 0.81 rose above 0.70; it was 0.42 the bar before". */
    String sentence();

    /** A reason that needs no numbers. */
    static Because of(String sentence) {
        return new Plain(sentence);
    }

    /** A sentence as it stands. */
    record Plain(String sentence) implements Because {}
}
