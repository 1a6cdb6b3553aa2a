package sojourn.market;

import java.time.LocalDate;
import java.util.Optional;
import sojourn.market.CsvTable.Row;

/** Reads the dates of a table's rows, and sees that they rise: one row a date, one row a bar where rows are bars. */
final class DatedRows {
    private final int column;
    private final DatePattern pattern;
    private final BarLength rowLength;
    private final Faults faults;
    private final Faults disorder;
    private Optional<LocalDate> previous = Optional.empty();
    private int rows;
    private int steps;
    private int backward;

    DatedRows(int column, DatePattern pattern, BarLength rowLength, Faults faults) {
        this.column = column;
        this.pattern = pattern;
        this.rowLength = rowLength;
        this.faults = faults;
        this.disorder = new Faults();
    }

    /** The date of the next row; a fault and empty if it has none. */
    Optional<LocalDate> dateOf(Row row) {
        String text = row.cell(column);
        Optional<LocalDate> date = pattern.parse(text);
        if (date.isEmpty()) {
            faults.add(row.problem(
                    column,
                    text.isEmpty() ? "the row has no date" : "date '" + text + "' is not written as " + pattern,
                    text.isEmpty()
                            ? "give every row a date"
                            : "write dates as " + pattern.example() + ", or say how they are written: date-format: …"));
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
            Faults one = new Faults();
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
            disorder.add(row.problem(
                    column, "date " + date + " comes after " + before, "sort the rows by date, oldest first"));
        } else if (date.equals(before)) {
            disorder.add(row.problem(column, "date " + date + " stands twice", "keep one row for each date"));
        } else if (rowLength.periodStart(date).equals(rowLength.periodStart(before))) {
            disorder.add(row.problem(
                    column,
                    "date " + date + " lies in the same " + rowLength.period() + " as " + before
                            + ", though each row is said to be one bar",
                    "keep one row for each " + rowLength.period() + ", or write rows: days"));
        }
    }
}
