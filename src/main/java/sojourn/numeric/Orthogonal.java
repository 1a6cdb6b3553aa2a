package sojourn.numeric;

import java.util.List;

/**
 * Independent vectors d_1..d_k as QR: orthonormal q_j and an upper triangle R, by modified Gram-Schmidt with every projection
 * taken twice, which keeps q_j orthogonal to rounding (Björck 1994, Linear Algebra and its Applications 197, 297-316).
 */
final class Orthogonal {
    /** A vector that sticks out of the others' span by less than this part of its length counts as dependent. */
    static final double DEPENDENT = 1e-10;

    private final int size;
    private final double[][] directions;
    private final double[][] triangle;

    private Orthogonal(int size, double[][] directions, double[][] triangle) {
        this.size = size;
        this.directions = directions;
        this.triangle = triangle;
    }

    /** Of vectors of {@code size} numbers, none modified. */
    static Orthogonal of(List<double[]> vectors, int size) {
        int count = vectors.size();
        double[][] directions = new double[count][];
        double[][] triangle = new double[count][count];
        for (int k = 0; k < count; k++) {
            double[] rest = vectors.get(k).clone();
            for (int pass = 0; pass < 2; pass++) {
                for (int j = 0; j < k; j++) {
                    triangle[j][k] += remove(rest, directions[j]);
                }
            }
            triangle[k][k] = Math.sqrt(QuadraticProgramme.product(rest, rest));
            for (int i = 0; i < size; i++) {
                rest[i] /= triangle[k][k];
            }
            directions[k] = rest;
        }
        return new Orthogonal(size, directions, triangle);
    }

    /** What of {@code vector} is orthogonal to all. Not modified. */
    double[] rest(double[] vector) {
        double[] rest = vector.clone();
        for (int pass = 0; pass < 2; pass++) {
            for (double[] direction : directions) {
                remove(rest, direction);
            }
        }
        return rest;
    }

    /** The r with sum r_j d_j nearest to {@code vector}: R r = Q'vector. Not modified. */
    double[] coordinates(double[] vector) {
        int count = directions.length;
        double[] r = new double[count];
        for (int j = count - 1; j >= 0; j--) {
            double sum = QuadraticProgramme.product(directions[j], vector);
            for (int m = j + 1; m < count; m++) {
                sum -= triangle[j][m] * r[m];
            }
            r[j] = sum / triangle[j][j];
        }
        return r;
    }

    /** The point nearest to {@code from} with d_j'v = levels_j for all j. Neither modified. */
    double[] nearest(double[] from, double[] levels) {
        double[] v = rest(from);
        double[] y = new double[levels.length]; // R'y = levels
        for (int j = 0; j < y.length; j++) {
            double sum = levels[j];
            for (int m = 0; m < j; m++) {
                sum -= triangle[m][j] * y[m];
            }
            y[j] = sum / triangle[j][j];
            for (int i = 0; i < size; i++) {
                v[i] += y[j] * directions[j][i];
            }
        }
        return v;
    }

    private static double remove(double[] from, double[] direction) {
        double share = QuadraticProgramme.product(from, direction);
        for (int i = 0; i < from.length; i++) {
            from[i] -= share * direction[i];
        }
        return share;
    }
}
