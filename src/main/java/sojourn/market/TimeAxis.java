package sojourn.market;

import java.time.LocalDate;
import java.time.temporal.ChronoUnit;
import java.util.List;

/** The common calendar: strictly increasing dates, one a bar, bars counted from 0. */
public final class TimeAxis {
    private final BarLength bars;
    private final LocalDate[] dates;

    private TimeAxis(BarLength bars, LocalDate[] dates) {
        this.bars = bars;
        this.dates = dates;
    }

    /** From strictly increasing dates. */
    public static TimeAxis of(BarLength bars, List<LocalDate> dates) {
        LocalDate[] copy = dates.toArray(LocalDate[]::new);
        for (int i = 1; i < copy.length; i++) {
            if (!copy[i].isAfter(copy[i - 1])) {
                throw new IllegalArgumentException("date " + copy[i] + " does not come after " + copy[i - 1]);
            }
        }
        return new TimeAxis(bars, copy);
    }

    /** Number of bars. */
    public int size() {
        return dates.length;
    }

    /** The date of a bar. */
    public LocalDate date(int bar) {
        return dates[bar];
    }

    /** The length of each bar. */
    public BarLength bars() {
        return bars;
    }

    /** Calendar days between two bars. */
    public int calendarDays(int fromBar, int toBar) {
        return (int) ChronoUnit.DAYS.between(dates[fromBar], dates[toBar]);
    }
}
