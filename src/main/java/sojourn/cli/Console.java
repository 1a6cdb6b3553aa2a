package sojourn.cli;

import java.io.PrintWriter;

/**
 * Where a command writes.
 *
 * @param out results
 * @param err messages and progress
 * @param terminal whether somebody is watching
 */
record Console(PrintWriter out, PrintWriter err, Terminal terminal) {
    /** Messages and progress. What was written to {@link #out} before is out before them, wherever the two are led. */
    @Override
    public PrintWriter err() {
        out.flush();
        return err;
    }
}
