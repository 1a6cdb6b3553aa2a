package sojourn.market;

/**
 * What cash earned on each bar, simple: the last rate dated at or before the previous bar × calendar days between the two
 * bars / day-count; 0 on bar 0. And the rate known at each close, from which the coming bar's return is expected.
 */
public final class CashReturns {
    private final double[] earned;
    private final double[] expectedNext;
    private final DayCount dayCount;

    private CashReturns(double[] earned, double[] expectedNext, DayCount dayCount) {
        this.earned = earned;
        this.expectedNext = expectedNext;
        this.dayCount = dayCount;
    }

    /**
     * Copies both. Neither modified. A year of other interest has 365 days; see {@link #countedBy}.
     *
     * @param earned simple return on each bar
     * @param expectedNext simple return over a nominal bar (365.25 / periods per year days) at the rate known at each close
     */
    public static CashReturns of(double[] earned, double[] expectedNext) {
        if (earned.length != expectedNext.length) {
            throw new IllegalArgumentException(earned.length + " returns for " + expectedNext.length + " expectations");
        }
        return new CashReturns(earned.clone(), expectedNext.clone(), DayCount.ACTUAL_365);
    }

    /** The same, other interest counted by another year. */
    public CashReturns countedBy(DayCount other) {
        return new CashReturns(earned, expectedNext, other);
    }

    /** Cash that earns nothing, over {@code bars} bars. */
    public static CashReturns none(int bars) {
        return of(new double[bars], new double[bars]);
    }

    int size() {
        return earned.length;
    }

    double earned(int bar) {
        return earned[bar];
    }

    double expectedNext(int bar) {
        return expectedNext[bar];
    }

    /** How many days a year of interest has. */
    DayCount dayCount() {
        return dayCount;
    }
}
