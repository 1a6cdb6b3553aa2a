package sojourn.cli;

/** Whether somebody is watching standard error. */
enum Terminal {
    /** A person: progress is shown. */
    WATCHED,
    /** A file or a pipe: no progress. */
    UNWATCHED;

    /** Judged by the console of this process, which exists only when input and output are a terminal. */
    static Terminal ofThisProcess() {
        return System.console() != null && System.getenv("TERM") != null ? WATCHED : UNWATCHED;
    }
}
