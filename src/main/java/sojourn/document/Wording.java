package sojourn.document;

import java.util.List;
import java.util.Optional;

/** How faults are worded, the same way everywhere. */
public final class Wording {
    private static final int LONGEST = 60;

    private Wording() {}

    /** What stands there: {@code 'confirm' is "abc"}. */
    public static String found(Node node) {
        if (node instanceof ScalarNode scalar) {
            String shown = shortened(scalar.text());
            return switch (scalar.kind()) {
                case NOTHING -> node.name() + " has no value";
                case TEXT -> node.name() + " is \"" + shown + "\"";
                case NUMBER, FLAG -> node.name() + " is " + shown;
            };
        }
        return node.name() + " is " + (node instanceof MapNode ? "a map" : "a list");
    }

    /** Adds "found this; give that", unless the node's fault is already told. */
    public static <T> Optional<T> mismatch(Shape<?> shape, Node node, Problems problems) {
        if (!(node instanceof BrokenNode)) {
            problems.add(node, found(node), remedy(shape, node));
        }
        return Optional.empty();
    }

    /** "did you mean …? give …". */
    public static String remedy(Shape<?> shape, Node node) {
        return shape.hint(node) + "give " + shape.expected();
    }

    /** On one line and not too long. */
    public static String shortened(String text) {
        String line = text.replace("\\", "\\\\")
                .replace("\n", "\\n")
                .replace("\r", "\\r")
                .replace("\t", "\\t");
        return line.codePointCount(0, line.length()) <= LONGEST
                ? line
                : line.substring(0, line.offsetByCodePoints(0, LONGEST)) + "…";
    }

    /** "a", "a and b", "a, b and c". */
    public static String all(List<String> words) {
        if (words.size() < 2) {
            return String.join("", words);
        }
        return String.join(", ", words.subList(0, words.size() - 1)) + " and " + words.get(words.size() - 1);
    }
}
