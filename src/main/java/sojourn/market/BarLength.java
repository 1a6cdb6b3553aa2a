package sojourn.market;

import java.time.DayOfWeek;
import java.time.LocalDate;
import java.time.temporal.TemporalAdjusters;

/** The length of a bar, with the periods per year that it is declared to have. */
public enum BarLength {
    /** A trading day. */
    DAILY("daily", 252, 1, "day") {
        @Override
        public LocalDate periodStart(LocalDate date) {
            return date;
        }
    },
    /** An ISO week, Monday to Sunday. */
    WEEKLY("weekly", 52, 7, "week") {
        @Override
        public LocalDate periodStart(LocalDate date) {
            return date.with(TemporalAdjusters.previousOrSame(DayOfWeek.MONDAY));
        }
    },
    /** A calendar month. */
    MONTHLY("monthly", 12, 31, "month") {
        @Override
        public LocalDate periodStart(LocalDate date) {
            return date.withDayOfMonth(1);
        }
    };

    private final String word;
    private final double periodsPerYear;
    private final int longestDays;
    private final String period;

    BarLength(String word, double periodsPerYear, int longestDays, String period) {
        this.word = word;
        this.periodsPerYear = periodsPerYear;
        this.longestDays = longestDays;
        this.period = period;
    }

    /** The word of the strategy file. */
    public String word() {
        return word;
    }

    /** Periods per year, declared, never estimated. */
    public double periodsPerYear() {
        return periodsPerYear;
    }

    /** The first calendar day of the period that {@code date} lies in: two dates lie in one period exactly if this agrees. */
    public abstract LocalDate periodStart(LocalDate date);

    /** Calendar days of a bar of nominal length: 365.25 / periods per year. */
    double nominalDays() {
        return 365.25 / periodsPerYear;
    }

    /** The most calendar days that one period has. */
    int longestDays() {
        return longestDays;
    }

    /** The noun: day, week, month. */
    String period() {
        return period;
    }
}
