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

    /** How a text that is no number was perhaps meant. */
    enum Meant {
        THOUSANDS_OR_DECIMALS(
                "remove the thousands separators from the column, or convert it to decimal points if the comma"
                        + " is decimal"),
        THOUSANDS("remove the thousands separators from the column"),
        THOUSANDS_BY_DOT("convert the column to decimal points, without thousands separators"),
        DECIMAL_COMMA("convert the column to decimal points"),
        UNKNOWN("write numbers such as 12.5, or leave the cells empty where there is none");

        private final String remedy;

        Meant(String remedy) {
            this.remedy = remedy;
        }

        /** What to do about a whole column of them. */
        String remedy() {
            return remedy;
        }
    }

    /** The number; infinite if it is too large for a double; empty if {@code text} is not such a number. */
    static OptionalDouble parse(String text) {
        return JSON.matcher(text).matches()
                ? OptionalDouble.of(Double.parseDouble(text) + 0.0)
                : OptionalDouble.empty();
    }

    /** How a {@code text} that {@link #parse} refuses was perhaps meant. */
    static Meant meant(String text) {
        boolean comma = COMMA.matcher(text).matches();
        if (GROUPED.matcher(text).matches()) {
            return comma ? Meant.THOUSANDS_OR_DECIMALS : Meant.THOUSANDS;
        }
        if (GROUPED_BY_DOT.matcher(text).matches()) {
            return Meant.THOUSANDS_BY_DOT;
        }
        return comma ? Meant.DECIMAL_COMMA : Meant.UNKNOWN;
    }

    /** What to do about a {@code text} that {@link #parse} refuses. */
    static String remedy(String text) {
        Matcher comma = COMMA.matcher(text);
        String point = comma.replaceFirst("$1.$2");
        return switch (meant(text)) {
            case THOUSANDS_OR_DECIMALS ->
                "write " + comma.replaceFirst("$1$2") + " without a thousands separator, or " + point
                        + " if the comma is decimal";
            case THOUSANDS -> "write " + text.replaceAll("[,' \u00a0\u202f]", "") + " without thousands separators";
            case THOUSANDS_BY_DOT ->
                "write " + text.replace(".", "").replace(',', '.') + ": a decimal point, no thousands separators";
            case DECIMAL_COMMA -> "write " + point + " with a decimal point";
            case UNKNOWN -> "write a number such as 12.5, or leave the cell empty if there is none";
        };
    }
}
