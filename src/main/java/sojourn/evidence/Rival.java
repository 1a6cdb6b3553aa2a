package sojourn.evidence;

import java.util.Optional;
import sojourn.walk.RegimeTimeline;

/**
 * A gauge beside the strategy's own, walked over the same prices and fitted on the same schedule,
 * which counts what each observes.
 *
 * @param subject its settings and what was known by it
 */
record Rival(WalkedRegimes subject) {
    /** Its word. */
    String gauge() {
        return subject.gauge();
    }

    /** Why it forecast nothing; empty if it did. */
    Optional<String> nothing() {
        RegimeTimeline timeline = subject.timeline();
        if (timeline.firstBar().isPresent()) {
            return Optional.empty();
        }
        return Optional.of(
                timeline.fits().isEmpty()
                        ? "no fit was due"
                        : "none of its " + timeline.fits().size() + " fits was accepted; the last was "
                                + timeline.fits()
                                        .get(timeline.fits().size() - 1)
                                        .fit()
                                        .outcome()
                                        .word());
    }
}
