package sojourn.latest;

import java.math.BigDecimal;
import java.math.RoundingMode;
import java.util.ArrayList;
import java.util.List;
import sojourn.allocate.Weights;
import sojourn.market.AssetName;

/** Weights in words: "stocks 60.00 %, cash 40.00 %". */
public final class WeightWords {
    private static final int DECIMALS = 2;

    private WeightWords() {}

    /** Every asset, then cash. */
    public static String of(Weights weights, List<String> assets) {
        List<String> parts = new ArrayList<>();
        for (int asset = 0; asset < assets.size(); asset++) {
            parts.add(assets.get(asset) + " " + percent(weights.at(asset)));
        }
        parts.add(AssetName.CASH + " " + percent(weights.cash()));
        return String.join(", ", parts);
    }

    private static String percent(double fraction) {
        BigDecimal percent = BigDecimal.valueOf(fraction).movePointRight(2).setScale(DECIMALS, RoundingMode.HALF_EVEN);
        return percent.toPlainString() + " %";
    }
}
