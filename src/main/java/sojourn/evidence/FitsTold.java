package sojourn.evidence;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import sojourn.regime.Outcome;
import sojourn.walk.FitRecord;
import sojourn.walk.RegimeTimeline;

/**
 * How the search for each fit went.
 *
 * @param fits how many were made
 * @param outcomes how many ended in each way, by word
 * @param searched accepted fits that took more than one start
 * @param allAgreed of these, those whose starts all ended at the same likelihood
 * @param leastShare least share of starts that agreed with the one that won; 1 if nothing was searched
 * @param rivalled of these, those with a second best maximum less than 2 nats below
 * @param numbers how many accepted fits have each number of regimes, the smallest first
 * @param changes how often an accepted fit has another number than the accepted one before
 * @param refused those not accepted, a line each
 */
public record FitsTold(
        int fits,
        Map<String, Integer> outcomes,
        int searched,
        int allAgreed,
        double leastShare,
        int rivalled,
        Map<Integer, Integer> numbers,
        int changes,
        List<String> refused) {
    /** Nats between two maxima below which a window hardly decides: a factor of about 7 in likelihood. Our own mark, no source. */
    public static final double CLOSE = 2;

    /** Copies its collections, in order. */
    public FitsTold {
        outcomes = java.util.Collections.unmodifiableMap(new LinkedHashMap<>(outcomes));
        numbers = java.util.Collections.unmodifiableMap(new TreeMap<>(numbers));
        refused = List.copyOf(refused);
    }

    static FitsTold of(RegimeTimeline timeline) {
        Map<String, Integer> outcomes = new LinkedHashMap<>();
        List<String> refused = new ArrayList<>();
        int searched = 0;
        int agreed = 0;
        int rivalled = 0;
        double least = 1;
        for (FitRecord record : timeline.fits()) {
            Outcome outcome = record.fit().outcome();
            outcomes.merge(outcome.word(), 1, Integer::sum);
            if (!outcome.accepted()) {
                refused.add("fit " + record.number() + " on " + record.fittedOn() + " was " + outcome.word() + ": "
                        + record.explanation());
            } else if (record.fit().starts() > 1) {
                double share =
                        (double) record.fit().startsAgreeing() / record.fit().starts();
                searched++;
                agreed += share == 1 ? 1 : 0;
                least = Math.min(least, share);
                rivalled += record.fit()
                                .runnerUp()
                                .filter(one -> record.fit().model().isPresent() && one.gap() < CLOSE)
                                .isPresent()
                        ? 1
                        : 0;
            }
        }
        List<Integer> numbers = timeline.fits().stream()
                .filter(record -> record.fit().outcome().accepted())
                .map(record -> record.regimes().size())
                .toList();
        Map<Integer, Integer> counts = new TreeMap<>();
        numbers.forEach(number -> counts.merge(number, 1, Integer::sum));
        return new FitsTold(
                timeline.fits().size(), outcomes, searched, agreed, least, rivalled, counts, changes(numbers), refused);
    }

    private static int changes(List<Integer> numbers) {
        int changes = 0;
        for (int i = 1; i < numbers.size(); i++) {
            changes += numbers.get(i).equals(numbers.get(i - 1)) ? 0 : 1;
        }
        return changes;
    }
}
