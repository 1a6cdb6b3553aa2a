package sojourn.measure;

import java.util.Optional;
import java.util.OptionalDouble;
import sojourn.inference.Estimate;
import sojourn.inference.LongRunVariance;
import sojourn.inference.Moments;
import sojourn.inference.SharpeError;
import sojourn.numeric.NormalQuantile;

/**
 * The Sharpe ratio per year, sqrt(P) mean(e) / sd(e), e the returns over cash, sd with divisor n - 1. Sharpe (1994), J. Portfolio Management
 * 21(1), 49-58. Its interval is the ratio plus and minus 1.96 sqrt(P) se, se the HAC standard error per period of {@link SharpeError}, whose sd
 * has the divisor n. Undefined for fewer than two returns and for returns that do not vary.
 */
public final class Sharpe {
    private static final double TWO_SIDED_95 = 0.975;

    private Sharpe() {}

    /** Of returns over cash per period. Not modified. The interval is missing where the error is undefined. */
    public static Measured perYear(double[] excess, double periodsPerYear) {
        if (excess.length < 2) {
            return Measured.tooFew(excess.length, 2);
        }
        Moments moments = Moments.of(excess);
        if (moments.constant()) {
            return Measured.from(Estimate.zeroVariance());
        }
        double scale = Math.sqrt(periodsPerYear);
        Measured deviation = Measured.from(moments.standardDeviation());
        if (!(deviation instanceof Measured.Value sd)) {
            return deviation;
        }
        double ratio = scale * moments.mean() / sd.amount();
        OptionalDouble error = SharpeError.hac(excess).number();
        if (error.isEmpty()) {
            return Measured.of(ratio);
        }
        double reach = NormalQuantile.of(TWO_SIDED_95) * scale * error.getAsDouble();
        String definition =
                "95 %: the ratio plus and minus 1.96 standard errors, errors robust to serial correlation over "
                        + LongRunVariance.defaultLags(excess.length) + " bars and to the shape of the returns";
        return Measured.of(ratio, new Measured.Interval(ratio - reach, ratio + reach, definition));
    }

    /** The lower end of a ratio's interval. */
    static Measured low(Measured ratio) {
        return bound(ratio, interval(ratio).map(Measured.Interval::low));
    }

    /** The upper end of a ratio's interval. */
    static Measured high(Measured ratio) {
        return bound(ratio, interval(ratio).map(Measured.Interval::high));
    }

    private static Optional<Measured.Interval> interval(Measured ratio) {
        return ratio instanceof Measured.Value value ? value.interval() : Optional.empty();
    }

    private static Measured bound(Measured ratio, Optional<Double> bound) {
        if (ratio instanceof Measured.Undefined) {
            return ratio;
        }
        return bound.map(Measured::of)
                .orElseGet(() ->
                        Measured.undefined(Measured.Reason.NOT_POSITIVE, "the variance of the ratio is not above 0"));
    }
}
