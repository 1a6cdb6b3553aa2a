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

    /** Why the stance after a close followed the one before, as one plain sentence without a full stop. */
    String sentence(Close close);

    /** A state in words. */
    String name(int state);
}
