package sojourn.market;

import java.time.LocalDate;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import sojourn.numeric.Check;

/**
 * What was known after the close of one bar: dates, prices and cash returns of that bar and of every bar before it. No method
 * returns anything later; asking for a later bar is refused. Where a price file has dividends or splits, they are put back into its
 * prices and volumes, bar by bar, so that returns are what a holder earned; the prices themselves are then not those quoted.
 */
public final class Known {
    private final PriceTable table;
    private final int bar;

    Known(PriceTable table, int bar) {
        this.table = table;
        this.bar = bar;
    }

    /** The last known bar. */
    public int bar() {
        return bar;
    }

    /** The date of the last known bar. */
    public LocalDate date() {
        return table.axis().date(bar);
    }

    /** The date of a known bar. */
    public LocalDate date(int knownBar) {
        return table.axis().date(known(knownBar));
    }

    /** What was known after the close of an earlier bar. */
    public Known at(int knownBar) {
        return table.knownAt(known(knownBar));
    }

    /** Length of the bars. */
    public BarLength barLength() {
        return table.barLength();
    }

    /** Asset names. */
    public List<String> assets() {
        return table.assets();
    }

    /** Close of a known bar. */
    public double close(int asset, int knownBar) {
        return table.reinvested(asset).close().at(known(knownBar));
    }

    /** Close of an asset, or of a series that is none, such as a rate, on a known bar; refuses an unknown name. */
    public double close(String series, int knownBar) {
        return table.closes(series).at(known(knownBar));
    }

    /** Whether an asset has no price of its own on a known bar, so that its close is the last one before, carried. */
    public boolean carried(int asset, int knownBar) {
        return table.carried().at(table.assets().get(asset), known(knownBar));
    }

    /** The same of a series by its name, which may be no asset; refuses an unknown name. */
    public boolean carried(String series, int knownBar) {
        Check.that(
                table.assets().contains(series) || table.levels().contains(series),
                "no series '" + series + "'; known: " + table.assets() + table.levels());
        return table.carried().at(series, known(knownBar));
    }

    /**
     * The last closes of an asset on bars on which it has a price of its own, up to a known bar, in their order: {@code most} of
     * them, or all while there are fewer.
     */
    public double[] ownCloses(int asset, int most, int lastBar) {
        double[] closes = new double[most];
        int found = 0;
        for (int at = known(lastBar); at >= 0 && found < most; at--) {
            if (!carried(asset, at)) {
                found++;
                closes[most - found] = close(asset, at);
            }
        }
        return Arrays.copyOfRange(closes, most - found, most);
    }

    /** Closes from the known bar {@code start} to the last known bar, a copy. */
    public double[] closes(int asset, int start) {
        return table.reinvested(asset).close().range(known(start), bar + 1);
    }

    /** Open of a known bar; empty where the file has none. */
    public OptionalDouble open(int asset, int knownBar) {
        return optional(table.reinvested(asset).open(), knownBar);
    }

    /** High of a known bar; empty where the file has none. */
    public OptionalDouble high(int asset, int knownBar) {
        return optional(table.reinvested(asset).high(), knownBar);
    }

    /** Low of a known bar; empty where the file has none. */
    public OptionalDouble low(int asset, int knownBar) {
        return optional(table.reinvested(asset).low(), knownBar);
    }

    /** Volume of a known bar; empty where the file has none. */
    public OptionalDouble volume(int asset, int knownBar) {
        return optional(table.reinvested(asset).volume(), knownBar);
    }

    /** What cash earned on a known bar, simple. */
    public double cashReturn(int knownBar) {
        return table.cash().earned(known(knownBar));
    }

    /** What cash is expected to earn on the next bar at the rate known now, simple, over a bar of nominal length. */
    public double expectedCashReturn() {
        return table.cash().expectedNext(bar);
    }

    /**
     * Probability of regime {@code state}, computed elsewhere, that counted at the close of a known bar: that of the row which had
     * become known last. Empty before the first row became known, and where there are no such probabilities.
     */
    public OptionalDouble given(int state, int knownBar) {
        int then = known(knownBar);
        return table.given().map(rows -> rows.at(then, state)).orElseGet(OptionalDouble::empty);
    }

    private OptionalDouble optional(Optional<PriceTable.Column> column, int knownBar) {
        int index = known(knownBar);
        if (column.isEmpty()) {
            return OptionalDouble.empty();
        }
        double value = column.get().at(index);
        return Double.isNaN(value) ? OptionalDouble.empty() : OptionalDouble.of(value);
    }

    private int known(int asked) {
        if (asked < 0 || asked > bar) {
            throw new IndexOutOfBoundsException("bar " + asked + " is not known at the close of bar " + bar);
        }
        return asked;
    }
}
