package sojourn.cli;

import java.util.concurrent.Callable;
import picocli.CommandLine.Command;

/** {@code sojourn invent}. */
@Command(name = "invent", mixinStandardHelpOptions = true)
final class InventCommand implements Callable<Integer> {
    private final Console console;

    InventCommand(Console console) {
        this.console = console;
    }

    @Override
    public Integer call() {
        console.out().println("invent");
        return 0;
    }
}
