package sojourn.market;

import java.util.Optional;
import sojourn.document.Field;
import sojourn.document.Refusal;
import sojourn.document.Shape;
import sojourn.document.Shapes;

/** The keys of the section {@code cash} as written, before it is settled which of the two kinds is meant. */
record CashSection(
        Optional<String> csv,
        Optional<String> column,
        Optional<Double> percentPerYear,
        DayCount dayCount,
        CsvLayout layout) {
    private static final Field<Optional<String>> CSV = Field.maybe(
            "csv", Shapes.text(), "Path of a file of rates, percent a year, from the folder of the strategy file.");
    private static final Field<Optional<String>> COLUMN =
            Field.maybe("column", Shapes.text(), "Name of the column of rates.");
    private static final Field<Optional<Double>> PERCENT = Field.maybe(
            "percent-per-year",
            Shapes.number().atLeast(-100).atMost(100),
            "One rate for all time, percent a year, instead of a file.");
    private static final Field<DayCount> DAY_COUNT =
            Field.defaulted("day-count", Shapes.word(DayCount.words()), "actual/365", "Days of a year of interest.");

    static final Shape<CashSource> SHAPE = Shapes.object(
                    "cash",
                    f -> new CashSection(
                            f.get(CSV),
                            f.get(COLUMN),
                            f.get(PERCENT),
                            f.get(DAY_COUNT),
                            CsvLayout.from(f.get(CSV).orElse(""), f)),
                    CSV,
                    COLUMN,
                    CsvLayout.DATE,
                    CsvLayout.DATE_FORMAT,
                    CsvLayout.SEPARATOR,
                    PERCENT,
                    DAY_COUNT)
            .refuse(CashSection::refusal)
            .as(CashSection::source);

    private Optional<Refusal> refusal() {
        if (csv.isPresent() && percentPerYear.isPresent()) {
            return Optional.of(
                    new Refusal("percent-per-year", "cash has both csv and percent-per-year", "keep one of the two"));
        }
        if (csv.isEmpty() && percentPerYear.isEmpty()) {
            return Optional.of(new Refusal(
                    "",
                    "cash has neither csv nor percent-per-year",
                    "name a file of rates, or write percent-per-year: 2"));
        }
        if (csv.isPresent() && column.isEmpty()) {
            return Optional.of(new Refusal(
                    "csv", "cash does not say which column holds the rates", "add column: NAME beside csv"));
        }
        if (percentPerYear.isPresent() && column.isPresent()) {
            return Optional.of(new Refusal(
                    "column", "cash has a column but no csv to find it in", "remove column, or name a csv"));
        }
        return Optional.empty();
    }

    private CashSource source() {
        return percentPerYear.isPresent()
                ? new CashSource.Constant(percentPerYear.get(), dayCount)
                : new CashSource.Dated(layout, column.orElseThrow(), dayCount);
    }
}
