package sojourn.cli;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Parameters;
import sojourn.compare.Prepared;
import sojourn.report.PlanJson;
import sojourn.report.PlanText;
import sojourn.strategy.StrategyFile;

/** {@code sojourn check}. */
@Command(
        name = "check",
        mixinStandardHelpOptions = true,
        description = {
            "Reads strategies and prices and prints the plan in plain English, every finding, and what is not modelled. Runs"
                    + " nothing and changes nothing.",
            "",
            "Example: sojourn check strategies/step-aside-in-storms.yaml"
        })
final class CheckCommand implements Callable<Integer> {
    private static final int USERS_INPUT = 2;

    private final Console console;

    @Parameters(arity = "1..*", paramLabel = "FILES-OR-FOLDERS", description = "Strategy files, and folders of them.")
    private final List<Path> given = new ArrayList<>();

    @Mixin
    private final CommonOptions options = new CommonOptions();

    CheckCommand(Console console) {
        this.console = console;
    }

    @Override
    public Integer call() {
        List<Prepared> prepared = new ArrayList<>();
        for (StrategyFile file : StrategyFiles.read(given)) {
            prepared.add(Prepared.of(file));
        }
        console.out().print(options.json() ? PlanJson.of(prepared) : PlanText.of(prepared));
        boolean readable = prepared.stream().allMatch(one -> one instanceof Prepared.Ready);
        return readable ? 0 : USERS_INPUT;
    }
}
