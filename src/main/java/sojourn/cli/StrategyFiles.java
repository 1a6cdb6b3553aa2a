package sojourn.cli;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.Stream;
import sojourn.document.InputException;
import sojourn.document.Problem;
import sojourn.document.Problems;
import sojourn.strategy.StrategyFile;
import sojourn.strategy.StrategyReader;

/** Finds and reads the strategy files that a command was given. */
final class StrategyFiles {
    private StrategyFiles() {}

    /**
     * All strategies of the given files and folders; a folder gives its {@code .yaml} and {@code .yml} files by name. Every
     * fault of every file is told at once.
     */
    static List<StrategyFile> read(List<Path> given) {
        Problems problems = new Problems();
        List<StrategyFile> files = new ArrayList<>();
        for (Path path : expanded(given, problems)) {
            StrategyReader.read(path, path.toString(), problems).ifPresent(files::add);
        }
        problems.throwIfAny();
        return files;
    }

    /** The name of a result: the folder's or file's own if there is one argument, else {@code comparison}. */
    static String resultName(List<Path> given) {
        if (given.size() != 1) {
            return "comparison";
        }
        Path last = given.get(0).toAbsolutePath().normalize().getFileName();
        String name = last == null ? "comparison" : last.toString().replaceAll("\\.ya?ml$", "");
        String plain = name.replaceAll("[^A-Za-z0-9._-]+", "-").replaceAll("^[.-]+", "");
        return plain.isEmpty() ? "comparison" : plain;
    }

    private static List<Path> expanded(List<Path> given, Problems problems) {
        List<Path> files = new ArrayList<>();
        for (Path path : given) {
            if (path.toString().isEmpty()) {
                problems.add(new Problem("''", 0, 0, "an empty name", "name a strategy file or a folder of them"));
                continue;
            }
            if (!Files.isDirectory(path)) {
                files.add(path);
                continue;
            }
            List<Path> found = inFolder(path);
            if (found.isEmpty()) {
                problems.add(new Problem(
                        path.toString(), 0, 0, "this folder holds no .yaml file", "name a folder of strategy files"));
            }
            files.addAll(found);
        }
        return files;
    }

    private static List<Path> inFolder(Path folder) {
        try (Stream<Path> entries = Files.list(folder)) {
            return entries.filter(Files::isRegularFile)
                    .filter(path -> path.toString().matches(".*\\.ya?ml"))
                    .sorted()
                    .toList();
        } catch (IOException e) {
            throw new InputException(
                    new Problem(folder.toString(), 0, 0, "this folder cannot be read", "check its permissions"));
        }
    }
}
