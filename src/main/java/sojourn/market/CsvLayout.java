package sojourn.market;

import java.util.List;
import java.util.Optional;
import sojourn.document.Field;
import sojourn.document.Fields;
import sojourn.document.Shapes;

/**
 * Where a file of dated rows lies and how it is written.
 *
 * @param csv path, from the folder of the strategy file or absolute
 * @param date name of the column of dates
 * @param dateFormat how dates are written
 * @param separator what separates cells; empty: taken from the header line
 */
public record CsvLayout(String csv, String date, DatePattern dateFormat, Optional<Separator> separator) {
    static final Field<String> DATE = Field.defaulted("date", Shapes.text(), "date", "name of the column of dates");
    static final Field<DatePattern> DATE_FORMAT =
            Field.defaulted("date-format", DatePattern.SHAPE, "yyyy-MM-dd", "how dates are written, e.g. dd.MM.yyyy");
    static final Field<Optional<Separator>> SEPARATOR = Field.maybe(
            "separator",
            Shapes.word(List.of(Separator.values()), Separator::word),
            "what separates cells; taken from the header line if not given");

    static CsvLayout from(String csv, Fields fields) {
        return new CsvLayout(csv, fields.get(DATE), fields.get(DATE_FORMAT), fields.get(SEPARATOR));
    }

    /** ISO dates in a column {@code date}, separator taken from the header line. */
    public static CsvLayout of(String csv) {
        return new CsvLayout(csv, "date", DatePattern.ISO, Optional.empty());
    }
}
