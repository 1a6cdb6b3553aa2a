package sojourn.cli;

import java.nio.file.Path;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Parameters;
import picocli.CommandLine.Spec;
import sojourn.archive.ResultFolder;
import sojourn.archive.RunFacts;
import sojourn.compare.Compared;
import sojourn.compare.Comparison;
import sojourn.compare.ComparisonJson;
import sojourn.compare.LocalWorkers;
import sojourn.compare.ResultWriter;
import sojourn.compare.Warnings;
import sojourn.compare.WhichPaths;
import sojourn.report.ComparisonText;
import sojourn.report.Lines;
import sojourn.strategy.StrategyFile;

/** {@code sojourn compare}. */
@Command(
        name = "compare",
        mixinStandardHelpOptions = true,
        description = {
            "The main job: walks every strategy forward through its prices, trades it with costs, and compares all of them with"
                    + " doing nothing. Writes the results and prints the table and the digest.",
            "",
            "Example: sojourn compare strategies"
        })
final class CompareCommand implements Callable<Integer> {
    private static final int OUR_BUG = 1;
    private static final int USERS_INPUT = 2;
    private static final int SHOWN_WARNINGS = 12;

    private final Console console;

    @Spec
    @SuppressWarnings("NullAway.Init") // set by the command line library
    private CommandSpec spec;

    @Parameters(arity = "1..*", paramLabel = "FILES-OR-FOLDERS", description = "Strategy files, and folders of them.")
    private final List<Path> given = new ArrayList<>();

    @Option(
            names = "--name",
            paramLabel = "NAME",
            defaultValue = "",
            description = "The result's name; by default that of the one file or folder, else 'comparison'.")
    private String name = "";

    @Option(
            names = "--paths",
            paramLabel = "all|best:N|none",
            defaultValue = "",
            converter = PathChoice.class,
            description = "Which variants get a folder of their own: by default all, or the best 10 of more than 20.")
    private WhichPaths paths = WhichPaths.byDefault();

    @Mixin
    private final CommonOptions options = new CommonOptions();

    CompareCommand(Console console) {
        this.console = console;
    }

    @Override
    public Integer call() {
        options.refuseNonsense(spec);
        refuseOddName();
        ResultFolder.refuseUnless(options.results());
        Instant started = Instant.now();
        List<StrategyFile> files = StrategyFiles.read(given);
        Compared compared;
        try (LocalWorkers workers = new LocalWorkers(options.threads())) {
            compared = new Comparison(workers, options.progress(console)).run(files);
        }
        String result = name.isEmpty() ? StrategyFiles.resultName(given) : name;
        RunFacts facts = options.facts(spec, started);
        ResultFolder.Published published = ResultWriter.write(options.results(), result, compared, facts, paths);
        if (options.json()) {
            console.out().print(ComparisonJson.of(compared, published.folder()));
        } else {
            console.out().print(ComparisonText.of(compared));
            console.out().println("digest " + compared.digest());
        }
        tell(compared, published);
        if (!compared.faults().isEmpty()) {
            console.err().println("Faults of the program cost the rows named above. Please report the lines below.");
            compared.faults().forEach(fault -> fault.printStackTrace(console.err()));
            return OUR_BUG;
        }
        return compared.ranked().isEmpty() ? USERS_INPUT : 0;
    }

    private void tell(Compared compared, ResultFolder.Published published) {
        if (options.quiet()) {
            return;
        }
        List<String> warnings = Warnings.of(compared);
        for (String warning : warnings.subList(0, Math.min(SHOWN_WARNINGS, warnings.size()))) {
            console.err().print(Lines.wrapped("note: " + warning, 2));
        }
        if (warnings.size() > SHOWN_WARNINGS) {
            console.err().println("note: " + (warnings.size() - SHOWN_WARNINGS) + " more, see record.json");
        }
        options.tell(console, published);
    }

    private void refuseOddName() {
        if (!name.isEmpty() && !name.matches("[A-Za-z0-9][A-Za-z0-9._-]*")) {
            throw new ParameterException(
                    spec.commandLine(),
                    "--name is '" + name + "'; use letters, digits, dots, hyphens and underscores, beginning with a"
                            + " letter or digit");
        }
    }
}
