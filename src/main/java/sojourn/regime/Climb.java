package sojourn.regime;

import java.util.Optional;

/**
 * Climbs to a maximum of the likelihood from one start: of two states five EM steps, and on while one gains more than a nat and less than
 * half of what the step before gained; of three and more states twenty, and on while one gains more than a tenth of a nat and less than the step before; from the summit
 * of an earlier window two instead of five or twenty. So it is clear which top it is going for. Then the initial distribution of a chain moved to its best corner; then {@link Ascent}. Where that finds no way up,
 * EM goes on, sped up by SQUAREM, scheme S3 (Varadhan and Roland 2008, Scand. J. Statistics 35, 335-353): an extrapolated point is kept
 * only if it is at least as likely as the plain step before it; otherwise the stride is halved, in the end to the plain second step.
 * A climb that comes near a {@link Landmark} ends there. With a prior it is the log-likelihood plus the log density of the prior that is
 * climbed, by EM and SQUAREM alone.
 *
 * <p>SQUAREM stops when the way still to go, the last EM step times the stride, is below 1e-9 in the largest parameter of the
 * standardised series, or when that times the gain of the last step is below 1e-9 nats; every search after 2000 evaluations. No step
 * of any kind lowers what is climbed, l, by more than 1e-9 (1 + |l|).
 */
final class Climb {
    /** The most evaluations of the likelihood. */
    static final int MOST_EVALUATIONS = 2000;

    /** The fewest EM steps; three and more states have more tops close by. */
    private static final int PLAIN_STEPS_OF_TWO = 5;

    private static final int PLAIN_STEPS_OF_MANY = 20;
    /** The same from the summit of a window of which this one is little changed. */
    private static final int PLAIN_STEPS_FROM_BEFORE = 2;

    /** Gain of an EM step, in nats, from which on another top is out of reach. */
    private static final double NEAR_OF_TWO = 1;

    private static final double NEAR_OF_MANY = 0.1;
    /** Part of the gain of the step before, of two states, from which on EM's way is a long one along a ridge. */
    private static final double SLOWING_OF_TWO = 0.5;

    /** Relative gain in likelihood that is worth a move to another initial distribution. */
    private static final double CORNER_GAIN = 1e-12;

    private static final int MOST_CORNERS = 5;
    private static final double LONGEST_STRIDE = 64;
    private static final int MOST_HALVINGS = 3;
    private static final double PARAMETER_TOLERANCE = 1e-9;
    private static final double GAIN_TOLERANCE = 1e-9;
    private static final double FALL_TOLERANCE = 1e-9;

    private final Objective objective;
    private final Maximisation maximisation;
    private final EmissionFamily family;
    private final InitialDistribution initial;
    private final Optional<Landmark> landmark;
    private final Optional<PriorDensity> prior;
    private final Origin origin;
    private Parameters at;
    private double reached;
    private Optional<Ascent> last = Optional.empty();

    /** Where a climb starts: the summit of a window of which this one is little changed, or not. */
    private enum Origin {
        BEFORE,
        ANYWHERE
    }

    private Climb(
            Parameters start,
            Window window,
            EmissionFamily family,
            InitialDistribution initial,
            Optional<Landmark> landmark,
            Optional<PriorDensity> prior,
            Origin origin) {
        this.objective = new Objective(start, window, family, initial, prior);
        this.maximisation = new Maximisation(family, initial, prior);
        this.family = family;
        this.initial = initial;
        this.landmark = landmark;
        this.prior = prior;
        this.origin = origin;
        this.at = start.copy();
        this.reached = objective.at(at);
    }

    /**
     * Where one start ended. {@code leastCount} is the smallest expected number of rows of a state; {@code objective} is what was climbed,
     * without a prior the log-likelihood.
     */
    record Summit(
            Parameters parameters,
            double logLikelihood,
            double objective,
            double leastCount,
            int evaluations,
            boolean converged) {
        /** Without a prior. */
        Summit(Parameters parameters, double logLikelihood, double leastCount, int evaluations, boolean converged) {
            this(parameters, logLikelihood, logLikelihood, leastCount, evaluations, converged);
        }
    }

    /** Climbs from {@code start}, which is not modified, with a free initial distribution. */
    static Summit from(Parameters start, Window window, EmissionFamily family) {
        return from(start, window, family, InitialDistribution.FREE, Optional.empty());
    }

    /** Climbs from {@code start}, which is not modified. */
    static Summit from(
            Parameters start,
            Window window,
            EmissionFamily family,
            InitialDistribution initial,
            Optional<Landmark> landmark) {
        InitialDistribution ofChain = ofChain(start, initial);
        return new Climb(start, window, family, ofChain, landmark, Optional.empty(), Origin.ANYWHERE).run();
    }

    /** Climbs the posterior of a chain with normal emissions from {@code start}, which is not modified. */
    static Summit under(
            PriorDensity prior, Parameters start, Window window, EmissionFamily family, InitialDistribution initial) {
        return new Climb(start, window, family, initial, Optional.empty(), Optional.of(prior), Origin.ANYWHERE).run();
    }

    /** Climbs from {@code start}, the summit of an earlier window; not modified. What it learns on the way leads other climbs. */
    static Landmark again(Parameters start, Window window, EmissionFamily family, InitialDistribution initial) {
        InitialDistribution ofChain = ofChain(start, initial);
        Climb climb = new Climb(start, window, family, ofChain, Optional.empty(), Optional.empty(), Origin.BEFORE);
        Summit summit = climb.run();
        Ascent last = climb.last
                .filter(ascent -> ascent.parameters() == summit.parameters())
                .orElseGet(climb::ascent);
        return last.landmark(summit);
    }

    /** The weights of a mixture are always free. */
    static InitialDistribution ofChain(Parameters start, InitialDistribution initial) {
        return start.kind() == ModelKind.HIDDEN_MARKOV ? initial : InitialDistribution.FREE;
    }

    private Summit run() {
        if (reached == Double.NEGATIVE_INFINITY) {
            throw new IllegalStateException("a start that makes the window impossible; this is a bug");
        }
        approach();
        boolean converged = near(at, reached) || ascend() || near(at, reached) || accelerate();
        if (near(at, reached)) {
            return landmark.orElseThrow().summit(objective.evaluations());
        }
        double least = Double.POSITIVE_INFINITY;
        for (double count : objective.sums().count) {
            least = StrictMath.min(least, count);
        }
        double logLikelihood = prior.isPresent() ? objective.sums().logLikelihood : reached;
        return new Summit(at, logLikelihood, reached, least, objective.evaluations(), converged);
    }

    /** Plain EM until it is clear which top it is going for. */
    private void approach() {
        double near = at.states() == 2 ? NEAR_OF_TWO : NEAR_OF_MANY;
        double slowing = at.states() == 2 ? SLOWING_OF_TWO : 1;
        double before = Double.POSITIVE_INFINITY;
        double gain = Double.POSITIVE_INFINITY;
        while (objective.evaluations() < MOST_EVALUATIONS
                && !near(at, reached)
                && (objective.evaluations() < plainSteps() || (gain > near && gain < slowing * before))) {
            double low = reached;
            step();
            before = gain;
            gain = reached - low;
        }
    }

    private int plainSteps() {
        if (origin == Origin.BEFORE) {
            return PLAIN_STEPS_FROM_BEFORE;
        }
        return at.states() == 2 ? PLAIN_STEPS_OF_TWO : PLAIN_STEPS_OF_MANY;
    }

    private boolean near(Parameters p, double logLikelihood) {
        return landmark.isPresent() && landmark.get().nearTo(p, logLikelihood, objective.sums());
    }

    /** One EM step. */
    private void step() {
        Parameters next = maximisation.next(at, objective.sums());
        arrive(next, objective.at(next));
    }

    private void arrive(Parameters next, double logLikelihood) {
        if (!(logLikelihood >= reached - FALL_TOLERANCE * (1 + StrictMath.abs(reached)))) {
            throw new IllegalStateException(
                    "a step lowered the objective from " + reached + " to " + logLikelihood + "; this is a bug");
        }
        at = next;
        reached = logLikelihood;
    }

    /** To the top by {@link Ascent}, from one corner after the other while another one is better; not with a prior. */
    private boolean ascend() {
        if (prior.isPresent()) {
            return false;
        }
        for (int corner = 0; corner < MOST_CORNERS; corner++) {
            if (cornerBeats()) {
                corner();
            } else if (corner > 0) {
                return true;
            }
            Ascent ascent = ascent();
            if (origin == Origin.BEFORE && corner == 0) {
                ascent.observe();
            }
            last = Optional.of(ascent);
            boolean converged = ascent.climb(a -> near(a.parameters(), a.logLikelihood()));
            arrive(ascent.parameters(), ascent.logLikelihood());
            if (!converged) {
                return false;
            }
        }
        return false;
    }

    private Ascent ascent() {
        return new Ascent(objective, family, at, reached, MOST_EVALUATIONS);
    }

    /**
     * The likelihood is linear in the initial distribution of a chain, so the best one starts for certain in the state from which
     * the window is most likely. EM goes there too, but slowly where states are about equally likely.
     */
    private boolean cornerBeats() {
        double average = 0;
        for (int k = 0; k < at.states(); k++) {
            average += at.at(at.initial(k)) * objective.sums().likelihoodFrom[k];
        }
        return initial == InitialDistribution.FREE
                && objective.sums().likelihoodFrom[likeliestStart()] > average * (1 + CORNER_GAIN);
    }

    private void corner() {
        Parameters corner = at.copy();
        for (int k = 0; k < at.states(); k++) {
            corner.set(corner.initial(k), k == likeliestStart() ? 1 : 0);
        }
        arrive(corner, objective.at(corner));
    }

    private int likeliestStart() {
        double[] from = objective.sums().likelihoodFrom;
        int best = 0;
        for (int k = 1; k < from.length; k++) {
            best = from[k] > from[best] ? k : best;
        }
        return best;
    }

    /** To the top by SQUAREM. */
    private boolean accelerate() {
        while (objective.evaluations() < MOST_EVALUATIONS) {
            if (cornerBeats()) {
                corner();
            }
            Parameters zero = at;
            double before = reached;
            step();
            Parameters one = at;
            double gain = reached - before;
            Parameters two = maximisation.next(one, objective.sums());
            double stride = Extrapolation.stride(zero, one, two);
            boolean there = stride * Extrapolation.largestChange(one, two) < PARAMETER_TOLERANCE
                    || stride * StrictMath.max(0, gain) < GAIN_TOLERANCE;
            Parameters next = there ? two : leap(zero, one, two, StrictMath.min(stride, LONGEST_STRIDE));
            arrive(next, objective.at(next));
            if (there) {
                return true;
            }
        }
        return false;
    }

    /** One EM step from the farthest extrapolated point that is at least as likely as the first plain step, or the second. */
    private Parameters leap(Parameters zero, Parameters one, Parameters two, double wanted) {
        double stride = wanted;
        for (int attempt = 0; attempt < MOST_HALVINGS && stride > 1; attempt++) {
            Parameters candidate = Extrapolation.point(zero, one, two, stride);
            double landed = objective.at(candidate);
            if (landed >= reached) {
                arrive(candidate, landed);
                return maximisation.next(candidate, objective.sums());
            }
            stride = (stride + 1) / 2;
        }
        return two;
    }
}
