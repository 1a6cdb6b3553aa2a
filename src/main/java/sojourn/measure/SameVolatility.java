package sojourn.measure;

import sojourn.inference.Moments;
import sojourn.numeric.Check;

/** The multiple of one path's holdings that has another's volatility. */
public final class SameVolatility {
    private SameVolatility() {}

    /**
     * sd(strategy) / sd(market) of simple returns over the same bars; undefined for fewer than two and where the market's do not
     * vary. Ours, after the volatility-matched market of Modigliani and Modigliani (1997), J. Portfolio Management 23(2), 45-54
     * (from memory), who match over cash; here the returns themselves are matched.
     *
     * @param strategy returns. Not modified.
     * @param market returns. Not modified.
     */
    public static Measured multiple(double[] strategy, double[] market) {
        Check.that(strategy.length == market.length, strategy.length + " returns beside " + market.length);
        if (market.length < 2) {
            return Measured.tooFew(market.length, 2);
        }
        Moments own = Moments.of(strategy);
        Moments other = Moments.of(market);
        return other.constant()
                ? Measured.undefined(
                        Measured.Reason.ZERO_VARIANCE,
                        "the returns of buy-and-hold do not vary, and no multiple of it has the strategy's volatility")
                : Measured.of(Math.sqrt(own.populationVariance() / other.populationVariance()));
    }
}
