package sojourn.regime;

import sojourn.numeric.Check;
import sojourn.numeric.Exp;

/**
 * Forward and backward recursion of a two-state chain (Rabiner 1989, Proc. IEEE 77, III.A and III.C) on density ratios r = f_narrow /
 * f_wide, so that one exponential an observation is enough, and without a division or a logarithm a row: variables are left
 * unnormalised and multiplied by an exact power of two at the start of every block of 16 rows; within a block the sum of alpha
 * times beta is the same at every row, so one division a block turns products into probabilities.
 *
 * <p>Each recursion waits for its own last row, so both go at once, a block from either end, on the way out keeping what they
 * find; past the middle each meets what the other kept, and probabilities are summed. Rows that do not make a pair of blocks lie in the
 * middle and are gone through alone. With g the narrow state's probability, steps from narrow to wide are summed in the left part, steps back
 * in the right part with the step that leads into it; over any stretch the former less the latter are g(first) - g(last).
 */
final class TwoStateExpectation implements Expectation {
    /** The shortest window: a pair of blocks. */
    static final int LEAST_ROWS = 32;

    private static final int BLOCK = 16;
    /** Below this a row has lost digits: only states that the chain can hardly be in could have made its observation. */
    private static final double LEAST = 1e-100;

    private static final double LN2 = 0.6931471805599453;

    private final Window window;
    private final Ratios ratios;
    private final Tally tally;
    private final int rows;
    /** Pairs of blocks. */
    private final int pairs;

    private final double[] a;
    private final double[] r;
    /** What is kept of the narrow state in every row: forward variables in the left part, backward variables in the right part. */
    private final double[] kept;
    /** The same of the wide state in the last row of every block, counted from the left or from the right. */
    private final double[] wideAlpha;

    private final double[] wideBeta;

    /** Forward variables, narrow and wide, of the row that the recursion has reached, and the exponent taken out. */
    private double u;

    private double v;
    private long exponent;

    /** Backward variables of the row that the recursion has reached. */
    private double y;

    private double w;

    /** Probability of the narrow state in the last row of the left part. */
    private double narrowBetween;
    /** The smallest sum of forward variables, or of forward times backward ones, met so far. */
    private double least;

    /** For a window of at least 32 rows. */
    TwoStateExpectation(Window window) {
        this.window = window;
        this.ratios = new Ratios(2, window);
        this.tally = new Tally(2, window);
        rows = Check.within(window.size(), LEAST_ROWS, Integer.MAX_VALUE, "rows");
        pairs = rows / (2 * BLOCK);
        a = new double[4];
        r = new double[rows];
        kept = new double[rows];
        wideAlpha = new double[pairs];
        wideBeta = new double[pairs + 2];
    }

    @Override
    public boolean fill(Parameters p, ExpectedSums sums) {
        if (!ratios.aim(p)) {
            return false;
        }
        sums.clear();
        tally.clear();
        ratios.fill(0, r);
        ratios.transitions(p, a);
        outward(p.at(p.initial(ratios.state(0))) * r[0], p.at(p.initial(ratios.state(1))));
        if (!(least > LEAST && onward())) {
            return false;
        }
        balance();
        tally.into(sums, ratios);
        sums.logLikelihood = ratios.logLikelihoodOfWidest() + (exponent * LN2 + StrictMath.log(u + v));
        sums.likelihoodFrom[ratios.state(0)] = r[0] * y;
        sums.likelihoodFrom[ratios.state(1)] = w;
        return true;
    }

    /** Both recursions to where they meet. */
    private void outward(double first, double second) {
        u = first;
        v = second;
        exponent = 0;
        least = u + v;
        y = 1;
        w = 1;
        for (int k = 0; k < pairs; k++) {
            if (k > 0) {
                rescaleForward();
                rescaleBackward();
            }
            keep(k);
        }
        int block = pairs;
        for (int end = rows - pairs * BLOCK; end > pairs * BLOCK; end -= BLOCK) {
            rescaleBackward();
            keepBackward(StrictMath.max(pairs * BLOCK, end - BLOCK), end, block++);
        }
    }

    /** Both past each other to the ends; false where a sum underflowed. */
    private boolean onward() {
        int from = pairs * BLOCK;
        int middle = rows - 2 * from;
        for (int left = middle; left > 0 && least > LEAST; ) {
            int length = left > BLOCK ? left - BLOCK : left;
            rescaleForward();
            sumForward(from + middle - left, length, pairs + (left > BLOCK ? 1 : 0));
            left -= length;
        }
        for (int k = pairs - 1; k >= 0 && least > LEAST; k--) {
            rescaleForward();
            rescaleBackward();
            sum(k);
        }
        return least > LEAST;
    }

    private void rescaleForward() {
        int e = Math.getExponent(u + v);
        u *= Exp.powerOfTwo(-e);
        v *= Exp.powerOfTwo(-e);
        exponent += e;
    }

    private void rescaleBackward() {
        double factor = Exp.powerOfTwo(-Math.getExponent(y + w));
        y *= factor;
        w *= factor;
    }

    /** The k-th block from either end: forward in the left one, backward in the right one. */
    private void keep(int k) {
        double a00 = a[0];
        double a01 = a[1];
        double a10 = a[2];
        double a11 = a[3];
        double f = u;
        double g = v;
        double b = y;
        double c = w;
        double low = least;
        int i = k * BLOCK;
        int end = i + BLOCK;
        int j = rows - 1 - i;
        if (k == 0) {
            kept[i++] = f;
            kept[j--] = b;
        }
        for (; i < end; i++, j--) {
            double next = f * (a00 * r[i]) + g * (a10 * r[i]);
            g = f * a01 + g * a11;
            f = next;
            kept[i] = f;
            low = Math.min(low, f + g);
            double h = r[j + 1];
            double before = b * (a00 * h) + c * a01;
            c = b * (a10 * h) + c * a11;
            b = before;
            kept[j] = b;
        }
        wideAlpha[k] = g;
        wideBeta[k] = c;
        u = f;
        v = g;
        y = b;
        w = c;
        least = low;
    }

    /** A block of the middle, backward alone. */
    private void keepBackward(int start, int end, int block) {
        double b = y;
        double c = w;
        for (int j = end - 1; j >= start; j--) {
            double h = r[j + 1];
            double before = b * (a[0] * h) + c * a[1];
            c = b * (a[2] * h) + c * a[3];
            b = before;
            kept[j] = b;
        }
        wideBeta[block] = c;
        y = b;
        w = c;
    }

    /** A block of the middle, forward alone. */
    private void sumForward(int start, int length, int block) {
        double n = 0;
        double c = 0;
        double s = 0;
        double q = 0;
        double back = 0;
        double norm =
                (u * (a[0] * r[start]) + v * (a[2] * r[start])) * kept[start] + (u * a[1] + v * a[3]) * wideBeta[block];
        for (int i = start; i < start + length; i++) {
            double rb = r[i] * kept[i];
            back += v * rb;
            double next = u * (a[0] * r[i]) + v * (a[2] * r[i]);
            v = u * a[1] + v * a[3];
            u = next;
            least = Math.min(least, u + v);
            double g = u * kept[i];
            double gz = g * window.values()[i];
            n += g;
            c += g * window.present()[i];
            s += gz;
            q += gz * window.values()[i];
        }
        tally.add(0, 1 / norm, n, c, s, q);
        tally.changes[2] += back / norm;
        least = Math.min(least, norm);
    }

    /** The k-th block from either end: backward in the left one, forward in the right one. */
    private void sum(int k) {
        double[] z = window.values();
        double[] present = window.present();
        double a00 = a[0];
        double a01 = a[1];
        double a10 = a[2];
        double a11 = a[3];
        double f = u;
        double g = v;
        double b = y;
        double c = w;
        double low = least;
        double leftRows = 0;
        double leftCount = 0;
        double leftSum = 0;
        double leftSquares = 0;
        double out = 0;
        double rightRows = 0;
        double rightCount = 0;
        double rightSum = 0;
        double rightSquares = 0;
        double back = 0;
        int j = (k + 1) * BLOCK - 1;
        int i = rows - 1 - j;
        // alpha times beta of either block, at the row that comes first
        double top = kept[j] * (b * (a00 * r[j + 1]) + c * a01);
        double norm = top + wideAlpha[k] * (b * (a10 * r[j + 1]) + c * a11);
        double other = (f * (a00 * r[i]) + g * (a10 * r[i])) * kept[i] + (f * a01 + g * a11) * wideBeta[k];
        if (k == pairs - 1) {
            out = -(kept[j] * c); // the step into the right part is summed there
            narrowBetween = top / norm;
        }
        for (int end = i + BLOCK; i < end; i++, j--) {
            double ri = r[i];
            double beta = kept[i];
            back += g * (ri * beta);
            double next = f * (a00 * ri) + g * (a10 * ri);
            g = f * a01 + g * a11;
            f = next;
            low = Math.min(low, f + g);
            double p = f * beta;
            double pz = p * z[i];
            rightRows += p;
            rightCount += p * present[i];
            rightSum += pz;
            rightSquares += pz * z[i];

            double h = r[j + 1];
            double alpha = kept[j];
            out += alpha * c;
            double before = b * (a00 * h) + c * a01;
            c = b * (a10 * h) + c * a11;
            b = before;
            double m = alpha * b;
            double mz = m * z[j];
            leftRows += m;
            leftCount += m * present[j];
            leftSum += mz;
            leftSquares += mz * z[j];
        }
        tally.add(0, 1 / norm, leftRows, leftCount, leftSum, leftSquares);
        tally.add(0, 1 / other, rightRows, rightCount, rightSum, rightSquares);
        tally.changes[1] += out / norm;
        tally.changes[2] += back / other;
        if (k == 0) {
            tally.first[0] = kept[0] * b / norm;
            tally.last[0] = f * kept[rows - 1] / other;
        }
        least = Math.min(low, Math.min(norm, other));
        u = f;
        v = g;
        y = b;
        w = c;
    }

    /** Completes the steps either way by what is known of the other way in each part. */
    private void balance() {
        double out = a[1] * tally.changes[1];
        double back = a[2] * tally.changes[2];
        tally.changes[1] = StrictMath.max(0, out + (back + narrowBetween - tally.last[0]));
        tally.changes[2] = StrictMath.max(0, back + (out + narrowBetween - tally.first[0]));
        tally.first[1] = StrictMath.max(0, 1 - tally.first[0]);
        tally.last[1] = StrictMath.max(0, 1 - tally.last[0]);
    }
}
