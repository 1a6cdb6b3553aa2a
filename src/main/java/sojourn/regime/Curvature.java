package sojourn.regime;

import java.util.Optional;
import sojourn.numeric.Cholesky;

/** The inverse of minus the matrix of second derivatives, learnt from gradients (BFGS; Nocedal and Wright 2006, Numerical Optimization, 6.1). */
final class Curvature {
    private static final double LEAST = 1e-10;

    private final int size;
    private final double[] inverse;

    /** Starts from a diagonal, all positive; not modified. */
    Curvature(double[] diagonal) {
        size = diagonal.length;
        inverse = new double[size * size];
        for (int i = 0; i < size; i++) {
            inverse[i * size + i] = 1 / diagonal[i];
        }
    }

    private Curvature(int size, double[] inverse) {
        this.size = size;
        this.inverse = inverse;
    }

    /** Of that matrix itself, row-major, not modified; empty where it is not positive definite. */
    static Optional<Curvature> of(double[] matrix, int size) {
        return Cholesky.of(matrix, size).map(factor -> {
            double[] inverse = new double[size * size];
            for (int i = 0; i < size; i++) {
                double[] unit = new double[size];
                unit[i] = 1;
                System.arraycopy(factor.solve(unit), 0, inverse, i * size, size);
            }
            return new Curvature(size, inverse);
        });
    }

    /** The Newton step up that gradient. */
    double[] step(double[] gradient) {
        double[] step = new double[size];
        for (int i = 0; i < size; i++) {
            for (int j = 0; j < size; j++) {
                step[i] += inverse[i * size + j] * gradient[j];
            }
        }
        return step;
    }

    /** Takes in that after {@code step} the gradient has fallen by {@code fall}, unless it curves the wrong way. */
    void learn(double[] step, double[] fall) {
        double product = dot(step, fall);
        double[] turned = step(fall);
        double square = dot(fall, turned);
        if (!(product > LEAST * square)) {
            return;
        }
        double scale = (1 + square / product) / product;
        for (int i = 0; i < size; i++) {
            for (int j = 0; j < size; j++) {
                inverse[i * size + j] +=
                        scale * step[i] * step[j] - (turned[i] * step[j] + step[i] * turned[j]) / product;
            }
        }
    }

    static double dot(double[] a, double[] b) {
        double sum = 0;
        for (int i = 0; i < a.length; i++) {
            sum += a[i] * b[i];
        }
        return sum;
    }
}
