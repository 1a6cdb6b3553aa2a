package sojourn.walk;

import java.util.HashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import sojourn.document.Refusal;
import sojourn.document.Shape;
import sojourn.document.Shapes;

/** Names of regimes, from lowest to highest volatility. */
public final class StateNames {
    private static final int MOST_STATES = 6;

    /** Reads a list of names. */
    public static final Shape<List<String>> SHAPE = Shapes.list(
                    Shapes.textLike("[a-z][a-z0-9_]*", "a name of lower-case letters, digits and underscores"),
                    1,
                    MOST_STATES)
            .refuse(StateNames::namedTwice);

    private StateNames() {}

    private static Optional<Refusal> namedTwice(List<String> states) {
        Set<String> seen = new HashSet<>();
        return states.stream()
                .filter(name -> !seen.add(name))
                .findFirst()
                .map(name ->
                        new Refusal("", "two regimes have the name '" + name + "'", "give each a name of its own"));
    }
}
