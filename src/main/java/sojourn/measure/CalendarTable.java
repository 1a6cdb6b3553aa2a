package sojourn.measure;

import java.time.DayOfWeek;
import java.time.LocalDate;
import java.time.Year;
import java.time.YearMonth;
import java.util.ArrayList;
import java.util.List;
import java.util.function.Function;
import sojourn.numeric.Check;

/**
 * Compounded returns by calendar month and year. A return belongs to the month of the date it ends on. The first period is whole when the
 * base date lies in an earlier one; the last when the next bar to be expected (the next weekday, the same weekday a week on, …) lies beyond it, so a
 * month that ends on a holiday counts as partial.
 */
public final class CalendarTable {
    private final List<Period> months;
    private final List<Period> years;

    /** Whether a window covers a period. */
    public enum Coverage {
        /** All of its bars lie in the window. */
        WHOLE,
        /** The window may have cut it. */
        PARTIAL
    }

    /** One month ({@code 2023-11}) or year ({@code 2023}): its bars in the window and their compounded return. */
    public record Period(String name, int bars, double compounded, Coverage coverage) {}

    private CalendarTable(List<Period> months, List<Period> years) {
        this.months = List.copyOf(months);
        this.years = List.copyOf(years);
    }

    /** Of the returns of a path. */
    public static CalendarTable of(EvaluatedPath path) {
        return of(path.dates(), path.returns(), path.periodsPerYear());
    }

    /**
     * Of returns.
     *
     * @param dates n + 1 ascending dates, the base date first
     * @param returns n simple returns. Not modified.
     * @param periodsPerYear bars per year, which says when the next bar is to be expected
     */
    public static CalendarTable of(List<LocalDate> dates, double[] returns, double periodsPerYear) {
        Check.that(dates.size() == returns.length + 1, dates.size() + " dates for " + returns.length + " returns");
        Check.above(periodsPerYear, 0, "periodsPerYear");
        return new CalendarTable(
                group(
                        dates,
                        returns,
                        periodsPerYear,
                        date -> YearMonth.from(date).toString()),
                group(dates, returns, periodsPerYear, date -> Year.from(date).toString()));
    }

    /** The months that hold a return, in order. */
    public List<Period> months() {
        return months;
    }

    /** The years that hold a return, in order. */
    public List<Period> years() {
        return years;
    }

    private static List<Period> group(
            List<LocalDate> dates, double[] returns, double periodsPerYear, Function<LocalDate, String> name) {
        List<Period> periods = new ArrayList<>();
        int start = 0;
        for (int end = 1; end <= returns.length; end++) {
            String current = name.apply(dates.get(start + 1));
            boolean last = end == returns.length;
            LocalDate next = last ? expectedAfter(dates.get(end), periodsPerYear) : dates.get(end + 1);
            boolean over = !name.apply(next).equals(current);
            if (last || over) {
                boolean begun = !name.apply(dates.get(start)).equals(current);
                periods.add(new Period(
                        current,
                        end - start,
                        compounded(returns, start, end),
                        begun && over ? Coverage.WHOLE : Coverage.PARTIAL));
                start = end;
            }
        }
        return periods;
    }

    private static double compounded(double[] returns, int start, int end) {
        double product = 1;
        for (int i = start; i < end; i++) {
            product *= 1 + returns[i];
        }
        return product - 1;
    }

    private static LocalDate expectedAfter(LocalDate date, double periodsPerYear) {
        if (periodsPerYear <= 12) {
            return date.plusMonths(Math.max(1, Math.round(12 / periodsPerYear)));
        }
        LocalDate next = date.plusDays(Math.max(1, Math.round(365.25 / periodsPerYear)));
        if (periodsPerYear > 200 && periodsPerYear < 300) {
            while (next.getDayOfWeek() == DayOfWeek.SATURDAY || next.getDayOfWeek() == DayOfWeek.SUNDAY) {
                next = next.plusDays(1);
            }
        }
        return next;
    }
}
