package sojourn.latest;

import java.util.ArrayList;
import java.util.List;
import sojourn.market.QuotedBar;
import sojourn.walk.Forecast;
import sojourn.walk.Reading;

/**
 * What the next bar of one asset is expected to bring, regimes mixed by their predicted probabilities. Simple returns of one bar,
 * not annualised.
 *
 * @param close the last close, as quoted
 * @param mean expected return
 * @param volatility standard deviation of the return
 */
public record AssetOutlook(String asset, double close, double mean, double volatility) {
    /** One an asset, in the order of the table. */
    static List<AssetOutlook> of(Standing standing, Reading reading) {
        Forecast next = reading.forecast(1);
        List<AssetOutlook> all = new ArrayList<>();
        List<String> assets = standing.table().assets();
        for (int asset = 0; asset < assets.size(); asset++) {
            double close = QuotedBar.of(standing.table(), asset, standing.bar()).close();
            all.add(new AssetOutlook(assets.get(asset), close, next.mean(asset), next.volatility(asset)));
        }
        return all;
    }
}
