package sojourn.report;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import tech.tablesaw.api.StringColumn;

/**
 * A table of texts laid out for a terminal: columns as wide as they need, two spaces between them, the first column flush left and the
 * others flush right. Columns without a table around them: the table's class looks through the whole program for readers and
 * writers of files when it is first used, which takes longer than reading the prices.
 */
final class Grid {
    private static final String GAP = "  ";
    private static final int LEAST_NAME = 8;

    private final List<String> headings;
    private final List<StringColumn> columns = new ArrayList<>();

    /** With headings and no row; two headings may be alike. */
    Grid(List<String> headings) {
        this.headings = List.copyOf(headings);
        headings.forEach(heading -> columns.add(StringColumn.create(heading)));
    }

    /** Adds a row; one cell a heading. */
    void add(List<String> cells) {
        for (int i = 0; i < columns.size(); i++) {
            columns.get(i).append(cells.get(i));
        }
    }

    /** The whole, each line ended. */
    String text() {
        int[] widths = new int[columns.size()];
        for (int i = 0; i < widths.length; i++) {
            widths[i] = headings.get(i).length();
            for (String cell : columns.get(i)) {
                widths[i] = Math.max(widths[i], cell.length());
            }
        }
        narrow(widths);
        StringBuilder text = new StringBuilder();
        line(text, headings, widths);
        for (int i = 0; i < widths.length; i++) {
            text.append(i == 0 ? "" : GAP).append("-".repeat(widths[i]));
        }
        text.append('\n');
        for (int row = 0; row < rows(); row++) {
            int at = row;
            line(text, columns.stream().map(column -> column.get(at)).toList(), widths);
        }
        return text.toString();
    }

    private int rows() {
        return columns.get(0).size();
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
