package sojourn.archive;

import java.util.List;

/**
 * What differs from run to run without changing a figure; recorded, never digested.
 *
 * @param command the command line, as given
 * @param host what the machine calls itself and its Java
 * @param threads threads used
 * @param startedAt wall-clock start, ISO
 * @param seconds how long the run took
 */
public record RunFacts(List<String> command, String host, int threads, String startedAt, double seconds) {
    /** Copies the list. */
    public RunFacts {
        command = List.copyOf(command);
    }
}
