package sojourn.document;

import java.util.Optional;

/**
 * Where a character of a text value stands in the file. Quotes, line folds and indentation change white space and quote marks
 * only, so the n-th visible character of the value is the n-th visible one of what is written.
 */
final class WithinScalar {
    private final String text;
    private final char style;
    private int at;

    private WithinScalar(String text, int start) {
        this.text = text;
        this.style = start < text.length() ? text.charAt(start) : ' ';
        this.at = switch (style) {
            case '\'', '"' -> start + 1;
            case '|', '>' -> text.indexOf('\n', start) < 0 ? text.length() : text.indexOf('\n', start);
            default -> start;
        };
    }

    /**
     * The place of the character at {@code codePoint} of a value that is written at {@code start}, or of the next visible one; the
     * end of the value if there is none, and its start where it is written elsewhere, under an anchor.
     */
    static Place of(String text, Place start, String value, int codePoint) {
        Optional<Integer> index = index(text, start);
        if (index.isEmpty() || "*&".indexOf(text.charAt(index.get())) >= 0) {
            return start;
        }
        WithinScalar scalar = new WithinScalar(text, index.get());
        int before = visible(value.substring(0, value.offsetByCodePoints(0, codePoint)));
        boolean last = before == visible(value);
        for (int seen = 0; seen < (last ? before - 1 : before); seen++) {
            scalar.skipBlanks();
            scalar.step();
        }
        scalar.skipBlanks();
        if (last && before > 0) {
            scalar.step();
        }
        Place found = TextPlace.end(start.file(), text.substring(0, scalar.at));
        return start.at(found.line(), found.column());
    }

    private static Optional<Integer> index(String text, Place place) {
        int start = 0;
        for (int line = 1; line < place.line(); line++) {
            int end = text.indexOf('\n', start);
            if (end < 0) {
                return Optional.empty();
            }
            start = end + 1;
        }
        int lineEnd = text.indexOf('\n', start) < 0 ? text.length() : text.indexOf('\n', start);
        int length = text.codePointCount(start, lineEnd);
        return place.column() - 1 < length
                ? Optional.of(text.offsetByCodePoints(start, place.column() - 1))
                : Optional.empty();
    }

    private static int visible(String value) {
        return (int) value.codePoints().filter(c -> !Character.isWhitespace(c)).count();
    }

    private void skipBlanks() {
        while (at < text.length() && (Character.isWhitespace(text.charAt(at)) || writesBlank())) {
            at += writesBlank() ? 2 : 1;
        }
    }

    /** An escape in double quotes that stands for white space or joins two lines. */
    private boolean writesBlank() {
        return style == '"'
                && text.startsWith("\\", at)
                && at + 1 < text.length()
                && "ntr \n".indexOf(text.charAt(at + 1)) >= 0;
    }

    /** Over one visible character. */
    private void step() {
        if (at < text.length()) {
            boolean pair = (style == '\'' && text.startsWith("''", at)) || (style == '"' && text.startsWith("\\", at));
            at = pair ? Math.min(at + 2, text.length()) : text.offsetByCodePoints(at, 1);
        }
    }
}
