package sojourn.allocate;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.function.Function;
import sojourn.market.AssetName;

/**
 * The names that stand in formulas, each a number or a truth: {@code probability.REGIME} and {@code most_likely.REGIME} as the
 * rule's {@code probability} and {@code smooth} say; {@code bars_in_regime}, closes running that the most likely regime has been
 * it; {@code forecast.mean.ASSET} and {@code forecast.volatility.ASSET} of the simple return of the first whole bar held, and
 * {@code forecast.mean.cash}; {@code weight.ASSET} and {@code weight.cash} held at this close; {@code periods_per_year}, bars.
 */
final class FormulaNames {
    private final Map<String, Function<FormulaMoment, Double>> numbers = new LinkedHashMap<>();
    private final Map<String, Function<FormulaMoment, Boolean>> truths = new LinkedHashMap<>();

    FormulaNames(List<String> regimes, List<String> assets) {
        for (int k = 0; k < regimes.size(); k++) {
            int regime = k;
            numbers.put("probability." + regimes.get(k), moment -> moment.probability(regime));
            truths.put("most_likely." + regimes.get(k), moment -> moment.mostLikely() == regime);
        }
        numbers.put("bars_in_regime", moment -> (double) moment.barsInRegime());
        for (int a = 0; a < assets.size(); a++) {
            int asset = a;
            numbers.put(
                    "forecast.mean." + assets.get(a),
                    moment -> moment.forecast().mean(asset));
            numbers.put(
                    "forecast.volatility." + assets.get(a),
                    moment -> moment.forecast().volatility(asset));
            numbers.put(
                    "weight." + assets.get(a),
                    moment -> moment.situation().weights().at(asset));
        }
        numbers.put(
                "forecast.mean." + AssetName.CASH,
                moment -> moment.situation().known().expectedCashReturn());
        numbers.put(
                "weight." + AssetName.CASH,
                moment -> moment.situation().weights().cash());
        numbers.put(
                "periods_per_year",
                moment -> moment.situation().known().barLength().periodsPerYear());
    }

    /** Numbers by name, in a fixed order. */
    Map<String, Function<FormulaMoment, Double>> numbers() {
        return Collections.unmodifiableMap(numbers);
    }

    /** Truths by name, in a fixed order. */
    Map<String, Function<FormulaMoment, Boolean>> truths() {
        return Collections.unmodifiableMap(truths);
    }
}
