package sojourn.market;

/** How many days a year of interest has; the days between two dates are always counted on the calendar. */
public enum DayCount {
    /** Money markets of the dollar and the euro. */
    ACTUAL_360("actual/360", 360),
    /** Money market of the pound, and the default. */
    ACTUAL_365("actual/365", 365);

    private final String word;
    private final double daysPerYear;

    DayCount(String word, double daysPerYear) {
        this.word = word;
        this.daysPerYear = daysPerYear;
    }

    /** The word of the strategy file. */
    public String word() {
        return word;
    }

    /**
     * Simple interest on one unit of money: percent / 100 × days / days per year.
     *
     * @param percentPerYear the rate, percent a year; may be negative
     * @param calendarDays days that it is earned
     */
    public double interest(double percentPerYear, double calendarDays) {
        return percentPerYear / 100 * calendarDays / daysPerYear;
    }
}
