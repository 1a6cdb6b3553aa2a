package sojourn.regime;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;

/**
 * A summit that is known before other climbs begin: where the search from the previous fit ended. A climb that comes within a twentieth
 * of a nat of it would end there too, and need not go on. The distance is half the square of the difference in {@link Coordinates},
 * measured by the information that complete data would hold, so that the true loss of likelihood is smaller still.
 */
final class Landmark {
    /** In nats. */
    private static final double NEAR = 0.05;

    private final Climb.Summit summit;
    private final Coordinates coordinates;
    private final double[] place;
    private final double[] information;
    private final int[] order;

    private Landmark(Climb.Summit summit, Coordinates coordinates, double[] information) {
        this.summit = summit;
        this.coordinates = coordinates;
        this.place = coordinates.of(summit.parameters());
        this.information = information;
        this.order = order(summit.parameters());
    }

    /** Of a summit that the search converged at. */
    static Landmark of(Climb.Summit summit, Window window, EmissionFamily family, InitialDistribution initial) {
        Parameters p = summit.parameters().copy();
        InitialDistribution ofChain = Climb.ofChain(p, initial);
        Objective objective = new Objective(p, window, family, ofChain);
        objective.at(p);
        Coordinates coordinates = new Coordinates(p, family, ofChain);
        return new Landmark(summit, coordinates, coordinates.information(coordinates.of(p), p, objective.sums()));
    }

    /** Whether a climb that stands at {@code p} is near. */
    boolean nearTo(Parameters p, double logLikelihood) {
        double below = summit.logLikelihood() - logLikelihood;
        if (!(below >= 0 && below < NEAR)) {
            return false;
        }
        int[] theirs = order(p);
        int[] stateFor = new int[theirs.length];
        for (int role = 0; role < theirs.length; role++) {
            stateFor[order[role]] = theirs[role];
        }
        double[] there = coordinates.of(p.ordered(stateFor));
        double twice = 0;
        for (int i = 0; i < there.length; i++) {
            double d = there[i] - place[i];
            twice += information[i] * d * d;
        }
        return 0.5 * twice < NEAR;
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
