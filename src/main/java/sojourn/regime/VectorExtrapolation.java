package sojourn.regime;

import sojourn.numeric.Cholesky;

/**
 * Extrapolates two EM steps as {@link Extrapolation} does, in free coordinates: probabilities and means as they are, covariances
 * by their Cholesky factors with the logarithm of the diagonal, so that every extrapolated covariance is positive definite.
 */
final class VectorExtrapolation {
    /** A probability that the extrapolation would make negative is cut to this part of where EM had taken it. */
    private static final double CUT = 0.1;

    private final VectorParameters two;
    private final double[] start;
    private final double[] first;
    private final double[] bend;
    private final double stride;

    /** Three successive points of EM. Not modified. */
    VectorExtrapolation(VectorParameters zero, VectorParameters one, VectorParameters two) {
        this.two = two;
        start = coordinates(zero);
        double[] middle = coordinates(one);
        double[] end = coordinates(two);
        first = new double[start.length];
        bend = new double[start.length];
        double r2 = 0;
        double v2 = 0;
        for (int e = 0; e < start.length; e++) {
            first[e] = middle[e] - start[e];
            bend[e] = (end[e] - middle[e]) - first[e];
            r2 += first[e] * first[e];
            v2 += bend[e] * bend[e];
        }
        stride = v2 > 0 ? StrictMath.max(1, Math.sqrt(r2 / v2)) : 1;
    }

    /** |r| / |v|, r the first step and v the second minus the first; at least 1. */
    double stride() {
        return stride;
    }

    /** The largest change of a coordinate in the second step. */
    double lastChange() {
        double largest = 0;
        for (int e = 0; e < start.length; e++) {
            largest = StrictMath.max(largest, StrictMath.abs(first[e] + bend[e]));
        }
        return largest;
    }

    /** The point theta0 + 2 stride r + stride^2 v, brought back to probabilities. */
    VectorParameters point(double strideTaken) {
        VectorParameters point = two.copy();
        Parameters chain = point.chain();
        int d = point.dimension();
        int e = 0;
        for (; e < chain.firstMean(); e++) {
            double value = value(e, strideTaken);
            chain.set(e, value > 0 ? value : CUT * two.chain().at(e));
        }
        for (int row = 0; row < chain.firstMean(); row += chain.states()) {
            Extrapolation.normalise(chain, row, chain.states());
        }
        for (int i = 0; i < point.means().length; i++) {
            point.means()[i] = value(e++, strideTaken);
        }
        for (int k = 0; k < point.states(); k++) {
            double[] l = new double[d * d];
            for (int i = 0; i < d; i++) {
                for (int j = 0; j <= i; j++) {
                    double value = value(e++, strideTaken);
                    l[i * d + j] = i == j ? StrictMath.exp(value) : value;
                }
            }
            multiply(l, d, point.covariances(), k * d * d);
        }
        return point;
    }

    private double value(int e, double strideTaken) {
        return start[e] + 2 * strideTaken * first[e] + strideTaken * strideTaken * bend[e];
    }

    /** L L' into {@code target}, which is modified. */
    private static void multiply(double[] l, int d, double[] target, int from) {
        for (int i = 0; i < d; i++) {
            for (int j = 0; j <= i; j++) {
                double sum = 0;
                for (int m = 0; m <= j; m++) {
                    sum += l[i * d + m] * l[j * d + m];
                }
                target[from + i * d + j] = sum;
                target[from + j * d + i] = sum;
            }
        }
    }

    private static double[] coordinates(VectorParameters p) {
        Parameters chain = p.chain();
        int d = p.dimension();
        double[] all = new double[chain.firstMean() + p.means().length + p.states() * d * (d + 1) / 2];
        int e = 0;
        for (; e < chain.firstMean(); e++) {
            all[e] = chain.at(e);
        }
        for (double mean : p.means()) {
            all[e++] = mean;
        }
        for (int k = 0; k < p.states(); k++) {
            Cholesky factor = Cholesky.of(Order.row(p.covariances(), k, d * d), d)
                    .orElseThrow(() -> new IllegalStateException("a search went beyond its bounds; this is a bug"));
            for (int i = 0; i < d; i++) {
                for (int j = 0; j <= i; j++) {
                    all[e++] = i == j ? StrictMath.log(factor.at(i, i)) : factor.at(i, j);
                }
            }
        }
        return all;
    }
}
