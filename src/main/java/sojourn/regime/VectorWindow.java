package sojourn.regime;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import sojourn.numeric.CompensatedSum;

/**
 * A window of several numbers a row, each column brought to mean 0 and variance 1 over the rows in which it is there, so that the
 * search does not depend on the units. Rows with the same numbers missing share a {@link Pattern}.
 */
final class VectorWindow {
    private final int dimension;
    private final double[] values;
    private final int[] patternOf;
    private final List<Pattern> patterns;
    private final int count;
    private final double[] centers;
    private final double[] scales;

    private VectorWindow(Observations x, double[] centers, double[] scales) {
        this.dimension = x.dimension();
        this.centers = centers;
        this.scales = scales;
        this.count = x.present();
        this.values = new double[x.size() * dimension];
        this.patternOf = new int[x.size()];
        this.patterns = new ArrayList<>();
        for (int t = 0; t < x.size(); t++) {
            Pattern pattern = Pattern.of(x, t);
            int index = patterns.indexOf(pattern);
            patternOf[t] = index < 0 ? patterns.size() : index;
            if (index < 0) {
                patterns.add(pattern);
            }
            for (int i = 0; i < dimension; i++) {
                values[t * dimension + i] = x.missing(t, i) ? 0 : (x.at(t, i) - centers[i]) / scales[i];
            }
        }
    }

    /** The window of those observations; a scale is 0 for a constant column, and not finite where squares overflow. */
    static VectorWindow of(Observations x) {
        double[] centers = new double[x.dimension()];
        double[] scales = new double[x.dimension()];
        for (int i = 0; i < centers.length; i++) {
            centers[i] = mean(x, i);
            scales[i] = Math.sqrt(meanSquareFrom(x, i, centers[i]));
        }
        return new VectorWindow(x, centers, scales);
    }

    private static double mean(Observations x, int column) {
        CompensatedSum sum = new CompensatedSum();
        for (int t = 0; t < x.size(); t++) {
            if (!x.missing(t, column)) {
                sum.add(x.at(t, column));
            }
        }
        return x.present(column) == 0 ? 0 : sum.value() / x.present(column);
    }

    private static double meanSquareFrom(Observations x, int column, double center) {
        CompensatedSum sum = new CompensatedSum();
        for (int t = 0; t < x.size(); t++) {
            if (!x.missing(t, column)) {
                double d = x.at(t, column) - center;
                sum.add(d * d);
            }
        }
        return x.present(column) == 0 ? 0 : sum.value() / x.present(column);
    }

    /** Number of rows, missing ones included. */
    int size() {
        return patternOf.length;
    }

    /** Numbers a row. */
    int dimension() {
        return dimension;
    }

    /** Number of rows that are not missing. */
    int count() {
        return count;
    }

    /** The standardised observations, row-major, 0 where missing; not to be modified. */
    double[] values() {
        return values;
    }

    /** One standardised row, a copy. */
    double[] row(int t) {
        return Arrays.copyOfRange(values, t * dimension, (t + 1) * dimension);
    }

    /** The pattern of a row, as an index into {@link #patterns}. */
    int patternOf(int row) {
        return patternOf[row];
    }

    /** Every pattern that occurs, in the order of occurrence. */
    List<Pattern> patterns() {
        return patterns;
    }

    /** What was subtracted from a column. */
    double center(int column) {
        return centers[column];
    }

    /** What the rest was divided by: the standard deviation with divisor n. */
    double scale(int column) {
        return scales[column];
    }
}
