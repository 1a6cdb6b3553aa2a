package sojourn.regime;

import java.util.Arrays;
import sojourn.numeric.Exp;

/** {@link ThreeStateExpectation} for four states. */
final class FourStateExpectation implements Expectation {
    private static final int BLOCK = 16;
    /** Below this a row has lost digits: only states that the chain can hardly be in could have made its observation. */
    private static final double LEAST = 1e-100;

    private static final double LN2 = 0.6931471805599453;

    private final Window window;
    private final Ratios ratios;
    private final Tally tally;
    private final double[] a;
    private final double[] beta;
    private final double[] r0;
    private final double[] r1;
    private final double[] r2;
    private final double[] alpha0;
    private final double[] alpha1;
    private final double[] alpha2;
    private final double[] alpha3;

    FourStateExpectation(Window window) {
        this.window = window;
        this.ratios = new Ratios(4, window);
        this.tally = new Tally(4, window);
        a = new double[16];
        beta = new double[4];
        r0 = new double[window.size()];
        r1 = new double[window.size()];
        r2 = new double[window.size()];
        alpha0 = new double[window.size()];
        alpha1 = new double[window.size()];
        alpha2 = new double[window.size()];
        alpha3 = new double[window.size()];
    }

    @Override
    public boolean fill(Parameters p, ExpectedSums sums) {
        if (!ratios.aim(p)) {
            return false;
        }
        sums.clear();
        ratios.fill(0, r0);
        ratios.fill(1, r1);
        ratios.fill(2, r2);
        ratios.transitions(p, a);
        alpha0[0] = p.at(p.initial(ratios.state(0))) * r0[0];
        alpha1[0] = p.at(p.initial(ratios.state(1))) * r1[0];
        alpha2[0] = p.at(p.initial(ratios.state(2))) * r2[0];
        alpha3[0] = p.at(p.initial(ratios.state(3)));
        double forward = forward();
        if (!(forward > Double.NEGATIVE_INFINITY && backward())) {
            return false;
        }
        tally.into(sums, ratios);
        sums.logLikelihood = ratios.logLikelihoodOfWidest() + forward;
        sums.likelihoodFrom[ratios.state(0)] = r0[0] * beta[0];
        sums.likelihoodFrom[ratios.state(1)] = r1[0] * beta[1];
        sums.likelihoodFrom[ratios.state(2)] = r2[0] * beta[2];
        sums.likelihoodFrom[ratios.state(3)] = beta[3];
        return true;
    }

    /** The log of the sum of the last forward variables; minus infinity when a sum underflowed. */
    private double forward() {
        int rows = window.size();
        long exponent = 0;
        double total = alpha0[0] + alpha1[0] + alpha2[0] + alpha3[0];
        double factor = 1; // rows of one block share their scale, and row 0 is not rescaled
        int start = 1;
        while (start < rows && total > LEAST) {
            int end = Math.min((start & -BLOCK) + BLOCK, rows);
            total = forward(start, end, factor);
            int e = end < rows ? Math.getExponent(total) : 0;
            factor = Exp.powerOfTwo(-e);
            exponent += e;
            start = end;
        }
        return total > LEAST ? exponent * LN2 + StrictMath.log(total) : Double.NEGATIVE_INFINITY;
    }

    /** Rows of one block, from what the row before them leaves times {@code factor}; returns their last sum, or 0 for one too small. */
    private double forward(int start, int end, double factor) {
        double[] a = this.a;
        double u0 = alpha0[start - 1] * factor;
        double u1 = alpha1[start - 1] * factor;
        double u2 = alpha2[start - 1] * factor;
        double u3 = alpha3[start - 1] * factor;
        for (int t = start; t < end; t++) {
            double n0 = (u0 * a[0] + u1 * a[4] + u2 * a[8] + u3 * a[12]) * r0[t];
            double n1 = (u0 * a[1] + u1 * a[5] + u2 * a[9] + u3 * a[13]) * r1[t];
            double n2 = (u0 * a[2] + u1 * a[6] + u2 * a[10] + u3 * a[14]) * r2[t];
            double n3 = u0 * a[3] + u1 * a[7] + u2 * a[11] + u3 * a[15];
            u0 = n0;
            u1 = n1;
            u2 = n2;
            u3 = n3;
            alpha0[t] = u0;
            alpha1[t] = u1;
            alpha2[t] = u2;
            alpha3[t] = u3;
            if (!(u0 + u1 + u2 + u3 > LEAST)) {
                return 0;
            }
        }
        return u0 + u1 + u2 + u3;
    }

    private boolean backward() {
        tally.clear();
        Arrays.fill(beta, 1);
        double norm = posterior(window.size() - 1, tally.last);
        for (int start = (window.size() - 1) & -BLOCK; norm > LEAST; start -= BLOCK) {
            backward(start, Math.min(start + BLOCK, window.size()), 1 / norm);
            if (start == 0) {
                norm = posterior(0, tally.first);
                tally.multiplyChanges(a);
                return norm > LEAST;
            }
            norm = across(start);
        }
        return false;
    }

    /** Fills the probabilities of a row that the recursion stands at; returns the sum of alpha times beta. Modified. */
    private double posterior(int t, double[] probabilities) {
        probabilities[0] = alpha0[t] * beta[0];
        probabilities[1] = alpha1[t] * beta[1];
        probabilities[2] = alpha2[t] * beta[2];
        probabilities[3] = alpha3[t] * beta[3];
        double norm = probabilities[0] + probabilities[1] + probabilities[2] + probabilities[3];
        for (int j = 0; j < 4; j++) {
            probabilities[j] /= norm;
        }
        return norm;
    }

    /** From the first row of a block to the row before it, rescaled; sums the changes between the two. Returns the new norm. */
    private double across(int first) {
        double factor = Exp.powerOfTwo(-Math.getExponent(beta[0] + beta[1] + beta[2] + beta[3]));
        double h0 = beta[0] * r0[first] * factor;
        double h1 = beta[1] * r1[first] * factor;
        double h2 = beta[2] * r2[first] * factor;
        double h3 = beta[3] * factor;
        for (int i = 0; i < 4; i++) {
            beta[i] = a[4 * i] * h0 + a[4 * i + 1] * h1 + a[4 * i + 2] * h2 + a[4 * i + 3] * h3;
        }
        int t = first - 1;
        double norm = alpha0[t] * beta[0] + alpha1[t] * beta[1] + alpha2[t] * beta[2] + alpha3[t] * beta[3];
        double[] x = tally.changes;
        double b0 = alpha0[t] / norm;
        double b1 = alpha1[t] / norm;
        double b2 = alpha2[t] / norm;
        double b3 = alpha3[t] / norm;
        x[1] += b0 * h1;
        x[2] += b0 * h2;
        x[3] += b0 * h3;
        x[4] += b1 * h0;
        x[6] += b1 * h2;
        x[7] += b1 * h3;
        x[8] += b2 * h0;
        x[9] += b2 * h1;
        x[11] += b2 * h3;
        x[12] += b3 * h0;
        x[13] += b3 * h1;
        x[14] += b3 * h2;
        return norm;
    }

    /** One block of rows, given the reciprocal of the sum of alpha times beta there. */
    private void backward(int start, int end, double inverse) {
        double[] z = window.values();
        double[] present = window.present();
        double[] a = this.a;
        double y0 = beta[0];
        double y1 = beta[1];
        double y2 = beta[2];
        double y3 = beta[3];
        double x01 = 0;
        double x02 = 0;
        double x03 = 0;
        double x10 = 0;
        double x12 = 0;
        double x13 = 0;
        double x20 = 0;
        double x21 = 0;
        double x23 = 0;
        double x30 = 0;
        double x31 = 0;
        double x32 = 0;
        double n0 = 0;
        double n1 = 0;
        double n2 = 0;
        double c0 = 0;
        double c1 = 0;
        double c2 = 0;
        double s0 = 0;
        double s1 = 0;
        double s2 = 0;
        double q0 = 0;
        double q1 = 0;
        double q2 = 0;
        for (int t = end - 1; t >= start; t--) {
            double g0 = alpha0[t] * y0;
            double gz0 = g0 * z[t];
            n0 += g0;
            c0 += g0 * present[t];
            s0 += gz0;
            q0 += gz0 * z[t];
            double g1 = alpha1[t] * y1;
            double gz1 = g1 * z[t];
            n1 += g1;
            c1 += g1 * present[t];
            s1 += gz1;
            q1 += gz1 * z[t];
            double g2 = alpha2[t] * y2;
            double gz2 = g2 * z[t];
            n2 += g2;
            c2 += g2 * present[t];
            s2 += gz2;
            q2 += gz2 * z[t];
            if (t > start) {
                double h0 = y0 * r0[t];
                double h1 = y1 * r1[t];
                double h2 = y2 * r2[t];
                double h3 = y3;
                double b0 = alpha0[t - 1];
                double b1 = alpha1[t - 1];
                double b2 = alpha2[t - 1];
                double b3 = alpha3[t - 1];
                x01 += b0 * h1;
                x02 += b0 * h2;
                x03 += b0 * h3;
                x10 += b1 * h0;
                x12 += b1 * h2;
                x13 += b1 * h3;
                x20 += b2 * h0;
                x21 += b2 * h1;
                x23 += b2 * h3;
                x30 += b3 * h0;
                x31 += b3 * h1;
                x32 += b3 * h2;
                y0 = a[0] * h0 + a[1] * h1 + a[2] * h2 + a[3] * h3;
                y1 = a[4] * h0 + a[5] * h1 + a[6] * h2 + a[7] * h3;
                y2 = a[8] * h0 + a[9] * h1 + a[10] * h2 + a[11] * h3;
                y3 = a[12] * h0 + a[13] * h1 + a[14] * h2 + a[15] * h3;
            }
        }
        beta[0] = y0;
        beta[1] = y1;
        beta[2] = y2;
        beta[3] = y3;
        tally.add(0, inverse, n0, c0, s0, q0);
        tally.add(1, inverse, n1, c1, s1, q1);
        tally.add(2, inverse, n2, c2, s2, q2);
        double[] x = tally.changes;
        x[1] += x01 * inverse;
        x[2] += x02 * inverse;
        x[3] += x03 * inverse;
        x[4] += x10 * inverse;
        x[6] += x12 * inverse;
        x[7] += x13 * inverse;
        x[8] += x20 * inverse;
        x[9] += x21 * inverse;
        x[11] += x23 * inverse;
        x[12] += x30 * inverse;
        x[13] += x31 * inverse;
        x[14] += x32 * inverse;
    }
}
