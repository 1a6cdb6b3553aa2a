package sojourn.market;

import java.time.LocalDate;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import sojourn.market.CsvTable.Row;
import sojourn.market.PriceTable.Bars;
import sojourn.market.PriceTable.Column;

/** Reads one asset's prices from the text of a file. An empty close means that the asset had no price on that day. */
final class PriceFile {
    private static final String CLOSE = "close";
    private static final String OPEN = "open";
    private static final String HIGH = "high";
    private static final String LOW = "low";
    private static final String VOLUME = "volume";

    private final Faults faults;
    private final Map<String, Integer> columns = new LinkedHashMap<>();
    private final Map<String, List<Double>> values = new LinkedHashMap<>();
    private final DatedRows dated;
    private final RangeCheck range = new RangeCheck();
    private final MissingValues missing = new MissingValues(CLOSE);

    private PriceFile(CsvTable table, String file, PriceSource source, BarLength rowLength, Faults faults) {
        this.faults = faults;
        CsvColumns named = new CsvColumns(table, faults);
        int date = named.required("date", source.layout().date());
        columns.put(CLOSE, named.required(CLOSE, source.close()));
        put(OPEN, named.optional(OPEN, source.open()));
        put(HIGH, named.optional(HIGH, source.high()));
        put(LOW, named.optional(LOW, source.low()));
        put(VOLUME, named.optional(VOLUME, source.volume()));
        columns.keySet().forEach(name -> values.put(name, new ArrayList<>()));
        this.dated = new DatedRows(date, source.layout().dateFormat(), rowLength, file, faults);
    }

    private void put(String name, OptionalInt column) {
        column.ifPresent(index -> columns.put(name, index));
    }

    /**
     * The series in {@code text}; empty if there is any fault. Each fault goes to {@code faults}, what is merely odd to
     * {@code findings}.
     *
     * @param rowLength the period of one row
     */
    static Optional<PriceSeries> read(
            String asset,
            TextFile text,
            PriceSource source,
            BarLength rowLength,
            Faults faults,
            List<Finding> findings) {
        Optional<CsvTable> table =
                CsvTable.of(text.file(), text.text(), source.layout().separator(), faults);
        if (table.isEmpty()) {
            return Optional.empty();
        }
        PriceFile file = new PriceFile(table.get(), text.file(), source, rowLength, faults);
        if (!faults.none()) {
            return Optional.empty();
        }
        table.get().forEachRow(faults, file::take);
        file.dated.finish(table.get(), CLOSE);
        if (!faults.none()) {
            return Optional.empty();
        }
        file.missing.finding(text.file()).ifPresent(findings::add);
        file.range.finding(text.file()).ifPresent(findings::add);
        Bars bars = new Bars(
                file.column(CLOSE).orElseThrow(),
                file.column(OPEN),
                file.column(HIGH),
                file.column(LOW),
                file.column(VOLUME));
        return Optional.of(PriceSeries.inFile(asset, file.dated.dates(), bars, text.file(), file.dated.lines()));
    }

    private void take(Row row) {
        Optional<LocalDate> date = dated.dateOf(row);
        if (date.isEmpty()) {
            return;
        }
        if (row.cell(columns.get(CLOSE)).isEmpty()) {
            missing.add(date.get(), row.line());
            return;
        }
        Map<String, Double> read = new LinkedHashMap<>();
        columns.forEach((name, column) -> value(row, name, column).ifPresent(value -> read.put(name, value)));
        if (read.size() < columns.size() || highBelowLow(row, read)) {
            return;
        }
        range.look(date.get(), row.line(), read);
        dated.keep(date.get(), row);
        read.forEach((name, value) -> values.get(name).add(value));
    }

    /** The number in a cell; NaN for an empty one; empty, and a fault, for anything that is no price or volume. */
    private OptionalDouble value(Row row, String name, int column) {
        String text = row.cell(column);
        if (text.isEmpty()) {
            return OptionalDouble.of(Double.NaN);
        }
        OptionalDouble number = Decimal.parse(text);
        if (number.isEmpty()) {
            faults.add(row.problem(column, name + " '" + text + "' is not a number", Decimal.remedy(text)));
        } else if (Double.isInfinite(number.getAsDouble())) {
            faults.add(row.problem(column, name + " " + text + " is too large", "mend the number"));
            return OptionalDouble.empty();
        } else if (name.equals(VOLUME) ? number.getAsDouble() < 0 : number.getAsDouble() <= 0) {
            faults.add(row.problem(
                    column,
                    name + " " + text + (name.equals(VOLUME) ? " is below 0" : " is not above 0"),
                    "mend it, or leave the cell empty if there is none"));
            return OptionalDouble.empty();
        }
        return number;
    }

    private boolean highBelowLow(Row row, Map<String, Double> read) {
        double high = read.getOrDefault(HIGH, Double.NaN);
        double low = read.getOrDefault(LOW, Double.NaN);
        if (!(high < low)) {
            return false;
        }
        faults.add(row.problem(
                columns.getOrDefault(HIGH, 0), "high " + high + " lies below low " + low, "mend one of the two"));
        return true;
    }

    private Optional<Column> column(String name) {
        return Optional.ofNullable(values.get(name))
                .map(list ->
                        Column.of(list.stream().mapToDouble(Double::doubleValue).toArray()));
    }
}
