package sojourn;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.List;
import sojourn.numeric.RandomStream;

/** Open price files, cut short: written into a folder as they would have stood there in the past. */
final class PriceHistory {
    private static final Path OPEN_DATA = Path.of("src", "test", "resources", "open-data");

    private final List<String> lines;

    private PriceHistory(List<String> lines) {
        this.lines = lines;
    }

    /** The NYSE composite, daily, 1990 to 2005. */
    static PriceHistory stocks() {
        return of("nyse/nyse_1990_2005.csv");
    }

    /** A file below the folder of open data, its dates in the first column. */
    static PriceHistory of(String name) {
        try {
            return new PriceHistory(Files.readAllLines(OPEN_DATA.resolve(name)));
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    /** Number of price rows. */
    int rows() {
        return lines.size() - 1;
    }

    /** The date of a price row, counted from 0. */
    LocalDate date(int row) {
        String line = lines.get(row + 1);
        return LocalDate.parse(line.substring(0, line.indexOf(',')));
    }

    /** The close of a price row, for files whose second column it is. */
    double close(int row) {
        return Double.parseDouble(lines.get(row + 1).split(",", -1)[1]);
    }

    /** The same with another close in one row. */
    PriceHistory with(int row, double close) {
        List<String> changed = new ArrayList<>(lines);
        String[] cells = changed.get(row + 1).split(",", -1);
        cells[1] = Double.toString(close);
        changed.set(row + 1, String.join(",", cells));
        return new PriceHistory(changed);
    }

    /** The same closes, with opens between closes and made-up highs and lows around both; a bar in 40 has no range. */
    PriceHistory withRanges(long seed) {
        RandomStream random = RandomStream.of(seed, "ranges");
        List<String> candles = new ArrayList<>(List.of("date,close,open,high,low"));
        for (int row = 0; row < rows(); row++) {
            double close = close(row);
            double open = row == 0 ? close : close(row - 1);
            double above = 1 + 0.01 * random.nextDouble();
            double below = 1 - 0.01 * random.nextDouble();
            boolean still = random.nextDouble() < 0.025;
            double high = still ? close : above * Math.max(open, close);
            double low = still ? close : below * Math.min(open, close);
            candles.add(date(row) + "," + close + "," + (still ? close : open) + "," + high + "," + low);
        }
        return new PriceHistory(candles);
    }

    /** Writes the first {@code rows} price rows. */
    void write(Path file, int rows) {
        write(file, lines.subList(0, rows + 1));
    }

    /** Writes the price rows dated up to {@code last}. */
    void write(Path file, LocalDate last) {
        int rows = 0;
        while (rows < rows() && !date(rows).isAfter(last)) {
            rows++;
        }
        write(file, rows);
    }

    private static void write(Path file, List<String> text) {
        try {
            Files.write(file, text);
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }
}
