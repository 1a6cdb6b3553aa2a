package sojourn.market;

import java.math.BigDecimal;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import sojourn.market.CsvTable.Row;
import sojourn.market.Faults.Kind;

/**
 * Reads probabilities of regimes, computed elsewhere, from the text of a file. Those of a row must sum to 1 within
 * {@value #TOLERANCE}, for files are rounded; they are then divided by their sum.
 */
final class GivenFile {
    private static final double TOLERANCE = 1e-6;

    private final Faults faults;
    private final GivenColumns wanted;
    private final DatedRows dated;
    private final int knownOn;
    private final List<Integer> columns = new ArrayList<>();
    private final List<GivenRow> rows = new ArrayList<>();

    private GivenFile(CsvTable table, GivenColumns wanted, Faults faults) {
        this.faults = faults;
        this.wanted = wanted;
        CsvLayout layout = wanted.source().layout();
        CsvColumns named = new CsvColumns(table, faults);
        int date = named.required("date", layout.date(), "date");
        this.knownOn = named.required("known-on", wanted.source().knownOn(), "");
        for (String state : wanted.states()) {
            columns.add(named.required("states", state, ""));
        }
        this.dated = new DatedRows(date, layout.dateFormat(), BarLength.DAILY, faults);
    }

    /** The rows in {@code text}; empty if there is any fault. */
    static Optional<GivenRows> read(TextFile text, GivenColumns wanted, Faults faults) {
        Optional<CsvTable> table =
                CsvTable.of(text.file(), text.text(), wanted.source().layout().separator(), faults);
        if (table.isEmpty()) {
            return Optional.empty();
        }
        GivenFile file = new GivenFile(table.get(), wanted, faults);
        if (!faults.none()) {
            return Optional.empty();
        }
        table.get().forEachRow(faults, file::take);
        file.dated.finish(table.get(), new MissingValues("probability"));
        return faults.none() ? Optional.of(new GivenRows(text.file(), wanted.states(), file.rows)) : Optional.empty();
    }

    private void take(Row row) {
        Optional<LocalDate> date = dated.dateOf(row);
        Optional<LocalDate> known = knownOn(row);
        if (date.isPresent() && known.isPresent() && known.get().isBefore(date.get())) {
            String remedy =
                    "a probability cannot be known before the day it is of; write the day on which it became known";
            faults.add(
                    row.problem(
                            knownOn,
                            "the probabilities of " + date.get() + " are said to be known on " + known.get(),
                            remedy),
                    new Kind("known before its date", knownOn),
                    remedy);
            return;
        }
        Optional<List<Double>> probabilities = probabilities(row);
        if (date.isPresent() && known.isPresent() && probabilities.isPresent()) {
            rows.add(new GivenRow(date.get(), known.get(), probabilities.get(), row.line()));
        }
    }

    private Optional<LocalDate> knownOn(Row row) {
        String text = row.cell(knownOn);
        DatePattern pattern = wanted.source().layout().dateFormat();
        Optional<LocalDate> date = pattern.parse(text);
        if (date.isEmpty()) {
            String remedy = "give every row the date on which it became known, e.g. " + pattern.example();
            String what = text.isEmpty()
                    ? "the row does not say when it became known"
                    : "date '" + text + "' is not written as " + pattern;
            faults.add(row.problem(knownOn, what, remedy), new Kind("not known when", knownOn), remedy);
        }
        return date;
    }

    /** The probabilities of a row; empty, and a fault, if they are none. */
    private Optional<List<Double>> probabilities(Row row) {
        List<Double> read = new ArrayList<>();
        BigDecimal sum = BigDecimal.ZERO; // of the decimals as written, so that 0.7 and 0.3 make 1
        for (int k = 0; k < columns.size(); k++) {
            OptionalDouble probability = probability(row, columns.get(k));
            if (probability.isEmpty()) {
                return Optional.empty();
            }
            read.add(probability.getAsDouble());
            sum = sum.add(BigDecimal.valueOf(probability.getAsDouble()));
        }
        double total = sum.doubleValue();
        if (Math.abs(total - 1) > TOLERANCE) {
            String remedy = "give probabilities that sum to 1 in every row, one column for each of 'states'";
            faults.add(
                    row.problem(
                            columns.get(0),
                            "the probabilities of " + String.join(", ", wanted.states()) + " sum to "
                                    + sum.toPlainString(),
                            remedy),
                    new Kind("sum", columns.get(0)),
                    remedy);
            return Optional.empty();
        }
        return Optional.of(read.stream().map(p -> p / total).toList());
    }

    private OptionalDouble probability(Row row, int column) {
        String text = row.cell(column);
        OptionalDouble number = Decimal.parse(text);
        if (number.isEmpty()) {
            String what = text.isEmpty() ? "a probability is missing" : "probability '" + text + "' is not a number";
            String remedy = text.isEmpty()
                    ? "give one, or leave the row out: the one before goes on counting"
                    : "write numbers such as 0.7";
            faults.add(row.problem(column, what, remedy), new Kind("no number", column), remedy);
            return number;
        }
        double probability = number.getAsDouble();
        if (!(probability >= 0 && probability <= 1)) {
            String remedy = "write probabilities as fractions from 0 to 1, 0.7 for 70 percent";
            faults.add(
                    row.problem(column, text + " is not a probability", remedy),
                    new Kind("not a probability", column),
                    remedy);
            return OptionalDouble.empty();
        }
        return number;
    }
}
