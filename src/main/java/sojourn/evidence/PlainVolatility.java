package sojourn.evidence;

import java.util.Arrays;
import java.util.OptionalDouble;
import sojourn.inference.Moments;

/**
 * Forecasts of the next squared return that know no regimes: what any gauge must beat. Each stands at the bar it is of and was known at the close
 * before.
 */
final class PlainVolatility {
    /** How much of yesterday's variance is kept from day to day. Common practice, no source. */
    static final double DECAY = 0.94;
    /** Bars of the rolling window, and of the first average of squares: about a month of days. */
    static final int BARS = 21;

    private PlainVolatility() {}

    /** v_t = 0.94 v_{t-1} + 0.06 r_t^2, begun with the mean of the first 21 squared returns at the 21st of them. */
    static PerBar exponential(PerBar returns) {
        double[] before = new double[returns.bars()];
        double variance = 0;
        int seen = 0;
        for (int bar = 0; bar < before.length; bar++) {
            if (returns.has(bar)) {
                before[bar] = seen >= BARS ? variance : 0;
                seen++;
                double square = square(returns, bar);
                variance = seen <= BARS ? variance + square / BARS : DECAY * variance + (1 - DECAY) * square;
            }
        }
        return PerBar.of(before.length, bar -> positive(before[bar]));
    }

    /** s^2 + m^2 of the last 21 returns, s with divisor 20. */
    static PerBar rolling(PerBar returns) {
        int[] present = returns.present();
        return PerBar.of(returns.bars(), bar -> {
            int at = Arrays.binarySearch(present, bar);
            if (at < BARS) {
                return OptionalDouble.empty();
            }
            double[] last = returns.at(Arrays.copyOfRange(present, at - BARS, at));
            Moments moments = Moments.of(last);
            double deviation = moments.standardDeviation().number().orElseThrow();
            return positive(deviation * deviation + moments.mean() * moments.mean());
        });
    }

    /** The same forecasts where returns are known so many bars late: each says of its bar what an earlier one said of an earlier bar. */
    static PerBar knownAfter(int bars, PerBar forecasts) {
        return PerBar.of(forecasts.bars(), bar -> bar < bars ? OptionalDouble.empty() : forecasts.at(bar - bars));
    }

    private static double square(PerBar returns, int bar) {
        double earned = returns.at(bar).orElseThrow();
        return earned * earned;
    }

    private static OptionalDouble positive(double value) {
        return value > 0 ? OptionalDouble.of(value) : OptionalDouble.empty();
    }
}
