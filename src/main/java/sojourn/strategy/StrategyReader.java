package sojourn.strategy;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Objects;
import java.util.Optional;
import sojourn.allocate.Misfit;
import sojourn.allocate.Pacing;
import sojourn.document.Document;
import sojourn.document.Problems;
import sojourn.document.SchemaText;

/** Reads strategy files: shapes first, then what parts of a file say of each other. */
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
        if (strategy.isEmpty()) {
            return Optional.empty();
        }
        for (Misfit misfit : misfits(strategy.get())) {
            problems.add(document.nearest(misfit.pointer()), misfit.what(), misfit.remedy());
        }
        if (!problems.isEmpty()) {
            return Optional.empty();
        }
        Path folder = Objects.requireNonNull(file.toAbsolutePath().normalize().getParent(), "a file lies in a folder");
        return Optional.of(
                new StrategyFile(shownName, folder, strategy.get(), Strategy.SHAPE.resolved(document.root())));
    }

    /** Faults between sections; pointers from the root. */
    private static List<Misfit> misfits(Strategy strategy) {
        List<Misfit> found = new ArrayList<>();
        List<String> assets = List.copyOf(strategy.prices().keySet());
        found.addAll(Names.unknownAssets(strategy, assets));
        below("/allocate", strategy.rule().misfits(strategy.regimes().states(), assets), found);
        below("/allocate", strategy.limits().misfits(strategy.rule()), found);
        below("/trade", Pacing.misfits(strategy.rule(), strategy.trade().stayAtLeast()), found);
        return found;
    }

    private static void below(String section, List<Misfit> misfits, List<Misfit> into) {
        for (Misfit misfit : misfits) {
            into.add(new Misfit(section + misfit.pointer(), misfit.what(), misfit.remedy()));
        }
    }
}
