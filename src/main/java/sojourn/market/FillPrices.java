package sojourn.market;

import java.util.OptionalDouble;

/** The whole price table, for filling orders and marking positions. Deciding code must not see it. */
public final class FillPrices {
    private final PriceTable table;

    FillPrices(PriceTable table) {
        this.table = table;
    }

    /** The calendar. */
    public TimeAxis axis() {
        return table.axis();
    }

    /** Close of a bar. */
    public double close(int asset, int bar) {
        return table.quoted(asset).close().at(bar);
    }

    /** Whether an asset has no price of its own on a bar, so that its close is carried: good for marking, not for trading. */
    public boolean carried(int asset, int bar) {
        return table.carried().at(table.assets().get(asset), bar);
    }

    /** Open of a bar; empty where the file has none. */
    public OptionalDouble open(int asset, int bar) {
        return table.quoted(asset)
                .open()
                .map(column -> column.at(bar))
                .filter(value -> !value.isNaN())
                .map(OptionalDouble::of)
                .orElseGet(OptionalDouble::empty);
    }

    /** What cash earned on a bar, simple. */
    public double cashReturn(int bar) {
        return table.cash().earned(bar);
    }

    /**
     * Simple interest on one unit of money from the close before to that of {@code bar}, at least 1, by the calendar days between
     * them and the days of a year that cash counts by.
     */
    public double interest(double percentPerYear, int bar) {
        return table.cash().dayCount().interest(percentPerYear, table.axis().calendarDays(bar - 1, bar));
    }

    /** Money that a unit held at the close before is paid on a bar, after that bar's split. */
    public double dividend(int asset, int bar) {
        return table.quoted(asset).dividendOn(bar);
    }

    /** Units that one unit held at the close before becomes on a bar. */
    public double split(int asset, int bar) {
        return table.quoted(asset).splitOn(bar);
    }

    /**
     * What who holds an asset through a bar, at least 1, gains on it, simple: split × (close + dividend) / close before - 1. Without
     * a split and a dividend that is close / close before - 1.
     */
    public double holdersReturn(int asset, int bar) {
        return split(asset, bar) * (close(asset, bar) + dividend(asset, bar)) / close(asset, bar - 1) - 1;
    }

    /** Whether any asset has a column of dividends or splits. */
    public boolean distributes() {
        for (int asset = 0; asset < table.assets().size(); asset++) {
            if (table.quoted(asset).distributes()) {
                return true;
            }
        }
        return false;
    }
}
