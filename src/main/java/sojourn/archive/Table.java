package sojourn.archive;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;
import org.apache.commons.csv.CSVFormat;
import sojourn.numeric.ShortestDecimal;

/**
 * Rows under named columns, as a result file holds them: comma, dot, {@code \n}, shortest decimals that read back to the same
 * double (0.0 for a negative zero), an empty cell for what is undefined. Quoted as RFC 4180 says. A text that a spreadsheet would
 * take for a formula, because it begins with {@code =}, {@code +}, {@code -}, {@code @}, a tab or a carriage return, gets an
 * apostrophe in front; numbers are left as they are, and are written without a look for what may need quotes: most cells are numbers.
 */
public final class Table {
    private static final CSVFormat FORMAT =
            CSVFormat.DEFAULT.builder().setRecordSeparator('\n').get();

    private static final String FORMULA_STARTS = "=+-@\t\r";

    private final List<String> columns;
    private final List<List<String>> rows = new ArrayList<>();
    private final StringBuilder csv = new StringBuilder();

    /** With these columns and no row. */
    public Table(List<String> columns) {
        this.columns = List.copyOf(columns);
        for (int i = 0; i < columns.size(); i++) {
            write(columns.get(i), i, csv);
        }
        csv.append('\n');
    }

    /** Begins a row; its cells are added in the order of the columns. */
    public Row row() {
        return new Row();
    }

    /** Column names. */
    public List<String> columns() {
        return columns;
    }

    /** Cells of each row. */
    public List<List<String>> rows() {
        return List.copyOf(rows);
    }

    /** The whole table as CSV text. */
    public String csv() {
        return csv.toString();
    }

    /** Adds a cell of a column, with what separates it from the one before, and with quotes where it needs them. */
    private static void write(String cell, int column, StringBuilder to) {
        try {
            FORMAT.print(cell, to, column == 0);
        } catch (IOException e) {
            throw new UncheckedIOException("a string cannot fail to be written to", e);
        }
    }

    /** A row that is being filled. */
    public final class Row {
        private final List<String> cells = new ArrayList<>(columns.size());
        private final StringBuilder line = new StringBuilder();

        private Row() {}

        /** A text, a date, a count. */
        public Row add(Object value) {
            String text = value.toString();
            boolean formula = !text.isEmpty() && FORMULA_STARTS.indexOf(text.charAt(0)) >= 0;
            String cell = formula ? "'" + text : text;
            write(cell, cells.size(), line);
            cells.add(cell);
            return this;
        }

        /** A number; NaN and infinity are refused. */
        public Row add(double value) {
            if (!Double.isFinite(value)) {
                throw new IllegalArgumentException("column '" + columns.get(cells.size()) + "' was given " + value);
            }
            return addPlain(ShortestDecimal.of(value + 0.0)); // -0.0 + 0.0 is 0.0
        }

        /** A number, or nothing. */
        public Row add(OptionalDouble value) {
            return value.isPresent() ? add(value.getAsDouble()) : blank();
        }

        /** An undefined cell. */
        public Row blank() {
            return addPlain("");
        }

        /** Ends the row, which must be full. */
        public void end() {
            if (cells.size() != columns.size()) {
                throw new IllegalArgumentException(cells.size() + " cells for " + columns.size() + " columns");
            }
            rows.add(List.copyOf(cells));
            csv.append(line).append('\n');
        }

        /** A cell that needs no quotes; the first of a row is left to the writer, which tells an empty row from no row. */
        private Row addPlain(String cell) {
            if (cells.isEmpty()) {
                write(cell, 0, line);
            } else {
                line.append(',').append(cell);
            }
            cells.add(cell);
            return this;
        }
    }
}
