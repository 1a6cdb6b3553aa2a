package sojourn.cli;

import java.time.Instant;
import java.util.List;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Spec;
import sojourn.archive.ResultFolder;
import sojourn.compare.LocalWorkers;
import sojourn.evidence.RegimeInquiry;
import sojourn.evidence.RegimesJson;
import sojourn.evidence.RegimesWriter;
import sojourn.report.RegimesText;
import sojourn.strategy.StrategyFile;

/** {@code sojourn regimes}. */
@Command(
        name = "regimes",
        mixinStandardHelpOptions = true,
        description = {
            "Questions the regimes of one strategy, walked as compare walks them: who they are, whether they stay the same from fit to"
                    + " fit, whether they forecast better than cruder gauges, whether their distributions are right, and what"
                    + " hangs on single bars. Writes the findings and prints them.",
            "",
            "Example: sojourn regimes strategies/step-aside-in-storms.yaml"
        })
final class RegimesCommand implements Callable<Integer> {
    private static final int OUR_BUG = 1;

    private final Console console;

    @Spec
    @SuppressWarnings("NullAway.Init") // set by the command line library
    private CommandSpec spec;

    @Mixin
    private final OneStrategy strategy = new OneStrategy();

    @Mixin
    private final CommonOptions options = new CommonOptions();

    RegimesCommand(Console console) {
        this.console = console;
    }

    @Override
    public Integer call() {
        options.refuseNonsense(spec);
        strategy.refuseFolder(spec);
        ResultFolder.refuseUnless(options.results());
        Instant started = Instant.now();
        StrategyFile file = strategy.read();
        RegimeInquiry inquiry;
        try (LocalWorkers workers = new LocalWorkers(options.threads())) {
            inquiry = RegimeInquiry.of(file, workers, options.progress(console));
        }
        String name = strategy.resultName() + "-regimes";
        ResultFolder.Published published =
                RegimesWriter.write(options.results(), name, inquiry, options.facts(spec, started));
        console.out().print(options.json() ? RegimesJson.of(inquiry) : RegimesText.of(inquiry));
        options.tell(console, published);
        List<RuntimeException> faults = inquiry.findings().faults();
        if (!faults.isEmpty()) {
            console.err().println("Faults of the program cost the gauges named above. Please report the lines below.");
            faults.forEach(fault -> fault.printStackTrace(console.err()));
        }
        return faults.isEmpty() ? 0 : OUR_BUG;
    }
}
