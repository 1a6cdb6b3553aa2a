package sojourn.trade;

import java.util.OptionalDouble;
import sojourn.market.FillPrices;

/** On which bar and at what price an order fills that was decided at a close. */
public interface FillRule {
    /** The bar that an order decided at the close of {@code decidedOn} is due on; grows with {@code decidedOn}. */
    int dueOn(int decidedOn);

    /** The price of an asset for orders filled on {@code bar}; empty if it does not trade then. */
    OptionalDouble price(FillPrices prices, int asset, int bar);

    /** The bar at whose close those costs of orders filled on {@code bar} are known that depend on past trading: the one before. */
    default int costsKnownOn(int bar) {
        return Math.max(0, bar - 1);
    }

    /** From the close of the decision to the end of the first whole bar that the position is held for. */
    int barsToFirstReturn();
}
