package sojourn.market;

import java.util.LinkedHashMap;
import java.util.Map;
import sojourn.document.Field;
import sojourn.document.Shape;
import sojourn.document.Shapes;

/**
 * The section {@code calendar}: what a bar is.
 *
 * @param bars length of the bars
 * @param days which days count
 * @param rows what one row of a price file is
 */
public record Calendar(BarLength bars, Days days, Rows rows) {
    /** Without the section: daily bars of common days. */
    public static final Calendar DAILY = new Calendar(BarLength.DAILY, Days.COMMON, Rows.DAYS);

    private static final Field<BarLength> BARS =
            Field.defaulted("bars", Shapes.word(BarLength.words()), "daily", "Length of the bars.");
    private static final Field<Days> DAYS = Field.defaulted(
            "days",
            Shapes.word(Map.of("common", Days.COMMON)),
            "common",
            "Days that count: those that every series has.");
    private static final Field<Rows> ROWS = Field.defaulted(
            "rows",
            Shapes.word(Rows.words()),
            "days",
            "What one row of a price file is: a day, from which longer bars are built, or a whole bar already.");

    /** The section. */
    public static final Shape<Calendar> SHAPE =
            Shapes.object("calendar", f -> new Calendar(f.get(BARS), f.get(DAYS), f.get(ROWS)), BARS, DAYS, ROWS);

    /** Which days count. */
    public enum Days {
        /** Days on which every series that defines the calendar has a close. */
        COMMON
    }

    /** What one row of a price file is. */
    public enum Rows {
        /** A day; weekly and monthly bars are built from days. */
        DAYS("days"),
        /** One bar already. */
        BARS("bars");

        private final String word;

        Rows(String word) {
            this.word = word;
        }

        static Map<String, Rows> words() {
            Map<String, Rows> words = new LinkedHashMap<>();
            for (Rows one : values()) {
                words.put(one.word, one);
            }
            return words;
        }
    }

    /** How long a period one row stands for. */
    BarLength rowLength() {
        return rows == Rows.BARS ? bars : BarLength.DAILY;
    }
}
