package sojourn.regime;

import sojourn.numeric.Exp;

/**
 * Forward and backward recursion of a two-state chain (Rabiner 1989, Proc. IEEE 77, III.A and III.C), without a division or a
 * logarithm a step. Forward variables are left unnormalised and multiplied by an exact power of two at the start of every block
 * of 16 rows; within a block the sum of alpha times beta is the same at every row, so one division a block turns products into
 * probabilities.
 */
final class TwoStateExpectation implements Expectation {
    private static final int BLOCK = 16;
    /** Below this a block has lost digits to underflow. */
    private static final double LEAST = 1e-250;

    private static final double LN2 = 0.6931471805599453;

    private final Window window;
    private final Densities densities;
    private final double[] b0;
    private final double[] b1;
    private final double[] a0;
    private final double[] a1;

    TwoStateExpectation(Window window) {
        this.window = window;
        this.densities = new Densities(2, window);
        b0 = new double[window.size()];
        b1 = new double[window.size()];
        a0 = new double[window.size()];
        a1 = new double[window.size()];
    }

    @Override
    public boolean fill(Parameters p, ExpectedSums sums) {
        sums.clear();
        double shift = densities.fillTwo(p, b0, b1);
        double forward = forward(p);
        sums.logLikelihood = shift + forward;
        return sums.logLikelihood > Double.NEGATIVE_INFINITY && backward(p, sums);
    }

    /** The log of the sum of the last forward variables; minus infinity, or NaN, when it underflowed. */
    private double forward(Parameters p) {
        double p00 = p.at(p.transition(0, 0));
        double p01 = p.at(p.transition(0, 1));
        double p10 = p.at(p.transition(1, 0));
        double p11 = p.at(p.transition(1, 1));
        int rows = b0.length;
        long exponent = 0;
        double u = p.at(p.initial(0)) * b0[0];
        double v = p.at(p.initial(1)) * b1[0];
        a0[0] = u;
        a1[0] = v;
        int t = 1;
        while (t < rows) {
            int end = Math.min((t & -BLOCK) + BLOCK, rows);
            for (; t < end; t++) {
                double next = (u * p00 + v * p10) * b0[t];
                v = (u * p01 + v * p11) * b1[t];
                u = next;
                a0[t] = u;
                a1[t] = v;
            }
            if (!(u + v > LEAST)) {
                return Double.NEGATIVE_INFINITY;
            }
            if (t < rows) {
                int e = Math.getExponent(u + v);
                u *= Exp.powerOfTwo(-e);
                v *= Exp.powerOfTwo(-e);
                exponent += e;
            }
        }
        return u + v > LEAST ? exponent * LN2 + StrictMath.log(u + v) : Double.NEGATIVE_INFINITY;
    }

    private boolean backward(Parameters p, ExpectedSums sums) {
        double p00 = p.at(p.transition(0, 0));
        double p01 = p.at(p.transition(0, 1));
        double p10 = p.at(p.transition(1, 0));
        double p11 = p.at(p.transition(1, 1));
        double[] z = window.values();
        double[] present = window.present();
        int t = b0.length - 1;
        double y0 = 1;
        double y1 = 1;
        double norm = a0[t] + a1[t];
        double x00 = 0;
        double x01 = 0;
        double x10 = 0;
        double x11 = 0;
        while (true) {
            int first = t & -BLOCK;
            double n0 = 0;
            double n1 = 0;
            double s0 = 0;
            double s1 = 0;
            double q0 = 0;
            double q1 = 0;
            for (; t >= first; t--) {
                double g0 = a0[t] * y0 * present[t];
                double g1 = a1[t] * y1 * present[t];
                double gz0 = g0 * z[t];
                double gz1 = g1 * z[t];
                n0 += g0;
                n1 += g1;
                s0 += gz0;
                s1 += gz1;
                q0 += gz0 * z[t];
                q1 += gz1 * z[t];
                if (t > first) {
                    double w0 = b0[t] * y0;
                    double w1 = b1[t] * y1;
                    x00 += a0[t - 1] * w0;
                    x01 += a0[t - 1] * w1;
                    x10 += a1[t - 1] * w0;
                    x11 += a1[t - 1] * w1;
                    y0 = p00 * w0 + p01 * w1;
                    y1 = p10 * w0 + p11 * w1;
                }
            }
            double inverse = 1 / norm;
            sums.count[0] += n0 * inverse;
            sums.count[1] += n1 * inverse;
            sums.sum[0] += s0 * inverse;
            sums.sum[1] += s1 * inverse;
            sums.squares[0] += q0 * inverse;
            sums.squares[1] += q1 * inverse;
            sums.transitions[0] += p00 * x00 * inverse;
            sums.transitions[1] += p01 * x01 * inverse;
            sums.transitions[2] += p10 * x10 * inverse;
            sums.transitions[3] += p11 * x11 * inverse;
            if (first == 0) {
                sums.initial[0] = a0[0] * y0 * inverse;
                sums.initial[1] = a1[0] * y1 * inverse;
                sums.likelihoodFrom[0] = b0[0] * y0;
                sums.likelihoodFrom[1] = b1[0] * y1;
                return true;
            }
            double w0 = b0[first] * y0;
            double w1 = b1[first] * y1;
            int e = Math.getExponent(w0 + w1);
            w0 *= Exp.powerOfTwo(-e);
            w1 *= Exp.powerOfTwo(-e);
            y0 = p00 * w0 + p01 * w1;
            y1 = p10 * w0 + p11 * w1;
            norm = a0[t] * y0 + a1[t] * y1;
            if (!(norm > LEAST)) {
                return false;
            }
            x00 = a0[t] * w0;
            x01 = a0[t] * w1;
            x10 = a1[t] * w0;
            x11 = a1[t] * w1;
        }
    }
}
