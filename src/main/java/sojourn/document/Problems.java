package sojourn.document;

import java.util.ArrayList;
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

    /** The faults so far, in the order they were found. */
    public List<Problem> list() {
        return List.copyOf(found);
    }

    /** Whether there is none so far. */
    public boolean isEmpty() {
        return found.isEmpty();
    }

    /** Throws them all as one {@link InputException} if there is any. */
    public void throwIfAny() {
        if (!found.isEmpty()) {
            throw new InputException(found);
        }
    }
}
