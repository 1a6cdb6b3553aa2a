package sojourn.trade;

import java.util.OptionalDouble;
import sojourn.market.FillPrices;

/** Fills at the open of the next bar: a second honest rule, to hold the simulation to worked cases that fill at opens. */
record NextOpen() implements FillRule {
    @Override
    public int dueOn(int decidedOn) {
        return decidedOn + 1;
    }

    @Override
    public OptionalDouble price(FillPrices prices, int asset, int bar) {
        return prices.open(asset, bar);
    }

    @Override
    public int barsToFirstReturn() {
        return 1;
    }
}
