package sojourn.trade;

import java.util.ArrayList;
import java.util.List;
import sojourn.allocate.Weights;
import sojourn.market.FillPrices;
import sojourn.numeric.Check;

/**
 * What somebody holds.
 *
 * @param units one an asset, in the order of the price table; negative if short
 * @param cash money, negative if borrowed
 */
public record Holdings(List<Double> units, double cash) {
    /** Refuses what is not finite. */
    public Holdings {
        units = List.copyOf(units);
        units.forEach(one -> Check.finite(one, "units"));
        Check.finite(cash, "cash");
    }

    /** What a track held after the fills of a bar. */
    public static Holdings of(Track track, int bar) {
        List<Double> units = new ArrayList<>();
        for (int asset = 0; asset < track.assets().size(); asset++) {
            units.add(track.units(bar, asset));
        }
        return new Holdings(units, track.cash(bar));
    }

    /** What is held once {@code basket} has traded what it may on one bar. */
    public Holdings after(Basket basket) {
        List<Double> changed = new ArrayList<>(units);
        for (Fill leg : basket.legs()) {
            changed.set(leg.asset(), changed.get(leg.asset()) + leg.units());
        }
        return new Holdings(changed, basket.cash());
    }

    /** The units alone. */
    public Quantities quantities() {
        return Quantities.each(units.size(), units::get);
    }

    /** What they are worth at the close of a bar. */
    public double wealth(FillPrices prices, int bar) {
        double wealth = cash;
        for (int asset = 0; asset < units.size(); asset++) {
            wealth += units.get(asset) * prices.close(asset, bar);
        }
        return wealth;
    }

    /** Shares of wealth, which must be above 0, at the close of a bar. */
    public Weights weights(FillPrices prices, int bar) {
        double wealth = Check.above(wealth(prices, bar), 0, "wealth");
        return Weights.each(units.size(), asset -> units.get(asset) * prices.close(asset, bar) / wealth);
    }
}
