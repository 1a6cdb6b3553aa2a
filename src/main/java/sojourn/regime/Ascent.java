package sojourn.regime;

import java.util.Optional;
import java.util.function.Predicate;

/**
 * The end of a climb by a quasi-Newton search (BFGS; Nocedal and Wright 2006, Numerical Optimization, 2nd ed., 6.1 and 3.5) in free
 * {@link Coordinates}: each step goes where the curvature learnt so far puts the top, is cut where it would go too far, and shortened
 * until it climbs. First the curvature is that of complete data, so that the first step is about EM's.
 *
 * <p>Converged when twice the gain that a step promises is below 1e-14 nats, which is a ten-millionth of a standard error in any
 * direction; that step is still taken.
 */
final class Ascent {
    private static final double LEAST_PROMISE = 1e-14;
    /** Part of the promised gain that a step must make true. */
    private static final double SUFFICIENT = 1e-4;

    private static final int MOST_CUTS = 8;
    /** Step of a difference of gradients, in standard errors of complete data. */
    private static final double DIFFERENCE = 1e-3;
    /** Rounding error of a log-likelihood, relative to 1 + |l|. */
    private static final double ROUNDING = 1e-11;

    private final Objective objective;
    private final EmissionFamily family;
    private final int mostEvaluations;
    private Parameters at;
    private double reached;
    private Coordinates coordinates;
    private double[] place;
    private double[] gradient;
    private Curvature curvature;
    /** Whether nothing has been learnt since the curvature was that of complete data. */
    private boolean fresh;

    /** From {@code start}, which the objective has just been evaluated at. Not modified. */
    Ascent(Objective objective, EmissionFamily family, Parameters start, double logLikelihood, int mostEvaluations) {
        this.objective = objective;
        this.family = family;
        this.mostEvaluations = mostEvaluations;
        this.at = start;
        this.reached = logLikelihood;
        this.coordinates = new Coordinates(start, family, objective.initial());
        this.place = coordinates.of(start);
        this.gradient = coordinates.gradient(place, start, objective.sums());
        this.curvature = new Curvature(coordinates.information(place, start, objective.sums()));
        this.fresh = true;
    }

    /**
     * Learns the curvature where it stands from differences of the gradient, at one evaluation a coordinate: worth it close to the
     * top, where it does not change on the way. Keeps what it has where that is no curvature of a top.
     */
    void observe() {
        int size = place.length;
        double[] information = coordinates.information(place, at, objective.sums());
        double[] matrix = new double[size * size];
        for (int i = 0; i < size; i++) {
            double[] there = place.clone();
            there[i] += DIFFERENCE / Math.sqrt(information[i]);
            Parameters moved = coordinates.model(there, at);
            objective.at(moved);
            double[] slope = coordinates.gradient(there, moved, objective.sums());
            for (int j = 0; j < size; j++) {
                double half = 0.5 * (gradient[j] - slope[j]) / (there[i] - place[i]);
                matrix[i * size + j] += half;
                matrix[j * size + i] += half;
            }
        }
        objective.at(at);
        Optional<Curvature> observed = Curvature.of(matrix, size);
        curvature = observed.orElse(curvature);
        fresh = observed.isEmpty();
    }

    /**
     * Climbs; returns whether it converged. Otherwise it stopped where that was enough, or for want of evaluations or of a step that
     * climbs. The objective was
     * last evaluated where it ends.
     */
    boolean climb(Predicate<Ascent> enough) {
        while (objective.evaluations() < mostEvaluations && !enough.test(this)) {
            double[] step = curvature.step(gradient);
            double promise = Curvature.dot(step, gradient);
            boolean climbs = promise > 0 && move(step, promise);
            if (climbs && promise < LEAST_PROMISE) {
                return true;
            }
            if (!climbs && fresh) {
                return promise == 0;
            }
            if (!climbs || coordinates.outgrown(place)) {
                startAfresh();
            }
        }
        return false;
    }

    /** The farthest part of the step that climbs; false, standing where it was, if none does. */
    private boolean move(double[] step, double promise) {
        double part = coordinates.within(step, at);
        double least = reached - ROUNDING * (1 + StrictMath.abs(reached));
        for (int cut = 0; cut < MOST_CUTS; cut++) {
            double[] next = place.clone();
            for (int i = 0; i < next.length; i++) {
                next[i] += part * step[i];
            }
            Parameters there = coordinates.model(next, at);
            double logLikelihood = objective.at(there);
            if (logLikelihood >= least + SUFFICIENT * part * promise) {
                arrive(next, there, logLikelihood);
                return true;
            }
            double top =
                    0.5 * part * promise / (reached + part * promise - logLikelihood); // of the parabola through both
            part *= StrictMath.max(0.1, StrictMath.min(0.5, top));
        }
        objective.at(at);
        return false;
    }

    private void arrive(double[] next, Parameters there, double logLikelihood) {
        double[] slope = coordinates.gradient(next, there, objective.sums());
        double[] moved = new double[next.length];
        double[] fall = new double[next.length];
        for (int i = 0; i < next.length; i++) {
            moved[i] = next[i] - place[i];
            fall[i] = gradient[i] - slope[i];
        }
        curvature.learn(moved, fall);
        at = there;
        reached = logLikelihood;
        place = next;
        gradient = slope;
        fresh = false;
    }

    private void startAfresh() {
        coordinates = new Coordinates(at, family, objective.initial());
        place = coordinates.of(at);
        gradient = coordinates.gradient(place, at, objective.sums());
        curvature = new Curvature(coordinates.information(place, at, objective.sums()));
        fresh = true;
    }

    /** What is known of the surroundings of where it stands; the objective must have been last evaluated there. */
    Landmark landmark(Climb.Summit summit) {
        double[] information = coordinates.information(place, at, objective.sums());
        return new Landmark(summit, coordinates, place, information, curvature);
    }

    /** Where it stands. */
    Parameters parameters() {
        return at;
    }

    /** The log-likelihood there. */
    double logLikelihood() {
        return reached;
    }
}
