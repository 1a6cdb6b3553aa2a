package sojourn.document;

/** How large a document may be: far beyond any honest strategy, and small enough that a hostile one does no harm. */
final class Limits {
    static final int CODE_POINTS = 1 << 20;
    static final int DEPTH = 50;
    static final int ALIASES = 50;
    /** With every alias written out. */
    static final int NODES = 100_000;

    private Limits() {}

    static void checkSize(String file, String text) {
        if (text.codePointCount(0, text.length()) > CODE_POINTS) {
            throw tooLarge(file);
        }
    }

    static InputException tooLarge(String file) {
        return new InputException(new Problem(
                file, 0, 0, "the file has more than " + CODE_POINTS + " characters", "give a smaller file"));
    }

    static void checkDepth(int depth, Place here) {
        if (depth > DEPTH) {
            throw exceeded(here, "maps and lists are nested more than " + DEPTH + " deep", "nest them less deeply");
        }
    }

    static void checkNodes(int nodes, Place here) {
        if (nodes > NODES) {
            throw exceeded(here, "there are more than " + NODES + " keys and values up to here", "give a smaller file");
        }
    }

    static InputException exceeded(Place here, String what, String remedy) {
        return new InputException(new Problem(here.file(), here.line(), here.column(), what, remedy));
    }
}
