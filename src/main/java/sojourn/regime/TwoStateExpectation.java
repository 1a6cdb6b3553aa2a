package sojourn.regime;

import sojourn.numeric.Exp;

/**
 * Forward and backward recursion of a two-state chain (Rabiner 1989, Proc. IEEE 77, III.A and III.C) on density ratios r = f_narrow /
 * f_wide, so that one exponential an observation is enough, and without a division or a logarithm a row: variables are left
 * unnormalised and multiplied by an exact power of two at the start of every block of 16 rows; within a block the sum of alpha
 * times beta is the same at every row, so one division a block turns products into probabilities. With g the narrow state's
 * probability, the steps from narrow to wide are summed; those back are as many, plus g(last) - g(first).
 */
final class TwoStateExpectation implements Expectation {
    private static final int BLOCK = 16;
    /** Below this a row has lost digits: only states that the chain can hardly be in could have made its observation. */
    private static final double LEAST = 1e-100;

    private static final double LN2 = 0.6931471805599453;

    private final Window window;
    private final Ratios ratios;
    private final Tally tally;
    private final double[] a;
    private final double[] r;
    /** Forward variable of the narrow state in every row. */
    private final double[] alpha;
    /** Forward variable of the wide state in the last row of every block. */
    private final double[] wideAlpha;

    /** Backward variables of the row that the recursion has reached. */
    private double narrowBeta;

    private double wideBeta;

    TwoStateExpectation(Window window) {
        this.window = window;
        this.ratios = new Ratios(2, window);
        this.tally = new Tally(2, window);
        a = new double[4];
        r = new double[window.size()];
        alpha = new double[window.size()];
        wideAlpha = new double[window.size() / BLOCK + 1];
    }

    @Override
    public boolean fill(Parameters p, ExpectedSums sums) {
        if (!ratios.aim(p)) {
            return false;
        }
        sums.clear();
        ratios.fill(0, r);
        ratios.transitions(p, a);
        double forward = forward(p.at(p.initial(ratios.state(0))) * r[0], p.at(p.initial(ratios.state(1))));
        if (!(forward > Double.NEGATIVE_INFINITY && backward())) {
            return false;
        }
        tally.into(sums, ratios);
        sums.logLikelihood = ratios.logLikelihoodOfWidest() + forward;
        sums.likelihoodFrom[ratios.state(0)] = r[0] * narrowBeta;
        sums.likelihoodFrom[ratios.state(1)] = wideBeta;
        return true;
    }

    /** The log of the sum of the last forward variables; minus infinity when a sum underflowed. */
    private double forward(double first, double second) {
        double a00 = a[0];
        double a01 = a[1];
        double a10 = a[2];
        double a11 = a[3];
        int rows = r.length;
        long exponent = 0;
        double u = first;
        double v = second;
        alpha[0] = u;
        int t = 1;
        for (int start = 0; start < rows; start += BLOCK) {
            int end = Math.min(start + BLOCK, rows);
            for (; t < end; t++) {
                double next = u * (a00 * r[t]) + v * (a10 * r[t]);
                v = u * a01 + v * a11;
                u = next;
                alpha[t] = u;
                if (!(u + v > LEAST)) {
                    return Double.NEGATIVE_INFINITY;
                }
            }
            wideAlpha[start / BLOCK] = v;
            if (end < rows) {
                int e = Math.getExponent(u + v);
                u *= Exp.powerOfTwo(-e);
                v *= Exp.powerOfTwo(-e);
                exponent += e;
            }
        }
        return u + v > LEAST ? exponent * LN2 + StrictMath.log(u + v) : Double.NEGATIVE_INFINITY;
    }

    private boolean backward() {
        tally.clear();
        narrowBeta = 1;
        wideBeta = 1;
        double norm = 1;
        for (int start = (r.length - 1) & -BLOCK; start >= 0 && norm > LEAST; start -= BLOCK) {
            norm = backward(start, Math.min(start + BLOCK, r.length));
        }
        double out = a[1] * tally.changes[1];
        tally.first[0] = alpha[0] * narrowBeta / norm;
        tally.first[1] = StrictMath.max(0, 1 - tally.first[0]);
        tally.last[1] = StrictMath.max(0, 1 - tally.last[0]);
        tally.changes[1] = out;
        tally.changes[2] = StrictMath.max(0, out + tally.last[0] - tally.first[0]);
        return norm > LEAST;
    }

    /** One block of rows; returns the sum of alpha times beta there. */
    private double backward(int start, int end) {
        double[] z = window.values();
        double[] present = window.present();
        double a00 = a[0];
        double a01 = a[1];
        double a10 = a[2];
        double a11 = a[3];
        int t = end - 1;
        double y = narrowBeta;
        double w = wideBeta;
        double x = 0;
        if (end < r.length) {
            double factor = Exp.powerOfTwo(-Math.getExponent(y + w));
            x = alpha[t] * (w * factor);
            double before = (y * (a00 * r[end]) + w * a01) * factor;
            w = (y * (a10 * r[end]) + w * a11) * factor;
            y = before;
        }
        double g = alpha[t] * y;
        double norm = g + wideAlpha[start / BLOCK] * w;
        double inverse = 1 / norm;
        tally.last[0] = end == r.length ? g * inverse : tally.last[0];
        double n = g;
        double c = g * present[t];
        double s = g * z[t];
        double q = s * z[t];
        for (t--; t >= start; t--) {
            double h = r[t + 1];
            x += alpha[t] * w;
            double before = y * (a00 * h) + w * a01;
            w = y * (a10 * h) + w * a11;
            y = before;
            g = alpha[t] * y;
            double gz = g * z[t];
            n += g;
            c += g * present[t];
            s += gz;
            q += gz * z[t];
        }
        narrowBeta = y;
        wideBeta = w;
        tally.rows[0] += n * inverse;
        tally.count[0] += c * inverse;
        tally.sum[0] += s * inverse;
        tally.squares[0] += q * inverse;
        tally.changes[1] += x * inverse;
        return norm;
    }
}
