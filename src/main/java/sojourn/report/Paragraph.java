package sojourn.report;

/** Text wrapped to the width of a terminal. */
final class Paragraph {
    /** Columns of a line at most. */
    static final int WIDTH = 100;

    private Paragraph() {}

    /** Wrapped at spaces; every line but the first begins with {@code indent} spaces. Ends with a line end. */
    static String wrapped(String text, int indent) {
        StringBuilder all = new StringBuilder();
        StringBuilder line = new StringBuilder();
        for (String word : text.strip().split("\\s+")) {
            if (!line.toString().isBlank() && line.length() + 1 + word.length() > WIDTH) {
                all.append(line.toString().stripTrailing()).append('\n');
                line = new StringBuilder(" ".repeat(indent));
                line.append(word);
            } else {
                line.append(line.isEmpty() || line.toString().isBlank() ? "" : " ")
                        .append(word);
            }
        }
        return all.append(line).append('\n').toString();
    }
}
