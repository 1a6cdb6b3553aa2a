package sojourn.allocate;

/**
 * A rule at work: two pure steps, one at every close and one at decisions. Made by {@link Rule#mechanism}.
 */
public interface Mechanism {
    /** Which state this close leads to, by the rule's confirmation and hysteresis; at every close, decision or not. */
    Stance live(double[] probabilities, Stance before);

    /**
     * The weights wanted in {@code state}, if there are any. {@code lived} is the stance after this close.
     *
     * @param situation has a reading; {@code probabilities} are taken from it
     */
    Wish weights(Situation situation, double[] probabilities, int state, Stance lived);

    /** Why {@code lived} followed {@code before}. */
    Because because(Situation situation, double[] probabilities, Stance before, Stance lived);

    /** A state in words. */
    String name(int state);
}
