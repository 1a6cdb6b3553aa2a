package sojourn.regime;

import sojourn.numeric.Exp;

/**
 * Normal densities of a standardised window in every state, each row divided by its largest, so that a row's largest is 1 and
 * nothing overflows; missing rows are 1 throughout.
 */
final class Densities {
    private static final double HALF_LN_TWO_PI = 0.9189385332046727;

    /** Logs below this give e^-700, which is as good as 0 beside 1. */
    private static final double LOWEST = -700;

    private final Window window;
    private final int states;
    private final double[] logScale;
    private final double[] mean;
    private final double[] halfPrecision;

    Densities(int states, Window window) {
        this.window = window;
        this.states = states;
        this.logScale = new double[states];
        this.mean = new double[states];
        this.halfPrecision = new double[states];
    }

    /** Fills rows × states, row-major, and returns the sum of the logs of the divisors. {@code densities} is modified. */
    double fill(Parameters p, double[] densities) {
        unpack(p);
        double[] z = window.values();
        double[] present = window.present();
        double shift = 0;
        for (int t = 0; t < z.length; t++) {
            int row = t * states;
            double highest = Double.NEGATIVE_INFINITY;
            for (int k = 0; k < states; k++) {
                double d = z[t] - mean[k];
                double log = (logScale[k] - halfPrecision[k] * d * d) * present[t];
                densities[row + k] = log;
                highest = Math.max(highest, log);
            }
            for (int k = 0; k < states; k++) {
                densities[row + k] = Math.max(LOWEST, densities[row + k] - highest);
            }
            shift += highest;
        }
        Exp.bySquaring(densities);
        return shift;
    }

    private void unpack(Parameters p) {
        for (int k = 0; k < states; k++) {
            double variance = p.at(p.variance(k));
            mean[k] = p.at(p.mean(k));
            halfPrecision[k] = 0.5 / variance;
            logScale[k] = -HALF_LN_TWO_PI - 0.5 * StrictMath.log(variance);
        }
    }
}
