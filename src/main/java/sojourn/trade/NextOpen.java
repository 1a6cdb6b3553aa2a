package sojourn.trade;

import java.util.OptionalDouble;
import sojourn.market.FillPrices;
import sojourn.numeric.Check;

/**
 * Fills at the open of the next bar, or {@code delay} bars later still: decided at close t, filled at open t + 1 + delay, so that with
 * no delay the return from that open to the close of bar t + 1 is the first one earned.
 */
public record NextOpen(int delay) implements FillRule {
    /** Refuses a negative delay. */
    public NextOpen {
        Check.within(delay, 0, Integer.MAX_VALUE, "delay");
    }

    @Override
    public int dueOn(int decidedOn) {
        return decidedOn + 1 + delay;
    }

    @Override
    public OptionalDouble price(FillPrices prices, int asset, int bar) {
        return prices.open(asset, bar);
    }

    @Override
    public int barsToFirstReturn() {
        return 1 + delay;
    }
}
