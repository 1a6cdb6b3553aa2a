package sojourn.job;

import java.io.IOException;
import java.io.Reader;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.apache.commons.csv.CSVFormat;
import org.apache.commons.csv.CSVParser;
import org.apache.commons.csv.CSVRecord;

/** A CSV file read back, independently of how it was written. */
final class WrittenTable {
    private final List<String> header;
    private final List<CSVRecord> rows;

    private WrittenTable(List<String> header, List<CSVRecord> rows) {
        this.header = header;
        this.rows = rows;
    }

    static WrittenTable read(Path file) {
        CSVFormat format = CSVFormat.RFC4180
                .builder()
                .setHeader()
                .setSkipHeaderRecord(true)
                .get();
        try (Reader reader = Files.newBufferedReader(file, StandardCharsets.UTF_8);
                CSVParser parser = format.parse(reader)) {
            return new WrittenTable(parser.getHeaderNames(), parser.getRecords());
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    int size() {
        return rows.size();
    }

    List<String> header() {
        return header;
    }

    String text(int row, String column) {
        return rows.get(row).get(column);
    }

    double number(int row, String column) {
        return Double.parseDouble(text(row, column));
    }

    List<String> texts(String column) {
        return rows.stream().map(row -> row.get(column)).toList();
    }

    double[] numbers(String column) {
        return rows.stream()
                .mapToDouble(row -> Double.parseDouble(row.get(column)))
                .toArray();
    }

    /** The first row that has {@code text} in {@code column}. */
    int row(String column, String text) {
        int row = texts(column).indexOf(text);
        if (row < 0) {
            throw new AssertionError("no row with " + column + " " + text + " among " + texts(column));
        }
        return row;
    }
}
