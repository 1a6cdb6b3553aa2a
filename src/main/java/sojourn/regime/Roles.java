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
        int states = described.states();
        int[] earlierRole = new int[states];
        for (int k = 0; k < states; k++) {
            earlierRole[k] = k;
        }
        previous.filter(p -> p.states() == states).ifPresent(p -> {
            int[] newForOld = Matching.of(
                            p.emission(), described.model().orElseThrow().emission())
                    .newForOld();
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
