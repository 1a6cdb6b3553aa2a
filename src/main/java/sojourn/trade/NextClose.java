package sojourn.trade;

import java.util.OptionalDouble;
import sojourn.market.FillPrices;
import sojourn.numeric.Check;

/**
 * Fills at the close of the next bar, or {@code delay} bars later still: decided at close t, filled at close t + 1 + delay, so that
 * with no delay the return of bar t + 2 is the first one earned.
 */
public record NextClose(int delay) implements FillRule {
    /** Refuses a negative delay. */
    public NextClose {
        Check.within(delay, 0, Integer.MAX_VALUE, "delay");
    }

    @Override
    public int dueOn(int decidedOn) {
        return decidedOn + 1 + delay;
    }

    @Override
    public OptionalDouble price(FillPrices prices, int asset, int bar) {
        return prices.carried(asset, bar) ? OptionalDouble.empty() : OptionalDouble.of(prices.close(asset, bar));
    }

    @Override
    public int barsToFirstReturn() {
        return 2 + delay;
    }
}
