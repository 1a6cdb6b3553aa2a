package sojourn.cli;

import java.time.LocalDate;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Spec;
import sojourn.compare.LocalWorkers;
import sojourn.compare.Prepared;
import sojourn.compare.Workers;
import sojourn.latest.Latest;
import sojourn.latest.Trace;
import sojourn.report.TraceJson;
import sojourn.report.TraceText;

/** {@code sojourn trace}. */
@Command(
        name = "trace",
        mixinStandardHelpOptions = true,
        description = {
            "Accounts for one bar of a strategy with every number behind it: prior, densities and posterior, parameters and"
                    + " their fit, the rule and what it remembers, the order, its fill and its costs.",
            "",
            "Example: sojourn trace strategies/step-aside-in-storms.yaml --date 2010-03-09"
        })
final class TraceCommand implements Callable<Integer> {
    private final Console console;

    @Spec
    @SuppressWarnings("NullAway.Init") // set by the command line library
    private CommandSpec spec;

    @Mixin
    private final OneStrategy strategy = new OneStrategy();

    @Option(
            names = "--date",
            paramLabel = "DATE",
            required = true,
            converter = IsoDate.class,
            description = "The date of a bar, as 2010-03-09.")
    @SuppressWarnings("NullAway.Init") // set by the command line library
    private LocalDate date;

    @Mixin
    private final CommonOptions options = new CommonOptions();

    TraceCommand(Console console) {
        this.console = console;
    }

    @Override
    public Integer call() {
        options.refuseNonsense(spec);
        strategy.refuseFolder(spec);
        Prepared.Ready ready = Latest.prepared(strategy.read());
        try (Workers workers = new LocalWorkers(options.threads())) {
            Trace trace = Trace.of(ready, date, workers, options.progress(console));
            console.out().print(options.json() ? TraceJson.of(trace) : TraceText.of(trace));
        }
        return 0;
    }
}
