package sojourn.compare;

import java.util.OptionalDouble;
import sojourn.allocate.Weights;
import sojourn.market.Known;
import sojourn.market.PriceTable;
import sojourn.regime.RecentVolatility;

/**
 * How volatile a constant mix was, known at each close: over its last {@value #BARS} bars, and over every bar so far. Standard
 * deviations of simple returns, divisor one less than their number, per bar. Taken in the order of the bars, each from what was
 * known at its close, so that the one at t rests on nothing later. Cost: {@value #BARS} additions a bar.
 */
final class TrailingVolatility {
    /** A month of trading days; common practice, no source. */
    static final int BARS = 21;

    private final double[] recent;
    private final double[] soFar;

    private TrailingVolatility(int bars) {
        this.recent = new double[bars];
        this.soFar = new double[bars];
    }

    static TrailingVolatility of(PriceTable table, Weights mix) {
        TrailingVolatility volatility = new TrailingVolatility(table.size());
        RecentVolatility.SoFar last = new RecentVolatility.Rolling(BARS).start();
        double mean = 0;
        double squares = 0; // about the running mean: Welford (1962), Technometrics 4, 419-420
        volatility.recent[0] = Double.NaN;
        volatility.soFar[0] = Double.NaN;
        for (int bar = 1; bar < table.size(); bar++) {
            double moved = moved(table.knownAt(bar), mix);
            last = last.with(moved);
            double before = moved - mean;
            mean += before / bar;
            squares += before * (moved - mean);
            volatility.recent[bar] = last.value().orElse(Double.NaN);
            volatility.soFar[bar] = bar < 2 ? Double.NaN : Math.sqrt(squares / (bar - 1));
        }
        return volatility;
    }

    /** The same where closes are known so many bars late: each bar is told what stood so many bars before. */
    TrailingVolatility knownAfter(int bars) {
        TrailingVolatility later = new TrailingVolatility(recent.length);
        for (int bar = 0; bar < recent.length; bar++) {
            later.recent[bar] = bar < bars ? Double.NaN : recent[bar - bars];
            later.soFar[bar] = bar < bars ? Double.NaN : soFar[bar - bars];
        }
        return later;
    }

    /** The last bar's simple return of the mix; what cash earned is left out. */
    private static double moved(Known known, Weights mix) {
        double moved = 0;
        for (int asset = 0; asset < mix.size(); asset++) {
            if (mix.at(asset) != 0) {
                moved += mix.at(asset) * (known.close(asset, known.bar()) / known.close(asset, known.bar() - 1) - 1);
            }
        }
        return moved;
    }

    /** Over the last {@value #BARS} bars; empty while there are fewer. */
    OptionalDouble recent(int bar) {
        return present(recent[bar]);
    }

    /** Over all bars up to this one; empty before the third. */
    OptionalDouble soFar(int bar) {
        return present(soFar[bar]);
    }

    private static OptionalDouble present(double value) {
        return Double.isNaN(value) ? OptionalDouble.empty() : OptionalDouble.of(value);
    }
}
