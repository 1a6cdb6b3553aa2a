package sojourn.regime;

import sojourn.numeric.Exp;

/**
 * Normal densities of a standardised window, each divided by that of the widest state in the same row: ln f_k - ln f_w =
 * ln(s_w / s_k) + (z - m_w)^2 / (2 v_w) - (z - m_k)^2 / (2 v_k). That is concave in z, so that over the window it lies between
 * bounds known in advance, and needs no exponential for the widest state, whose own log-likelihood is closed form in the window's
 * totals. Missing rows are 1.
 */
final class Ratios {
    private static final double LN_TWO_PI = 1.8378770664093453;
    /** Logs of ratios below this give ratios of e^-700, which is as good as 0 beside 1. */
    private static final double LOWEST = -700;
    /** Highest log of a ratio for recursions that are rescaled every 16 rows: e^(16 36) is still a double. */
    private static final double HIGHEST = 36;
    /** Highest where a row may be so unlikely that its ratio was raised to the lowest: what it hides must stay negligible. */
    private static final double HIGHEST_WITH_OUTLIERS = 8;

    private static final double OUTLIER = -600;

    private final Window window;
    private final int states;
    private final int[] order;
    private final double[] mean;
    private final double[] halfPrecision;
    private final double[] logScale;

    Ratios(int states, Window window) {
        this.window = window;
        this.states = states;
        this.order = new int[states];
        this.mean = new double[states];
        this.halfPrecision = new double[states];
        this.logScale = new double[states];
    }

    /** Takes those parameters; false where a ratio may leave what doubles hold. */
    boolean aim(Parameters p) {
        int widest = 0;
        for (int k = 1; k < states; k++) {
            widest = p.at(p.variance(k)) > p.at(p.variance(widest)) ? k : widest;
        }
        for (int k = 0, next = 0; k < states; k++) {
            order[k == widest ? states - 1 : next++] = k;
        }
        for (int i = 0; i < states; i++) {
            double v = p.at(p.variance(order[i]));
            mean[i] = p.at(p.mean(order[i]));
            halfPrecision[i] = 0.5 / v;
            logScale[i] = -0.5 * StrictMath.log(v);
        }
        boolean within = true;
        for (int i = 0; i < states - 1; i++) {
            within &= within(i);
        }
        return within;
    }

    private boolean within(int i) {
        double low = log(i, window.lowest());
        double high = log(i, window.highest());
        double curvature = halfPrecision[i] - halfPrecision[states - 1];
        double top = StrictMath.max(low, high);
        if (curvature > 0) {
            double at = (halfPrecision[i] * mean[i] - halfPrecision[states - 1] * mean[states - 1]) / curvature;
            if (at > window.lowest() && at < window.highest()) {
                top = StrictMath.max(top, log(i, at));
            }
        }
        boolean outliers = StrictMath.min(low, high) < OUTLIER;
        return top <= (outliers ? HIGHEST_WITH_OUTLIERS : HIGHEST);
    }

    private double log(int i, double z) {
        int last = states - 1;
        double d = z - mean[i];
        double w = z - mean[last];
        return logScale[i] - logScale[last] + halfPrecision[last] * w * w - halfPrecision[i] * d * d;
    }

    /** The state that takes place {@code i}: the widest comes last, the others in their order. */
    int state(int i) {
        return order[i];
    }

    /** Fills the transition matrix by place, row-major. {@code transitions} is modified. */
    void transitions(Parameters p, double[] transitions) {
        for (int i = 0; i < states; i++) {
            for (int j = 0; j < states; j++) {
                transitions[i * states + j] = p.at(p.transition(order[i], order[j]));
            }
        }
    }

    /** Fills one ratio a row, of the state in place {@code i}, which is not the last. {@code ratios} is modified. */
    void fill(int i, double[] ratios) {
        double[] z = window.values();
        double[] present = window.present();
        int last = states - 1;
        double constant = logScale[i] - logScale[last];
        double m = mean[i];
        double h = halfPrecision[i];
        double wideMean = mean[last];
        double wideHalf = halfPrecision[last];
        for (int t = 0; t < ratios.length; t++) {
            double d = z[t] - m;
            double w = z[t] - wideMean;
            double log = (constant + (wideHalf * w * w - h * d * d)) * present[t];
            ratios[t] = Math.max(log, LOWEST);
        }
        Exp.bySquaring(ratios);
    }

    /** Log-likelihood of all observations under the widest state alone. */
    double logLikelihoodOfWidest() {
        int last = states - 1;
        double n = window.count();
        double squares = window.squares() - 2 * mean[last] * window.sum() + n * mean[last] * mean[last];
        return n * (logScale[last] - 0.5 * LN_TWO_PI) - halfPrecision[last] * squares;
    }
}
