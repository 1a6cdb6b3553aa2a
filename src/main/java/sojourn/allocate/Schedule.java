package sojourn.allocate;

import java.util.List;
import sojourn.document.Shape;
import sojourn.document.Shapes;
import sojourn.market.BarLength;
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
            return startsPeriod(known, BarLength.WEEKLY);
        }
    },
    /** The first bar of each calendar month. */
    FIRST_OF_MONTH("first-of-month") {
        @Override
        public boolean decides(Known known) {
            return startsPeriod(known, BarLength.MONTHLY);
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

    private static boolean startsPeriod(Known known, BarLength period) {
        int bar = known.bar();
        return bar > 0 && !period.periodStart(known.date(bar)).equals(period.periodStart(known.date(bar - 1)));
    }
}
