package sojourn.cli;

import java.nio.file.Path;
import java.time.Instant;
import java.time.temporal.ChronoUnit;
import java.util.List;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import sojourn.archive.ResultFolder;
import sojourn.archive.RunFacts;
import sojourn.compare.Progress;

/** Options that commands share. */
final class CommonOptions {
    private static final int MOST_THREADS = 1024;

    @Option(
            names = "--results",
            paramLabel = "DIR",
            defaultValue = "results",
            description = "The folder that results are written below (default: ${DEFAULT-VALUE}).")
    @SuppressWarnings("NullAway.Init") // set by the command line library
    private Path results;

    @Option(
            names = "--threads",
            paramLabel = "N",
            defaultValue = "0",
            description = "How many threads to use; 0, the default, is one a processor. Changes no figure.")
    private int threads;

    @Option(names = "--quiet", description = "No progress and no notes on standard error, only faults.")
    private boolean quiet;

    @Option(names = "--json", description = "Machine-readable output on standard output.")
    private boolean json;

    Path results() {
        return results;
    }

    int threads() {
        return threads > 0 ? threads : Runtime.getRuntime().availableProcessors();
    }

    boolean quiet() {
        return quiet;
    }

    boolean json() {
        return json;
    }

    /** How this run went, for the record. */
    RunFacts facts(CommandSpec spec, Instant started) {
        List<String> command =
                List.copyOf(spec.root().commandLine().getParseResult().originalArgs());
        String host = System.getProperty("os.name") + " " + System.getProperty("os.arch") + ", Java "
                + System.getProperty("java.version");
        double seconds = ChronoUnit.MILLIS.between(started, Instant.now()) / 1000.0;
        return new RunFacts(command, host, threads(), started.toString(), seconds);
    }

    /** Refuses options that no run can have. */
    void refuseNonsense(CommandSpec spec) {
        if (threads < 0 || threads > MOST_THREADS) {
            throw new ParameterException(spec.commandLine(), "--threads must be from 0 to " + MOST_THREADS);
        }
    }

    /** Where a run shows how far it is. */
    Progress progress(Console console) {
        return quiet ? Progress.silent() : TerminalProgress.on(console);
    }

    /** Says where the result stands, unless nothing was to be said. */
    void tell(Console console, ResultFolder.Published published) {
        if (!quiet) {
            String where = published.folder().toString();
            console.err()
                    .println(
                            published.arrival() == ResultFolder.Arrival.WRITTEN
                                    ? "written to " + where
                                    : "the same result stands in " + where + " already; it was left alone");
        }
    }
}
