package sojourn.market;

import java.time.LocalDate;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import sojourn.market.CsvTable.Row;

/** Reads the dates of a table's rows, and sees that they rise: one row a date, one row a bar where rows are bars. */
final class DatedRows {
    private final int column;
    private final DatePattern pattern;
    private final BarLength rowLength;
    private final Faults faults;
    private final Faults disorder;
    private final List<LocalDate> dates = new ArrayList<>();
    private final List<Integer> lines = new ArrayList<>();
    private Optional<LocalDate> previous = Optional.empty();
    private int steps;
    private int backward;

    DatedRows(int column, DatePattern pattern, BarLength rowLength, String file, Faults faults) {
        this.column = column;
        this.pattern = pattern;
        this.rowLength = rowLength;
        this.faults = faults;
        this.disorder = new Faults(file);
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
        return date;
    }

    /** Counts the row, dated {@code date}, as one of the series. */
    void keep(LocalDate date, Row row) {
        dates.add(date);
        lines.add(row.line());
    }

    /** Hands over the faults of order (those of a file that runs backwards as one), and a lack of rows with a {@code value}. */
    void finish(CsvTable table, String value) {
        if (steps > 1 && backward == steps) {
            Faults one = new Faults("");
            one.add(table.headerProblem("dates run from the newest to the oldest", "sort the rows, oldest first"));
            faults.add(one);
        } else {
            faults.add(disorder);
        }
        if (faults.none() && dates.isEmpty()) {
            faults.add(table.headerProblem(
                    previous.isEmpty() ? "no row follows the header" : "no row has a " + value,
                    "give a row for each date"));
        }
    }

    List<LocalDate> dates() {
        return List.copyOf(dates);
    }

    int[] lines() {
        return lines.stream().mapToInt(Integer::intValue).toArray();
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
