package sojourn.numeric;

import java.util.Optional;

/**
 * The Cholesky factor of a small symmetric positive definite matrix: M = L L', L lower triangular with a positive diagonal. Golub
 * and Van Loan (2013), Matrix Computations, 4th edition, algorithm 4.2.1. Immutable.
 */
public final class Cholesky {
    private final int size;
    private final double[] lower;

    private Cholesky(int size, double[] lower) {
        this.size = size;
        this.lower = lower;
    }

    /**
     * The factor; empty when the matrix is not positive definite in double precision.
     *
     * @param matrix size × size, row-major, of which the lower triangle is read. Not modified.
     */
    public static Optional<Cholesky> of(double[] matrix, int size) {
        Check.within(size, 1, Integer.MAX_VALUE, "size");
        Check.that(matrix.length == size * size, matrix.length + " entries of a matrix of " + size + " rows");
        double[] l = new double[size * size];
        for (int i = 0; i < size; i++) {
            for (int j = 0; j <= i; j++) {
                double rest = matrix[i * size + j];
                for (int m = 0; m < j; m++) {
                    rest -= l[i * size + m] * l[j * size + m];
                }
                if (i == j && !(rest > 0 && rest <= Double.MAX_VALUE)) {
                    return Optional.empty();
                }
                l[i * size + j] = i == j ? Math.sqrt(rest) : rest / l[j * size + j];
            }
        }
        return Optional.of(new Cholesky(size, l));
    }

    /** Number of rows. */
    public int size() {
        return size;
    }

    /** An entry of L; 0 above the diagonal. */
    public double at(int row, int column) {
        return lower[row * size + column];
    }

    /** ln |M| = 2 sum ln L_ii. */
    public double logDeterminant() {
        double sum = 0;
        for (int i = 0; i < size; i++) {
            sum += StrictMath.log(lower[i * size + i]);
        }
        return 2 * sum;
    }

    /** L^-1, size × size, row-major, lower triangular; a copy. */
    public double[] inverseOfFactor() {
        double[] w = new double[size * size];
        for (int j = 0; j < size; j++) {
            w[j * size + j] = 1 / lower[j * size + j];
            for (int i = j + 1; i < size; i++) {
                double sum = 0;
                for (int m = j; m < i; m++) {
                    sum -= lower[i * size + m] * w[m * size + j];
                }
                w[i * size + j] = sum / lower[i * size + i];
            }
        }
        return w;
    }

    /** M^-1 x. Not modified. */
    public double[] solve(double[] x) {
        double[] y = forward(x);
        for (int i = size - 1; i >= 0; i--) {
            for (int j = i + 1; j < size; j++) {
                y[i] -= lower[j * size + i] * y[j];
            }
            y[i] /= lower[i * size + i];
        }
        return y;
    }

    /** x' M^-1 x, the squared length of L^-1 x. Not modified. */
    public double squaredDistance(double[] x) {
        double sum = 0;
        for (double y : forward(x)) {
            sum += y * y;
        }
        return sum;
    }

    private double[] forward(double[] x) {
        Check.that(x.length == size, x.length + " numbers for a matrix of " + size + " rows");
        double[] y = x.clone();
        for (int i = 0; i < size; i++) {
            for (int j = 0; j < i; j++) {
                y[i] -= lower[i * size + j] * y[j];
            }
            y[i] /= lower[i * size + i];
        }
        return y;
    }
}
