package sojourn.trade;

import java.util.Arrays;
import java.util.function.IntToDoubleFunction;
import sojourn.numeric.Check;

/** Units of each asset, in the order of the price table; negative if short. Immutable. */
public final class Quantities {
    private final double[] units;

    private Quantities(double[] units) {
        for (int i = 0; i < units.length; i++) {
            Check.finite(units[i], "units of asset", i);
        }
        this.units = units;
    }

    /** Copies {@code units}; each must be finite. Not modified. */
    public static Quantities of(double... units) {
        return new Quantities(units.clone());
    }

    /** The units of each asset by its index; each must be finite. */
    public static Quantities each(int assets, IntToDoubleFunction units) {
        double[] all = new double[assets];
        Arrays.setAll(all, units);
        return new Quantities(all);
    }

    /** Number of assets. */
    public int size() {
        return units.length;
    }

    /** Units of one asset. */
    public double at(int asset) {
        return units[asset];
    }

    @Override
    public boolean equals(Object other) {
        return other instanceof Quantities that && Arrays.equals(units, that.units);
    }

    @Override
    public int hashCode() {
        return Arrays.hashCode(units);
    }

    @Override
    public String toString() {
        return Arrays.toString(units);
    }
}
