package sojourn.market;

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

    /** Looks at one row; what is NaN is not compared. */
    void look(PriceRow row) {
        boolean closeOutside = outside(row.close(), row);
        if (!closeOutside && !outside(row.open(), row)) {
            return;
        }
        if (count == 0) {
            firstLine = row.line();
            firstPlace = (closeOutside ? "close of " : "open of ") + row.date();
        }
        count++;
    }

    private static boolean outside(double price, PriceRow row) {
        return price > row.high() * (1 + DUST) || price < row.low() * (1 - DUST);
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
