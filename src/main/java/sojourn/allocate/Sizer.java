package sojourn.allocate;

/** How a {@link Sizing} rule arrives at weights, names resolved. Pure. */
interface Sizer {
    /** The weights for this close, if there are any. {@code situation} has a reading; {@code probabilities} is not modified. */
    Wish weights(Situation situation, double[] probabilities, Stance lived);

    /** The weights for a close. */
    default Wish weights(Close close) {
        return weights(close.situation(), close.probabilities(), close.lived());
    }

    /** Why these weights, as one plain sentence without a full stop. */
    String sentence(Close close);
}
