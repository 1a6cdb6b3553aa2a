package sojourn.latest;

import sojourn.allocate.Decision;

/** What a decision came to, in one word of the files. */
public final class KindWords {
    private KindWords() {}

    /** The word. */
    public static String of(Decision.Kind kind) {
        return switch (kind) {
            case NONE -> "none";
            case UNDEFINED -> "undefined";
            case KEEP -> "keep";
            case ORDER -> "order";
        };
    }
}
