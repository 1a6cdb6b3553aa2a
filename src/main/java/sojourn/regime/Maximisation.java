package sojourn.regime;

import java.util.Optional;

/**
 * The maximisation step of EM: the parameters that the expected sums make most likely (Rabiner 1989, Proc. IEEE 77, III.C), with
 * a floor under the variances, relative to the window's own variance, that keeps a state from closing in on a single value.
 * With a prior, the parameters that the sums and the prior together make most likely. A state without weight keeps its parameters.
 */
final class Maximisation {
    /** Floor of a state's variance as a fraction of the window's variance. */
    static final double FLOOR = 1e-4;

    private final EmissionFamily family;
    private final InitialDistribution initial;
    private final Optional<PriorDensity> prior;

    /** For a free initial distribution. */
    Maximisation(EmissionFamily family) {
        this(family, InitialDistribution.FREE);
    }

    Maximisation(EmissionFamily family, InitialDistribution initial) {
        this(family, initial, Optional.empty());
    }

    /** With a prior: for a chain with normal emissions, each state with a variance of its own. */
    Maximisation(EmissionFamily family, InitialDistribution initial, Optional<PriorDensity> prior) {
        this.family = family;
        this.initial = initial;
        this.prior = prior;
    }

    /** The next parameters. Neither argument is modified. */
    Parameters next(Parameters old, ExpectedSums expected) {
        ExpectedSums sums = prior.isPresent() ? prior.get().added(expected) : expected;
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
        if (family.form() == EmissionFamily.Form.NORMAL_TIED) {
            tie(next, sums);
        }
        if (old.kind() == ModelKind.HIDDEN_MARKOV && initial == InitialDistribution.STATIONARY) {
            StationaryStart.raise(next, old, sums);
        }
        return next;
    }

    private void emission(Parameters next, ExpectedSums sums, int k) {
        double n = sums.count[k];
        if (!(n > 0)) {
            return;
        }
        if (family.fatTailed()) {
            student(next, sums, k);
            return;
        }
        double mean = family.estimatesMeans() ? sums.sum[k] / n : 0;
        double square = sums.squares[k] / n - mean * mean;
        next.set(next.mean(k), mean);
        next.set(
                next.variance(k),
                Math.max(FLOOR, prior.isPresent() ? prior.get().variance(n, square) : square));
    }

    /** Mean sum(g u z) / sum(g u), squared scale sum(g u (z - mean)^2) / sum(g) (Peel and McLachlan 2000, eqs. 29 and 30). */
    private void student(Parameters next, ExpectedSums sums, int k) {
        double mean = sums.sum[k] / sums.weights[k];
        double square = sums.squares[k] - mean * sums.sum[k];
        next.set(next.mean(k), mean);
        next.set(next.variance(k), Math.max(FLOOR, square / sums.count[k]));
        if (family.fixedDegreesOfFreedom().isEmpty()) {
            double old = next.at(next.degreesOfFreedom(k));
            next.set(next.degreesOfFreedom(k), DegreesOfFreedom.next(old, sums.logWeights[k] / sums.count[k]));
        }
    }

    /** One variance for all states: sum_k sum_t g (z - mean_k)^2 / n, over the states that have weight. */
    private static void tie(Parameters next, ExpectedSums sums) {
        double squares = 0;
        double count = 0;
        for (int k = 0; k < next.states(); k++) {
            if (sums.count[k] > 0) {
                double mean = next.at(next.mean(k));
                squares += sums.squares[k] - mean * mean * sums.count[k];
                count += sums.count[k];
            }
        }
        for (int k = 0; count > 0 && k < next.states(); k++) {
            next.set(next.variance(k), Math.max(FLOOR, squares / count));
        }
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
