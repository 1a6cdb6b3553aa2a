package sojourn.market;

import java.util.OptionalInt;

/** What the numbers of a series are. */
enum SeriesKind {
    /** Prices, of which returns are taken: above 0. */
    PRICES(PriceColumn.Bound.ABOVE_ZERO),
    /** Levels, such as rates and spreads, of which only changes are taken: any numbers, and closes alone are read. */
    LEVELS(PriceColumn.Bound.ANY);

    private final PriceColumn.Bound bound;

    SeriesKind(PriceColumn.Bound bound) {
        this.bound = bound;
    }

    /** What a close must keep to. */
    PriceColumn.Bound bound() {
        return bound;
    }

    /** A column besides closes, if it is read. */
    OptionalInt read(OptionalInt column) {
        return this == PRICES ? column : OptionalInt.empty();
    }
}
