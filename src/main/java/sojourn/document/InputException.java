package sojourn.document;

import java.util.List;
import java.util.stream.Collectors;

/** The user's input cannot be used: every fault found, in the order of the file. */
public final class InputException extends RuntimeException {
    private static final long serialVersionUID = 1L;

    private final transient List<Problem> problems;

    /** With every fault found; at least one. */
    public InputException(List<Problem> problems) {
        super(problems.stream().map(Problem::toString).collect(Collectors.joining("\n")));
        this.problems = List.copyOf(problems);
    }

    /** With one fault. */
    public InputException(Problem problem) {
        this(List.of(problem));
    }

    /** The faults, at least one. */
    public List<Problem> problems() {
        return problems;
    }
}
