package sojourn.archive;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.DirectoryNotEmptyException;
import java.nio.file.FileAlreadyExistsException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.util.Comparator;
import java.util.List;
import java.util.stream.Stream;
import sojourn.document.InputException;
import sojourn.document.Problem;

/**
 * A folder of results while it is written. It grows under a hidden name and gets its own name in one step when everything
 * stands in it, so that a folder with a record is complete; a finished folder is never overwritten.
 */
public final class ResultFolder implements AutoCloseable {
    /** The file whose presence says that a folder is complete. */
    public static final String RECORD = "record.json";

    private static final int DIGEST_DIGITS = 8;

    private final Path results;
    private final Path staging;
    private boolean published;

    /** Where a result ended up. */
    public enum Arrival {
        /** A new folder was made. */
        WRITTEN,
        /** The same result stood there already and was left alone. */
        STOOD_ALREADY
    }

    /**
     * The end of a run's writing.
     *
     * @param folder where the result stands
     * @param arrival whether it is new
     */
    public record Published(Path folder, Arrival arrival) {}

    private ResultFolder(Path results, Path staging) {
        this.results = results;
        this.staging = staging;
    }

    /** Refuses a place for results that is a file, before any work is done. */
    public static void refuseUnless(Path results) {
        if (Files.exists(results) && !Files.isDirectory(results)) {
            throw new InputException(new Problem(
                    results.toString(), 0, 0, "is a file, results need a folder", "give --results another name"));
        }
    }

    /** Begins a folder below {@code results}, which is made if it is missing. */
    public static ResultFolder begin(Path results) {
        try {
            Files.createDirectories(results);
            return new ResultFolder(results, freshFolder(results));
        } catch (IOException e) {
            throw unwritable(results, e);
        }
    }

    /** Writes a text file at a relative path such as {@code calm-rule/path.csv}. */
    public void write(String relativePath, String content) {
        Path target = staging.resolve(relativePath).normalize();
        if (!target.startsWith(staging)) {
            throw new IllegalArgumentException("path " + relativePath + " leaves the result folder");
        }
        try {
            Files.createDirectories(target.getParent());
            Files.writeString(target, content, StandardCharsets.UTF_8);
        } catch (IOException e) {
            throw unwritable(target, e);
        }
    }

    /**
     * Writes the record and gives the folder its name: {@code name}, or {@code name-digest8} if another result stands there. If
     * the same digest stands there already, that folder is kept and this one dropped.
     */
    public Published publish(String name, String digest, String recordJson) {
        write(RECORD, recordJson);
        for (String candidate : List.of(name, name + "-" + digest.substring(0, DIGEST_DIGITS))) {
            Path target = results.resolve(candidate);
            if (standsIn(target, digest)) {
                return new Published(target, Arrival.STOOD_ALREADY);
            }
            if (move(target)) {
                published = true;
                return new Published(target, Arrival.WRITTEN);
            }
        }
        throw new InputException(new Problem(
                results.resolve(name).toString(),
                0,
                0,
                "both this folder and the one with the digest behind its name hold something else",
                "give another --name or --results"));
    }

    /** Removes what was not published. */
    @Override
    public void close() {
        if (published || !Files.exists(staging)) {
            return;
        }
        try (Stream<Path> tree = Files.walk(staging)) {
            for (Path path : tree.sorted(Comparator.reverseOrder()).toList()) {
                Files.delete(path);
            }
        } catch (IOException e) {
            throw unwritable(staging, e);
        }
    }

    /** A folder that no other run writes to: the first free number behind this process's own. */
    private static Path freshFolder(Path results) throws IOException {
        String prefix = ".writing-" + ProcessHandle.current().pid() + "-";
        int attempt = 1;
        while (true) {
            try {
                return Files.createDirectory(results.resolve(prefix + attempt));
            } catch (FileAlreadyExistsException e) {
                attempt++; // another run of this process writes there
            }
        }
    }

    private boolean move(Path target) {
        try {
            if (Files.exists(target)) {
                return false;
            }
            Files.move(staging, target, StandardCopyOption.ATOMIC_MOVE);
            return true;
        } catch (FileAlreadyExistsException | DirectoryNotEmptyException e) {
            return false;
        } catch (IOException e) {
            throw unwritable(target, e);
        }
    }

    private static boolean standsIn(Path folder, String digest) {
        Path record = folder.resolve(RECORD);
        if (!Files.isRegularFile(record)) {
            return false;
        }
        try {
            JsonNode tree = new ObjectMapper().readTree(Files.readString(record, StandardCharsets.UTF_8));
            return tree.path("digest").asText().equals(digest);
        } catch (IOException e) {
            // a record that cannot be read is some other result: it is left alone, and this one gets another name
            return false;
        }
    }

    private static InputException unwritable(Path path, IOException e) {
        return new InputException(new Problem(
                path.toString(),
                0,
                0,
                "cannot be written (" + e.getClass().getSimpleName() + ": " + e.getMessage() + ")",
                "check that the folder exists, that you may write there, and that the disk has room"));
    }
}
