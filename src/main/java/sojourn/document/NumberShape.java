package sojourn.document;

/** A number within bounds. */
public interface NumberShape extends Shape<Double> {
    /** At least {@code low}. */
    NumberShape atLeast(double low);

    /** At most {@code high}. */
    NumberShape atMost(double high);

    /** More than {@code low}. */
    NumberShape above(double low);

    /** Less than {@code high}. */
    NumberShape below(double high);
}
