package sojourn.trade;

import java.util.ArrayList;
import java.util.List;
import java.util.OptionalInt;
import sojourn.market.FillPrices;

/** What holding brings and costs from one close to the next, besides interest at the cash rate. */
final class Accruals {
    private final FillPrices prices;
    private final Costs costs;
    private final boolean distributes;
    private final List<LedgerEntry> entries = new ArrayList<>();
    private double margin;
    private double borrowFee;
    private double dividend;

    Accruals(FillPrices prices, Costs costs) {
        this.prices = prices;
        this.costs = costs;
        this.distributes = prices.distributes();
    }

    /** Whether there can be anything. */
    boolean any() {
        return distributes || costs.onHolding();
    }

    /**
     * Takes one bar in: the margin on negative cash, then the fee on what is held short, both for the calendar days since the close
     * before and on its values; then the bar's splits; then its dividends, which shorts pay.
     *
     * @param cash at the close before
     * @param units at the close before. Modified: splits.
     * @return what cash gains
     */
    double on(int bar, double cash, double[] units) {
        clear();
        if (costs.onHolding()) {
            finance(bar, cash, units);
        }
        if (distributes) {
            distribute(bar, units);
        }
        return dividend - margin - borrowFee;
    }

    private void finance(int bar, double cash, double[] units) {
        margin = Math.max(0, -cash) * prices.interest(costs.marginPercentPerYear(), bar);
        add(bar, LedgerKind.MARGIN_INTEREST, OptionalInt.empty(), -margin);
        double rate = prices.interest(costs.borrowPercentPerYear(), bar);
        for (int i = 0; i < units.length; i++) {
            double fee = Math.max(0, -units[i]) * prices.close(i, bar - 1) * rate;
            add(bar, LedgerKind.BORROW_FEE, OptionalInt.of(i), -fee);
            borrowFee += fee;
        }
    }

    private void distribute(int bar, double[] units) {
        for (int i = 0; i < units.length; i++) {
            units[i] *= prices.split(i, bar);
            double paid = units[i] * prices.dividend(i, bar);
            add(bar, LedgerKind.DIVIDEND, OptionalInt.of(i), paid);
            dividend += paid;
        }
    }

    /** Takes in a bar on which nothing is held. */
    void clear() {
        margin = 0;
        borrowFee = 0;
        dividend = 0;
    }

    private void add(int bar, LedgerKind kind, OptionalInt asset, double amount) {
        if (amount != 0) {
            entries.add(new LedgerEntry(bar, kind, asset, amount));
        }
    }

    /** Paid on negative cash above the cash rate, this bar. */
    double margin() {
        return margin;
    }

    /** Paid for what is held short, this bar. */
    double borrowFee() {
        return borrowFee;
    }

    /** Received for what is held, paid for what is held short, this bar. */
    double dividend() {
        return dividend;
    }

    /** Every movement so far, in order. */
    List<LedgerEntry> entries() {
        return entries;
    }
}
