package sojourn.compare;

import java.util.LinkedHashMap;
import java.util.Map;
import java.util.TreeMap;
import sojourn.regime.Outcome;
import sojourn.walk.FitRecord;
import sojourn.walk.RegimeTimeline;

/**
 * How the fits of a timeline went.
 *
 * @param fits how many were made
 * @param outcomes how many ended in each way, by word
 * @param events in how many fits each kind of event was seen, by the event's first word
 */
record FitTally(int fits, Map<String, Integer> outcomes, Map<String, Integer> events) {
    static FitTally of(RegimeTimeline timeline) {
        Map<String, Integer> outcomes = new LinkedHashMap<>();
        Map<String, Integer> events = new TreeMap<>();
        for (Outcome outcome : Outcome.values()) {
            int count = 0;
            for (FitRecord record : timeline.fits()) {
                count += record.fit().outcome() == outcome ? 1 : 0;
            }
            if (count > 0) {
                outcomes.put(outcome.word(), count);
            }
        }
        for (FitRecord record : timeline.fits()) {
            record.events().stream()
                    .map(event -> event.split(" ", 2)[0])
                    .distinct()
                    .forEach(word -> events.merge(word, 1, Integer::sum));
        }
        return new FitTally(timeline.fits().size(), outcomes, events);
    }

    int withEvent(String word) {
        return events.getOrDefault(word, 0);
    }
}
