package sojourn.market;

import java.time.LocalDate;
import java.util.Optional;
import sojourn.market.CsvTable.Row;
import sojourn.market.Faults.Kind;

/** Reads the dates of a table's rows, and sees that they rise: one row a date, one row a bar where rows are bars. */
final class DatedRows {
    private final int column;
    private final DatePattern pattern;
    private final BarLength rowLength;
    private final Faults faults;
    private final Faults disorder;
    private final DateForms forms;
    private Optional<LocalDate> previous = Optional.empty();
    private int rows;
    private int steps;
    private int backward;

    DatedRows(int column, DatePattern pattern, BarLength rowLength, Faults faults) {
        this.column = column;
        this.pattern = pattern;
        this.rowLength = rowLength;
        this.faults = faults;
        this.disorder = new Faults(faults.owner());
        this.forms = new DateForms(pattern);
    }

    /** The date of the next row; a fault and empty if it has none. */
    Optional<LocalDate> dateOf(Row row) {
        String text = row.cell(column);
        Optional<LocalDate> date = pattern.parse(text);
        if (date.isEmpty()) {
            notADate(row, text);
            return date;
        }
        previous.ifPresent(before -> follow(before, date.get(), row));
        previous = date;
        rows++;
        return date;
    }

    /** Hands over the faults of order (those of a file that runs backwards as one), and that of a file without any value. */
    void finish(CsvTable table, MissingValues missing) {
        if (steps > 1 && backward == steps) {
            Faults one = new Faults(faults.owner());
            one.add(table.headerProblem("dates run from the newest to the oldest", "sort the rows, oldest first"));
            faults.add(one);
        } else {
            faults.add(disorder);
        }
        if (faults.none() && rows == missing.count()) {
            faults.add(table.headerProblem(
                    rows == 0 ? "no row follows the header" : "no row has a " + missing.name(),
                    "give a row for each date"));
        }
    }

    private void follow(LocalDate before, LocalDate date, Row row) {
        steps++;
        if (date.isBefore(before)) {
            backward++;
            disorder(row, "order", "date " + date + " comes after " + before, "sort the rows by date, oldest first");
        } else if (date.equals(before)) {
            disorder(row, "twice", "date " + date + " stands twice", "keep one row for each date");
        } else if (rowLength.periodStart(date).equals(rowLength.periodStart(before))) {
            disorder(
                    row,
                    "period",
                    "date " + date + " lies in the same " + rowLength.period() + " as " + before
                            + ", though each row is said to be one bar",
                    "keep one row for each " + rowLength.period() + ", or write rows: days");
        }
    }

    private void disorder(Row row, String kind, String what, String remedy) {
        disorder.add(row.problem(column, what, remedy), new Kind(kind, column), remedy);
    }

    private void notADate(Row row, String text) {
        if (text.isEmpty()) {
            String remedy = "give every row a date";
            faults.add(row.problem(column, "the row has no date", remedy), new Kind("no date", column), remedy);
        } else {
            String remedy = forms.remedy(text);
            String what = "date '" + text + "' is not written as " + pattern;
            faults.add(row.problem(column, what, remedy), new Kind("date " + forms.shape(text), column), remedy);
        }
    }
}
