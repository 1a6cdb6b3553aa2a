package sojourn.measure;

import java.util.EnumMap;
import java.util.Map;
import sojourn.trade.LedgerEntry;
import sojourn.trade.LedgerKind;
import sojourn.trade.Track;

/**
 * The returns of a track on some bars and what they are made of, as fractions of the wealth at the close before: r = g + i - k, what
 * assets gained with their dividends, interest and costs. Interest and costs are what the ledger says; gains are the rest.
 */
final class BarReturns {
    private final double[] total;
    private final double[] interest;
    private final Map<LedgerKind, double[]> costs = new EnumMap<>(LedgerKind.class);

    /** Of the bars from {@code base} + 1 to {@code last}; wealth is above 0 on all of them. */
    BarReturns(Track track, int base, int last) {
        total = track.simpleReturns(base + 1, last);
        interest = new double[total.length];
        for (LedgerEntry entry : track.ledger()) {
            if (entry.bar() > base && entry.bar() <= last) {
                take(entry, entry.bar() - base - 1, track.wealth(entry.bar() - 1));
            }
        }
    }

    private void take(LedgerEntry entry, int i, double before) {
        switch (entry.kind()) {
            case CAPITAL, TRADE, RUIN -> {
                // what is bought and sold changes hands at its price, and is neither gain nor cost
            }
            case DIVIDEND -> {
                // what an asset pays is a part of what it gained, so it stays in the rest
            }
            case INTEREST -> interest[i] += entry.amount() / before;
            case MARGIN_INTEREST, BORROW_FEE, COMMISSION, FIXED_FEE, HALF_SPREAD, STAMP_DUTY, IMPACT ->
                costs.computeIfAbsent(entry.kind(), unused -> new double[total.length])[i] -= entry.amount() / before;
        }
    }

    double total(int i) {
        return total[i];
    }

    double interest(int i) {
        return interest[i];
    }

    /** What was paid of one kind, above 0. */
    double cost(LedgerKind kind, int i) {
        double[] paid = costs.get(kind);
        return paid == null ? 0 : paid[i];
    }

    /** Gains on prices and dividends, before any cost. */
    double gain(int i) {
        double gain = total[i] - interest[i];
        for (double[] paid : costs.values()) {
            gain += paid[i];
        }
        return gain;
    }
}
