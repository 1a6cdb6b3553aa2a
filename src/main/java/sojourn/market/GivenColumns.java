package sojourn.market;

import java.util.List;

/**
 * Which columns of a file of given probabilities are wanted.
 *
 * @param source the file
 * @param states names of the regimes, each of which is a column of probabilities
 */
public record GivenColumns(GivenSource source, List<String> states) {
    /** What the file is called among the files that went in. */
    public static final String ROLE = "regimes.given";

    /** Copies the list. */
    public GivenColumns {
        states = List.copyOf(states);
    }
}
