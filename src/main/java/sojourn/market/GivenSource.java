package sojourn.market;

import sojourn.document.Field;
import sojourn.document.Shape;
import sojourn.document.Shapes;

/**
 * The key {@code given} of the section {@code regimes}: a file of probabilities of regimes that were computed elsewhere.
 *
 * @param layout where it lies and how it is written
 * @param knownOn name of the column that says when each row became known
 */
public record GivenSource(CsvLayout layout, String knownOn) {
    private static final Field<String> CSV = Field.required(
            "csv",
            Shapes.text(),
            "path of a file with a column of probabilities for each of 'states', from the folder of the strategy file");
    private static final Field<String> KNOWN_ON = Field.required(
            "known-on",
            Shapes.text(),
            "name of the column that says when each row became known; the row counts from the first close on or after that"
                    + " date, never from its own");

    /** Reads the map under {@code given}. */
    public static final Shape<GivenSource> SHAPE = Shapes.object(
            "given",
            f -> new GivenSource(CsvLayout.from(f.get(CSV), f), f.get(KNOWN_ON)),
            CSV,
            KNOWN_ON,
            CsvLayout.DATE,
            CsvLayout.DATE_FORMAT,
            CsvLayout.SEPARATOR);
}
