package sojourn.regime;

import java.util.Comparator;
import java.util.Optional;
import java.util.stream.IntStream;

/** The order in which states take the roles: by volatility of the order-by series, then by its mean, then as in the last fit. */
final class Roles {
    private Roles() {}

    /** For each role, from the calmest, the state of the model that takes it. */
    static int[] order(Described described, Optional<RegimeModel> previous) {
        return matched(
                described,
                previous.filter(p -> p.states() == described.states())
                        .map(p -> Matching.of(
                                p.emission(), described.model().orElseThrow().emission())));
    }

    /**
     * The order that emissions alone let expect: by standard deviation of the first series, then by mean. A window described in it needs
     * no second description unless its returns say otherwise.
     */
    static int[] expected(Emission emission) {
        return sorted(
                emission.states(),
                Comparator.comparingDouble((Integer k) -> emission.standardDeviation(k, 0))
                        .thenComparingDouble(k -> emission.mean(k, 0)));
    }

    /** 0, 1, … */
    static int[] asTheyStand(int states) {
        int[] order = new int[states];
        for (int k = 0; k < states; k++) {
            order[k] = k;
        }
        return order;
    }

    /** The same where the states are matched to those of the last fit, if there is one to match. */
    static int[] matched(Described described, Optional<Matching> matching) {
        int states = described.states();
        int[] earlierRole = asTheyStand(states);
        matching.map(Matching::newForOld).ifPresent(newForOld -> {
            for (int old = 0; old < states; old++) {
                earlierRole[newForOld[old]] = old;
            }
        });
        StateWeights weights = described.orderBy();
        return sorted(
                states,
                Comparator.comparingDouble((Integer k) -> weights.deviation(k))
                        .thenComparingDouble(weights::mean)
                        .thenComparingInt(k -> earlierRole[k]));
    }

    private static int[] sorted(int states, Comparator<Integer> by) {
        return IntStream.range(0, states).boxed().sorted(by).mapToInt(k -> k).toArray();
    }
}
