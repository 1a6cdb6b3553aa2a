package sojourn.strategy;

import java.nio.file.Path;
import java.util.Objects;
import java.util.Optional;
import sojourn.document.Document;
import sojourn.document.Problems;
import sojourn.document.SchemaText;

/** Reads strategy files: the shape of each section, and what sections say of each other. */
public final class StrategyReader {
    private static final String TITLE = "Sojourn strategy file";

    private StrategyReader() {}

    /** The JSON Schema of the strategy file, as text. */
    public static String schemaJson() {
        return SchemaText.of(TITLE, Strategy.SHAPE);
    }

    /**
     * Reads one file. Faults go to {@code problems}; empty exactly if there were any.
     *
     * @param shownName what messages call the file
     */
    public static Optional<StrategyFile> read(Path file, String shownName, Problems problems) {
        Problems own = new Problems();
        Optional<Document> document = Document.read(file, shownName, own);
        Optional<StrategyFile> read = document.flatMap(found -> assemble(found, file, shownName, own));
        own.list().forEach(problems::add);
        return own.isEmpty() ? read : Optional.empty();
    }

    /** Reads a text as if it stood in {@code folder}; for checks that need no file. */
    public static Optional<StrategyFile> parse(String text, Path folder, String shownName, Problems problems) {
        Problems own = new Problems();
        Optional<Document> document = Document.parse(shownName, text, own);
        Optional<StrategyFile> read =
                document.flatMap(found -> assemble(found, folder.resolve(shownName), shownName, own));
        own.list().forEach(problems::add);
        return own.isEmpty() ? read : Optional.empty();
    }

    private static Optional<StrategyFile> assemble(Document document, Path file, String shownName, Problems problems) {
        Optional<Strategy> strategy = Strategy.SHAPE.read(document.root(), problems);
        BetweenSections.check(document, problems);
        if (strategy.isEmpty() || !problems.isEmpty()) {
            return Optional.empty();
        }
        Path folder = Objects.requireNonNull(file.toAbsolutePath().normalize().getParent(), "a file lies in a folder");
        return Optional.of(
                new StrategyFile(shownName, folder, strategy.get(), Strategy.SHAPE.resolved(document.root())));
    }
}
