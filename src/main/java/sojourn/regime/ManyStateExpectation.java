package sojourn.regime;

import java.util.Arrays;
import sojourn.numeric.Exp;

/** The recursion of {@link TwoStateExpectation} for any number of states. */
final class ManyStateExpectation implements Expectation {
    private static final int BLOCK = 16;
    private static final double LEAST = 1e-100;
    private static final double LN2 = 0.6931471805599453;

    private final int states;
    private final Window window;
    private final Densities densities;
    private final double[] b;
    private final double[] a;
    private final double[] transition;
    private final double[] y;
    private final double[] w;
    private final double[] steps;
    private final double[] moments;

    ManyStateExpectation(int states, Window window) {
        this.states = states;
        this.window = window;
        this.densities = new Densities(states, window);
        b = new double[window.size() * states];
        a = new double[window.size() * states];
        transition = new double[states * states];
        y = new double[states];
        w = new double[states];
        steps = new double[states * states];
        moments = new double[3 * states];
    }

    @Override
    public boolean fill(Parameters p, ExpectedSums sums) {
        sums.clear();
        for (int i = 0; i < states; i++) {
            for (int j = 0; j < states; j++) {
                transition[i * states + j] = p.at(p.transition(i, j));
            }
        }
        double shift = densities.fill(p, b);
        sums.logLikelihood = shift + forward(p);
        return sums.logLikelihood > Double.NEGATIVE_INFINITY && backward(sums);
    }

    private double forward(Parameters p) {
        int rows = window.size();
        long exponent = 0;
        double total = 0;
        for (int k = 0; k < states; k++) {
            a[k] = p.at(p.initial(k)) * b[k];
            total += a[k];
        }
        double factor = 1;
        for (int t = 1; t < rows; t++) {
            if ((t & (BLOCK - 1)) == 0) {
                if (!(total > LEAST)) {
                    return Double.NEGATIVE_INFINITY;
                }
                int e = Math.getExponent(total);
                factor = Exp.powerOfTwo(-e);
                exponent += e;
            }
            total = step((t - 1) * states, t * states, factor);
            factor = 1;
        }
        return total > LEAST ? exponent * LN2 + StrictMath.log(total) : Double.NEGATIVE_INFINITY;
    }

    /** One row of the forward recursion; returns the sum of the new variables. */
    private double step(int from, int to, double factor) {
        double total = 0;
        for (int j = 0; j < states; j++) {
            double predicted = 0;
            for (int i = 0; i < states; i++) {
                predicted += a[from + i] * transition[i * states + j];
            }
            double next = predicted * b[to + j] * factor;
            a[to + j] = next;
            total += next;
        }
        return total;
    }

    private boolean backward(ExpectedSums sums) {
        Arrays.fill(y, 1);
        Arrays.fill(steps, 0);
        int t = window.size() - 1;
        double norm = dot(t * states);
        while (true) {
            int first = t & -BLOCK;
            Arrays.fill(moments, 0);
            for (; t > first; t--) {
                observe(t);
                weigh(t, 1);
                back(t);
            }
            observe(first);
            flush(sums, 1 / norm);
            if (first == 0) {
                for (int k = 0; k < states; k++) {
                    sums.initial[k] = a[k] * y[k] / norm;
                    sums.likelihoodFrom[k] = b[k] * y[k];
                }
                return true;
            }
            double total = 0;
            for (int k = 0; k < states; k++) {
                total += b[first * states + k] * y[k];
            }
            weigh(first, Exp.powerOfTwo(-Math.getExponent(total)));
            Arrays.fill(steps, 0);
            back(first);
            t = first - 1;
            norm = dot(t * states);
            if (!(norm > LEAST)) {
                return false;
            }
        }
    }

    private double dot(int row) {
        double total = 0;
        for (int k = 0; k < states; k++) {
            total += a[row + k] * y[k];
        }
        return total;
    }

    private void observe(int t) {
        double z = window.values()[t];
        double present = window.present()[t];
        for (int k = 0; k < states; k++) {
            double g = a[t * states + k] * y[k] * present;
            moments[3 * k] += g;
            moments[3 * k + 1] += g * z;
            moments[3 * k + 2] += g * z * z;
        }
    }

    private void weigh(int t, double factor) {
        for (int k = 0; k < states; k++) {
            w[k] = b[t * states + k] * y[k] * factor;
        }
    }

    /** From the weights of row t to beta of row t - 1; adds the steps between the two rows. */
    private void back(int t) {
        int before = (t - 1) * states;
        for (int i = 0; i < states; i++) {
            double alpha = a[before + i];
            double beta = 0;
            for (int j = 0; j < states; j++) {
                steps[i * states + j] += alpha * w[j];
                beta += transition[i * states + j] * w[j];
            }
            y[i] = beta;
        }
    }

    private void flush(ExpectedSums sums, double inverse) {
        for (int k = 0; k < states; k++) {
            sums.count[k] += moments[3 * k] * inverse;
            sums.sum[k] += moments[3 * k + 1] * inverse;
            sums.squares[k] += moments[3 * k + 2] * inverse;
        }
        for (int s = 0; s < steps.length; s++) {
            sums.transitions[s] += transition[s] * steps[s] * inverse;
        }
        Arrays.fill(steps, 0);
    }
}
