package sojourn.document;

/** How messages quote text that the user wrote. */
public final class Quoted {
    private Quoted() {}

    /** In single quotes, on one line, and cut short if it is very long. */
    public static String of(String text) {
        return "'" + Wording.shortened(text) + "'";
    }
}
