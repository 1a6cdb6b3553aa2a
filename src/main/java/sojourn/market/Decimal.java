package sojourn.market;

import java.util.OptionalDouble;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** Numbers as JSON writes them: a dot, digits on both sides of it, an exponent if need be; nothing else. */
final class Decimal {
    private static final Pattern JSON = Pattern.compile("-?\\d+(\\.\\d+)?([eE][+-]?\\d+)?");
    private static final Pattern GROUPED =
            Pattern.compile("-?\\d{1,3}(([,' \u00a0\u202f])\\d{3})(\\2\\d{3})*(\\.\\d+)?");
    private static final Pattern GROUPED_BY_DOT = Pattern.compile("-?\\d{1,3}(\\.\\d{3})+,\\d+");
    private static final Pattern COMMA = Pattern.compile("(-?\\d+),(\\d+)");

    private Decimal() {}

    /** The number; infinite if it is too large for a double; empty if {@code text} is not such a number. */
    static OptionalDouble parse(String text) {
        return JSON.matcher(text).matches()
                ? OptionalDouble.of(Double.parseDouble(text) + 0.0)
                : OptionalDouble.empty();
    }

    /** What to do about a {@code text} that {@link #parse} refuses. */
    static String remedy(String text) {
        Matcher comma = COMMA.matcher(text);
        if (GROUPED.matcher(text).matches() && comma.matches()) {
            return "write " + comma.group(1) + comma.group(2) + " without a thousands separator, or " + comma.group(1)
                    + "." + comma.group(2) + " if the comma is decimal";
        }
        if (GROUPED.matcher(text).matches()) {
            return "write " + text.replaceAll("[,' \u00a0\u202f]", "") + " without thousands separators";
        }
        if (GROUPED_BY_DOT.matcher(text).matches()) {
            return "write " + text.replace(".", "").replace(',', '.') + ": a decimal point, no thousands separators";
        }
        if (comma.matches()) {
            return "write " + comma.group(1) + "." + comma.group(2) + " with a decimal point";
        }
        return "write a number such as 12.5, or leave the cell empty if there is none";
    }
}
