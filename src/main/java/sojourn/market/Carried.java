package sojourn.market;

import java.util.BitSet;
import java.util.Collections;
import java.util.SortedMap;
import java.util.TreeMap;

/**
 * The bars on which a series has no price of its own and its last close is carried, for marking only. Immutable. Bars after the
 * last one that is named here have prices of their own, so that it stands for longer and shorter tables alike.
 */
final class Carried {
    /** Every series has a price of its own on every bar. */
    static final Carried NOTHING = new Carried(new TreeMap<>());

    private final SortedMap<String, BitSet> bars;

    private Carried(SortedMap<String, BitSet> bars) {
        this.bars = bars;
    }

    /** From the bars of each series, by its name; copies them. */
    static Carried of(SortedMap<String, BitSet> bars) {
        SortedMap<String, BitSet> copies = new TreeMap<>();
        bars.forEach((series, own) -> {
            if (!own.isEmpty()) {
                copies.put(series, (BitSet) own.clone());
            }
        });
        return new Carried(Collections.unmodifiableSortedMap(copies));
    }

    /** Whether the close of a series is carried on a bar. */
    boolean at(String series, int bar) {
        if (bars.isEmpty()) {
            return false;
        }
        BitSet own = bars.get(series);
        return own != null && own.get(bar);
    }
}
