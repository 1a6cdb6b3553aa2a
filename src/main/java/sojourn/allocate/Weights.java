package sojourn.allocate;

import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.function.IntToDoubleFunction;
import sojourn.numeric.Check;

/** Shares of wealth, one an asset, in the order of the price table; what they leave of 1 is cash. Immutable. */
public final class Weights implements Wish {
    /** Differences of weights up to this are rounding. */
    static final double SLACK = 1e-12;

    private final double[] shares;
    private final double cash;

    private Weights(double[] shares, double cash) {
        this.shares = shares;
        this.cash = cash;
    }

    /** Takes over {@code shares}. */
    private static Weights sharing(double[] shares) {
        double rest = 1;
        for (double share : shares) {
            rest -= Check.finite(share, "weight");
        }
        // 1 - 0.7 - 0.2 - 0.1 is not quite 0, and full weight must not borrow a rounding error
        double cash = Math.abs(rest) <= SLACK ? 0 : rest;
        return new Weights(shares, cash);
    }

    /** Copies {@code shares}; each must be finite. Not modified. */
    public static Weights of(double... shares) {
        return sharing(shares.clone());
    }

    /** The share of each asset by its index; each must be finite. */
    public static Weights each(int assets, IntToDoubleFunction share) {
        double[] shares = new double[assets];
        for (int i = 0; i < assets; i++) {
            shares[i] = share.applyAsDouble(i);
        }
        return sharing(shares);
    }

    /** Nothing but cash. */
    public static Weights none(int assets) {
        return sharing(new double[assets]);
    }

    /** From weights by name; an asset that is not named gets 0, a name that is no asset is refused. */
    public static Weights named(Map<String, Double> byName, List<String> assets) {
        double[] shares = new double[assets.size()];
        byName.forEach((name, share) -> {
            int asset = assets.indexOf(name);
            Check.that(asset >= 0, "no asset '" + name + "'; known: " + assets);
            shares[asset] = share;
        });
        return of(shares);
    }

    /** Number of assets. */
    public int size() {
        return shares.length;
    }

    /** The share of one asset. */
    public double at(int asset) {
        return shares[asset];
    }

    /** What the assets leave of 1; negative if borrowed; exactly 0 where only rounding differs from it. */
    public double cash() {
        return cash;
    }

    /** The sum of the absolute shares. */
    public double gross() {
        double gross = 0;
        for (double share : shares) {
            gross += Math.abs(share);
        }
        return gross;
    }

    /** {@code fraction} of the way from {@code from} to these. */
    Weights after(double fraction, Weights from) {
        if (fraction == 1) {
            return this;
        }
        double[] between = new double[shares.length];
        for (int i = 0; i < between.length; i++) {
            between[i] = from.shares[i] + fraction * (shares[i] - from.shares[i]);
        }
        return sharing(between);
    }

    /** Whether any share differs from {@code other}'s by more than {@code band}, rounding aside. */
    boolean strictlyOutside(double band, Weights other) {
        for (int i = 0; i < shares.length; i++) {
            if (Math.abs(shares[i] - other.shares[i]) > band + SLACK) {
                return true;
            }
        }
        return false;
    }

    @Override
    public boolean equals(Object other) {
        return this == other || (other instanceof Weights that && Arrays.equals(shares, that.shares));
    }

    @Override
    public int hashCode() {
        return Arrays.hashCode(shares);
    }

    @Override
    public String toString() {
        return Arrays.toString(shares);
    }
}
