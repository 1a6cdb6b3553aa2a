package sojourn.market;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.util.Arrays;
import java.util.Iterator;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.Set;
import java.util.function.Consumer;
import org.apache.commons.csv.CSVFormat;
import org.apache.commons.csv.CSVParser;
import org.apache.commons.csv.CSVRecord;
import sojourn.document.Problem;

/** The text of a file as a header and rows of cells, each of which knows its line and column. */
final class CsvTable {
    private final String file;
    private final String text;
    private final int[] lineStarts;
    private final Separator separator;
    private final Row header;
    private final Iterator<CSVRecord> records;

    private CsvTable(
            String file,
            String text,
            int[] lineStarts,
            Separator separator,
            Iterator<CSVRecord> records,
            CSVRecord header) {
        this.file = file;
        this.text = text;
        this.lineStarts = lineStarts;
        this.separator = separator;
        this.records = records;
        this.header = new Row(header);
    }

    /**
     * Reads the header of {@code text}. Every fault goes to {@code faults}; empty if there is no use in going on.
     *
     * @param stated the separator; if empty, taken from the header line
     */
    static Optional<CsvTable> of(String file, String text, Optional<Separator> stated, Faults faults) {
        String headerLine =
                text.lines().filter(line -> !line.isBlank()).findFirst().orElse("");
        if (headerLine.isEmpty()) {
            faults.add(new Problem(file, 0, 0, "the file is empty", "give a header line and a row for each date"));
            return Optional.empty();
        }
        Separator separator = stated.orElseGet(() -> Separator.detectedIn(headerLine));
        CSVFormat format = CSVFormat.RFC4180
                .builder()
                .setDelimiter(separator.character())
                .setIgnoreEmptyLines(true)
                .setIgnoreSurroundingSpaces(true)
                .get();
        int[] lineStarts = lineStarts(text);
        try {
            Iterator<CSVRecord> records = CSVParser.parse(text, format).iterator();
            CSVRecord header = records.next();
            while (isBlank(header)) {
                header = records.next();
            }
            CsvTable table = new CsvTable(file, text, lineStarts, separator, records, header);
            table.refuseRepeatedNames(faults);
            return Optional.of(table);
        } catch (IOException | UncheckedIOException quotes) {
            faults.add(new Problem(
                    file, 1, 0, "the header cannot be read: a quote opens or closes amiss", "mend its quotes"));
            return Optional.empty();
        }
    }

    /** The column of that name. */
    OptionalInt column(String name) {
        int index = header.cells.indexOf(name);
        return index < 0 ? OptionalInt.empty() : OptionalInt.of(index);
    }

    /** The names of the header, in order. */
    List<String> names() {
        return header.cells;
    }

    /** A fault of the header line. */
    Problem headerProblem(String what, String remedy) {
        return header.problem(0, what, remedy);
    }

    /** Hands each row to {@code reader}, once; blank lines are skipped, rows of another width than the header's are faults. */
    void forEachRow(Faults faults, Consumer<Row> reader) {
        int line = header.line();
        int rows = 0;
        try {
            while (records.hasNext()) {
                CSVRecord read = records.next();
                if (isBlank(read)) {
                    continue;
                }
                Row row = new Row(read);
                line = row.line();
                rows++;
                if (row.cells.size() == names().size()) {
                    reader.accept(row);
                } else {
                    String what = "the row has " + cells(row.cells.size()) + ", the header " + names().size();
                    String remedy = "give every row as many cells as the header; quote a cell that holds the separator";
                    faults.add(row.problem(0, what, remedy), new Faults.Kind(what, -1), remedy);
                }
            }
        } catch (UncheckedIOException quotes) {
            faults.add(new Problem(
                    file,
                    line,
                    0,
                    "the rows after this line cannot be read: a quote opens or closes amiss",
                    "mend the quotes of the next row"));
        }
        faults.lookedAt(rows);
    }

    private static boolean isBlank(CSVRecord record) {
        return record.size() == 1 && record.get(0).isBlank();
    }

    private static String cells(int count) {
        return count + (count == 1 ? " cell" : " cells");
    }

    private void refuseRepeatedNames(Faults faults) {
        Set<String> seen = new LinkedHashSet<>();
        for (int i = 0; i < names().size(); i++) {
            String name = names().get(i);
            if (!name.isEmpty() && !seen.add(name)) {
                faults.add(header.problem(
                        i, "the header names column '" + name + "' twice", "give each column a name of its own"));
            }
        }
    }

    /** Offsets at which lines begin; a line ends with LF, CR LF or CR. */
    private static int[] lineStarts(String text) {
        int[] starts = new int[16];
        int count = 1;
        for (int i = 0; i < text.length(); i++) {
            char c = text.charAt(i);
            boolean beforeLineFeed = i + 1 < text.length() && text.charAt(i + 1) == '\n';
            if (c == '\n' || (c == '\r' && !beforeLineFeed)) {
                if (count == starts.length) {
                    starts = Arrays.copyOf(starts, 2 * count);
                }
                starts[count++] = i + 1;
            }
        }
        return Arrays.copyOf(starts, count);
    }

    /** One row. */
    final class Row {
        private final List<String> cells;
        private final int start;

        private Row(CSVRecord cells) {
            this.cells = cells.stream().map(String::strip).toList();
            this.start = skipBlank((int) cells.getCharacterPosition());
        }

        /** The text of a cell, without blanks around it. */
        String cell(int column) {
            return cells.get(column);
        }

        /** The line on which the row begins, 1-based. */
        int line() {
            return lineOf(start);
        }

        /** A fault at a cell. */
        Problem problem(int column, String what, String remedy) {
            int offset = cellStart(column);
            int line = lineOf(offset);
            return new Problem(file, line, offset - lineStarts[line - 1] + 1, what, remedy);
        }

        private int lineOf(int offset) {
            int found = Arrays.binarySearch(lineStarts, offset);
            return found >= 0 ? found + 1 : -found - 1;
        }

        private int cellStart(int column) {
            boolean quoted = false;
            int offset = start;
            for (int passed = 0; passed < column; offset++) {
                char c = text.charAt(offset);
                quoted ^= c == '"';
                if (c == separator.character() && !quoted) {
                    passed++;
                }
            }
            while (offset < text.length() && text.charAt(offset) == ' ') {
                offset++;
            }
            return offset;
        }

        /** Past the empty lines that the parser counts to the row after them. */
        private int skipBlank(int offset) {
            int at = offset;
            while (at < text.length() && (text.charAt(at) == '\n' || text.charAt(at) == '\r')) {
                at++;
            }
            return at;
        }
    }
}
