package sojourn.regime;

import java.util.Arrays;
import sojourn.numeric.Check;

/**
 * A series of observations without dates: rows of {@code dimension} numbers, any of which may be missing. A row is missing when
 * all its numbers are. Immutable.
 */
public final class Observations {
    private final int dimension;
    private final double[] values;
    private final boolean[] missingCells;
    private final boolean[] missingRows;
    private final int present;

    private Observations(int dimension, double[] values, boolean[] missingCells) {
        this.dimension = dimension;
        this.values = values;
        this.missingCells = missingCells;
        this.missingRows = new boolean[missingCells.length / dimension];
        int count = 0;
        for (int row = 0; row < missingRows.length; row++) {
            boolean gap = true;
            for (int i = row * dimension; i < (row + 1) * dimension; i++) {
                gap &= missingCells[i];
            }
            missingRows[row] = gap;
            count += gap ? 0 : 1;
        }
        this.present = count;
    }

    /** One number a row, none missing. Copied; NaN and infinities are refused. */
    public static Observations univariate(double[] values) {
        return of(1, values, new boolean[values.length]);
    }

    /**
     * Rows of {@code dimension} numbers, each row there or missing as a whole. Copies its arrays; neither modified.
     *
     * @param rowMajor rows × dimension; the numbers of a missing row are ignored, all others must be finite
     * @param missingRows one entry a row
     */
    public static Observations of(int dimension, double[] rowMajor, boolean[] missingRows) {
        Check.within(dimension, 1, Integer.MAX_VALUE, "dimension");
        Check.that(
                rowMajor.length == missingRows.length * dimension,
                rowMajor.length + " numbers for " + missingRows.length + " rows of dimension " + dimension);
        boolean[] cells = new boolean[rowMajor.length];
        for (int i = 0; i < cells.length; i++) {
            cells[i] = missingRows[i / dimension];
        }
        return withMissingCells(dimension, rowMajor, cells);
    }

    /**
     * Rows of {@code dimension} numbers, each number there or missing. Copies its arrays; neither modified.
     *
     * @param rowMajor rows × dimension; missing numbers are ignored, all others must be finite
     * @param missingCells rows × dimension, row-major
     */
    public static Observations withMissingCells(int dimension, double[] rowMajor, boolean[] missingCells) {
        Check.within(dimension, 1, Integer.MAX_VALUE, "dimension");
        Check.that(
                rowMajor.length % dimension == 0 && rowMajor.length == missingCells.length,
                rowMajor.length + " numbers and " + missingCells.length + " flags for rows of dimension " + dimension);
        double[] values = new double[rowMajor.length];
        for (int i = 0; i < values.length; i++) {
            if (!missingCells[i]) {
                values[i] = Check.finite(rowMajor[i], "observation in row", i / dimension);
            }
        }
        return new Observations(dimension, values, missingCells.clone());
    }

    /** Number of rows, missing ones included. */
    public int size() {
        return missingRows.length;
    }

    /** Numbers a row. */
    public int dimension() {
        return dimension;
    }

    /** Whether that row holds no number at all. */
    public boolean missing(int row) {
        return missingRows[row];
    }

    /** Whether that number is missing. */
    public boolean missing(int row, int column) {
        Check.within(column, 0, dimension - 1, "column");
        return missingCells[row * dimension + column];
    }

    /** One number that is not missing. */
    public double at(int row, int column) {
        Check.within(column, 0, dimension - 1, "column");
        int cell = row * dimension + column;
        if (missingCells[cell]) {
            String where = missingRows[row] ? "row " + row : "column " + column + " of row " + row;
            throw new IllegalArgumentException(where + " is missing");
        }
        return values[cell];
    }

    /** Number of rows that are not missing. */
    public int present() {
        return present;
    }

    /** Number of numbers in one column that are not missing. */
    public int present(int column) {
        int count = 0;
        for (int row = 0; row < size(); row++) {
            count += missing(row, column) ? 0 : 1;
        }
        return count;
    }

    /** The rows from {@code start} up to, not including, {@code end}. */
    public Observations range(int start, int end) {
        Check.that(
                start >= 0 && start <= end && end <= size(),
                "rows " + start + " to " + end + " of a series of " + size() + " rows");
        return new Observations(
                dimension,
                Arrays.copyOfRange(values, start * dimension, end * dimension),
                Arrays.copyOfRange(missingCells, start * dimension, end * dimension));
    }
}
