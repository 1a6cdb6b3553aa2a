package sojourn.numeric;

import com.fasterxml.jackson.core.io.NumberOutput;

/**
 * A double as the shortest decimal that reads back to the same double: {@code 0.1}, {@code 1.0}, {@code 1.0E-4}. Of several
 * shortest ones it is the nearest. {@code Double.toString} keeps this promise only from JDK 19 on (JDK 17 writes 2.0E23 as
 * {@code 1.9999999999999998E23}), so its output depends on the JDK; this one does not. Raffaello Giulietti, The Schubfach way
 * to render doubles, 2020, as built into Jackson.
 */
public final class ShortestDecimal {
    private ShortestDecimal() {}

    /** The decimal of a finite value: plain from 1.0E-3 up to below 1.0E7, with an exponent outside. */
    public static String of(double value) {
        return NumberOutput.toString(Check.finite(value, "value"), true);
    }
}
