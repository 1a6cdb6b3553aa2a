package sojourn.walk;

import java.time.LocalDate;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import sojourn.market.BarLength;
import sojourn.market.CashReturns;
import sojourn.market.PriceTable;
import sojourn.market.PriceTable.Column;
import sojourn.market.TimeAxis;
import sojourn.numeric.RandomStream;

/** Bars of one asset, a, with all their prices: rows of open, high, low, close; NaN where the file has none. */
final class Candles {
    private static final LocalDate FIRST = LocalDate.of(2001, 1, 1);

    private final double[][] rows;

    private Candles(double[][] rows) {
        this.rows = rows;
    }

    static Candles of(double[]... rows) {
        return new Candles(rows);
    }

    /** A walk of {@code steps} independent normal moves a bar, with volatility {@code deviation} a bar and no gaps between bars. */
    static Candles random(long seed, int bars, int steps, double deviation) {
        RandomStream random = RandomStream.of(seed, "candles");
        double step = deviation / StrictMath.sqrt(steps);
        double price = 0;
        double[][] rows = new double[bars][];
        for (int bar = 0; bar < bars; bar++) {
            double open = price;
            double high = price;
            double low = price;
            for (int i = 0; i < steps; i++) {
                price += step * random.nextNormal();
                high = Math.max(high, price);
                low = Math.min(low, price);
            }
            rows[bar] = new double[] {
                100 * StrictMath.exp(open),
                100 * StrictMath.exp(high),
                100 * StrictMath.exp(low),
                100 * StrictMath.exp(price)
            };
        }
        return new Candles(rows);
    }

    /** The same with another value in one cell. */
    Candles with(int bar, int column, double value) {
        double[][] changed = Arrays.stream(rows).map(double[]::clone).toArray(double[][]::new);
        changed[bar][column] = value;
        return new Candles(changed);
    }

    double at(int bar, int column) {
        return rows[bar][column];
    }

    PriceTable table() {
        List<LocalDate> dates = new ArrayList<>();
        for (int bar = 0; bar < rows.length; bar++) {
            dates.add(FIRST.plusDays(bar));
        }
        PriceTable.Bars bars = new PriceTable.Bars(
                column(3), Optional.of(column(0)), Optional.of(column(1)), Optional.of(column(2)), Optional.empty());
        double[] none = new double[rows.length];
        return PriceTable.of(
                TimeAxis.of(BarLength.DAILY, dates), List.of("a"), List.of(bars), CashReturns.of(none, none));
    }

    private Column column(int column) {
        return Column.of(Arrays.stream(rows).mapToDouble(row -> row[column]).toArray());
    }
}
