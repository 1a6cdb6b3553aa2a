package sojourn.walk;

import java.time.LocalDate;
import sojourn.market.BarLength;
import sojourn.market.Known;

/** On which bars a model is fitted again, judged from what was known at the bar's close. */
public sealed interface RefitSchedule {
    /**
     * Whether a fit is made at this close.
     *
     * @param known ends with the bar in question
     * @param observed observations present up to this bar, this bar's included
     * @param hereToo whether this bar has an observation
     * @param firstAfter how many observations the first fit wants
     */
    boolean due(Known known, int observed, boolean hereToo, int firstAfter);

    /**
     * Every so many observations from the first fit on.
     *
     * @param observations at least 1
     */
    record EveryObservations(int observations) implements RefitSchedule {
        @Override
        public boolean due(Known known, int observed, boolean hereToo, int firstAfter) {
            return hereToo && observed >= firstAfter && (observed - firstAfter) % observations == 0;
        }
    }

    /** The first bar of each new period. The file's first bar starts none. */
    enum FirstBarOf implements RefitSchedule {
        /** ISO week, Monday to Sunday. */
        WEEK {
            @Override
            LocalDate start(LocalDate date) {
                return BarLength.WEEKLY.periodStart(date);
            }
        },
        /** Calendar month. */
        MONTH {
            @Override
            LocalDate start(LocalDate date) {
                return BarLength.MONTHLY.periodStart(date);
            }
        },
        /** Calendar quarter. */
        QUARTER {
            @Override
            LocalDate start(LocalDate date) {
                return LocalDate.of(date.getYear(), date.getMonth().firstMonthOfQuarter(), 1);
            }
        };

        /** The first calendar day of the period that a date lies in. */
        abstract LocalDate start(LocalDate date);

        @Override
        public boolean due(Known known, int observed, boolean hereToo, int firstAfter) {
            int bar = known.bar();
            return bar > 0 && observed >= firstAfter && !start(known.date()).equals(start(known.date(bar - 1)));
        }
    }
}
