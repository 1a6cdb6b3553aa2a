package sojourn.evidence;

import java.util.OptionalDouble;
import java.util.stream.IntStream;
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
        double[] after = new double[returns.bars()];
        double variance = 0;
        for (int bar = 1; bar < after.length; bar++) {
            double square = square(returns, bar);
            variance = bar <= BARS ? variance + square / BARS : DECAY * variance + (1 - DECAY) * square;
            after[bar] = variance;
        }
        return PerBar.of(after.length, bar -> positive(bar > BARS ? after[bar - 1] : 0));
    }

    /** s^2 + m^2 of the last 21 returns, s with divisor 20. */
    static PerBar rolling(PerBar returns) {
        return PerBar.of(returns.bars(), bar -> {
            if (bar <= BARS) {
                return OptionalDouble.empty();
            }
            double[] last = returns.at(IntStream.range(bar - BARS, bar).toArray());
            Moments moments = Moments.of(last);
            double deviation = moments.standardDeviation().number().orElseThrow();
            return positive(deviation * deviation + moments.mean() * moments.mean());
        });
    }

    private static double square(PerBar returns, int bar) {
        double earned = returns.at(bar).orElseThrow();
        return earned * earned;
    }

    private static OptionalDouble positive(double value) {
        return value > 0 ? OptionalDouble.of(value) : OptionalDouble.empty();
    }
}
