package sojourn.walk;

import java.time.LocalDate;
import java.util.Arrays;
import java.util.BitSet;
import java.util.List;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import sojourn.market.Known;
import sojourn.regime.Companions;
import sojourn.regime.Observations;

/**
 * Observations and asset returns as they came in, one row a bar from the bar of the first observation on. Rows are only ever
 * appended at a close, so a window taken now cannot hold anything later. Of several series any may be missing on a bar; the bar has
 * an observation when at least one is there.
 *
 * <p>An asset of which every observation is known some bars late is late itself: its returns of the last so many rows are withheld
 * from a window, as not published yet. What orders the regimes, and the moments of each, are the returns of the bars on which the
 * late number was seen, which is what a holder of the assets lived through.
 */
final class ObservationLog {
    private final List<Observation> observed;
    private final int assets;
    /** Bars that the returns of each asset are late. */
    private final int[] late;

    private int firstBar = -1;
    private int rows;
    private int present;
    private double[] values;
    private boolean[] missing;
    private double[] returns;
    /** Rows × assets: no price of its own on that bar. */
    private boolean[] carried;

    ObservationLog(List<Observation> observed, List<String> assets) {
        this.observed = List.copyOf(observed);
        this.assets = assets.size();
        this.late = assets.stream().mapToInt(asset -> barsLate(observed, asset)).toArray();
        this.values = new double[64 * observed.size()];
        this.missing = new boolean[64 * observed.size()];
        this.returns = new double[64 * this.assets];
        this.carried = new boolean[64 * this.assets];
    }

    /** As late as the earliest of the observations of it; an asset that is not observed is not late. */
    static int barsLate(List<Observation> observed, String asset) {
        return observed.stream()
                .filter(one -> one.asset().equals(asset))
                .mapToInt(Observation::barsLate)
                .min()
                .orElse(0);
    }

    /** Takes in the bar that {@code known} ends with; the file's first bar, which has no returns, is passed over. */
    void append(Known known) {
        if (known.bar() == 0) {
            return;
        }
        grow();
        boolean any = false;
        for (int column = 0; column < observed.size(); column++) {
            OptionalDouble value = observed.get(column).at(known);
            values[rows * observed.size() + column] = value.orElse(0);
            missing[rows * observed.size() + column] = value.isEmpty();
            any |= value.isPresent();
        }
        if (rows == 0 && !any) {
            return;
        }
        if (rows == 0) {
            firstBar = known.bar();
        }
        present += any ? 1 : 0;
        for (int asset = 0; asset < assets; asset++) {
            returns[rows * assets + asset] = known.close(asset, known.bar()) / known.close(asset, known.bar() - 1) - 1;
            carried[rows * assets + asset] = known.carried(asset, known.bar());
        }
        rows++;
    }

    /** Observations present so far. */
    int present() {
        return present;
    }

    /** Whether the last bar has an observation. */
    boolean lastPresent() {
        return rows > 0 && !missing(rows - 1);
    }

    /** The first row of a window that ends now: row 0, or the row of the last so-manieth observation. */
    int windowStart(OptionalInt rolling) {
        if (rolling.isEmpty() || present <= rolling.getAsInt()) {
            return 0;
        }
        int wanted = rolling.getAsInt();
        int row = rows;
        while (wanted > 0) {
            row--;
            wanted -= missing(row) ? 0 : 1;
        }
        return row;
    }

    /** The bar of a row. */
    int bar(int row) {
        return firstBar + row;
    }

    /** The row of a bar's date. */
    int row(Known known, LocalDate date) {
        int row = 0;
        while (!known.date(bar(row)).equals(date)) {
            row++;
        }
        return row;
    }

    /** The rows from {@code start} to now. */
    Observations window(int start) {
        int columns = observed.size();
        return Observations.withMissingCells(
                columns,
                Arrays.copyOfRange(values, start * columns, rows * columns),
                Arrays.copyOfRange(missing, start * columns, rows * columns));
    }

    /** The last row alone. */
    Observations last() {
        return window(rows - 1);
    }

    /** Simple returns of all assets, rows from {@code start} to now; missing where one is carried or not published yet. */
    Companions companions(int start) {
        boolean[] withheld = new boolean[rows - start];
        int latest = Arrays.stream(late).max().orElse(0);
        Arrays.fill(withheld, StrictMath.max(0, withheld.length - latest), withheld.length, true);
        for (int cell = start * assets; cell < rows * assets; cell++) {
            withheld[cell / assets - start] |= carried[cell];
        }
        return Companions.of(assets, Arrays.copyOfRange(returns, start * assets, rows * assets), withheld);
    }

    /** The rows from {@code start} to now, counted from there, whose return of an asset is carried or not published yet. */
    BitSet withheld(int asset, int start) {
        BitSet withheld = new BitSet();
        for (int row = start; row < rows; row++) {
            withheld.set(row - start, carried[row * assets + asset] || row >= rows - late[asset]);
        }
        return withheld;
    }

    /** Simple returns of one asset, rows from {@code start} to now, those not published yet included. */
    double[] returnsOf(int asset, int start) {
        double[] column = new double[rows - start];
        for (int row = start; row < rows; row++) {
            column[row - start] = returns[row * assets + asset];
        }
        return column;
    }

    private boolean missing(int row) {
        boolean gap = true;
        for (int cell = row * observed.size(); cell < (row + 1) * observed.size(); cell++) {
            gap &= missing[cell];
        }
        return gap;
    }

    private void grow() {
        if (rows * observed.size() == values.length) {
            values = Arrays.copyOf(values, 2 * values.length);
            missing = Arrays.copyOf(missing, 2 * missing.length);
            returns = Arrays.copyOf(returns, 2 * returns.length);
            carried = Arrays.copyOf(carried, 2 * carried.length);
        }
    }
}
