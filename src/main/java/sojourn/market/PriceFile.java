package sojourn.market;

import java.time.LocalDate;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import java.util.function.ToDoubleFunction;
import java.util.stream.Stream;
import sojourn.market.CsvTable.Row;
import sojourn.market.PriceColumn.Bound;
import sojourn.market.PriceTable.Bars;
import sojourn.market.PriceTable.Column;

/** Reads one asset's prices from the text of a file. An empty close means that the asset had no price on that day. */
final class PriceFile {
    private final Faults faults;
    private final PriceColumn close;
    private final PriceColumn open;
    private final PriceColumn high;
    private final PriceColumn low;
    private final PriceColumn volume;
    private final PriceColumn dividend;
    private final PriceColumn split;
    private final DatedRows dated;
    private final List<PriceRow> rows = new ArrayList<>();
    private final RangeCheck range = new RangeCheck();
    private final MissingValues missing = new MissingValues("close");

    private PriceFile(CsvTable table, PriceSource source, SeriesKind kind, BarLength rowLength, Faults faults) {
        this.faults = faults;
        CsvColumns named = new CsvColumns(table, faults);
        int date = named.required("date", source.layout().date(), "date");
        this.close = new PriceColumn(
                "close", OptionalInt.of(named.required("close", source.close(), "close")), kind.bound());
        this.open = new PriceColumn("open", kind.read(named.optional("open", source.open())), Bound.ABOVE_ZERO);
        this.high = new PriceColumn("high", kind.read(named.optional("high", source.high())), Bound.ABOVE_ZERO);
        this.low = new PriceColumn("low", kind.read(named.optional("low", source.low())), Bound.ABOVE_ZERO);
        this.volume =
                new PriceColumn("volume", kind.read(named.optional("volume", source.volume())), Bound.NOT_BELOW_ZERO);
        this.dividend = new PriceColumn(
                "dividend", kind.read(onlyIfStated(named, "dividend", source.dividend())), Bound.NOT_BELOW_ZERO);
        this.split =
                new PriceColumn("split", kind.read(onlyIfStated(named, "split", source.split())), Bound.ABOVE_ZERO);
        this.dated = new DatedRows(date, source.layout().dateFormat(), rowLength, faults);
    }

    /** Prices that are adjusted already may stand beside a column of that name. */
    private static OptionalInt onlyIfStated(CsvColumns named, String key, Optional<String> stated) {
        return stated.isPresent() ? named.optional(key, stated) : OptionalInt.empty();
    }

    /**
     * The series in {@code text}; empty if there is any fault. Each fault goes to {@code faults}, what is merely odd to
     * {@code findings}.
     *
     * @param kind prices, or levels, of which closes alone are read
     * @param rowLength the period of one row
     */
    static Optional<PriceSeries> read(
            String asset,
            TextFile text,
            PriceSource source,
            SeriesKind kind,
            BarLength rowLength,
            Faults faults,
            List<Finding> findings) {
        Optional<CsvTable> table =
                CsvTable.of(text.file(), text.text(), source.layout().separator(), faults);
        if (table.isEmpty()) {
            return Optional.empty();
        }
        PriceFile file = new PriceFile(table.get(), source, kind, rowLength, faults);
        if (!faults.none()) {
            return Optional.empty();
        }
        table.get().forEachRow(faults, file::take);
        file.dated.finish(table.get(), file.missing);
        if (!faults.none()) {
            return Optional.empty();
        }
        file.missing.finding(text.file()).ifPresent(findings::add);
        file.range.finding(text.file()).ifPresent(findings::add);
        return Optional.of(file.series(asset, text.file()));
    }

    private void take(Row row) {
        Optional<LocalDate> date = dated.dateOf(row);
        if (date.isEmpty()) {
            return;
        }
        if (close.text(row).isEmpty()) {
            missing.add(date.get(), row.line());
            refuseLost(row, dividend);
            refuseLost(row, split);
            return;
        }
        List<OptionalDouble> read = Stream.of(close, open, high, low, volume, dividend, split)
                .map(column -> column.read(row, faults))
                .toList();
        if (read.stream().allMatch(OptionalDouble::isPresent)) {
            double[] cells =
                    read.stream().mapToDouble(OptionalDouble::getAsDouble).toArray();
            keep(
                    row,
                    new PriceRow(
                            date.get(),
                            row.line(),
                            cells[0],
                            cells[1],
                            cells[2],
                            cells[3],
                            cells[4],
                            Double.isNaN(cells[5]) ? 0 : cells[5],
                            Double.isNaN(cells[6]) ? 1 : cells[6]));
        }
    }

    /** What was given on a day without a close would be lost. */
    private void refuseLost(Row row, PriceColumn given) {
        if (!given.text(row).isEmpty()) {
            String remedy = "write it on the next day that has a close";
            int column = given.index().orElseThrow();
            faults.add(
                    row.problem(
                            column, given.key() + " " + given.text(row) + " stands on a day without a close", remedy),
                    new Faults.Kind("lost", column),
                    remedy);
        }
    }

    private void keep(Row row, PriceRow prices) {
        if (prices.high() < prices.low()) {
            String what = "high " + high.text(row) + " lies below low " + low.text(row);
            String remedy = "mend one of the two";
            int column = high.index().orElseThrow();
            faults.add(row.problem(column, what, remedy), new Faults.Kind("below low", column), remedy);
        } else {
            range.look(prices);
            rows.add(prices);
        }
    }

    private PriceSeries series(String asset, String file) {
        Bars bars = new Bars(
                column(PriceRow::close),
                column(open, PriceRow::open),
                column(high, PriceRow::high),
                column(low, PriceRow::low),
                column(volume, PriceRow::volume),
                column(dividend, PriceRow::dividend),
                column(split, PriceRow::split));
        return PriceSeries.inFile(
                asset,
                rows.stream().map(PriceRow::date).toList(),
                bars,
                file,
                rows.stream().mapToInt(PriceRow::line).toArray());
    }

    private Optional<Column> column(PriceColumn named, ToDoubleFunction<PriceRow> value) {
        return named.present() ? Optional.of(column(value)) : Optional.empty();
    }

    private Column column(ToDoubleFunction<PriceRow> value) {
        return Column.of(rows.stream().mapToDouble(value).toArray());
    }
}
