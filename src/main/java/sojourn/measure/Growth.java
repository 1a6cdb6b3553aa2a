package sojourn.measure;

import java.time.LocalDate;
import java.time.temporal.ChronoUnit;
import sojourn.numeric.Check;

/** Compound growth of wealth. All are -1 when the final wealth is 0, and undefined where no time has passed. */
public final class Growth {
    private static final double DAYS_PER_YEAR = 365.25;

    private Growth() {}

    /** W_n / W_0 - 1. {@code first} above 0, {@code last} at least 0. */
    public static Measured total(double first, double last) {
        return Measured.of(ratio(first, last) - 1);
    }

    /** Per year of the calendar: (W_n / W_0)^(365.25 / days) - 1. */
    public static Measured perYear(double first, double last, LocalDate from, LocalDate to) {
        long days = ChronoUnit.DAYS.between(from, to);
        return days < 1
                ? Measured.tooFew(0, 1)
                : Measured.of(StrictMath.pow(ratio(first, last), DAYS_PER_YEAR / days) - 1);
    }

    /** Per year of {@code periodsPerYear} bars: (W_n / W_0)^(P / n) - 1. */
    public static Measured perYear(double first, double last, int bars, double periodsPerYear) {
        return bars < 1
                ? Measured.tooFew(bars, 1)
                : Measured.of(StrictMath.pow(ratio(first, last), periodsPerYear / bars) - 1);
    }

    /** prod (1 + r) - 1 of simple returns; 0 for none. Not modified. */
    public static double compounded(double... returns) {
        double product = 1;
        for (double one : returns) {
            product *= 1 + one;
        }
        return product - 1;
    }

    private static double ratio(double first, double last) {
        return Check.atLeast(last, 0, "last wealth") / Check.above(first, 0, "first wealth");
    }
}
