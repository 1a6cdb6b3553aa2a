package sojourn.regime;

import java.util.Arrays;
import sojourn.numeric.Check;

/** A series of observations without dates: rows of {@code dimension} numbers, some rows missing altogether. Immutable. */
public final class Observations {
    private final int dimension;
    private final double[] values;
    private final boolean[] missing;
    private final int present;

    private Observations(int dimension, double[] values, boolean[] missing) {
        this.dimension = dimension;
        this.values = values;
        this.missing = missing;
        int count = 0;
        for (boolean gap : missing) {
            count += gap ? 0 : 1;
        }
        this.present = count;
    }

    /** One number a row, none missing. Copied; NaN and infinities are refused. */
    public static Observations univariate(double[] values) {
        return of(1, values, new boolean[values.length]);
    }

    /**
     * Rows of {@code dimension} numbers. Copies its arrays; neither modified.
     *
     * @param rowMajor rows × dimension; the numbers of a missing row are ignored, all others must be finite
     * @param missing one entry a row
     */
    public static Observations of(int dimension, double[] rowMajor, boolean[] missing) {
        Check.within(dimension, 1, Integer.MAX_VALUE, "dimension");
        Check.that(
                rowMajor.length == missing.length * dimension,
                rowMajor.length + " numbers for " + missing.length + " rows of dimension " + dimension);
        double[] values = new double[rowMajor.length];
        for (int row = 0; row < missing.length; row++) {
            for (int i = row * dimension; !missing[row] && i < (row + 1) * dimension; i++) {
                values[i] = Check.finite(rowMajor[i], "observation in row " + row);
            }
        }
        return new Observations(dimension, values, missing.clone());
    }

    /** Number of rows, missing ones included. */
    public int size() {
        return missing.length;
    }

    /** Numbers a row. */
    public int dimension() {
        return dimension;
    }

    /** Whether that row holds no observation. */
    public boolean missing(int row) {
        return missing[row];
    }

    /** One number of a row that is not missing. */
    public double at(int row, int column) {
        if (missing[row]) {
            throw new IllegalArgumentException("row " + row + " is missing");
        }
        Check.within(column, 0, dimension - 1, "column");
        return values[row * dimension + column];
    }

    /** Number of rows that are not missing. */
    public int present() {
        return present;
    }

    /** The rows from {@code start} up to, not including, {@code end}. */
    public Observations range(int start, int end) {
        Check.that(
                start >= 0 && start <= end && end <= size(),
                "rows " + start + " to " + end + " of a series of " + size() + " rows");
        return new Observations(
                dimension,
                Arrays.copyOfRange(values, start * dimension, end * dimension),
                Arrays.copyOfRange(missing, start, end));
    }
}
