package sojourn.archive;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.FileAlreadyExistsException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.util.ArrayList;
import java.util.List;
import java.util.Objects;
import java.util.stream.Stream;
import sojourn.document.InputException;
import sojourn.document.Problem;

/** The folder where the seals of one strategy stand, one file each; names sort in the order of sealing. Nothing is overwritten. */
public final class SealShelf {
    private static final String FOLDER = "seals";
    private static final String ENDING = ".json";

    private final Path folder;

    private SealShelf(Path folder) {
        this.folder = folder;
    }

    /** {@code <results>/seals/<name>}, which need not be there yet. */
    public static SealShelf of(Path results, String name) {
        ResultFolder.refuseUnless(results);
        return new SealShelf(results.resolve(FOLDER).resolve(name));
    }

    /** The one that a seal stands in; refuses a path where no file is. */
    public static SealShelf around(Path seal) {
        if (!Files.isRegularFile(seal)) {
            throw new InputException(new Problem(
                    seal.toString(), 0, 0, "there is no such file", "name a seal, a .json file that --seal wrote"));
        }
        return new SealShelf(
                Objects.requireNonNull(seal.toAbsolutePath().normalize().getParent(), "a file has a folder"));
    }

    /**
     * A seal as it stands there.
     *
     * @param name of its file
     */
    public record Stored(String name, String text) {}

    /** All seals, in order of their names. */
    public List<Stored> all() {
        if (!Files.isDirectory(folder)) {
            return List.of();
        }
        try (Stream<Path> entries = Files.list(folder)) {
            List<Stored> stored = new ArrayList<>();
            for (Path file : entries.filter(path -> path.toString().endsWith(ENDING))
                    .sorted()
                    .toList()) {
                stored.add(new Stored(file.getFileName().toString(), Files.readString(file, StandardCharsets.UTF_8)));
            }
            return stored;
        } catch (IOException e) {
            throw new InputException(new Problem(
                    folder.toString(),
                    0,
                    0,
                    "the seals in it cannot be read (" + e.getMessage() + ")",
                    "check that they are text files in UTF-8 and that you may read them"));
        }
    }

    /** Puts a new seal there and tells where it stands. */
    public Path put(Stored seal) {
        Path file = folder.resolve(seal.name());
        try {
            Files.createDirectories(folder);
            Files.writeString(file, seal.text(), StandardCharsets.UTF_8, StandardOpenOption.CREATE_NEW);
            return file;
        } catch (FileAlreadyExistsException e) {
            throw new InputException(
                    new Problem(file.toString(), 0, 0, "another run sealed at the same moment", "seal again"));
        } catch (IOException e) {
            throw new InputException(new Problem(
                    file.toString(),
                    0,
                    0,
                    "cannot be written (" + e.getMessage() + ")",
                    "check that you may write there"));
        }
    }

    /** Where a seal of that name stands. */
    public Path path(String name) {
        return folder.resolve(name);
    }
}
