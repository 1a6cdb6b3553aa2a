package sojourn.market;

import java.time.DayOfWeek;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.SortedMap;
import java.util.TreeMap;
import java.util.function.UnaryOperator;
import sojourn.market.PriceTable.Bars;
import sojourn.market.PriceTable.Column;
import sojourn.numeric.Check;

/** The same history with another end: cut short, as it stood at an earlier close, or one invented bar longer. */
public final class AnotherEnd {
    private AnotherEnd() {}

    /** The first {@code bars} bars, at least 1: what a table of that day would hold. */
    public static PriceTable cut(PriceTable table, int bars) {
        Check.within(bars, 1, table.size(), "bars");
        int[] kept = new int[bars];
        List<LocalDate> dates = new ArrayList<>();
        double[] earned = new double[bars];
        double[] expected = new double[bars];
        for (int bar = 0; bar < bars; bar++) {
            kept[bar] = bar;
            dates.add(table.axis().date(bar));
            earned[bar] = table.cash().earned(bar);
            expected[bar] = table.cash().expectedNext(bar);
        }
        List<Bars> columns = new ArrayList<>();
        for (int asset = 0; asset < table.assets().size(); asset++) {
            columns.add(table.quoted(asset).each(column -> column.at(kept)));
        }
        return of(table, dates, columns, CashReturns.of(earned, expected), level -> level.at(kept));
    }

    /**
     * One bar more, on {@code date}: each asset runs straight from its last close to the one that its simple return leads to, so the
     * open is the last close and high and low are the two; no volume, dividend or split. Cash goes on at the rate in force, levels
     * stay where they are, and so do given probabilities.
     *
     * @param simpleReturns above -1, one an asset
     */
    public static PriceTable longer(PriceTable table, LocalDate date, List<Double> simpleReturns) {
        int bars = table.size();
        List<LocalDate> dates = new ArrayList<>();
        double[] earned = new double[bars + 1];
        double[] expected = new double[bars + 1];
        for (int bar = 0; bar < bars; bar++) {
            dates.add(table.axis().date(bar));
            earned[bar] = table.cash().earned(bar);
            expected[bar] = table.cash().expectedNext(bar);
        }
        dates.add(date);
        expected[bars] = expected[bars - 1];
        TimeAxis axis = TimeAxis.of(table.barLength(), dates);
        earned[bars] = expected[bars] / table.barLength().nominalDays() * axis.calendarDays(bars - 1, bars);
        List<Bars> columns = new ArrayList<>();
        for (int asset = 0; asset < table.assets().size(); asset++) {
            Bars quoted = table.quoted(asset);
            columns.add(straight(quoted, quoted.close().at(bars - 1) * (1 + simpleReturns.get(asset))));
        }
        return of(table, dates, columns, CashReturns.of(earned, expected), level -> and(level, level.at(bars - 1)));
    }

    /** The date that an invented bar after the last one gets: the next weekday, the same day a week on or a month on. */
    public static LocalDate nextDate(PriceTable table) {
        LocalDate last = table.axis().date(table.size() - 1);
        if (table.barLength() == BarLength.WEEKLY) {
            return last.plusWeeks(1);
        }
        if (table.barLength() == BarLength.MONTHLY) {
            return last.plusMonths(1);
        }
        LocalDate next = last.plusDays(1);
        while (next.getDayOfWeek() == DayOfWeek.SATURDAY || next.getDayOfWeek() == DayOfWeek.SUNDAY) {
            next = next.plusDays(1);
        }
        return next;
    }

    private static Bars straight(Bars bars, double close) {
        double last = bars.close().at(bars.close().size() - 1);
        return new Bars(
                and(bars.close(), close),
                bars.open().map(column -> and(column, last)),
                bars.high().map(column -> and(column, Math.max(last, close))),
                bars.low().map(column -> and(column, Math.min(last, close))),
                bars.volume().map(column -> and(column, Double.NaN)),
                bars.dividend().map(column -> and(column, 0)),
                bars.split().map(column -> and(column, 1)));
    }

    private static Column and(Column column, double value) {
        double[] longer = new double[column.size() + 1];
        for (int bar = 0; bar < column.size(); bar++) {
            longer[bar] = column.at(bar);
        }
        longer[column.size()] = value;
        return Column.of(longer);
    }

    private static PriceTable of(
            PriceTable table,
            List<LocalDate> dates,
            List<Bars> columns,
            CashReturns cash,
            UnaryOperator<Column> level) {
        SortedMap<String, Column> levels = new TreeMap<>();
        table.levels().forEach(name -> levels.put(name, level.apply(table.closes(name))));
        PriceTable other = PriceTable.of(
                        TimeAxis.of(table.barLength(), dates),
                        table.assets(),
                        columns,
                        cash.countedBy(table.cash().dayCount()))
                .withLevels(levels)
                .withCarried(table.carried());
        Optional<GivenByBar> given = table.given();
        return given.isEmpty() ? other : other.withGiven(given.get().over(dates.size()));
    }
}
