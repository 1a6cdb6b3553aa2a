package sojourn.trade;

import java.util.ArrayList;
import java.util.List;
import java.util.OptionalInt;

/** Movements of cash, told from a track's columns and fills: their running sum is the track's cash. Nothing of 0 is listed. */
final class Ledger {
    private final List<LedgerEntry> entries = new ArrayList<>();

    private Ledger() {}

    /** In the order in which they happen: capital, then on each bar interest, the fills leg by leg, and ruin. */
    static List<LedgerEntry> of(Track track, double writtenOff) {
        Ledger ledger = new Ledger();
        int next = 0;
        List<Fill> fills = track.fills();
        for (int bar = track.firstBar(); bar <= track.lastBar(); bar++) {
            if (bar == track.firstBar()) {
                ledger.add(bar, LedgerKind.CAPITAL, OptionalInt.empty(), track.capital());
            }
            ledger.add(bar, LedgerKind.INTEREST, OptionalInt.empty(), track.interest(bar));
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
        add(fill.filledOn(), LedgerKind.TRADE, asset, -fill.notional());
        add(fill.filledOn(), LedgerKind.COMMISSION, asset, -fill.commission());
        add(fill.filledOn(), LedgerKind.HALF_SPREAD, asset, -fill.halfSpread());
    }

    private void add(int bar, LedgerKind kind, OptionalInt asset, double amount) {
        if (amount != 0) {
            entries.add(new LedgerEntry(bar, kind, asset, amount));
        }
    }
}
