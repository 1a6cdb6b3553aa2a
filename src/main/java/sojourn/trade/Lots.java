package sojourn.trade;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import sojourn.document.IntegerShape;
import sojourn.document.Shape;
import sojourn.document.Shapes;
import sojourn.numeric.Check;

/**
 * The units that an asset is traded in. A target becomes the multiple of the lot next to it towards zero,
 * sign · floor(|w V / p| / L) · L, with w the weight, V wealth after costs, p the price and L the lot: buyers get less, sellers keep
 * less, and what remains stays cash.
 *
 * @param every the lot of every asset that is not named; 0 means any fraction of a unit
 * @param named the lots of single assets, by name
 */
public record Lots(int every, Map<String, Integer> named) {
    private static final int LARGEST = 1_000_000_000;
    /** Quotients that should be whole and are short of it by rounding; relative. */
    private static final double SLACK = 1e-12;

    /** Any fraction of a unit. */
    public static final Lots FRACTIONS = new Lots(0, Map.of());

    /** Reads one number for all, or a number for each asset that has a lot. */
    public static final Shape<Lots> SHAPE = Shapes.either(
            size().as(every -> new Lots(every, Map.of())),
            Shapes.named(Shapes.text(), size()).as(named -> new Lots(0, named)));

    private static IntegerShape size() {
        return Shapes.integer().atLeast(1).atMost(LARGEST);
    }

    /** Refuses lots below 1, except {@link #FRACTIONS}; copies the map in its order. */
    public Lots {
        Check.within(every, 0, LARGEST, "every");
        named = Collections.unmodifiableMap(new LinkedHashMap<>(named));
        named.forEach((asset, lot) -> Check.within(lot, 1, LARGEST, "lot of " + asset));
    }

    /** The lot of each asset; 0 where any fraction may be held. */
    double[] of(List<String> assets) {
        return assets.stream()
                .mapToDouble(asset -> named.getOrDefault(asset, every))
                .toArray();
    }

    /** {@code units} as whole lots, towards zero. */
    static double whole(double lot, double units) {
        if (lot == 0) {
            return units;
        }
        double count = Math.abs(units) / lot;
        return Math.signum(units) * Math.floor(count * (1 + SLACK)) * lot;
    }
}
