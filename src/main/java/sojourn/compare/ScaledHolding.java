package sojourn.compare;

import java.util.OptionalDouble;
import sojourn.allocate.Because;
import sojourn.allocate.Decision;
import sojourn.allocate.Policy;
import sojourn.allocate.Situation;
import sojourn.allocate.Stance;
import sojourn.allocate.Weights;
import sojourn.market.FillPrices;
import sojourn.trade.FillRule;
import sojourn.trade.Track;

/**
 * A multiple of what another track holds, renewed at every bar: each order aims at that multiple of the weights the track will
 * have when the order fills, so that from the first fill on every bar earns lambda r + (1 - lambda) c, r the track's return and c
 * that of cash. Looks ahead: known only after the fact.
 */
final class ScaledHolding implements Policy {
    private static final Because SCALES = Because.of("brought to the multiple of what is held");

    private final double multiple;
    private final Track held;
    private final FillRule fill;
    private final FillPrices prices;

    ScaledHolding(double multiple, Track held, FillRule fill, FillPrices prices) {
        this.multiple = multiple;
        this.held = held;
        this.fill = fill;
        this.prices = prices;
    }

    @Override
    public Decision at(Situation situation, Stance stance) {
        int due = Math.min(fill.dueOn(situation.bar()), held.lastBar());
        double wealth = held.cash(due);
        for (int asset = 0; asset < held.assets().size(); asset++) {
            wealth += value(asset, due);
        }
        double part = wealth > 0 ? multiple / wealth : 0;
        Weights wanted = Weights.each(held.assets().size(), asset -> part * value(asset, due));
        return Decision.order(wanted, stance, SCALES, Decision.Change.SAME);
    }

    private double value(int asset, int bar) {
        OptionalDouble quoted = fill.price(prices, asset, bar);
        return held.units(bar, asset) * quoted.orElseGet(() -> prices.close(asset, bar));
    }
}
