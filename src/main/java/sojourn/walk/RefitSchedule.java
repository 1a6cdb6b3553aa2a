package sojourn.walk;

import java.time.LocalDate;
import java.time.temporal.IsoFields;
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
            int period(LocalDate date) {
                return date.get(IsoFields.WEEK_BASED_YEAR) * 53 + date.get(IsoFields.WEEK_OF_WEEK_BASED_YEAR);
            }
        },
        /** Calendar month. */
        MONTH {
            @Override
            int period(LocalDate date) {
                return date.getYear() * 12 + date.getMonthValue();
            }
        },
        /** Calendar quarter. */
        QUARTER {
            @Override
            int period(LocalDate date) {
                return date.getYear() * 4 + date.get(IsoFields.QUARTER_OF_YEAR);
            }
        };

        abstract int period(LocalDate date);

        @Override
        public boolean due(Known known, int observed, boolean hereToo, int firstAfter) {
            int bar = known.bar();
            return bar > 0 && observed >= firstAfter && period(known.date()) != period(known.date(bar - 1));
        }
    }
}
