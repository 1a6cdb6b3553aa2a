package sojourn.walk;

import java.util.OptionalDouble;
import sojourn.market.Known;

/** What a bar may hold besides its close, as far as some kind of observation reads it. */
public enum BarColumn {
    /** The open. */
    OPEN("open") {
        @Override
        OptionalDouble of(Known known, int asset, int bar) {
            return known.open(asset, bar);
        }
    },
    /** The high. */
    HIGH("high") {
        @Override
        OptionalDouble of(Known known, int asset, int bar) {
            return known.high(asset, bar);
        }
    },
    /** The low. */
    LOW("low") {
        @Override
        OptionalDouble of(Known known, int asset, int bar) {
            return known.low(asset, bar);
        }
    };

    private final String word;

    BarColumn(String word) {
        this.word = word;
    }

    /** Its key in the strategy file's section {@code prices}. */
    public String word() {
        return word;
    }

    /** Its value on a known bar; empty where the file has none. */
    abstract OptionalDouble of(Known known, int asset, int bar);
}
