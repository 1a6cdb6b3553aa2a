package sojourn.allocate;

import java.time.LocalDate;
import java.util.List;
import sojourn.document.Shape;
import sojourn.document.Shapes;
import sojourn.market.Known;

/**
 * The closes at which a strategy decides. The first bar of a period is known at its close; the last is not, so it is not offered.
 * The first bar of the files starts no period, because the bar before it is not known.
 */
public enum Schedule {
    /** Every bar. */
    AT_EVERY_CLOSE("at-every-close") {
        @Override
        public boolean decides(Known known) {
            return true;
        }
    },
    /** The first bar of each ISO week, which begins on Monday. */
    FIRST_OF_WEEK("first-of-week") {
        @Override
        public boolean decides(Known known) {
            return startsPeriod(known, this);
        }

        @Override
        long period(LocalDate date) {
            return Math.floorDiv(date.toEpochDay() + 3, 7L); // day 0 of the epoch was a Thursday
        }
    },
    /** The first bar of each calendar month. */
    FIRST_OF_MONTH("first-of-month") {
        @Override
        public boolean decides(Known known) {
            return startsPeriod(known, this);
        }

        @Override
        long period(LocalDate date) {
            return 12L * date.getYear() + date.getMonthValue();
        }
    };

    /** Reads the word of the strategy file. */
    public static final Shape<Schedule> SHAPE = Shapes.word(List.of(values()), Schedule::word);

    private final String word;

    Schedule(String word) {
        this.word = word;
    }

    /** The word of the strategy file. */
    public String word() {
        return word;
    }

    /** Whether the close that {@code known} ends with is one to decide at. */
    public abstract boolean decides(Known known);

    long period(LocalDate date) {
        return date.toEpochDay();
    }

    private static boolean startsPeriod(Known known, Schedule schedule) {
        int bar = known.bar();
        return bar > 0 && schedule.period(known.date(bar)) != schedule.period(known.date(bar - 1));
    }
}
