package sojourn.market;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import sojourn.document.InputException;
import sojourn.document.Problem;
import sojourn.market.PriceTable.Bars;
import sojourn.market.PriceTable.Column;
import sojourn.numeric.RandomStream;

/** Small price files and series for tests. */
final class Fixture {
    private static final Path OPEN_DATA = Path.of("src", "test", "resources", "open-data");

    private Fixture() {}

    /** A path below the folder of open data. */
    static String openData(String file) {
        return OPEN_DATA.resolve(file).toAbsolutePath().toString();
    }

    static void write(Path folder, String name, String text) {
        try {
            Files.writeString(folder.resolve(name), text);
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    /** The market of one file {@code prices.csv} holding {@code text}, one asset, default columns, daily bars. */
    static Market market(Path folder, String text) {
        return market(folder, text, PriceSource.of("prices.csv"), Calendar.DAILY);
    }

    static Market market(Path folder, String text, PriceSource source, Calendar calendar) {
        write(folder, "prices.csv", text);
        return PriceReader.read(folder, Map.of("stocks", source), calendar, CashSource.NOTHING, List.of("stocks"));
    }

    /** The faults of such a file, as the user reads them. */
    static List<String> faults(Path folder, String text) {
        return faults(() -> market(folder, text));
    }

    /** The faults that {@code reading} ends in, as the user reads them; none if it succeeds. */
    static List<String> faults(Runnable reading) {
        try {
            reading.run();
            return List.of();
        } catch (InputException e) {
            return e.problems().stream().map(Problem::toString).toList();
        }
    }

    static List<LocalDate> dates(String... iso) {
        return List.of(iso).stream().map(LocalDate::parse).toList();
    }

    /**
     * Invented prices of about {@code rows} days with every column: each weekday of the calendar with probability 0.9 (so that
     * series of different seeds lack different days), a volume missing now and then.
     */
    static PriceSeries invented(String asset, LocalDate first, int rows, long seed) {
        RandomStream random = RandomStream.of(seed, "prices", asset);
        List<LocalDate> dates = new ArrayList<>();
        List<double[]> prices = new ArrayList<>();
        double close = 100;
        for (LocalDate day = first; dates.size() < rows; day = day.plusDays(1)) {
            if (day.getDayOfWeek().getValue() > 5 || random.nextDouble() > 0.9) {
                continue;
            }
            double open = close * (1 + 0.01 * random.nextNormal());
            close = open * (1 + 0.01 * random.nextNormal());
            double high = Math.max(open, close) * (1 + 0.005 * random.nextDouble());
            double low = Math.min(open, close) * (1 - 0.005 * random.nextDouble());
            double volume = random.nextDouble() < 0.02 ? Double.NaN : random.nextInt(100_000);
            dates.add(day);
            prices.add(new double[] {close, open, high, low, volume});
        }
        return PriceSeries.of(
                asset,
                dates,
                new Bars(
                        column(prices, 0),
                        Optional.of(column(prices, 1)),
                        Optional.of(column(prices, 2)),
                        Optional.of(column(prices, 3)),
                        Optional.of(column(prices, 4))));
    }

    private static Column column(List<double[]> rows, int index) {
        return Column.of(rows.stream().mapToDouble(row -> row[index]).toArray());
    }
}
