package sojourn.archive;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;
import org.apache.commons.csv.CSVFormat;
import org.apache.commons.csv.CSVPrinter;
import sojourn.numeric.ShortestDecimal;

/**
 * Rows under named columns, as a result file holds them: comma, dot, {@code \n}, shortest decimals that read back to the same
 * double (0.0 for a negative zero), an empty cell for what is undefined. Quoted as RFC 4180 says. A text that a spreadsheet would
 * take for a formula, because it begins with {@code =}, {@code +}, {@code -}, {@code @}, a tab or a carriage return, gets an
 * apostrophe in front; numbers are left as they are.
 */
public final class Table {
    private static final CSVFormat FORMAT =
            CSVFormat.DEFAULT.builder().setRecordSeparator('\n').get();

    private static final String FORMULA_STARTS = "=+-@\t\r";

    private final List<String> columns;
    private final List<List<String>> rows = new ArrayList<>();

    /** With these columns and no row. */
    public Table(List<String> columns) {
        this.columns = List.copyOf(columns);
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
        StringBuilder text = new StringBuilder();
        try (CSVPrinter printer = new CSVPrinter(text, FORMAT)) {
            printer.printRecord(columns);
            for (List<String> row : rows) {
                printer.printRecord(row);
            }
        } catch (IOException e) {
            throw new UncheckedIOException("a string cannot fail to be written to", e);
        }
        return text.toString();
    }

    /** A row that is being filled. */
    public final class Row {
        private final List<String> cells = new ArrayList<>(columns.size());

        private Row() {}

        /** A text, a date, a count. */
        public Row add(Object value) {
            String text = value.toString();
            boolean formula = !text.isEmpty() && FORMULA_STARTS.indexOf(text.charAt(0)) >= 0;
            cells.add(formula ? "'" + text : text);
            return this;
        }

        /** A number; NaN and infinity are refused. */
        public Row add(double value) {
            if (!Double.isFinite(value)) {
                throw new IllegalArgumentException("column '" + columns.get(cells.size()) + "' was given " + value);
            }
            cells.add(ShortestDecimal.of(value + 0.0)); // -0.0 + 0.0 is 0.0
            return this;
        }

        /** A number, or nothing. */
        public Row add(OptionalDouble value) {
            return value.isPresent() ? add(value.getAsDouble()) : blank();
        }

        /** An undefined cell. */
        public Row blank() {
            cells.add("");
            return this;
        }

        /** Ends the row, which must be full. */
        public void end() {
            if (cells.size() != columns.size()) {
                throw new IllegalArgumentException(cells.size() + " cells for " + columns.size() + " columns");
            }
            rows.add(List.copyOf(cells));
        }
    }
}
