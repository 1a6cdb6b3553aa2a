package sojourn.allocate;

/** How a {@link Sizing} rule arrives at weights, names resolved. Pure. */
interface Sizer {
    /** The weights for this close, if there are any. {@code situation} has a reading; {@code probabilities} is not modified. */
    Wish weights(Situation situation, double[] probabilities, Stance lived);

    /** Why these weights. {@code probabilities} is not modified. */
    Because because(Situation situation, double[] probabilities, Stance lived);
}
