package sojourn.trade;

import java.util.ArrayList;
import java.util.List;
import java.util.OptionalInt;

/** Movements of cash, told from a track: their running sum is the track's cash. Nothing of 0 is listed. */
final class Ledger {
    private final List<LedgerEntry> entries = new ArrayList<>();

    private Ledger() {}

    /**
     * In the order in which they happen: capital, then on each bar interest, what holding brought or cost, the fills leg by leg, and
     * ruin.
     *
     * @param held what holding brought or cost, in the order of bars
     */
    static List<LedgerEntry> of(Track track, List<LedgerEntry> held, double writtenOff) {
        Ledger ledger = new Ledger();
        int nextHeld = 0;
        int next = 0;
        List<Fill> fills = track.fills();
        for (int bar = track.firstBar(); bar <= track.lastBar(); bar++) {
            if (bar == track.firstBar()) {
                ledger.add(bar, LedgerKind.CAPITAL, OptionalInt.empty(), track.capital());
            }
            ledger.add(bar, LedgerKind.INTEREST, OptionalInt.empty(), track.interest(bar));
            for (; nextHeld < held.size() && held.get(nextHeld).bar() == bar; nextHeld++) {
                ledger.entries.add(held.get(nextHeld));
            }
            for (; next < fills.size() && fills.get(next).filledOn() == bar; next++) {
                ledger.add(fills.get(next));
            }
            if (track.ruinedOn().isPresent() && track.ruinedOn().getAsInt() == bar) {
                ledger.add(bar, LedgerKind.RUIN, OptionalInt.empty(), writtenOff);
            }
        }
        return List.copyOf(ledger.entries);
    }

    private void add(Fill fill) {
        OptionalInt asset = OptionalInt.of(fill.asset());
        Charges charges = fill.charges();
        add(fill.filledOn(), LedgerKind.TRADE, asset, -fill.notional());
        add(fill.filledOn(), LedgerKind.COMMISSION, asset, -charges.commission());
        add(fill.filledOn(), LedgerKind.FIXED_FEE, asset, -charges.fixedFee());
        add(fill.filledOn(), LedgerKind.HALF_SPREAD, asset, -charges.halfSpread());
        add(fill.filledOn(), LedgerKind.STAMP_DUTY, asset, -charges.stampDuty());
        add(fill.filledOn(), LedgerKind.IMPACT, asset, -charges.impact());
    }

    private void add(int bar, LedgerKind kind, OptionalInt asset, double amount) {
        if (amount != 0) {
            entries.add(new LedgerEntry(bar, kind, asset, amount));
        }
    }
}
