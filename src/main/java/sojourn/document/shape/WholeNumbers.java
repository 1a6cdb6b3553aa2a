package sojourn.document.shape;

import java.math.BigDecimal;
import java.util.Optional;
import sojourn.document.Node;
import sojourn.document.PlainScalar;
import sojourn.document.ScalarNode;

/** What the shapes of whole numbers share. */
final class WholeNumbers {
    private WholeNumbers() {}

    static boolean isNumber(Node node) {
        return node instanceof ScalarNode scalar && scalar.kind() == ScalarNode.Kind.NUMBER;
    }

    /** The whole number at {@code node} if it is one within bounds; 5.0 and 5e0 are whole, as JSON Schema has it. */
    static Optional<Long> read(Node node, long low, long high) {
        if (!isNumber(node)) {
            return Optional.empty();
        }
        BigDecimal value = ((ScalarNode) node).decimal();
        boolean whole = value.signum() == 0 || value.stripTrailingZeros().scale() <= 0;
        boolean within =
                value.compareTo(BigDecimal.valueOf(low)) >= 0 && value.compareTo(BigDecimal.valueOf(high)) <= 0;
        return whole && within ? Optional.of(value.longValueExact()) : Optional.empty();
    }

    /** For text that would be a number without its quotes. */
    static String unquoteHint(Node node) {
        boolean quotedNumber = node instanceof ScalarNode scalar
                && scalar.kind() == ScalarNode.Kind.TEXT
                && PlainScalar.isNumber(scalar.text());
        return quotedNumber ? "did you mean " + ((ScalarNode) node).text() + ", without quotes? " : "";
    }

    /** "a whole number", with the bounds that are not merely the type's own. */
    static String expected(long low, long high, long typeLow, long typeHigh) {
        if (low > typeLow && high < typeHigh) {
            return "a whole number from " + low + " to " + high;
        }
        if (low > typeLow) {
            return "a whole number at least " + low;
        }
        return high < typeHigh ? "a whole number at most " + high : "a whole number";
    }

    /** Names the type's own bounds when the value is beyond them. */
    static String beyondHint(Node node, long typeLow, long typeHigh) {
        if (!isNumber(node)) {
            return "";
        }
        BigDecimal value = ((ScalarNode) node).decimal();
        boolean beyond =
                value.compareTo(BigDecimal.valueOf(typeLow)) < 0 || value.compareTo(BigDecimal.valueOf(typeHigh)) > 0;
        return beyond ? "stay between " + typeLow + " and " + typeHigh + " and " : "";
    }
}
