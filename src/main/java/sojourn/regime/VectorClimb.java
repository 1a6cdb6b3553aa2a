package sojourn.regime;

import java.util.OptionalInt;

/**
 * Climbs to a maximum of the likelihood of a window of several numbers a row, from one start: twenty plain EM steps, then EM sped up
 * by SQUAREM, scheme S3 (Varadhan and Roland 2008, Scand. J. Statistics 35, 335-353), with the initial distribution of a chain moved
 * to its best corner. An extrapolated point is kept only if it is at least as likely as the plain step before it; otherwise the
 * stride is halved, in the end to the plain second step.
 *
 * <p>Stops when the way still to go, the last EM step times the stride, is below 1e-9 in the largest coordinate, or when that times
 * the gain of the last step is below 1e-9 nats; when a state is squeezed; after 2000 evaluations without any. Every EM step must
 * not lower the log-likelihood l by more than 1e-9 (1 + |l|); one that lowers it by less than 1e-7 (1 + |l|) ends the climb.
 */
final class VectorClimb {
    private static final int PLAIN_STEPS = 20;
    /** Leaps begin when a plain step gains less than so many nats. */
    private static final double NEAR = 0.1;

    private static final double CORNER_GAIN = 1e-12;
    /** The longest stride allowed at first; grows by as much whenever it was taken in full. */
    private static final double FIRST_LONGEST = 4;

    private static final int MOST_HALVINGS = 3;
    private static final double TOLERANCE = 1e-9;
    /** A smaller fall, relative, is rounding where series nearly move together: nothing is left to gain that doubles could tell. */
    private static final double ROUNDING = 1e-7;

    private final VectorExpectation expectation;
    private final VectorMaximisation maximisation;
    private final InitialDistribution initial;
    private final VectorSums sums;
    private double longest = FIRST_LONGEST;
    private int evaluations;
    /** Where the climb stands, always within bounds. */
    private VectorParameters at;

    private double reached;
    private boolean converged;
    private OptionalInt squeezed = OptionalInt.empty();

    private VectorClimb(
            VectorWindow window, VectorMaximisation maximisation, InitialDistribution initial, VectorParameters start) {
        this.expectation = new VectorExpectation(window, start.states());
        this.maximisation = maximisation;
        this.initial = start.chain().kind() == ModelKind.HIDDEN_MARKOV ? initial : InitialDistribution.FREE;
        this.sums = new VectorSums(start.states(), window.dimension());
        this.at = start.copy();
    }

    /**
     * Where one start ended. {@code leastCount} is the smallest expected number of rows of a state, or of its rows that
     * hold the numbers which one of its variances or covariances is told by.
     */
    record Summit(
            VectorParameters parameters,
            double logLikelihood,
            double leastCount,
            OptionalInt squeezed,
            int evaluations,
            boolean converged) {}

    /** Climbs from {@code start}, which is not modified and must be within the bounds of {@code maximisation}. */
    static Summit from(
            VectorParameters start, VectorWindow window, VectorMaximisation maximisation, InitialDistribution initial) {
        return new VectorClimb(window, maximisation, initial, start).run();
    }

    private Summit run() {
        if (!startsAsItMust(at)) {
            throw new IllegalStateException("a start whose chain has no one long run; this is a bug");
        }
        reached = evaluate(at);
        if (reached == Double.NEGATIVE_INFINITY) {
            throw new IllegalStateException("a start that makes a row impossible; this is a bug");
        }
        while (!converged && squeezed.isEmpty() && evaluations < Climb.MOST_EVALUATIONS) {
            cycle();
        }
        double least = Double.POSITIVE_INFINITY;
        for (double count : sums.count) {
            least = StrictMath.min(least, count);
        }
        for (int e = 0; e < sums.together.length; e++) {
            if (maximisation.estimates(e)) {
                least = StrictMath.min(least, sums.together[e]);
            }
        }
        return new Summit(at, reached, least, squeezed, evaluations, converged);
    }

    /** Two EM steps and, where they are short, a leap beyond them. */
    private void cycle() {
        if (initial == InitialDistribution.FREE && evaluations > PLAIN_STEPS) {
            turnToCorner();
        }
        VectorParameters zero = at;
        double before = reached;
        VectorParameters one = maximisation.next(zero, sums);
        if (!moved(one)) {
            return;
        }
        double first = reached;
        VectorParameters two = maximisation.next(one, sums);
        if (within(two)) {
            VectorExtrapolation beyond = new VectorExtrapolation(zero, one, two);
            double gain = StrictMath.max(0, first - before);
            converged = beyond.stride() * beyond.lastChange() < TOLERANCE || beyond.stride() * gain < TOLERANCE;
            boolean leap = !converged && beyond.stride() > 1 && evaluations > PLAIN_STEPS && gain < NEAR;
            if (leap && leapt(beyond)) {
                moved(maximisation.next(at, sums));
            } else {
                moved(two);
            }
        }
    }

    /** Takes an EM step unless it leaves the bounds; false if so. */
    private boolean moved(VectorParameters next) {
        if (!within(next)) {
            return false;
        }
        double after = evaluate(next);
        if (!(after >= reached - TOLERANCE * (1 + StrictMath.abs(reached)))) {
            if (!(after >= reached - ROUNDING * (1 + StrictMath.abs(reached)))) {
                throw new IllegalStateException(
                        "an EM step lowered the log-likelihood from " + reached + " to " + after + "; this is a bug");
            }
            converged = true;
            evaluate(at);
            return false;
        }
        at = next;
        reached = after;
        return true;
    }

    private boolean within(VectorParameters next) {
        squeezed = maximisation.squeezed(next);
        return squeezed.isEmpty();
    }

    /** Stands on the farthest extrapolated point that is at least as likely as here; false if there is none. */
    private boolean leapt(VectorExtrapolation beyond) {
        double stride = StrictMath.min(beyond.stride(), longest);
        for (int attempt = 0; attempt < MOST_HALVINGS && stride > 1; attempt++) {
            VectorParameters candidate = beyond.point(stride);
            boolean allowed = maximisation.squeezed(candidate).isEmpty() && startsAsItMust(candidate);
            double there = allowed ? evaluate(candidate) : Double.NEGATIVE_INFINITY;
            if (there >= reached) {
                longest = stride >= longest ? longest * FIRST_LONGEST : longest;
                at = candidate;
                reached = there;
                return true;
            }
            stride = (stride + 1) / 2;
        }
        return false;
    }

    /** The likelihood is linear in the initial distribution of a chain, so the best one starts for certain in one state. */
    private void turnToCorner() {
        Parameters chain = at.chain();
        double average = 0;
        int best = 0;
        for (int k = 0; k < at.states(); k++) {
            average += chain.at(chain.initial(k)) * sums.chain.likelihoodFrom[k];
            best = sums.chain.likelihoodFrom[k] > sums.chain.likelihoodFrom[best] ? k : best;
        }
        if (sums.chain.likelihoodFrom[best] > average * (1 + CORNER_GAIN)) {
            VectorParameters corner = at.copy();
            for (int k = 0; k < at.states(); k++) {
                corner.chain().set(chain.initial(k), k == best ? 1 : 0);
            }
            moved(corner);
        }
    }

    /** Puts a chain that starts in its long run there; false if it has none. {@code p} is modified. */
    private boolean startsAsItMust(VectorParameters p) {
        return initial == InitialDistribution.FREE || StationaryStart.impose(p.chain());
    }

    /** Fills the sums at those parameters and returns their log-likelihood. */
    private double evaluate(VectorParameters parameters) {
        evaluations++;
        return expectation.fill(parameters, sums) ? sums.chain.logLikelihood : Double.NEGATIVE_INFINITY;
    }
}
