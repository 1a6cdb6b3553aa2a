package sojourn.document;

/** The line and column of a position in a text. */
final class TextPlace {
    private TextPlace() {}

    /** The place just after the first {@code codePoints} code points. */
    static Place ofCodePoint(String file, String text, int codePoints) {
        return end(file, text.substring(0, text.offsetByCodePoints(0, codePoints)));
    }

    /** The place just after {@code before}. */
    static Place end(String file, String before) {
        int line = 1 + (int) before.chars().filter(c -> c == '\n').count();
        int lineStart = before.lastIndexOf('\n') + 1;
        return Place.root(file).at(line, 1 + before.codePointCount(lineStart, before.length()));
    }
}
