package sojourn.numeric;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * Minimises x'Qx/2 - c'x over a convex region, Q positive definite, by the dual active-set method of Goldfarb and Idnani (1983,
 * Mathematical Programming 27, 1-33): from the minimum without constraints, the most violated half-space is made active, and
 * active ones whose multiplier would turn negative are let go, until no half-space is violated. In coordinates v = L'x, Q = LL',
 * the objective is a distance, the step is the part of the new normal that is orthogonal to the active ones, and the multipliers
 * fall by its coordinates along them. Exact up to rounding, for small problems; cost per step about size^3.
 */
public final class QuadraticProgramme {
    private static final double SLACK = 1e-11;
    private static final int STEPS_PER_NUMBER = 200;

    private final double[] inverse;
    private final int size;
    private final double[] start;
    private double[] v;
    private final List<Active> actives = new ArrayList<>();

    /** The half-spaces that x must lie in, which may be too many to list. */
    public interface Region {
        /** One that {@code x} violates by more than {@code slack}, the most violated; empty if there is none. Not modified. */
        Optional<HalfSpace> mostViolated(double[] x, double slack);
    }

    /** All x with normal'x at or above a level. */
    public static final class HalfSpace {
        private final double[] normal;
        private final double least;

        private HalfSpace(double[] normal, double least) {
            this.normal = normal;
            this.least = least;
        }

        /** Copies {@code normal}. */
        public static HalfSpace atLeast(double least, double... normal) {
            return new HalfSpace(normal.clone(), least);
        }

        /** How far {@code x} falls short of the level; negative inside. Not modified. */
        double violation(double[] x) {
            return least - product(normal, x);
        }
    }

    /** An active half-space in the coordinates v, with its multiplier. */
    private static final class Active {
        private final double[] normal;
        private final double least;
        private double multiplier;

        Active(double[] normal, double least) {
            this.normal = normal;
            this.least = least;
        }
    }

    private QuadraticProgramme(Cholesky quadratic, double[] linear) {
        this.size = quadratic.size();
        this.inverse = quadratic.inverseOfFactor();
        this.start = inner(linear);
        this.v = start.clone();
    }

    /**
     * The minimum; empty if the region is empty or the search did not end in {@value #STEPS_PER_NUMBER} steps a number.
     *
     * @param quadratic the factor of Q
     * @param linear c. Not modified.
     */
    public static Optional<double[]> minimum(Cholesky quadratic, double[] linear, Region region) {
        return new QuadraticProgramme(quadratic, linear).search(region);
    }

    private Optional<double[]> search(Region region) {
        for (int steps = 0; steps < STEPS_PER_NUMBER * (size + 1); steps++) {
            Optional<HalfSpace> violated = region.mostViolated(outer(v), SLACK);
            if (violated.isEmpty()) {
                return Optional.of(outer(v));
            }
            if (!activate(new Active(inner(violated.get().normal), violated.get().least))) {
                return Optional.empty();
            }
            v = Orthogonal.of(normals(), size).nearest(start, levels());
        }
        return Optional.empty();
    }

    /** Moves until {@code added} holds with equality; false if it cannot be met together with the active ones. */
    private boolean activate(Active added) {
        while (true) {
            Orthogonal active = Orthogonal.of(normals(), size);
            double[] along = active.coordinates(added.normal);
            double[] step = active.rest(added.normal);
            double square = product(step, step);
            double full = Math.sqrt(square) <= Orthogonal.DEPENDENT * Math.sqrt(product(added.normal, added.normal))
                    ? Double.POSITIVE_INFINITY
                    : (added.least - product(added.normal, v)) / square;
            int leaving = firstToLeave(along);
            double partial = leaving < 0 ? Double.POSITIVE_INFINITY : actives.get(leaving).multiplier / along[leaving];
            double length = Math.min(full, partial);
            if (length == Double.POSITIVE_INFINITY) {
                return false;
            }
            for (int j = 0; j < along.length; j++) {
                actives.get(j).multiplier -= length * along[j];
            }
            added.multiplier += length;
            for (int i = 0; i < size && full < Double.POSITIVE_INFINITY; i++) {
                v[i] += length * step[i];
            }
            if (full <= partial) {
                actives.add(added);
                return true;
            }
            actives.remove(leaving);
        }
    }

    /** The active one whose multiplier is the first to reach 0; -1 if none falls. */
    private int firstToLeave(double[] along) {
        int first = -1;
        for (int j = 0; j < along.length; j++) {
            boolean falls = along[j] > 0;
            if (falls
                    && (first < 0
                            || actives.get(j).multiplier * along[first] < actives.get(first).multiplier * along[j])) {
                first = j;
            }
        }
        return first;
    }

    private List<double[]> normals() {
        return actives.stream().map(active -> active.normal).toList();
    }

    private double[] levels() {
        return actives.stream().mapToDouble(active -> active.least).toArray();
    }

    /** L^-1 x. */
    private double[] inner(double[] x) {
        double[] y = new double[size];
        for (int i = 0; i < size; i++) {
            for (int j = 0; j <= i; j++) {
                y[i] += inverse[i * size + j] * x[j];
            }
        }
        return y;
    }

    /** L'^-1 y. */
    private double[] outer(double[] y) {
        double[] x = new double[size];
        for (int i = 0; i < size; i++) {
            for (int j = i; j < size; j++) {
                x[i] += inverse[j * size + i] * y[j];
            }
        }
        return x;
    }

    static double product(double[] a, double[] b) {
        double sum = 0;
        for (int i = 0; i < a.length; i++) {
            sum += a[i] * b[i];
        }
        return sum;
    }
}
