package sojourn.report;

/** Text wrapped to the width of a terminal. */
public final class Lines {
    /** Columns of a line at most. */
    static final int WIDTH = 100;

    private Lines() {}

    /** Wrapped at spaces; every line but the first begins with {@code indent} spaces. Ends with a line end. */
    public static String wrapped(String text, int indent) {
        return after("", text, indent);
    }

    /** The same behind a head that stands on the first line. */
    static String after(String head, String text, int indent) {
        StringBuilder all = new StringBuilder();
        StringBuilder line = new StringBuilder(head);
        boolean fresh = true;
        for (String word : text.strip().split("\\s+", -1)) {
            if (!fresh && line.length() + 1 + word.length() > WIDTH) {
                all.append(line.toString().stripTrailing()).append('\n');
                line = new StringBuilder(" ".repeat(indent));
                fresh = true;
            }
            line.append(fresh ? "" : " ").append(word);
            fresh = false;
        }
        return all.append(line.toString().stripTrailing()).append('\n').toString();
    }
}
