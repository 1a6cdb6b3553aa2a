package sojourn.regime;

/**
 * One descent to a local optimum of a jump model: the cheapest path for the centres, the means of the path for centres, in turn
 * until the path stays. Neither half can raise the objective, so it ends.
 *
 * @param centres at the end
 * @param path the cheapest for them
 * @param rounds how many paths were found
 * @param settled whether the path stayed in the end
 */
record JumpDescent(JumpCentres centres, JumpPath path, int rounds, boolean settled) {
    static final int MOST_ROUNDS = 1000;

    static JumpDescent from(JumpCentres start, double penalty, Observations x) {
        return from(start, penalty, x, MOST_ROUNDS);
    }

    /** With another limit than usual, at least 1. */
    static JumpDescent from(JumpCentres start, double penalty, Observations x, int mostRounds) {
        JumpCentres centres = start;
        JumpPath path = JumpPath.of(centres, penalty, x);
        for (int round = 2; round <= mostRounds; round++) {
            JumpCentres means = centres.means(x, path.states());
            JumpPath next = JumpPath.of(means, penalty, x);
            if (next.sameAs(path)) {
                return new JumpDescent(means, next, round, true);
            }
            centres = means;
            path = next;
        }
        return new JumpDescent(centres, path, mostRounds, false);
    }

    double objective() {
        return path.objective();
    }
}
