package sojourn.regime;

/**
 * The maximisation step of EM: the parameters that the expected sums make most likely (Rabiner 1989, Proc. IEEE 77, III.C), with
 * a floor under the variances, relative to the window's own variance, that keeps a state from closing in on a single value.
 * A state without weight keeps its parameters.
 */
final class Maximisation {
    /** Floor of a state's variance as a fraction of the window's variance. */
    static final double FLOOR = 1e-4;

    private final EmissionFamily family;

    Maximisation(EmissionFamily family) {
        this.family = family;
    }

    /** The next parameters. Neither argument is modified. */
    Parameters next(Parameters old, ExpectedSums sums) {
        Parameters next = old.copy();
        int states = old.states();
        double total = 0;
        for (int k = 0; k < states; k++) {
            total += sums.initial[k];
        }
        for (int k = 0; k < states; k++) {
            next.set(next.initial(k), sums.initial[k] / total);
            emission(next, sums, k);
        }
        for (int i = 0; old.kind() == ModelKind.HIDDEN_MARKOV && i < states; i++) {
            row(next, sums, i);
        }
        return next;
    }

    private void emission(Parameters next, ExpectedSums sums, int k) {
        double n = sums.count[k];
        if (!(n > 0)) {
            return;
        }
        double mean = family.estimatesMeans() ? sums.sum[k] / n : 0;
        double square = sums.squares[k] / n - mean * mean;
        next.set(next.mean(k), mean);
        next.set(next.variance(k), Math.max(FLOOR, square));
    }

    private static void row(Parameters next, ExpectedSums sums, int i) {
        int states = next.states();
        double total = 0;
        for (int j = 0; j < states; j++) {
            total += sums.transitions[i * states + j];
        }
        for (int j = 0; total > 0 && j < states; j++) {
            next.set(next.transition(i, j), sums.transitions[i * states + j] / total);
        }
    }
}
