package sojourn.walk;

import java.time.LocalDate;
import java.util.ArrayList;
import java.util.List;
import sojourn.market.Known;
import sojourn.market.PriceTable;

/**
 * On which closes a walk will fit, found without fitting.
 *
 * @param observations observations present in the whole history
 * @param fitDates the dates of the fits, in order
 */
public record FitPlan(int observations, List<LocalDate> fitDates) {
    /** Copies the list. */
    public FitPlan {
        fitDates = List.copyOf(fitDates);
    }

    /** The plan of a walk with these settings. */
    public static FitPlan of(PriceTable table, RegimeSettings regimes, RefitSettings refit) {
        List<LocalDate> dates = new ArrayList<>();
        int present = 0;
        for (int bar = 0; bar < table.size(); bar++) {
            Known known = table.knownAt(bar);
            boolean here = bar > 0
                    && regimes.observe().stream()
                            .anyMatch(one -> one.at(known).isPresent()); // a walk passes over the first bar
            present += here ? 1 : 0;
            if (refit.schedule().due(known, present, here, refit.firstFitAfter())) {
                dates.add(known.date());
            }
        }
        return new FitPlan(present, dates);
    }
}
