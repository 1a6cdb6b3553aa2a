package sojourn.cli;

import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import sojourn.strategy.StrategyReader;

/** {@code sojourn schema}. */
@Command(
        name = "schema",
        mixinStandardHelpOptions = true,
        description = "Prints the JSON Schema of the strategy file, for editors that complete and check YAML.")
final class SchemaCommand implements Callable<Integer> {
    private final Console console;

    SchemaCommand(Console console) {
        this.console = console;
    }

    @Override
    public Integer call() {
        console.out().println(StrategyReader.schemaJson());
        return 0;
    }
}
