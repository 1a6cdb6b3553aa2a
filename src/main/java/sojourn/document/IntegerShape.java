package sojourn.document;

/** A whole number within bounds. */
public interface IntegerShape extends Shape<Integer> {
    /** At least {@code low}. */
    IntegerShape atLeast(int low);

    /** At most {@code high}. */
    IntegerShape atMost(int high);
}
