package sojourn.job;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.io.PrintWriter;
import java.io.StringWriter;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import java.util.stream.Stream;
import sojourn.cli.Shell;

/** A folder with strategies and prices, compared through the shell as a user would; results go to its folder {@code results}. */
final class JobFolder {
    private final Path folder;

    JobFolder(Path folder) {
        this.folder = folder;
    }

    /** What a command came to. */
    record Ran(int code, String out, String err) {}

    Path path(String relative) {
        return folder.resolve(relative);
    }

    /** Writes a file. */
    JobFolder with(String name, String text) {
        try {
            Path file = path(name);
            Files.createDirectories(file.toAbsolutePath().getParent());
            Files.writeString(file, text, StandardCharsets.UTF_8);
            return this;
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    /** Writes a strategy to {@code <its file name>}. */
    JobFolder with(String name, StrategyText strategy) {
        return with(name, strategy.yaml());
    }

    /** Runs {@code compare --results results --name NAME} on files of this folder, given by their names in it. */
    Ran compare(String name, String... files) {
        List<String> arguments = new ArrayList<>(
                List.of("compare", "--results", path("results").toString(), "--threads", "2", "--name", name));
        for (String file : files) {
            arguments.add(path(file).toString());
        }
        return shell(arguments.toArray(String[]::new));
    }

    /** Runs any command line. */
    static Ran shell(String... arguments) {
        StringWriter out = new StringWriter();
        StringWriter err = new StringWriter();
        int code = Shell.unwatched(new PrintWriter(out), new PrintWriter(err)).run(arguments);
        return new Ran(code, out.toString(), err.toString());
    }

    /** A table of a result. */
    WrittenTable table(String relativeToResults) {
        return WrittenTable.read(path("results").resolve(relativeToResults));
    }

    /** The record of a result. */
    JsonNode record(String name) {
        return json("results/" + name + "/record.json");
    }

    JsonNode json(String relative) {
        return parsed(text(relative));
    }

    static JsonNode parsed(String text) {
        try {
            return new ObjectMapper().readTree(text);
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    String text(String relative) {
        try {
            return Files.readString(path(relative), StandardCharsets.UTF_8);
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    /** Digest of each variant that ran. */
    Map<String, String> digests(String name) {
        Map<String, String> digests = new TreeMap<>();
        for (JsonNode variant : record(name).get("variants")) {
            if (variant.has("digest")) {
                digests.put(
                        variant.get("variant").asText(), variant.get("digest").asText());
            }
        }
        return digests;
    }

    /** Every file below {@code relative}, by its path from there. */
    Map<String, String> files(String relative) {
        Path root = path(relative);
        Map<String, String> files = new TreeMap<>();
        try (Stream<Path> tree = Files.walk(root)) {
            for (Path file : tree.filter(Files::isRegularFile).toList()) {
                files.put(root.relativize(file).toString(), Files.readString(file, StandardCharsets.UTF_8));
            }
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
        return files;
    }

    /** Names of what stands directly in a folder. */
    List<String> names(String relative) {
        try (Stream<Path> entries = Files.list(path(relative))) {
            return entries.map(path -> path.getFileName().toString()).sorted().toList();
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }
}
