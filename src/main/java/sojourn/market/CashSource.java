package sojourn.market;

import java.util.List;
import sojourn.document.Field;
import sojourn.document.Shape;
import sojourn.document.Shapes;

/** The section {@code cash}: what money earns that is not invested. */
public sealed interface CashSource {
    /** Without the section: cash earns nothing. */
    CashSource NOTHING = new Constant(0, DayCount.ACTUAL_365);

    /** The section: a file of rates, or one rate for all time. */
    Shape<CashSource> SHAPE = Shapes.either(Dated.SHAPE, Constant.SHAPE);

    /** One rate for all time, percent a year. */
    record Constant(double percentPerYear, DayCount dayCount) implements CashSource {
        private static final Field<Double> PERCENT = Field.required(
                "percent-per-year", Shapes.number().atLeast(-100).atMost(100), "one rate for all time, percent a year");
        private static final Field<DayCount> DAY_COUNT = dayCountField();

        static final Shape<Constant> SHAPE =
                Shapes.object("cash", f -> new Constant(f.get(PERCENT), f.get(DAY_COUNT)), PERCENT, DAY_COUNT);
    }

    /** Rates from a file, percent a year, each in force from its date on. */
    record Dated(CsvLayout layout, String column, DayCount dayCount) implements CashSource {
        private static final Field<String> CSV =
                Field.required("csv", Shapes.text(), "path of a file of rates, from the folder of the strategy file");
        private static final Field<String> COLUMN =
                Field.required("column", Shapes.text(), "name of the column of rates, percent a year");
        private static final Field<DayCount> DAY_COUNT = dayCountField();

        static final Shape<Dated> SHAPE = Shapes.object(
                "cash",
                f -> new Dated(CsvLayout.from(f.get(CSV), f), f.get(COLUMN), f.get(DAY_COUNT)),
                CSV,
                COLUMN,
                CsvLayout.DATE,
                CsvLayout.DATE_FORMAT,
                CsvLayout.SEPARATOR,
                DAY_COUNT);
    }

    private static Field<DayCount> dayCountField() {
        return Field.defaulted(
                "day-count",
                Shapes.word(List.of(DayCount.values()), DayCount::word),
                "actual/365",
                "days of a year of interest");
    }
}
