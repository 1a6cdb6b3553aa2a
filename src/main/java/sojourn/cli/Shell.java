package sojourn.cli;

import java.io.PrintWriter;
import java.util.Arrays;
import java.util.stream.Collectors;
import picocli.CommandLine;
import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Spec;
import sojourn.document.InputException;
import sojourn.document.Nearest;
import sojourn.document.Problem;

/**
 * Runs one command line. Exit codes: 0 done, 1 our bug, 2 the user's input, 3 an audit of the result found something, 130
 * interrupted.
 */
public final class Shell {
    private static final int OUR_BUG = 1;
    private static final int USERS_INPUT = 2;

    private final PrintWriter out;
    private final PrintWriter err;
    private final Terminal terminal;

    /** Results go to {@code out}, messages to {@code err}. */
    Shell(PrintWriter out, PrintWriter err, Terminal terminal) {
        this.out = out;
        this.err = err;
        this.terminal = terminal;
    }

    /** A shell without a watcher, for embedding and tests. */
    public static Shell unwatched(PrintWriter out, PrintWriter err) {
        return new Shell(out, err, Terminal.UNWATCHED);
    }

    /** Runs the command and returns its exit code; never throws. */
    public int run(String... args) {
        CommandLine line = new CommandLine(new Root());
        Console console = new Console(out, err, terminal);
        line.addSubcommand(new CompareCommand(console));
        line.addSubcommand(new CheckCommand(console));
        line.addSubcommand(new RegimesCommand(console));
        line.addSubcommand(new LatestCommand(console));
        line.addSubcommand(new TraceCommand(console));
        line.addSubcommand(new SchemaCommand(console));
        line.addSubcommand(new InventCommand(console));
        line.setOut(out);
        line.setErr(err);
        line.setUsageHelpWidth(100);
        line.setExecutionExceptionHandler((failure, where, parsed) -> tell(failure));
        line.setParameterExceptionHandler((failure, given) -> tellMisuse(failure));
        int code = line.execute(args);
        out.flush();
        err.flush();
        return code;
    }

    private int tell(Exception failure) {
        if (failure instanceof InputException input) {
            for (Problem problem : input.problems()) {
                err.println(problem);
            }
            err.println("Nothing was changed. `sojourn --help` lists the commands and their options.");
            return USERS_INPUT;
        }
        err.println("This is a fault of the program, not of your input. Please report the lines below.");
        failure.printStackTrace(err);
        return OUR_BUG;
    }

    private int tellMisuse(ParameterException failure) {
        err.println(failure.getMessage());
        CommandLine command = failure.getCommandLine();
        if (failure instanceof CommandLine.UnmatchedArgumentException unmatched
                && command.getParent() == null
                && !unmatched.getUnmatched().isEmpty()) {
            Nearest.to(unmatched.getUnmatched().get(0), command.getSubcommands().keySet())
                    .ifPresent(nearest -> err.println("Did you mean '" + nearest + "'?"));
        }
        err.println("Try `" + command.getCommandSpec().qualifiedName() + " --help`.");
        return USERS_INPUT;
    }

    /** The program itself: prints its help. */
    @Command(
            name = "sojourn",
            mixinStandardHelpOptions = true,
            versionProvider = Version.class,
            description =
                    "Walks strategies keyed to regime probabilities through past prices as if nothing beyond each close"
                            + " existed, trades them with costs, and compares them with doing nothing.",
            footer = {
                "",
                "Exit codes: 0 done, 1 a fault of the program, 2 your input, 3 an audit found something, 130 interrupted.",
                "All performance shown is hypothetical. It is not advice."
            })
    static final class Root implements Runnable {
        @Spec
        @SuppressWarnings("NullAway.Init") // set by the command line library before run
        private CommandSpec spec;

        @Override
        public void run() {
            throw new ParameterException(
                    spec.commandLine(),
                    "No command given; known: "
                            + Arrays.stream(spec.subcommands().keySet().toArray(String[]::new))
                                    .collect(Collectors.joining(", ")));
        }
    }
}
