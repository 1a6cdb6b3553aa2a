package sojourn.document;

import java.math.BigDecimal;

/**
 * A single value. What kind it is depends on how it is written, never on what is expected of it: unquoted JSON numbers are
 * numbers, unquoted {@code true} and {@code false} are flags, nothing at all (or {@code null} or {@code ~}) is nothing,
 * and all else is text: quoted text, dates, and words such as {@code no} and {@code on} as well.
 *
 * @param place where it stands
 * @param kind what kind of value it is
 * @param text as written, without quotes
 */
public record ScalarNode(Place place, Kind kind, String text) implements Node {
    /** The kinds of single value. */
    public enum Kind {
        /** A finite decimal number. */
        NUMBER,
        /** true or false. */
        FLAG,
        /** Any text, perhaps empty. */
        TEXT,
        /** No value. */
        NOTHING
    }

    /** The exact value of a number. */
    public BigDecimal decimal() {
        return new BigDecimal(text);
    }

    /** The double nearest to a number; zero is never negative. */
    public double nearestDouble() {
        return Double.parseDouble(text) + 0.0;
    }
}
