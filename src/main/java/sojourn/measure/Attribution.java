package sojourn.measure;

import java.util.Collections;
import java.util.EnumMap;
import java.util.Map;
import sojourn.trade.LedgerKind;

/**
 * Where a difference to buy-and-hold comes from: parts that add up to it. {@link GrowthDifference} has the formula.
 *
 * @param difference what is explained
 * @param exposure the strategy's mean weights, held through every bar, instead of what buy-and-hold held
 * @param timing the strategy's weights of each bar instead of their mean
 * @param cash what the strategy's cash earned, less what buy-and-hold's did
 * @param costs by kind, what the strategy paid more than buy-and-hold, below 0 if it did; kinds that neither paid are left out
 */
public record Attribution(
        Measured difference, Measured exposure, Measured timing, Measured cash, Map<LedgerKind, Measured> costs) {
    /** Copies the map. */
    public Attribution {
        Map<LedgerKind, Measured> inOrder = new EnumMap<>(LedgerKind.class);
        inOrder.putAll(costs);
        costs = Collections.unmodifiableMap(inOrder);
    }

    static Attribution undefined(Measured.Undefined because) {
        return new Attribution(because, because, because, because, Map.of());
    }

    /** All costs together. */
    public Measured allCosts() {
        if (difference instanceof Measured.Undefined) {
            return difference;
        }
        double sum = 0;
        for (Measured one : costs.values()) {
            sum += one.number().orElseThrow();
        }
        return Measured.of(sum);
    }
}
