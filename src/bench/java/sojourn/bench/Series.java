package sojourn.bench;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import sojourn.GivenPrices;

/** The series that the benchmarks run on: the first column of a file, below its header. */
final class Series {
    private Series() {}

    /** The numbers of that file. */
    static double[] read(Path file) {
        try {
            List<String> lines = Files.readAllLines(file);
            return lines.stream()
                    .skip(1)
                    .mapToDouble(line -> Double.parseDouble(line.split(",", 2)[0]))
                    .toArray();
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    /** Prices with those log returns. */
    static GivenPrices prices(double[] logReturns) {
        double[] closes = new double[logReturns.length + 1];
        double sum = 0;
        closes[0] = 100;
        for (int t = 0; t < logReturns.length; t++) {
            sum += logReturns[t];
            closes[t + 1] = 100 * StrictMath.exp(sum);
        }
        return GivenPrices.closes(closes);
    }
}
