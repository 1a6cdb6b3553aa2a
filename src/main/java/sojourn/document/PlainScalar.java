package sojourn.document;

import java.util.Optional;
import java.util.regex.Pattern;
import sojourn.document.ScalarNode.Kind;

/**
 * What a value means that is written without quotes. Readers of YAML disagree about {@code 010} (8 or 10), {@code 1_000},
 * {@code 0x1F}, {@code .5} and their like, so these are refused; a number is what JSON calls one, with a sign allowed.
 */
public final class PlainScalar {
    private static final int LONGEST_NUMBER = 100;
    private static final Pattern NUMBER = Pattern.compile("[-+]?(0|[1-9][0-9]*)(\\.[0-9]+)?([eE][-+]?[0-9]+)?");
    private static final Pattern LEADING_ZEROS = Pattern.compile("[-+]?0[0-9_]+(\\.[0-9_]*)?([eE][-+]?[0-9]+)?");
    private static final Pattern OTHER_BASE = Pattern.compile("[-+]?0[xob][0-9A-Fa-f_]+");
    private static final Pattern STARTS_WITH_DIGIT = Pattern.compile("[-+]?[0-9]");
    private static final Pattern BARE_POINT = Pattern.compile("[-+]?(\\.[0-9][0-9_]*|[0-9]+\\.)([eE][-+]?[0-9]+)?");
    private static final Pattern NOT_FINITE = Pattern.compile("[-+]?\\.(inf|Inf|INF)|\\.(nan|NaN|NAN)");

    private PlainScalar() {}

    /** The kind of an accepted value; only for values that {@link #refusal} lets pass. */
    static Kind kind(String text) {
        if (text.isEmpty() || text.equals("~") || text.equals("null")) {
            return Kind.NOTHING;
        }
        if (text.equals("true") || text.equals("false")) {
            return Kind.FLAG;
        }
        return isNumber(text) ? Kind.NUMBER : Kind.TEXT;
    }

    /** Whether the text is a number that we accept, when unquoted. */
    public static boolean isNumber(String text) {
        return text.length() <= LONGEST_NUMBER && NUMBER.matcher(text).matches();
    }

    /** What to do instead, if the value looks like a number and is none that all readers agree on. */
    static Optional<String> refusal(String text) {
        if (NUMBER.matcher(text).matches()) {
            return outOfRange(text);
        }
        if (text.indexOf('_') >= 0 && text.length() <= LONGEST_NUMBER && looksNumericWithUnderscores(text)) {
            return Optional.of("write the digits without underscores, or quote it if text is meant");
        }
        if (LEADING_ZEROS.matcher(text).matches()) {
            return Optional.of("leave out the leading zeros, or quote it if text is meant");
        }
        if (OTHER_BASE.matcher(text).matches()) {
            return Optional.of("write it in base ten, or quote it if text is meant");
        }
        if (BARE_POINT.matcher(text).matches()) {
            return Optional.of("write digits on both sides of the point, or quote it if text is meant");
        }
        if (NOT_FINITE.matcher(text).matches()) {
            return Optional.of("write a finite number, or quote it if text is meant");
        }
        return Optional.empty();
    }

    private static boolean looksNumericWithUnderscores(String text) {
        String without = text.replace("_", "");
        return STARTS_WITH_DIGIT.matcher(text).lookingAt()
                && (NUMBER.matcher(without).matches()
                        || LEADING_ZEROS.matcher(without).matches()
                        || OTHER_BASE.matcher(without).matches());
    }

    private static Optional<String> outOfRange(String text) {
        if (text.length() > LONGEST_NUMBER) {
            return Optional.of("write a number with at most " + LONGEST_NUMBER + " characters");
        }
        double value = Double.parseDouble(text);
        if (Double.isInfinite(value)) {
            return Optional.of("write a number between -1.7e308 and 1.7e308");
        }
        if (value == 0 && hasDigitOtherThanZero(text)) {
            return Optional.of("write 0, or a number at least 4.9e-324 away from it");
        }
        return Optional.empty();
    }

    private static boolean hasDigitOtherThanZero(String text) {
        String mantissa = text.split("[eE]", 2)[0];
        return mantissa.chars().anyMatch(c -> c >= '1' && c <= '9');
    }
}
