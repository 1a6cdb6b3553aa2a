package sojourn.regime;

import java.util.Arrays;
import sojourn.numeric.Check;

/** Simple returns per bar of every asset, on the rows of a fit's window: what the regimes' moments are taken of. Immutable. */
public final class Companions {
    private final int assets;
    private final double[] returns;
    private final boolean[] missing;

    private Companions(int assets, double[] returns, boolean[] missing) {
        this.assets = assets;
        this.returns = returns;
        this.missing = missing;
    }

    /** All rows hold a return of every asset. Copies {@code rowMajor} (rows × assets), which must be finite. */
    public static Companions of(int assets, double[] rowMajor) {
        Check.within(assets, 1, Integer.MAX_VALUE, "assets");
        Check.that(rowMajor.length % assets == 0, rowMajor.length + " returns of " + assets + " assets");
        return of(assets, rowMajor, new boolean[rowMajor.length / assets]);
    }

    /**
     * Some rows lack the return of at least one asset and count for no moment. Copies its arrays; neither modified.
     *
     * @param rowMajor rows × assets; ignored in a missing row, otherwise finite
     * @param missing one entry a row
     */
    public static Companions of(int assets, double[] rowMajor, boolean[] missing) {
        Check.within(assets, 1, Integer.MAX_VALUE, "assets");
        Check.that(
                rowMajor.length == missing.length * assets,
                rowMajor.length + " returns for " + missing.length + " rows of " + assets + " assets");
        double[] returns = new double[rowMajor.length];
        for (int row = 0; row < missing.length; row++) {
            for (int a = 0; !missing[row] && a < assets; a++) {
                returns[row * assets + a] = Check.finite(rowMajor[row * assets + a], "return of an asset in row", row);
            }
        }
        return new Companions(assets, returns, missing.clone());
    }

    /** The rows from {@code start} on. */
    Companions from(int start) {
        return new Companions(
                assets,
                Arrays.copyOfRange(returns, start * assets, returns.length),
                Arrays.copyOfRange(missing, start, missing.length));
    }

    /** Number of rows, missing ones included. */
    public int size() {
        return missing.length;
    }

    /** Number of assets. */
    public int assets() {
        return assets;
    }

    /** Whether the row lacks a return. */
    public boolean missing(int row) {
        return missing[row];
    }

    /** The simple return of an asset in a row that is not missing. */
    public double at(int row, int asset) {
        if (missing[row]) {
            throw new IllegalArgumentException("row " + row + " is missing");
        }
        return returns[row * assets + asset];
    }
}
