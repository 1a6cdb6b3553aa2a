package sojourn.market;

import java.time.LocalDate;
import java.util.ArrayList;
import java.util.BitSet;
import java.util.Collection;
import java.util.List;
import java.util.Optional;
import java.util.TreeSet;
import sojourn.market.PriceTable.Bars;
import sojourn.market.PriceTable.Column;

/**
 * Days on which any of several series has a row, from the day by which all have had one. A series without a row of its own keeps its
 * last close, and has no other value, no dividend and no split on such a day. They end with the last row of any series: cut at a
 * date, the days up to it are the same.
 */
final class UnionDays {
    private final List<LocalDate> days;

    private UnionDays(List<LocalDate> days) {
        this.days = days;
    }

    /** Those of {@code series}, of which there is at least one. */
    static UnionDays of(List<PriceSeries> series) {
        TreeSet<LocalDate> any = new TreeSet<>();
        series.forEach(one -> any.addAll(one.dates()));
        LocalDate start = series.stream()
                .map(PriceSeries::first)
                .max(LocalDate::compareTo)
                .orElseThrow();
        return new UnionDays(List.copyOf(any.tailSet(start)));
    }

    /** The dates, strictly increasing. */
    List<LocalDate> days() {
        return days;
    }

    /** The days on which a series has no row of its own, counted from 0. */
    BitSet carried(PriceSeries one) {
        Collection<LocalDate> own = new TreeSet<>(one.dates());
        BitSet carried = new BitSet();
        for (int day = 0; day < days.size(); day++) {
            carried.set(day, !own.contains(days.get(day)));
        }
        return carried;
    }

    /** A series on every day. */
    Bars of(PriceSeries one) {
        BitSet carried = carried(one);
        List<LocalDate> own = new ArrayList<>();
        for (int day = 0; day < days.size(); day++) {
            if (!carried.get(day)) {
                own.add(days.get(day));
            }
        }
        Bars rows = Distributions.at(one.bars(), one.rowsOf(own));
        return new Bars(
                closes(one),
                missing(rows.open(), carried),
                missing(rows.high(), carried),
                missing(rows.low(), carried),
                missing(rows.volume(), carried),
                rows.dividend().map(column -> spread(column, carried, 0)),
                rows.split().map(column -> spread(column, carried, 1)));
    }

    private Column closes(PriceSeries one) {
        double[] closes = new double[days.size()];
        int row = 0;
        for (int day = 0; day < closes.length; day++) {
            while (row + 1 < one.size() && !one.dates().get(row + 1).isAfter(days.get(day))) {
                row++;
            }
            closes[day] = one.close(row);
        }
        return Column.of(closes);
    }

    private Optional<Column> missing(Optional<Column> own, BitSet carried) {
        return own.map(column -> spread(column, carried, Double.NaN));
    }

    private Column spread(Column own, BitSet carried, double otherwise) {
        double[] values = new double[days.size()];
        int row = 0;
        for (int day = 0; day < values.length; day++) {
            values[day] = carried.get(day) ? otherwise : own.at(row++);
        }
        return Column.of(values);
    }

    /** What there is to say about the days on which a series' close is carried; empty if there is none. */
    Optional<Finding> finding(PriceSeries one) {
        BitSet carried = carried(one);
        if (carried.isEmpty()) {
            return Optional.empty();
        }
        int first = carried.nextSetBit(0);
        int last = carried.length() - 1;
        int longest = 0;
        for (int day = first; day >= 0; day = carried.nextSetBit(carried.nextClearBit(day))) {
            longest = Math.max(longest, carried.nextClearBit(day) - day);
        }
        int ownLess = carried.cardinality();
        return Optional.of(new Finding(
                one.file(),
                0,
                one.asset() + " has no row on " + ownLess + " of " + days.size() + " bars, the first " + days.get(first)
                        + ", the last " + days.get(last) + ", at most " + longest
                        + " in a row: its last close is carried for marking, and not traded or observed",
                "nothing to do if it did not trade then; orders that hold or trade it wait for its next row"));
    }
}
