package sojourn.document;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;

/** Collects every fault of one input, so that the user hears of all of them in one go. */
public final class Problems {
    private final List<Problem> found = new ArrayList<>();

    /** Adds a fault. */
    public void add(Problem problem) {
        found.add(problem);
    }

    /** Adds a fault at a node's own place. */
    public void add(Node node, String what, String remedy) {
        found.add(new Problem(node.file(), node.line(), node.column(), what, remedy));
    }

    /** Adds a fault at a place: a key's, say. */
    public void add(Place place, String what, String remedy) {
        found.add(new Problem(place.file(), place.line(), place.column(), what, remedy));
    }

    /**
     * The faults so far, each once: files in the order in which they first had one, and each file's faults from its first line
     * to its last.
     */
    public List<Problem> list() {
        List<String> files = found.stream().map(Problem::file).distinct().toList();
        return found.stream()
                .distinct()
                .sorted(Comparator.comparingInt((Problem p) -> files.indexOf(p.file()))
                        .thenComparingInt(Problem::line)
                        .thenComparingInt(Problem::column))
                .toList();
    }

    /** Whether there is none so far. */
    public boolean isEmpty() {
        return found.isEmpty();
    }

    /** Throws them all as one {@link InputException} if there is any. */
    public void throwIfAny() {
        if (!found.isEmpty()) {
            throw new InputException(list());
        }
    }
}
