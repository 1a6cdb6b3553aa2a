package sojourn.market;

import java.time.LocalDate;
import java.util.Map;
import java.util.Optional;

/**
 * Counts rows whose open or close lies outside low to high by more than rounding. Prices from columns that were adjusted
 * differently show this way.
 */
final class RangeCheck {
    /** Relative; prices rounded alike keep their order, so only the dust of an adjustment may remain. */
    private static final double DUST = 1e-6;

    private int count;
    private int firstLine;
    private String firstPlace = "";

    /** Looks at one row's values by name; absent or NaN values are not compared. */
    void look(LocalDate date, int line, Map<String, Double> row) {
        double high = row.getOrDefault("high", Double.NaN) * (1 + DUST);
        double low = row.getOrDefault("low", Double.NaN) * (1 - DUST);
        for (String name : new String[] {"close", "open"}) {
            double price = row.getOrDefault(name, Double.NaN);
            if (price > high || price < low) {
                if (count == 0) {
                    firstLine = line;
                    firstPlace = name + " of " + date;
                }
                count++;
                return;
            }
        }
    }

    Optional<Finding> finding(String file) {
        if (count == 0) {
            return Optional.empty();
        }
        return Optional.of(
                new Finding(
                        file,
                        firstLine,
                        "on " + count + (count == 1 ? " row" : " rows")
                                + " the open or close lies outside low to high, first the " + firstPlace,
                        "look whether all columns are adjusted alike for splits and dividends; name columns that belong together"));
    }
}
