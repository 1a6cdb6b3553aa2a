package sojourn;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.io.InputStream;
import java.io.InputStreamReader;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.List;
import java.util.Objects;
import org.apache.commons.csv.CSVFormat;
import org.apache.commons.csv.CSVRecord;

/** An open data set of {@code open-data/<set>/}: its columns, and values of an independent implementation on them. */
public final class OpenData {
    private OpenData() {}

    /** One column of a CSV file as numbers, blank cells left out. */
    public static double[] column(String file, String name) {
        try (InputStream in = open(file);
                InputStreamReader reader = new InputStreamReader(in, StandardCharsets.UTF_8)) {
            List<Double> values = new ArrayList<>();
            CSVFormat format = CSVFormat.RFC4180
                    .builder()
                    .setHeader()
                    .setSkipHeaderRecord(true)
                    .get();
            for (CSVRecord row : format.parse(reader)) {
                String cell = row.get(name);
                if (!cell.isBlank()) {
                    values.add(Double.parseDouble(cell));
                }
            }
            return values.stream().mapToDouble(v -> v).toArray();
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    /** A JSON file of reference values. */
    public static JsonNode reference(String file) {
        try (InputStream in = open(file)) {
            return new ObjectMapper().readTree(in);
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    private static InputStream open(String file) {
        return Objects.requireNonNull(OpenData.class.getResourceAsStream("/open-data/" + file), file);
    }
}
