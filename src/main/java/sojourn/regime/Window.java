package sojourn.regime;

import sojourn.numeric.CompensatedSum;

/**
 * A univariate window brought to mean 0 and variance 1 (zero-mean family: mean square 1), so that the search does not depend on
 * the unit of the observations. Missing rows hold 0 and the flag 0.
 */
final class Window {
    /** No rows, no change of unit. */
    static final Window UNIT = new Window(new double[0], new double[0], 0, 0, 1);

    private static final double LN_TWO_PI = 1.8378770664093453;

    private final double[] values;
    private final double[] present;
    private final int count;
    private final double center;
    private final double scale;
    private final double sum;
    private final double squares;
    private final double lowest;
    private final double highest;

    private Window(double[] values, double[] present, int count, double center, double scale) {
        CompensatedSum plain = new CompensatedSum();
        CompensatedSum squared = new CompensatedSum();
        double low = 0;
        double high = 0;
        for (double value : values) {
            plain.add(value);
            squared.add(value * value);
            low = StrictMath.min(low, value);
            high = StrictMath.max(high, value);
        }
        this.sum = plain.value();
        this.squares = squared.value();
        this.lowest = low;
        this.highest = high;
        this.values = values;
        this.present = present;
        this.count = count;
        this.center = center;
        this.scale = scale;
    }

    /** The window of those observations; its scale is 0 for a constant series, and not finite where squares overflow. */
    static Window of(Observations x, EmissionFamily family) {
        int rows = x.size();
        double center = family.estimatesMeans() ? mean(x) : 0;
        double scale = Math.sqrt(meanSquareFrom(x, center));
        double[] values = new double[rows];
        double[] present = new double[rows];
        for (int t = 0; t < rows; t++) {
            present[t] = x.missing(t) ? 0 : 1;
            values[t] = x.missing(t) ? 0 : (x.at(t, 0) - center) / scale;
        }
        return new Window(values, present, x.present(), center, scale);
    }

    /** Mean of the observations that are present; 0 for none. */
    static double mean(Observations x) {
        CompensatedSum sum = new CompensatedSum();
        for (int t = 0; t < x.size(); t++) {
            if (!x.missing(t)) {
                sum.add(x.at(t, 0));
            }
        }
        return x.present() == 0 ? 0 : sum.value() / x.present();
    }

    private static double meanSquareFrom(Observations x, double center) {
        CompensatedSum sum = new CompensatedSum();
        for (int t = 0; t < x.size(); t++) {
            if (!x.missing(t)) {
                double d = x.at(t, 0) - center;
                sum.add(d * d);
            }
        }
        return x.present() == 0 ? 0 : sum.value() / x.present();
    }

    /** Number of rows, missing ones included. */
    int size() {
        return values.length;
    }

    /** Number of rows that are not missing. */
    int count() {
        return count;
    }

    /** The standardised observations, not to be modified. */
    double[] values() {
        return values;
    }

    /** 1 where the observation is present, 0 where it is missing; not to be modified. */
    double[] present() {
        return present;
    }

    /** Sum of the standardised observations: about 0 unless the family has no means. */
    double sum() {
        return sum;
    }

    /** Sum of their squares. */
    double squares() {
        return squares;
    }

    /** The lowest of them and 0. */
    double lowest() {
        return lowest;
    }

    /** The highest of them and 0. */
    double highest() {
        return highest;
    }

    /** What was subtracted. */
    double center() {
        return center;
    }

    /** What the rest was divided by: the standard deviation with divisor n. */
    double scale() {
        return scale;
    }

    /** The log-likelihood of the standardised observations under a single regime: -n/2 (ln 2 pi + 1). */
    double oneRegimeLogLikelihood() {
        return -0.5 * count * (LN_TWO_PI + 1);
    }
}
