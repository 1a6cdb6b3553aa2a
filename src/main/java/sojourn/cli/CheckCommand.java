package sojourn.cli;

import java.util.concurrent.Callable;
import picocli.CommandLine.Command;

/** {@code sojourn check}. */
@Command(name = "check", mixinStandardHelpOptions = true)
final class CheckCommand implements Callable<Integer> {
    private final Console console;

    CheckCommand(Console console) {
        this.console = console;
    }

    @Override
    public Integer call() {
        console.out().println("check");
        return 0;
    }
}
