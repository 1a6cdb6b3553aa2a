package sojourn.report;

import java.util.Locale;
import java.util.OptionalDouble;
import sojourn.measure.Measured;

/** Numbers as people read them; what is undefined reads n/a. */
final class Figures {
    static final String NONE = "n/a";

    private Figures() {}

    /** A fraction as percent with one decimal: {@code -23.4 %}. */
    static String percent(Measured measured) {
        return percent(measured.number(), "%.1f %%");
    }

    /** A fraction as percent with two decimals, for small amounts. */
    static String finePercent(Measured measured) {
        return percent(measured.number(), "%.2f %%");
    }

    /** A fraction as percent with three decimals, for means of single bars. */
    static String thousandths(Measured measured) {
        return percent(measured.number(), "%.3f %%");
    }

    /** A fraction as percent with one decimal. */
    static String percent(double fraction) {
        return percent(OptionalDouble.of(fraction), "%.1f %%");
    }

    /** A fraction as percent with one decimal, or n/a. */
    static String percent(OptionalDouble fraction) {
        return percent(fraction, "%.1f %%");
    }

    /** A plain number by a format such as {@code %.3f}, or n/a. */
    static String plain(OptionalDouble number, String format) {
        return number(number, format);
    }

    /** A probability of a test: three decimals, {@code <0.001} below. */
    static String pValue(OptionalDouble p) {
        return p.isPresent() && p.getAsDouble() < 0.0005 ? "<0.001" : number(p, "%.3f");
    }

    /** A plain number with two decimals. */
    static String ratio(Measured measured) {
        return number(measured.number(), "%.2f");
    }

    /** A plain number with one decimal. */
    static String times(Measured measured) {
        return number(measured.number(), "%.1f");
    }

    /** A whole number. */
    static String count(Measured measured) {
        return number(measured.number(), "%.0f");
    }

    /** {@code -0.05 to 0.78}. */
    static String interval(Measured low, Measured high) {
        if (low.number().isEmpty() || high.number().isEmpty()) {
            return NONE;
        }
        return ratio(low) + " to " + ratio(high);
    }

    private static String percent(OptionalDouble number, String format) {
        return number.isPresent() ? unsigned(String.format(Locale.ROOT, format, 100 * number.getAsDouble())) : NONE;
    }

    private static String number(OptionalDouble number, String format) {
        return number.isPresent() ? unsigned(String.format(Locale.ROOT, format, number.getAsDouble())) : NONE;
    }

    /** A zero that rounding left a minus sign loses it. */
    private static String unsigned(String text) {
        return text.matches("-0(\\.0+)?( %)?") ? text.substring(1) : text;
    }
}
