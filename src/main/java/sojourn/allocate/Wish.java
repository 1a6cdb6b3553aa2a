package sojourn.allocate;

/** What a rule makes of one close: {@link Weights}, or none, with the reason. */
public sealed interface Wish permits Weights, Wish.Undefined {
    /**
     * There are no weights to be had: a covariance that cannot be inverted, a formula that divided by nothing.
     *
     * @param because why
     */
    record Undefined(Because because) implements Wish {
        /** For a reason that stands as it is. */
        public static Undefined because(String sentence) {
            return new Undefined(Because.of(sentence));
        }
    }
}
