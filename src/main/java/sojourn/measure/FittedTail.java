package sojourn.measure;

import sojourn.numeric.Check;
import sojourn.numeric.NormalQuantile;

/**
 * The bad tail of a distribution described by its moments, as positive losses: the normal, or the normal bent by skewness S and excess kurtosis K
 * after Cornish and Fisher, w(z) = z + (z^2 - 1) S/6 + (z^3 - 3z) K/24 - (2z^3 - 5z) S^2/36. Value at risk -(m + s w(z_a)); expected shortfall, the
 * closed form of the tail integral of w, -m + s phi(z_a)/a [1 + S z_a/6 + K (z_a^2 - 1)/24 - S^2 (2 z_a^2 - 1)/36]. S and K with divisor n, s with n - 1. Cf. Maillard
 * (2012); it differs from the Edgeworth tail of Boudt, Peterson and Croux (2008). Where w does not rise all the way up to z_a, the formula
 * describes no distribution and both are undefined.
 */
public final class FittedTail {
    private final double level;
    private final double mean;
    private final double deviation;
    private final double skewness;
    private final double excessKurtosis;

    private FittedTail(double level, double mean, double deviation, double skewness, double excessKurtosis) {
        Check.above(level, 0, "level");
        Check.that(level < 1, "level is " + level + ", must be below 1");
        this.level = level;
        this.mean = Check.finite(mean, "mean");
        this.deviation = Check.atLeast(deviation, 0, "deviation");
        this.skewness = Check.finite(skewness, "skewness");
        this.excessKurtosis = Check.finite(excessKurtosis, "excessKurtosis");
    }

    /** The tail a of a normal distribution. */
    public static FittedTail normal(double mean, double deviation, double level) {
        return new FittedTail(level, mean, deviation, 0, 0);
    }

    /** The tail a of a distribution with these four moments. */
    public static FittedTail cornishFisher(
            double mean, double deviation, double skewness, double excessKurtosis, double level) {
        return new FittedTail(level, mean, deviation, skewness, excessKurtosis);
    }

    /** The loss exceeded with probability a. */
    public Measured valueAtRisk() {
        double z = NormalQuantile.of(level);
        double s2 = skewness * skewness;
        double w = z
                + (z * z - 1) * skewness / 6
                + (z * z * z - 3 * z) * excessKurtosis / 24
                - (2 * z * z * z - 5 * z) * s2 / 36;
        return rising(z) ? Measured.of(-(mean + deviation * w)) : notRising();
    }

    /** The mean loss in the worst share a. */
    public Measured expectedShortfall() {
        double z = NormalQuantile.of(level);
        double density = StrictMath.exp(-z * z / 2) / Math.sqrt(2 * Math.PI);
        double s2 = skewness * skewness;
        double bend = 1 + skewness * z / 6 + excessKurtosis * (z * z - 1) / 24 - s2 * (2 * z * z - 1) / 36;
        return rising(z) ? Measured.of(-mean + deviation * density / level * bend) : notRising();
    }

    /** Whether dw/dz = c2 z^2 + c1 z + c0 is above 0 everywhere up to {@code end}. */
    private boolean rising(double end) {
        double s2 = skewness * skewness;
        double c2 = excessKurtosis / 8 - s2 / 6;
        double c1 = skewness / 3;
        double c0 = 1 - excessKurtosis / 8 + 5 * s2 / 36;
        if (c2 < 0 || (c2 == 0 && c1 > 0)) {
            return false;
        }
        double lowest = c2 > 0 ? Math.min(end, -c1 / (2 * c2)) : end;
        return (c2 * lowest + c1) * lowest + c0 > 0;
    }

    private static Measured notRising() {
        return Measured.undefined(
                Measured.Reason.NOT_APPLICABLE,
                "with this skewness and kurtosis the Cornish-Fisher expansion does not rise throughout the tail");
    }
}
