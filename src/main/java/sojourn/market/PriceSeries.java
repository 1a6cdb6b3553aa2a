package sojourn.market;

import java.nio.ByteBuffer;
import java.time.LocalDate;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import sojourn.market.PriceTable.Bars;
import sojourn.market.PriceTable.Column;

/** One asset's prices as given, before they are put on a common calendar: strictly increasing dates, a row each. */
public final class PriceSeries {
    private final String asset;
    private final List<LocalDate> dates;
    private final Bars bars;
    private final String file;
    private final int[] lines;

    private PriceSeries(String asset, List<LocalDate> dates, Bars bars, String file, int[] lines) {
        this.asset = asset;
        this.dates = dates;
        this.bars = bars;
        this.file = file;
        this.lines = lines;
    }

    /** From strictly increasing dates and as many bars; at least one. */
    public static PriceSeries of(String asset, List<LocalDate> dates, Bars bars) {
        return inFile(asset, dates, bars, asset, new int[dates.size()]);
    }

    /**
     * As {@link #of}, and where each row stands.
     *
     * @param file the file as the strategy file names it
     * @param lines 1-based, one a row. Not modified.
     */
    static PriceSeries inFile(String asset, List<LocalDate> dates, Bars bars, String file, int[] lines) {
        if (dates.isEmpty()) {
            throw new IllegalArgumentException("the series of " + asset + " has no row");
        }
        if (dates.size() != bars.close().size() || dates.size() != lines.length) {
            throw new IllegalArgumentException(dates.size() + " dates, "
                    + bars.close().size() + " closes and " + lines.length + " lines of " + asset);
        }
        for (int row = 1; row < dates.size(); row++) {
            if (!dates.get(row).isAfter(dates.get(row - 1))) {
                throw new IllegalArgumentException(
                        "date " + dates.get(row) + " of " + asset + " does not come after " + dates.get(row - 1));
            }
        }
        return new PriceSeries(asset, List.copyOf(dates), bars, file, lines.clone());
    }

    /** The asset's name. */
    public String asset() {
        return asset;
    }

    /** The file as the strategy file names it; the asset's name if it comes from none. */
    public String file() {
        return file;
    }

    /** Number of rows, at least one. */
    public int size() {
        return dates.size();
    }

    /** The dates, strictly increasing. */
    public List<LocalDate> dates() {
        return dates;
    }

    /** The prices, a bar a row. */
    public Bars bars() {
        return bars;
    }

    /** The first date. */
    public LocalDate first() {
        return dates.get(0);
    }

    /** The last date. */
    public LocalDate last() {
        return dates.get(size() - 1);
    }

    /** The rows dated up to and including {@code last}; empty if there is none. */
    public Optional<PriceSeries> upTo(LocalDate last) {
        int end = 0;
        while (end < size() && !dates.get(end).isAfter(last)) {
            end++;
        }
        if (end == 0) {
            return Optional.empty();
        }
        int[] kept = new int[end];
        Arrays.setAll(kept, row -> row);
        return Optional.of(new PriceSeries(
                asset, dates.subList(0, end), bars.each(c -> c.at(kept)), file, Arrays.copyOf(lines, end)));
    }

    /**
     * SHA-256, in hexadecimal, over dates and raw bits of every column: the same for the same numbers, however and wherever they
     * were written. Each column goes in as its name, the number of rows and the rows.
     */
    public String digest() {
        Digest digest = new Digest();
        ByteBuffer days = ByteBuffer.allocate(size() * Long.BYTES);
        dates.forEach(date -> days.putLong(date.toEpochDay()));
        digest.add("dates", days.array());
        List<String> names = List.of("close", "open", "high", "low", "volume", "dividend", "split");
        List<Optional<Column>> columns = List.of(
                Optional.of(bars.close()),
                bars.open(),
                bars.high(),
                bars.low(),
                bars.volume(),
                bars.dividend(),
                bars.split());
        for (int i = 0; i < names.size(); i++) {
            if (columns.get(i).isPresent()) {
                digest.add(names.get(i), bits(columns.get(i).get()));
            }
        }
        return digest.hex();
    }

    int line(int row) {
        return lines[row];
    }

    double close(int row) {
        return bars.close().at(row);
    }

    /** The row numbers of {@code wanted}, each of which is a date of this series, in increasing order. */
    int[] rowsOf(List<LocalDate> wanted) {
        int[] rows = new int[wanted.size()];
        int row = 0;
        for (int i = 0; i < rows.length; i++) {
            while (!dates.get(row).equals(wanted.get(i))) {
                row++;
            }
            rows[i] = row;
        }
        return rows;
    }

    private static byte[] bits(Column column) {
        ByteBuffer bits = ByteBuffer.allocate(column.size() * Long.BYTES);
        for (int bar = 0; bar < column.size(); bar++) {
            bits.putLong(Double.doubleToLongBits(column.at(bar)));
        }
        return bits.array();
    }
}
