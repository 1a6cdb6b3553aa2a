package sojourn.cli;

/** Whether somebody is watching standard error. */
enum Terminal {
    /** A person: progress is shown. */
    WATCHED,
    /** A file or a pipe: no progress. */
    UNWATCHED;

    /** Judged by the console of this process: before Java 22 it exists only for a terminal, afterwards it can be asked. */
    @SuppressWarnings("SystemConsoleNull") // the newer question is asked first where it exists
    static Terminal ofThisProcess() {
        if (System.console() == null || System.getenv("TERM") == null) {
            return UNWATCHED;
        }
        return Runtime.version().feature() < 22 || asksTerminal() ? WATCHED : UNWATCHED;
    }

    private static boolean asksTerminal() {
        try {
            Object answer = java.io.Console.class.getMethod("isTerminal").invoke(System.console());
            return Boolean.TRUE.equals(answer);
        } catch (ReflectiveOperationException e) {
            return false; // unknown is treated as unwatched: no progress is the safe side
        }
    }
}
