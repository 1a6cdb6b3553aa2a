package sojourn.market;

/** What stands between the cells of a row. */
public enum Separator {
    /** {@code ,} */
    COMMA("comma", ','),
    /** {@code ;} */
    SEMICOLON("semicolon", ';'),
    /** The tabulator. */
    TAB("tab", '\t');

    private final String word;
    private final char character;

    Separator(String word, char character) {
        this.word = word;
        this.character = character;
    }

    /** The word of the strategy file. */
    public String word() {
        return word;
    }

    /** The character itself. */
    char character() {
        return character;
    }

    /** The separator that stands most often outside quotes in {@code headerLine}; the first of them on a tie. */
    static Separator detectedIn(String headerLine) {
        Separator most = COMMA;
        int mostCount = 0;
        for (Separator one : values()) {
            int count = one.countIn(headerLine);
            if (count > mostCount) {
                most = one;
                mostCount = count;
            }
        }
        return most;
    }

    private int countIn(String line) {
        boolean quoted = false;
        int count = 0;
        for (int i = 0; i < line.length(); i++) {
            char c = line.charAt(i);
            if (c == '"') {
                quoted = !quoted;
            } else if (c == character && !quoted) {
                count++;
            }
        }
        return count;
    }
}
