package sojourn.allocate;

/** The most likely regime, and for how many closes running it has been that. */
final class MostLikely {
    private MostLikely() {}

    /** The index of the largest probability; the lowest of equals. */
    static int of(double[] probabilities) {
        int best = 0;
        for (int k = 1; k < probabilities.length; k++) {
            if (probabilities[k] > probabilities[best]) {
                best = k;
            }
        }
        return best;
    }

    /**
     * After one more close: the candidate is the most likely regime, its run is counted up to {@code confirm}, and it becomes the
     * lived state once confirmed. The very first one is taken at once: there is nothing it could be confirmed against.
     */
    static Stance live(double[] probabilities, int confirm, Stance before) {
        int label = of(probabilities);
        int run = label == before.candidate() ? Math.min(before.run() + 1, confirm) : 1;
        int lived = before.lived() == Stance.NONE || run >= confirm ? label : before.lived();
        return before.living(lived, label, run);
    }
}
