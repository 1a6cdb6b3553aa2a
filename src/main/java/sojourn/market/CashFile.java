package sojourn.market;

import java.time.LocalDate;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import sojourn.market.CsvTable.Row;
import sojourn.market.Faults.Kind;

/** Reads rates of interest, percent a year, from the text of a file. An empty rate means that the one before goes on. */
final class CashFile {
    /** Percent a year; beyond it something else than a rate is written. */
    private static final double MOST = 100;

    /** Percent a year; if all rates lie below it they may be fractions. */
    static final double PERHAPS_A_FRACTION = 0.2;

    private final Faults faults;
    private final int column;
    private final DatedRows dated;
    private final List<Rate> rates = new ArrayList<>();
    private final MissingValues missing = new MissingValues("rate");

    private CashFile(CsvTable table, CashSource.Dated source, Faults faults) {
        this.faults = faults;
        CsvColumns named = new CsvColumns(table, faults);
        int date = named.required("date", source.layout().date(), "date");
        this.column = named.required("column", source.column(), "");
        this.dated = new DatedRows(date, source.layout().dateFormat(), BarLength.DAILY, faults);
    }

    private record Rate(LocalDate date, int line, double percentPerYear) {}

    /** A rate file's content. */
    record Content(CashRates rates, int rows, LocalDate first, LocalDate last) {}

    /** The rates in {@code text}; empty if there is any fault. */
    static Optional<Content> read(TextFile text, CashSource.Dated source, Faults faults, List<Finding> findings) {
        Optional<CsvTable> table =
                CsvTable.of(text.file(), text.text(), source.layout().separator(), faults);
        if (table.isEmpty()) {
            return Optional.empty();
        }
        CashFile file = new CashFile(table.get(), source, faults);
        if (!faults.none()) {
            return Optional.empty();
        }
        table.get().forEachRow(faults, file::take);
        file.dated.finish(table.get(), file.missing);
        if (!faults.none()) {
            return Optional.empty();
        }
        file.missing.finding(text.file()).ifPresent(findings::add);
        file.perhapsFractions(text.file()).ifPresent(findings::add);
        return Optional.of(file.content(text.file(), source.dayCount()));
    }

    private Content content(String file, DayCount dayCount) {
        List<LocalDate> dates = rates.stream().map(Rate::date).toList();
        double[] percents = rates.stream().mapToDouble(Rate::percentPerYear).toArray();
        int[] lines = rates.stream().mapToInt(Rate::line).toArray();
        CashRates read = CashRates.inFile(file, dates, percents, lines, dayCount);
        return new Content(read, dates.size(), dates.get(0), dates.get(dates.size() - 1));
    }

    private void take(Row row) {
        Optional<LocalDate> date = dated.dateOf(row);
        if (date.isEmpty()) {
            return;
        }
        String text = row.cell(column);
        if (text.isEmpty()) {
            missing.add(date.get(), row.line());
            return;
        }
        OptionalDouble rate = Decimal.parse(text);
        if (rate.isEmpty()) {
            Decimal.Meant meant = Decimal.meant(text);
            faults.add(
                    row.problem(column, "rate '" + text + "' is not a number", Decimal.remedy(text)),
                    new Kind(meant.name(), column),
                    meant.remedy());
        } else if (Math.abs(rate.getAsDouble()) > MOST) {
            String remedy = "write rates in percent a year, e.g. 2.5";
            faults.add(
                    row.problem(column, "rate " + text + " lies beyond 100 percent a year", remedy),
                    new Kind("size", column),
                    remedy);
        } else {
            rates.add(new Rate(date.get(), row.line(), rate.getAsDouble()));
        }
    }

    private Optional<Finding> perhapsFractions(String file) {
        double most = rates.stream()
                .mapToDouble(rate -> Math.abs(rate.percentPerYear()))
                .max()
                .orElse(0);
        if (most == 0 || most >= PERHAPS_A_FRACTION) {
            return Optional.empty();
        }
        return Optional.of(new Finding(
                file,
                0,
                "no rate is above " + most + " percent a year",
                "look whether the rates are fractions; they are read as percent a year"));
    }
}
