package sojourn.cli;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Option;
import picocli.CommandLine.Parameters;
import sojourn.document.Document;
import sojourn.document.InputException;
import sojourn.document.Problem;
import sojourn.document.Problems;
import sojourn.world.Inventor;
import sojourn.world.World;
import sojourn.world.WorldFiles;

/** {@code sojourn invent}. */
@Command(
        name = "invent",
        mixinStandardHelpOptions = true,
        description = {
            "Writes invented prices of a stated world, with the true regimes in a file of their own. The same world and seed give"
                    + " the same bytes.",
            "",
            "Example: sojourn invent demo-data/skerry-world.yaml --to my-world"
        })
final class InventCommand implements Callable<Integer> {
    private final Console console;

    @Parameters(paramLabel = "WORLD", description = "The file that states the world.")
    @SuppressWarnings("NullAway.Init") // set by the command line library
    private Path world;

    @Option(
            names = "--to",
            paramLabel = "DIR",
            required = true,
            description =
                    "The folder to write to; it is made if missing. A file that says something else is never overwritten.")
    @SuppressWarnings("NullAway.Init") // set by the command line library
    private Path folder;

    @Option(names = "--seed", paramLabel = "N", description = "Another seed than the world's own.")
    private Optional<Long> seed = Optional.empty();

    @Option(names = "--quiet", description = "No notes on standard error, only faults.")
    private boolean quiet;

    InventCommand(Console console) {
        this.console = console;
    }

    @Override
    public Integer call() {
        Problems problems = new Problems();
        Optional<World> read = Document.read(world, world.toString(), problems)
                .flatMap(document -> World.SHAPE.read(document.root(), problems));
        problems.throwIfAny();
        World stated = read.orElseThrow();
        World wanted = seed.map(stated::withSeed).orElse(stated);
        Map<String, String> files = WorldFiles.of(Inventor.invent(wanted));
        refuseOverwriting(files);
        try {
            Files.createDirectories(folder);
            for (Map.Entry<String, String> file : files.entrySet()) {
                Files.writeString(folder.resolve(file.getKey()), file.getValue(), StandardCharsets.UTF_8);
            }
        } catch (IOException e) {
            throw new InputException(new Problem(
                    folder.toString(),
                    0,
                    0,
                    "cannot be written (" + e + ")",
                    "check the folder and the room on the disk"));
        }
        for (String name : files.keySet()) {
            console.out().println(folder.resolve(name));
        }
        if (!quiet) {
            console.err()
                    .println(
                            "note: these prices are invented; the true regimes stand in the file that ends in truth.csv");
        }
        return 0;
    }

    private void refuseOverwriting(Map<String, String> files) {
        List<Problem> standing = new ArrayList<>();
        for (Map.Entry<String, String> file : files.entrySet()) {
            Path target = folder.resolve(file.getKey());
            if (Files.exists(target) && !holds(target, file.getValue())) {
                standing.add(new Problem(
                        target.toString(),
                        0,
                        0,
                        "this file exists and says something else",
                        "name another folder by --to"));
            }
        }
        if (!standing.isEmpty()) {
            throw new InputException(standing);
        }
    }

    private static boolean holds(Path file, String content) {
        try {
            return Files.readString(file, StandardCharsets.UTF_8).equals(content);
        } catch (IOException e) {
            return false; // unreadable counts as something else, which is never overwritten
        }
    }
}
