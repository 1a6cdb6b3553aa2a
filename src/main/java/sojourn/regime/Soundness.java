package sojourn.regime;

import java.util.Locale;
import sojourn.numeric.Check;

/**
 * Tells a model that means something from a degenerate one: a state stands on too few observations, or closed in on a single value
 * (in several dimensions: lost its spread in some direction), or the states add nothing to a single one, which is no maximum.
 */
final class Soundness {
    static final int LEAST_COUNT = 5;

    /** Nats by which several states must beat a single one. */
    private static final double NOTHING_GAINED = 1e-6;

    private final int leastCount;
    private final double alone;

    /**
     * @param dimension of the observations
     * @param alone log-likelihood of a single state; minus infinity where only one is searched
     */
    Soundness(int dimension, double alone) {
        this.leastCount = leastCount(dimension);
        this.alone = alone;
    }

    /** Fewest observations that a state must account for: 5, or d + 2 where that is more. */
    static int leastCount(int dimension) {
        Check.within(dimension, 1, Integer.MAX_VALUE, "dimension");
        return StrictMath.max(LEAST_COUNT, dimension + 2);
    }

    /** Whether the model means something. */
    boolean sound(SearchEnd end) {
        return end.squeezed().isEmpty() && end.leastCount() >= leastCount && parted(end);
    }

    private boolean parted(SearchEnd end) {
        return end.logLikelihood() >= alone + NOTHING_GAINED;
    }

    /**
     * What is wrong with the likeliest of the starts, all of them degenerate. A state is written {@code {k}}, k its role.
     *
     * @param order the state that takes each role. Not modified.
     */
    String wrong(SearchEnd end, Described described, int[] order, int starts) {
        String where = starts == 1
                ? "the search ended in a degenerate model: "
                : "all " + starts + " starts ended in degenerate models; in the likeliest ";
        double[] occupancy = described.orderBy().occupancy();
        if (end.squeezed().isPresent()) {
            int role = role(end.squeezed().getAsInt(), order);
            return where + lost(described.model().orElseThrow().emission().dimension(), role) + " (it accounts for "
                    + count(occupancy[role], described) + " observations)";
        }
        int least = least(occupancy);
        if (end.leastCount() < leastCount && occupancy[least] * described.observations() >= leastCount) {
            return where
                    + String.format(
                            Locale.ROOT,
                            "a state accounts for %.1f rows that hold the numbers which one of its variances or covariances is"
                                    + " told by, fewer than the %d it needs: one of the series is missing too often",
                            end.leastCount(),
                            leastCount);
        }
        if (end.leastCount() < leastCount) {
            return where + "{" + least + "} accounts for " + count(occupancy[least], described)
                    + " observations, fewer than the " + leastCount + " it needs";
        }
        return where + "the states did not part: together they are no likelier than a single one";
    }

    private static String lost(int dimension, int role) {
        return dimension == 1
                ? "{" + role + "} closed in on a single value: its variance fell to a ten-thousandth of the window's"
                : "{" + role
                        + "} closed in on a line or a point: in some direction its variance fell to a ten-thousandth"
                        + " of the window's";
    }

    private static String count(double occupancy, Described described) {
        int observations = described.observations();
        return String.format(Locale.ROOT, "%.1f of %d", occupancy * observations, observations);
    }

    private static int role(int state, int[] order) {
        int role = 0;
        while (order[role] != state) {
            role++;
        }
        return role;
    }

    private static int least(double[] occupancy) {
        int least = 0;
        for (int k = 1; k < occupancy.length; k++) {
            least = occupancy[k] < occupancy[least] ? k : least;
        }
        return least;
    }
}
