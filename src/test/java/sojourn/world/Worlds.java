package sojourn.world;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import sojourn.document.Document;
import sojourn.document.Problems;

/** Worlds for the tests, all changed copies of the one that ships as demo data. */
final class Worlds {
    static final Path DEMO_DATA = Path.of("demo-data");
    static final String FILE = "skerry-world.yaml";

    private Worlds() {}

    /** The text of the shipped world. */
    static String skerryText() {
        return text(FILE);
    }

    /** The shipped world. */
    static World skerry() {
        return read(skerryText());
    }

    /** Reads {@code yaml}; throws every fault there is. */
    static World read(String yaml) {
        Problems problems = new Problems();
        var world =
                Document.parse(FILE, yaml, problems).flatMap(document -> World.SHAPE.read(document.root(), problems));
        problems.throwIfAny();
        return world.orElseThrow();
    }

    /** The text of a demo file. */
    static String text(String file) {
        try {
            return Files.readString(DEMO_DATA.resolve(file));
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    static World with(World world, Bills bills) {
        return new World(
                world.name(),
                world.filePrefix(),
                world.seed(),
                world.firstDay(),
                world.years(),
                world.barsPerYear(),
                world.holidays(),
                world.assets(),
                bills,
                world.startsIn(),
                world.states());
    }
}
