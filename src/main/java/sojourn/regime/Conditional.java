package sojourn.regime;

import java.util.List;
import sojourn.numeric.Cholesky;

/**
 * One state's normal distribution N(m, S) seen through a pattern of missing numbers: the density of the numbers that are there,
 * and the mean and covariance of the others given them, m_a + B (x_o - m_o) and C = S_aa - B S_oa with B = S_ao S_oo^-1 (Anderson
 * 2003, An Introduction to Multivariate Statistical Analysis, theorem 2.5.1). For the expectation step.
 */
final class Conditional {
    private static final double LN_TWO_PI = 1.8378770664093453;

    private final int[] present;
    private final int[] absent;
    private final double[] mean;
    /** Inverse of the Cholesky factor of S_oo. */
    private final double[] whitening;

    private final double logScale;
    private final double[] regression;
    private final double[] rest;
    private final double[] residual;

    Conditional(Pattern pattern, VectorParameters p, int state) {
        int d = p.dimension();
        present = indices(pattern.present());
        absent = indices(pattern.absent());
        mean = Order.row(p.means(), state, d);
        double[] s = Order.row(p.covariances(), state, d * d);
        int o = present.length;
        residual = new double[o];
        regression = new double[absent.length * o];
        rest = new double[absent.length * absent.length];
        if (o == 0) {
            whitening = new double[0];
            logScale = 0;
            System.arraycopy(s, 0, rest, 0, d * d);
            return;
        }
        Cholesky factor = Cholesky.of(part(s, d, present, present), o)
                .orElseThrow(() -> new IllegalStateException("a search went beyond its bounds; this is a bug"));
        whitening = factor.inverseOfFactor();
        logScale = -0.5 * (o * LN_TWO_PI + factor.logDeterminant());
        for (int i = 0; i < absent.length; i++) {
            double[] with = part(s, d, new int[] {absent[i]}, present);
            double[] b = factor.solve(with);
            System.arraycopy(b, 0, regression, i * o, o);
        }
        for (int i = 0; i < absent.length; i++) {
            for (int j = 0; j < absent.length; j++) {
                double value = s[absent[i] * d + absent[j]];
                for (int m = 0; m < o; m++) {
                    value -= regression[i * o + m] * s[present[m] * d + absent[j]];
                }
                rest[i * absent.length + j] = value;
            }
        }
    }

    private static int[] indices(List<Integer> columns) {
        return columns.stream().mapToInt(Integer::intValue).toArray();
    }

    private static double[] part(double[] s, int d, int[] rows, int[] columns) {
        double[] part = new double[rows.length * columns.length];
        for (int i = 0; i < rows.length; i++) {
            for (int j = 0; j < columns.length; j++) {
                part[i * columns.length + j] = s[rows[i] * d + columns[j]];
            }
        }
        return part;
    }

    /** Log density of the numbers that are there; 0 for none. {@code values} is not modified. */
    double logDensity(double[] values, int from) {
        return logScale - 0.5 * squaredDistance(values, from);
    }

    /** (x_o - m_o)' S_oo^-1 (x_o - m_o); 0 for none. {@code values} is not modified. */
    double squaredDistance(double[] values, int from) {
        int o = present.length;
        double squares = 0;
        for (int i = 0; i < o; i++) {
            residual[i] = values[from + present[i]] - mean[present[i]];
            double y = 0;
            for (int j = 0; j <= i; j++) {
                y += whitening[i * o + j] * residual[j];
            }
            squares += y * y;
        }
        return squares;
    }

    /** Puts the expected values of the missing numbers in their places in {@code row}, which is modified. */
    void complete(double[] row) {
        int o = present.length;
        for (int i = 0; i < absent.length; i++) {
            double value = mean[absent[i]];
            for (int j = 0; j < o; j++) {
                value += regression[i * o + j] * (row[present[j]] - mean[present[j]]);
            }
            row[absent[i]] = value;
        }
    }

    /** Adds {@code weight} times the covariance of the missing numbers given the others to a d × d table, which is modified. */
    void addRest(double weight, double[] products, int from, int dimension) {
        for (int i = 0; i < absent.length; i++) {
            for (int j = 0; j < absent.length; j++) {
                products[from + absent[i] * dimension + absent[j]] += weight * rest[i * absent.length + j];
            }
        }
    }
}
