package sojourn.regime;

import java.util.Arrays;
import sojourn.numeric.Exp;
import sojourn.numeric.Log;

/**
 * The expectation step of Student-t emissions, of a chain or of an independent mixture (a chain with equal rows): the scaled
 * forward and backward recursion (Rabiner 1989, Proc. IEEE 77, III.A and V.A), and for each row and state the weight u = (nu + 1) /
 * (nu + d^2) that the row's outlyingness leaves it. One logarithm, ln(1 + d^2 / nu), serves both the density and ln u.
 */
final class StudentExpectation implements Expectation {
    private static final double LEAST = 1e-250;
    private static final double FLUSH = 1e-50;

    private final int states;
    private final Window window;
    private final double[] transition;
    private final double[] mean;
    private final double[] precision;
    private final double[] nu;
    private final double[] constant;
    private final double[] logs;
    private final double[] density;
    private final double[] alpha;
    private final double[] factor;
    private final double[] beta;
    private final double[] weighted;

    StudentExpectation(int states, Window window) {
        this.states = states;
        this.window = window;
        transition = new double[states * states];
        mean = new double[states];
        precision = new double[states];
        nu = new double[states];
        constant = new double[states];
        logs = new double[window.size() * states];
        density = new double[window.size() * states];
        alpha = new double[window.size() * states];
        factor = new double[window.size()];
        beta = new double[states];
        weighted = new double[states];
    }

    @Override
    public boolean fill(Parameters p, ExpectedSums sums) {
        sums.clear();
        unpack(p);
        double shift = densities();
        double forward = forward(p);
        sums.logLikelihood = shift + forward;
        if (!(forward > Double.NEGATIVE_INFINITY)) {
            return false;
        }
        backward(sums);
        for (int k = 0; p.kind() != ModelKind.HIDDEN_MARKOV && k < states; k++) {
            sums.initial[k] = sums.count[k] / window.count();
            sums.likelihoodFrom[k] = 0;
        }
        return true;
    }

    private void unpack(Parameters p) {
        for (int k = 0; k < states; k++) {
            double variance = p.at(p.variance(k));
            nu[k] = p.at(p.degreesOfFreedom(k));
            mean[k] = p.at(p.mean(k));
            precision[k] = 1 / (variance * nu[k]);
            constant[k] = StudentT.logConstant(nu[k]) - 0.5 * StrictMath.log(variance);
            for (int j = 0; j < states; j++) {
                transition[k * states + j] =
                        p.kind() == ModelKind.HIDDEN_MARKOV ? p.at(p.transition(k, j)) : p.at(p.initial(j));
            }
        }
    }

    /** Each row's densities divided by its largest; returns the sum of the logs of the divisors. */
    private double densities() {
        double[] z = window.values();
        double[] present = window.present();
        double shift = 0;
        for (int t = 0; t < z.length; t++) {
            int row = t * states;
            double highest = Double.NEGATIVE_INFINITY;
            for (int k = 0; k < states; k++) {
                double d = z[t] - mean[k];
                double log = Log.of(1 + d * d * precision[k]);
                logs[row + k] = log;
                density[row + k] = (constant[k] - 0.5 * (nu[k] + 1) * log) * present[t];
                highest = Math.max(highest, density[row + k]);
            }
            for (int k = 0; k < states; k++) {
                density[row + k] = density[row + k] == highest ? 1 : Exp.of(density[row + k] - highest);
            }
            shift += highest;
        }
        return shift;
    }

    /** Scaled forward variables; returns the log of the product of the scales, minus infinity where double precision ends. */
    private double forward(Parameters p) {
        double result = 0;
        double product = 1;
        for (int t = 0; t < factor.length; t++) {
            int row = t * states;
            double total = 0;
            for (int j = 0; j < states; j++) {
                double predicted = 0;
                if (t == 0) {
                    predicted = p.at(p.initial(j));
                } else {
                    for (int i = 0; i < states; i++) {
                        predicted += alpha[row - states + i] * transition[i * states + j];
                    }
                }
                double next = predicted * density[row + j];
                alpha[row + j] = next;
                total += next;
            }
            if (!(total > LEAST)) {
                return Double.NEGATIVE_INFINITY;
            }
            double inverse = 1 / total;
            for (int j = 0; j < states; j++) {
                alpha[row + j] *= inverse;
            }
            factor[t] = inverse;
            product *= total;
            if (product < FLUSH) { // one logarithm for many rows
                result += StrictMath.log(product);
                product = 1;
            }
        }
        return result + StrictMath.log(product);
    }

    private void backward(ExpectedSums sums) {
        Arrays.fill(beta, 1);
        for (int t = factor.length - 1; t >= 0; t--) {
            int row = t * states;
            if (window.present()[t] > 0) {
                observe(sums, t);
            }
            for (int j = 0; j < states; j++) {
                weighted[j] = density[row + j] * beta[j] * factor[t];
            }
            for (int i = 0; t > 0 && i < states; i++) {
                double total = 0;
                for (int j = 0; j < states; j++) {
                    double step = transition[i * states + j] * weighted[j];
                    sums.transitions[i * states + j] += alpha[row - states + i] * step;
                    total += step;
                }
                beta[i] = total;
            }
        }
        for (int k = 0; k < states; k++) {
            sums.initial[k] = alpha[k] * beta[k];
            sums.likelihoodFrom[k] = weighted[k];
            sums.logWeights[k] += sums.count[k] * StrictMath.log((nu[k] + 1) / nu[k]);
        }
    }

    private void observe(ExpectedSums sums, int t) {
        double z = window.values()[t];
        for (int k = 0; k < states; k++) {
            double g = alpha[t * states + k] * beta[k];
            double d = z - mean[k];
            double u = (nu[k] + 1) / (nu[k] * (1 + d * d * precision[k]));
            double gu = g * u;
            sums.count[k] += g;
            sums.weights[k] += gu;
            sums.sum[k] += gu * z;
            sums.squares[k] += gu * z * z;
            sums.logWeights[k] -= g * (logs[t * states + k] + u); // ln u = ln((nu + 1) / nu) - ln(1 + d^2 / nu)
        }
    }
}
