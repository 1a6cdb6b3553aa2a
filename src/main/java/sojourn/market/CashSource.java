package sojourn.market;

import sojourn.document.Shape;

/** The section {@code cash}: what money earns that is not invested. */
public sealed interface CashSource {
    /** Without the section: cash earns nothing. */
    CashSource NOTHING = new Constant(0, DayCount.ACTUAL_365);

    /** The section: a file of rates, or one rate for all time. */
    Shape<CashSource> SHAPE = CashSection.SHAPE;

    /** One rate for all time, percent a year. */
    record Constant(double percentPerYear, DayCount dayCount) implements CashSource {}

    /** Rates from a file, percent a year, each in force from its date on. */
    record Dated(CsvLayout layout, String column, DayCount dayCount) implements CashSource {}
}
