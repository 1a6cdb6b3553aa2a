package sojourn.trade;

import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;
import sojourn.market.Known;
import sojourn.market.PriceTable;

/**
 * A column of a price file that trading needs and the file does not have.
 *
 * @param asset whose prices
 * @param column its key in the section {@code prices}
 * @param what what needs it, in the words of the strategy file
 */
public record Needed(String asset, String column, String what) {
    /** A value of a known bar. */
    private interface Value {
        OptionalDouble on(Known known, int asset, int bar);
    }

    /** What {@code settings} need of the assets that are traded and {@code table} has on no bar. */
    public static List<Needed> lacking(TradeSettings settings, PriceTable table, List<String> traded) {
        List<Needed> lacking = new ArrayList<>();
        for (String asset : traded) {
            if (settings.fill() == FillTime.NEXT_OPEN && never(table, asset, Known::open)) {
                lacking.add(new Needed(asset, "open", "fill: next-open"));
            }
            if (settings.costs().impact().isPresent() && never(table, asset, Known::volume)) {
                lacking.add(new Needed(asset, "volume", "impact"));
            }
        }
        return lacking;
    }

    private static boolean never(PriceTable table, String asset, Value value) {
        Known all = table.knownAt(table.size() - 1);
        int index = table.asset(asset);
        for (int bar = 0; bar < table.size(); bar++) {
            if (value.on(all, index, bar).isPresent()) {
                return false;
            }
        }
        return true;
    }
}
