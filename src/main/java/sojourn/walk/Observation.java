package sojourn.walk;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import sojourn.document.Shape;
import sojourn.document.Shapes;
import sojourn.market.Known;
import sojourn.market.PriceTable;

/**
 * What the regime model sees of the market at each close: one number, computed from what was known then. A new kind of
 * observation is one record and one line in {@link #shape()}.
 *
 * <p>None is scaled before it is fitted, and there is no key for it: a fit brings its window to mean 0 and variance 1 for its
 * search, so probabilities are the same whatever the unit and the origin of one series.
 */
public interface Observation {
    /**
     * The number at the close that {@code known} ends with; empty where there is none (a missing observation), never NaN or
     * infinite. A walk does not ask at the file's first bar, on which no asset has a return.
     */
    OptionalDouble at(Known known);

    /** The asset it is computed from; its simple returns order the regimes unless the strategy names another. */
    String asset();

    /** Its word in the strategy file. */
    String word();

    /** Its name in result files: letters, digits and underscores. */
    String column();

    /** What is read besides dates and closes; all that it reads otherwise is closes. */
    default List<BarColumn> reads() {
        return List.of();
    }

    /** Whether it lies on both sides of zero, so that a mean of zero may be assumed; sizes and logarithms of sizes do not. */
    default boolean aroundZero() {
        return true;
    }

    /** Whether it is computed from the table's prices alone, so that an address that holds those holds it. */
    default boolean fromPrices() {
        return true;
    }

    /** Whether its series must be prices, above 0; other series may be levels of any sign, as long as nobody takes a return of them. */
    default boolean takesReturns() {
        return true;
    }

    /** How many bars late it is known; its asset is as late as the earliest of the observations of it. */
    default int barsLate() {
        return 0;
    }

    /** What it is, in words. */
    default String inWords() {
        return word() + " of " + asset();
    }

    /** What it reads and no bar of the table has, so that it would be missing throughout. */
    default List<BarColumn> lacking(PriceTable table) {
        List<BarColumn> lacking = new ArrayList<>(reads());
        if (lacking.isEmpty()) {
            return lacking;
        }
        int index = table.asset(asset());
        Known all = table.knownAt(table.size() - 1);
        for (int bar = 0; bar < table.size() && !lacking.isEmpty(); bar++) {
            int here = bar;
            lacking.removeIf(column -> column.of(all, index, here).isPresent());
        }
        return lacking;
    }

    /** Every kind of observation, by its word in the strategy file. */
    static Shape<Observation> shape() {
        Map<String, Shape<? extends Observation>> kinds = new LinkedHashMap<>();
        kinds.put(LogReturn.WORD, LogReturn.SHAPE);
        kinds.put(SimpleReturn.WORD, SimpleReturn.SHAPE);
        kinds.put(AbsoluteReturn.WORD, AbsoluteReturn.SHAPE);
        kinds.put(LogRealisedVolatility.WORD, LogRealisedVolatility.SHAPE);
        kinds.put(LogParkinsonVolatility.WORD, LogParkinsonVolatility.SHAPE);
        kinds.put(LogGarmanKlassVolatility.WORD, LogGarmanKlassVolatility.SHAPE);
        kinds.put(Change.WORD, Change.SHAPE);
        return Shapes.oneKey(kinds);
    }
}
