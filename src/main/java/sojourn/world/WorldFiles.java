package sojourn.world;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.Map;

/**
 * An invented market as the texts of its files: {@code PREFIX-ASSET.csv} for each asset, {@code PREFIX-bills.csv} and
 * {@code PREFIX-truth.csv}. Comma, dot, ISO dates, {@code \n} at the end of each line.
 */
public final class WorldFiles {
    private WorldFiles() {}

    /** File name to content, in the order named above. */
    public static Map<String, String> of(InventedMarket market) {
        String prefix = market.world().filePrefix() + "-";
        Map<String, String> files = new LinkedHashMap<>();
        for (InventedPrices prices : market.prices()) {
            files.put(prefix + prices.asset() + ".csv", priceFile(prices));
        }
        files.put(prefix + "bills.csv", billFile(market));
        files.put(prefix + "truth.csv", truthFile(market.truth()));
        return Collections.unmodifiableMap(files);
    }

    private static String priceFile(InventedPrices prices) {
        boolean traded = prices.listing().trading().isPresent();
        boolean total = prices.listing().couponPercentPerYear().isPresent();
        StringBuilder text = new StringBuilder("date,")
                .append(traded ? "open,high,low," : "")
                .append("close")
                .append(total ? ",total_return" : "")
                .append(traded ? ",volume" : "")
                .append('\n');
        for (Quote quote : prices.quotes()) {
            append(text, quote, prices.listing().decimals());
        }
        return text.toString();
    }

    private static void append(StringBuilder text, Quote quote, int decimals) {
        text.append(quote.date());
        quote.candle()
                .ifPresent(candle -> text.append(',')
                        .append(Decimals.text(candle.open(), decimals))
                        .append(',')
                        .append(Decimals.text(candle.high(), decimals))
                        .append(',')
                        .append(Decimals.text(candle.low(), decimals)));
        text.append(',').append(Decimals.text(quote.close(), decimals));
        quote.totalReturn()
                .ifPresent(total -> text.append(',').append(Decimals.text(total, Decimals.OF_TOTAL_RETURNS)));
        quote.candle().ifPresent(candle -> text.append(',').append(candle.volume()));
        text.append('\n');
    }

    private static String billFile(InventedMarket market) {
        StringBuilder text = new StringBuilder("date,percent_per_year\n");
        for (BillRate rate : market.bills()) {
            text.append(rate.date())
                    .append(',')
                    .append(Decimals.text(rate.percentPerYear(), Decimals.OF_RATES))
                    .append('\n');
        }
        return text.toString();
    }

    private static String truthFile(WorldTruth truth) {
        StringBuilder text = new StringBuilder("date,state\n");
        for (int bar = 0; bar < truth.size(); bar++) {
            text.append(truth.date(bar)).append(',').append(truth.state(bar)).append('\n');
        }
        return text.toString();
    }
}
