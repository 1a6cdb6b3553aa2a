package sojourn.regime;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;

/**
 * A summit that is known before other climbs begin: where the search from the previous fit ended. A climb that comes near it would end
 * there too, and need not go on. Near is what lies within a twentieth of a nat; of a chain of two states also that whence one Newton step by the
 * summit's own curvature leads within a quarter of a nat, gaining about as much as the summit lies above, at most five nats. Of mixtures and of
 * more states the tops lie too close together for a step to tell them apart. Distances are half squares of differences
 * in {@link Coordinates}, measured by the information that complete data would hold, so that the true loss of likelihood is smaller still.
 */
final class Landmark {
    /** In nats, of where a climb stands. */
    private static final double NEAR = 0.05;
    /** In nats, of where a Newton step leads. */
    private static final double NEAR_BY_A_STEP = 0.25;
    /** Farthest below the summit, in nats, that a Newton step is believed. */
    private static final double FAR = 5;
    /** The largest difference between what the step promises and what the summit lies above, a part of that and in nats. */
    private static final double PART = 0.3;

    private static final double NATS = 0.01;

    private final Climb.Summit summit;
    private final Coordinates coordinates;
    private final double[] place;
    private final double[] information;
    private final Curvature curvature;
    private final int[] order;

    /** The place of the summit in those coordinates, and the information and the curvature there. Keeps its arrays. */
    Landmark(Climb.Summit summit, Coordinates coordinates, double[] place, double[] information, Curvature curvature) {
        this.summit = summit;
        this.coordinates = coordinates;
        this.place = place;
        this.information = information;
        this.curvature = curvature;
        this.order = order(summit.parameters());
    }

    /** The summit itself. */
    Climb.Summit summit() {
        return summit;
    }

    /** Whether a climb that stands at {@code p} is near, {@code sums} being what is expected there. Not modified. */
    boolean nearTo(Parameters p, double logLikelihood, ExpectedSums sums) {
        double below = summit.logLikelihood() - logLikelihood;
        if (!(below >= 0 && below < FAR)) {
            return false;
        }
        int[] stateFor = stateFor(p);
        Parameters turned = p.ordered(stateFor);
        double[] there = coordinates.of(turned);
        if (below < NEAR && distance(there) < NEAR) {
            return true;
        }
        if (!believesSteps()) {
            return false;
        }
        double[] gradient = coordinates.gradient(there, turned, sums.ordered(stateFor));
        double[] step = curvature.step(gradient);
        double promise = 0.5 * Curvature.dot(gradient, step);
        for (int i = 0; i < there.length; i++) {
            there[i] += step[i];
        }
        return StrictMath.abs(promise - below) < PART * below + NATS && distance(there) < NEAR_BY_A_STEP;
    }

    private boolean believesSteps() {
        return summit.parameters().kind() == ModelKind.HIDDEN_MARKOV
                && summit.parameters().states() == 2;
    }

    /** The state of {@code p} that stands for each of the summit's. */
    private int[] stateFor(Parameters p) {
        int[] theirs = order(p);
        int[] stateFor = new int[theirs.length];
        for (int role = 0; role < theirs.length; role++) {
            stateFor[order[role]] = theirs[role];
        }
        return stateFor;
    }

    private double distance(double[] there) {
        double twice = 0;
        for (int i = 0; i < there.length; i++) {
            double d = there[i] - place[i];
            twice += information[i] * d * d;
        }
        return 0.5 * twice;
    }

    /** The summit, as that of a climb that took so many evaluations to come near. */
    Climb.Summit summit(int evaluations) {
        return new Climb.Summit(
                summit.parameters(), summit.logLikelihood(), summit.leastCount(), evaluations, summit.converged());
    }

    /** States by variance, equal ones by mean. */
    private static int[] order(Parameters p) {
        List<Integer> order = new ArrayList<>();
        for (int k = 0; k < p.states(); k++) {
            order.add(k);
        }
        order.sort(Comparator.comparingDouble((Integer k) -> p.at(p.variance(k)))
                .thenComparingDouble(k -> p.at(p.mean(k))));
        return order.stream().mapToInt(k -> k).toArray();
    }
}
