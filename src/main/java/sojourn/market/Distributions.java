package sojourn.market;

import java.util.Arrays;
import sojourn.market.PriceTable.Bars;
import sojourn.market.PriceTable.Column;

/**
 * What an asset gave its holders between two bars when several rows lie between them: splits multiply; a dividend counts per unit
 * after all of the bar's splits, D = sum_j D_j prod_{k <= j} s_k / prod_k s_k over the rows j, k up to the bar's own.
 */
final class Distributions {
    private Distributions() {}

    /** The bars at {@code rows}, increasing, with what rows left out before each of them gave. Not modified. */
    static Bars at(Bars all, int[] rows) {
        Bars kept = all.each(column -> column.at(rows));
        return all.distributes() ? kept.giving(dividends(all, rows), splits(all, rows)) : kept;
    }

    /** Dividends of bars that end with the rows {@code ends}. Of the first bar only its own row counts. */
    static Column dividends(Bars all, int[] ends) {
        double[] given = new double[ends.length];
        for (int i = 0; i < given.length; i++) {
            double units = 1;
            for (int row = start(ends, i); row <= ends[i]; row++) {
                units *= all.splitOn(row);
                given[i] += units * all.dividendOn(row);
            }
            given[i] /= units;
        }
        return Column.of(given);
    }

    /** Splits of bars that end with the rows {@code ends}. */
    static Column splits(Bars all, int[] ends) {
        double[] ratio = new double[ends.length];
        for (int i = 0; i < ratio.length; i++) {
            ratio[i] = 1;
            for (int row = start(ends, i); row <= ends[i]; row++) {
                ratio[i] *= all.splitOn(row);
            }
        }
        return Column.of(ratio);
    }

    private static int start(int[] ends, int i) {
        return i == 0 ? ends[0] : ends[i - 1] + 1;
    }

    /** The same prices and volumes in the units that hold after the last row of each period; {@code ends} are those rows. */
    static Bars inUnitsOfTheEnd(Bars daily, int[] ends) {
        if (!daily.distributes()) {
            return daily;
        }
        double[] later = new double[daily.close().size()];
        Arrays.fill(later, 1);
        for (int i = 0; i < ends.length; i++) {
            for (int row = ends[i] - 1; row > (i == 0 ? -1 : ends[i - 1]); row--) {
                later[row] = later[row + 1] * daily.splitOn(row + 1);
            }
        }
        return new Bars(
                scaled(daily.close(), later, -1),
                daily.open().map(column -> scaled(column, later, -1)),
                daily.high().map(column -> scaled(column, later, -1)),
                daily.low().map(column -> scaled(column, later, -1)),
                daily.volume().map(column -> scaled(column, later, 1)));
    }

    /**
     * Prices as if everything given had been put back into the asset at the close of its day, which is what returns are taken from: the
     * factor of bar t is that of the bar before × split × (1 + dividend / close), so that close / close before is
     * split × (close + dividend) / close before, and nothing later has a part in it. Volumes are in those units too.
     */
    static Bars reinvested(Bars quoted) {
        if (!quoted.distributes()) {
            return quoted;
        }
        double[] factor = new double[quoted.close().size()];
        factor[0] = 1;
        for (int bar = 1; bar < factor.length; bar++) {
            factor[bar] = factor[bar - 1]
                    * quoted.splitOn(bar)
                    * (1 + quoted.dividendOn(bar) / quoted.close().at(bar));
        }
        return new Bars(
                scaled(quoted.close(), factor, 1),
                quoted.open().map(column -> scaled(column, factor, 1)),
                quoted.high().map(column -> scaled(column, factor, 1)),
                quoted.low().map(column -> scaled(column, factor, 1)),
                quoted.volume().map(column -> scaled(column, factor, -1)));
    }

    private static Column scaled(Column column, double[] factor, int power) {
        double[] values = new double[factor.length];
        Arrays.setAll(values, i -> power > 0 ? column.at(i) * factor[i] : column.at(i) / factor[i]);
        return Column.of(values);
    }
}
