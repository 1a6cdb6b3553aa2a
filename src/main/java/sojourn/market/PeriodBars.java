package sojourn.market;

import java.time.LocalDate;
import java.util.ArrayList;
import java.util.List;
import java.util.function.DoubleBinaryOperator;
import sojourn.market.PriceTable.Bars;
import sojourn.market.PriceTable.Column;

/**
 * Weekly or monthly bars built from days. A bar is dated by its last day; open = first open, high = greatest, low = least,
 * close = last close, volume = sum; a value that one of its days lacks is missing on the bar too (for opens: its first day).
 * A bar exists only once a day of a later period exists, for until then nobody knows that it is complete.
 */
final class PeriodBars {
    private final List<LocalDate> days;
    private final List<Integer> ends = new ArrayList<>();

    /** The complete periods of {@code days}, which increase strictly. */
    PeriodBars(List<LocalDate> days, BarLength length) {
        this.days = days;
        for (int day = 1; day < days.size(); day++) {
            if (!length.periodStart(days.get(day)).equals(length.periodStart(days.get(day - 1)))) {
                ends.add(day);
            }
        }
    }

    /** Last days of the complete periods. */
    List<LocalDate> dates() {
        return ends.stream().map(end -> days.get(end - 1)).toList();
    }

    /** Days after the last complete period. */
    List<LocalDate> unfinished() {
        return days.subList(ends.isEmpty() ? 0 : ends.get(ends.size() - 1), days.size());
    }

    /**
     * One asset's bars, from its values on each day. Prices before a split within the period are in the units after it; a dividend
     * within it goes to who held at the close of the period before, also where an order fills at the period's open.
     */
    Bars of(Bars daily) {
        int[] lastRows = ends.stream().mapToInt(end -> end - 1).toArray();
        Bars even = Distributions.inUnitsOfTheEnd(daily, lastRows);
        Bars joined = new Bars(
                last(even.close()),
                even.open().map(this::first),
                even.high().map(column -> over(column, Math::max)),
                even.low().map(column -> over(column, Math::min)),
                even.volume().map(column -> over(column, Double::sum)));
        return daily.distributes()
                ? joined.giving(Distributions.dividends(daily, lastRows), Distributions.splits(daily, lastRows))
                : joined;
    }

    private Column last(Column daily) {
        return Column.of(ends.stream().mapToDouble(end -> daily.at(end - 1)).toArray());
    }

    private Column first(Column daily) {
        double[] firsts = new double[ends.size()];
        for (int bar = 0; bar < firsts.length; bar++) {
            firsts[bar] = daily.at(start(bar));
        }
        return Column.of(firsts);
    }

    /** NaN on one day stays NaN on the bar: so do max, min and sum. */
    private Column over(Column daily, DoubleBinaryOperator join) {
        double[] joined = new double[ends.size()];
        for (int bar = 0; bar < joined.length; bar++) {
            joined[bar] = daily.at(start(bar));
            for (int day = start(bar) + 1; day < ends.get(bar); day++) {
                joined[bar] = join.applyAsDouble(joined[bar], daily.at(day));
            }
        }
        return Column.of(joined);
    }

    private int start(int bar) {
        return bar == 0 ? 0 : ends.get(bar - 1);
    }
}
