package sojourn.cli;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Parameters;
import sojourn.strategy.StrategyFile;

/** The strategy file of a command that is about one strategy. */
final class OneStrategy {
    @Parameters(paramLabel = "FILE", description = "A strategy file.")
    @SuppressWarnings("NullAway.Init") // set by the command line library
    private Path given;

    /** Refuses a folder. */
    void refuseFolder(CommandSpec spec) {
        if (Files.isDirectory(given)) {
            throw new ParameterException(spec.commandLine(), given + " is a folder; name one strategy file");
        }
    }

    /** What it says; refuses it with every fault. */
    StrategyFile read() {
        return StrategyFiles.read(List.of(given)).get(0);
    }

    /** The name that results of it have. */
    String resultName() {
        return StrategyFiles.resultName(List.of(given));
    }
}
