package sojourn.regime;

/**
 * Climbs to a maximum of the likelihood from one start: twenty plain EM steps, and on until a step gains less than 0.1 nats; then
 * EM sped up by SQUAREM, scheme S3 (Varadhan and Roland 2008, Scand. J. Statistics 35, 335-353), and by moving the initial
 * distribution of a chain to its best corner. An extrapolated point is kept only if it is at least as likely as the plain step
 * before it; otherwise the stride is halved, in the end to the plain second step. The longest stride allowed starts at 4 and
 * grows fourfold whenever it was taken in full, which keeps early leaps in the valley that EM is in.
 *
 * <p>Stops when the way still to go, the last EM step times the stride, is below 1e-9 in the largest parameter of the
 * standardised series, or when that times the gain of the last step is below 1e-9 nats; after 2000 evaluations without that.
 * Every EM step must not lower the log-likelihood l by more than 1e-9 (1 + |l|).
 */
final class Climb {
    /** The most evaluations of the likelihood. */
    static final int MOST_EVALUATIONS = 2000;

    private static final int PLAIN_STEPS = 20;
    /** Leaps begin when a plain step gains less than so many nats. */
    private static final double NEAR = 0.1;

    /** Relative gain in likelihood that is worth a move to another initial distribution. */
    private static final double CORNER_GAIN = 1e-12;

    private static final double FIRST_LONGEST = 4;
    private static final int MOST_HALVINGS = 3;
    private static final double PARAMETER_TOLERANCE = 1e-9;
    private static final double GAIN_TOLERANCE = 1e-9;
    private static final double FALL_TOLERANCE = 1e-9;

    private final Expectation fast;
    private final Expectation plain;
    private final Maximisation maximisation;
    private final InitialDistribution initial;
    private final ExpectedSums sums;
    private int evaluations;
    /** Log-likelihood that the next EM step must not fall below after a leap. */
    private double landed;

    /** The longest stride allowed so far. */
    private double longest = FIRST_LONGEST;

    private Climb(
            Expectation fast, Expectation plain, Maximisation maximisation, InitialDistribution initial, int states) {
        this.initial = initial;
        this.fast = fast;
        this.plain = plain;
        this.maximisation = maximisation;
        this.sums = new ExpectedSums(states);
    }

    /** Where one start ended. {@code leastCount} is the smallest expected number of rows of a state. */
    record Summit(Parameters parameters, double logLikelihood, double leastCount, int evaluations, boolean converged) {}

    /** Climbs from {@code start}, which is not modified, with a free initial distribution. */
    static Summit from(Parameters start, Window window, EmissionFamily family) {
        return from(start, window, family, InitialDistribution.FREE);
    }

    /** Climbs from {@code start}, which is not modified. */
    static Summit from(Parameters start, Window window, EmissionFamily family, InitialDistribution initial) {
        InitialDistribution ofChain = start.kind() == ModelKind.HIDDEN_MARKOV ? initial : InitialDistribution.FREE;
        Climb climb = new Climb(
                Expectation.of(start.kind(), start.states(), window, family),
                new PlainExpectation(window, family),
                new Maximisation(family, ofChain),
                ofChain,
                start.states());
        return climb.run(start);
    }

    private Summit run(Parameters start) {
        Parameters at = start.copy();
        if (!startsAsItMust(at)) {
            throw new IllegalStateException("a start whose chain has no one long run; this is a bug");
        }
        double reached = evaluate(at);
        boolean converged = false;
        while (!converged && evaluations < MOST_EVALUATIONS) {
            boolean freely = initial == InitialDistribution.FREE;
            if (freely && evaluations > PLAIN_STEPS && cornerBeats(at)) {
                at = cornered(at);
                reached = notBelow(reached, evaluate(at));
            }
            Parameters one = maximisation.next(at, sums);
            double first = notBelow(reached, evaluate(one));
            Parameters two = maximisation.next(one, sums);
            double stride = Extrapolation.stride(at, one, two);
            converged = stride * Extrapolation.largestChange(one, two) < PARAMETER_TOLERANCE
                    || stride * StrictMath.max(0, first - reached) < GAIN_TOLERANCE;
            boolean leap = !converged && stride > 1 && evaluations > PLAIN_STEPS && first - reached < NEAR;
            at = leap ? leap(at, one, two, stride, first) : two;
            double before = leap ? landed : first;
            reached = notBelow(before, evaluate(at));
        }
        double least = Double.POSITIVE_INFINITY;
        for (double count : sums.count) {
            least = StrictMath.min(least, count);
        }
        return new Summit(at, reached, least, evaluations, converged);
    }

    /**
     * The likelihood is linear in the initial distribution of a chain, so the best one starts for certain in the state from which
     * the window is most likely. EM goes there too, but slowly where states are about equally likely.
     */
    private boolean cornerBeats(Parameters at) {
        double average = 0;
        for (int k = 0; k < at.states(); k++) {
            average += at.at(at.initial(k)) * sums.likelihoodFrom[k];
        }
        return sums.likelihoodFrom[likeliestStart()] > average * (1 + CORNER_GAIN);
    }

    private Parameters cornered(Parameters at) {
        Parameters corner = at.copy();
        for (int k = 0; k < at.states(); k++) {
            corner.set(corner.initial(k), k == likeliestStart() ? 1 : 0);
        }
        return corner;
    }

    private int likeliestStart() {
        int best = 0;
        for (int k = 1; k < sums.likelihoodFrom.length; k++) {
            best = sums.likelihoodFrom[k] > sums.likelihoodFrom[best] ? k : best;
        }
        return best;
    }

    /** One EM step from the farthest extrapolated point that is at least as likely as the first plain step, or the second. */
    private Parameters leap(Parameters at, Parameters one, Parameters two, double wanted, double first) {
        double stride = StrictMath.min(wanted, longest);
        for (int attempt = 0; attempt < MOST_HALVINGS && stride > 1; attempt++) {
            Parameters candidate = Extrapolation.point(at, one, two, stride);
            landed = startsAsItMust(candidate) ? evaluate(candidate) : Double.NEGATIVE_INFINITY;
            if (landed >= first) {
                longest = stride >= longest ? longest * FIRST_LONGEST : longest;
                return maximisation.next(candidate, sums);
            }
            stride = (stride + 1) / 2;
        }
        landed = first;
        return two;
    }

    /** Puts a chain that starts in its long run there; false if it has none. {@code p} is modified. */
    private boolean startsAsItMust(Parameters p) {
        return initial == InitialDistribution.FREE || StationaryStart.impose(p);
    }

    /** Fills the sums at those parameters and returns their log-likelihood. */
    private double evaluate(Parameters parameters) {
        evaluations++;
        if (!fast.fill(parameters, sums) && !plain.fill(parameters, sums)) {
            return Double.NEGATIVE_INFINITY;
        }
        return sums.logLikelihood;
    }

    private static double notBelow(double before, double after) {
        if (!(after >= before - FALL_TOLERANCE * (1 + StrictMath.abs(before)))) {
            throw new IllegalStateException(
                    "an EM step lowered the log-likelihood from " + before + " to " + after + "; this is a bug");
        }
        return after;
    }
}
