package sojourn.market;

import java.util.List;
import java.util.Optional;
import sojourn.document.Field;
import sojourn.document.Refusal;
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

    private static final Field<BarLength> BARS = Field.defaulted(
            "bars", Shapes.word(List.of(BarLength.values()), BarLength::word), "daily", "length of the bars");
    private static final Field<Days> DAYS = Field.defaulted(
            "days",
            Shapes.word(List.of(Days.values()), Days::word),
            "common",
            "days that count: those that every series has, or from the first such day on those that any series has");
    private static final Field<Rows> ROWS = Field.defaulted(
            "rows",
            Shapes.word(List.of(Rows.values()), Rows::word),
            "days",
            "what one row of a price file is: a day, from which longer bars are built, or a whole bar already");

    /** The section. */
    public static final Shape<Calendar> SHAPE = Shapes.object(
                    "calendar", f -> new Calendar(f.get(BARS), f.get(DAYS), f.get(ROWS)), BARS, DAYS, ROWS)
            .refuse(Calendar::builtFromUnion);

    /** Which days count. */
    public enum Days {
        /** Days on which every series that defines the calendar has a close. */
        COMMON("common"),
        /** From the first day by which every series has had a close: days on which any of them has one. */
        UNION("union");

        private final String word;

        Days(String word) {
            this.word = word;
        }

        /** The word of the strategy file. */
        public String word() {
            return word;
        }
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

        /** The word of the strategy file. */
        public String word() {
            return word;
        }
    }

    /** A week that ends on a day which one series lacks would close it at a price of another day than the rest. */
    private static Optional<Refusal> builtFromUnion(Calendar stated) {
        return stated.days() == Days.COMMON || stated.rowLength() == stated.bars()
                ? Optional.empty()
                : Optional.of(new Refusal(
                        "days",
                        "'days' is union, and " + stated.bars().word()
                                + " bars are built from days that every series has",
                        "write days: common, or rows: bars if each row of the files is a whole bar already"));
    }

    /** How long a period one row stands for. */
    BarLength rowLength() {
        return rows == Rows.BARS ? bars : BarLength.DAILY;
    }
}
