package sojourn.regime;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;

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

    /** The same where the states are matched to those of the last fit, if there is one to match. */
    static int[] matched(Described described, Optional<Matching> matching) {
        int states = described.states();
        int[] earlierRole = new int[states];
        for (int k = 0; k < states; k++) {
            earlierRole[k] = k;
        }
        matching.map(Matching::newForOld).ifPresent(newForOld -> {
            for (int old = 0; old < states; old++) {
                earlierRole[newForOld[old]] = old;
            }
        });
        List<Integer> order = new ArrayList<>();
        for (int k = 0; k < states; k++) {
            order.add(k);
        }
        StateWeights weights = described.orderBy();
        order.sort(Comparator.comparingDouble((Integer k) -> weights.deviation(k))
                .thenComparingDouble(weights::mean)
                .thenComparingInt(k -> earlierRole[k]));
        return order.stream().mapToInt(k -> k).toArray();
    }
}
