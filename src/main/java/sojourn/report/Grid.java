package sojourn.report;

import java.util.List;
import java.util.Locale;
import tech.tablesaw.api.Row;
import tech.tablesaw.api.StringColumn;
import tech.tablesaw.api.Table;

/**
 * A table of texts laid out for a terminal: columns as wide as they need, two spaces between them, the first column flush left and the
 * others flush right.
 */
final class Grid {
    private static final String GAP = "  ";
    private static final int LEAST_NAME = 8;

    private final List<String> headings;
    private final Table table;

    /** With headings and no row; two headings may be alike. */
    Grid(List<String> headings) {
        this.headings = List.copyOf(headings);
        this.table = Table.create();
        for (int i = 0; i < headings.size(); i++) {
            table.addColumns(StringColumn.create(i + " " + headings.get(i)));
        }
    }

    /** Adds a row; one cell a heading. */
    void add(List<String> cells) {
        Row row = table.appendRow();
        for (int i = 0; i < cells.size(); i++) {
            row.setString(i, cells.get(i));
        }
    }

    /** The whole, each line ended. */
    String text() {
        int columns = table.columnCount();
        int[] widths = new int[columns];
        for (int i = 0; i < columns; i++) {
            widths[i] = headings.get(i).length();
            for (String cell : table.stringColumn(i)) {
                widths[i] = Math.max(widths[i], cell.length());
            }
        }
        narrow(widths);
        StringBuilder text = new StringBuilder();
        line(text, headings, widths);
        for (int i = 0; i < columns; i++) {
            text.append(i == 0 ? "" : GAP).append("-".repeat(widths[i]));
        }
        text.append('\n');
        for (Row row : table) {
            String[] cells = new String[columns];
            for (int i = 0; i < columns; i++) {
                cells[i] = row.getString(i);
            }
            line(text, List.of(cells), widths);
        }
        return text.toString();
    }

    /** Takes from the first column, which holds names, what is too much for a line. */
    private static void narrow(int[] widths) {
        int line = GAP.length() * (widths.length - 1);
        for (int width : widths) {
            line += width;
        }
        int tooMuch = Math.max(0, line - Lines.WIDTH);
        widths[0] = Math.max(Math.min(LEAST_NAME, widths[0]), widths[0] - tooMuch);
    }

    private static String fitted(String cell, int width) {
        return cell.length() <= width ? cell : cell.substring(0, width - 1) + "…";
    }

    private static void line(StringBuilder text, List<String> cells, int[] widths) {
        StringBuilder line = new StringBuilder();
        for (int i = 0; i < widths.length; i++) {
            String format = i == 0 ? "%-" + widths[i] + "s" : "%" + widths[i] + "s";
            line.append(i == 0 ? "" : GAP).append(String.format(Locale.ROOT, format, fitted(cells.get(i), widths[i])));
        }
        text.append(line.toString().stripTrailing()).append('\n');
    }
}
