package sojourn.compare;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import sojourn.market.Finding;
import sojourn.regime.Outcome;
import sojourn.walk.FitRecord;
import sojourn.walk.RegimeTimeline;

/** What a reader of the result should know before believing it. */
public final class Warnings {
    private static final String EXTERNAL_PRIOR =
            "its parameters are declared, an external prior; if they were estimated on this"
                    + " period, the result has seen its own future";

    private Warnings() {}

    /** One sentence each; what several variants share is told once, with all their names. */
    public static List<String> of(Compared compared) {
        Map<String, List<String>> shared = new LinkedHashMap<>();
        for (Prepared one : compared.prepared()) {
            if (one instanceof Prepared.Ready ready) {
                for (Finding finding : ready.market().findings()) {
                    told(shared, finding.toString(), one);
                }
                if (one.file().strategy().regimes().fixed().isPresent()) {
                    told(shared, EXTERNAL_PRIOR, one);
                }
                if (one.file().strategy().hypothesis().isEmpty()) {
                    told(
                            shared,
                            "no hypothesis is written down; say why it should work before looking at results",
                            one);
                }
            }
        }
        List<String> warnings = new ArrayList<>();
        shared.forEach((text, names) -> warnings.add(String.join(", ", names) + ": " + text));
        compared.timelines().forEach((key, timeline) -> addFits(key, timeline, warnings));
        for (Run.Failed one : compared.failed()) {
            warnings.add(one.file().slug() + " failed: " + one.reason());
        }
        for (Judgement one : compared.ranked()) {
            for (String yardstick : one.ruinedBefore()) {
                warnings.add(one.run().file().slug() + ": " + yardstick
                        + " had nothing left when the window began and has no row");
            }
        }
        addWindows(compared, warnings);
        return warnings;
    }

    private static void told(Map<String, List<String>> shared, String text, Prepared by) {
        shared.computeIfAbsent(text, unused -> new ArrayList<>()).add(by.file().slug());
    }

    private static void addFits(String key, RegimeTimeline timeline, List<String> warnings) {
        int atTheLimit = 0;
        for (FitRecord record : timeline.fits()) {
            if (!record.fit().outcome().accepted()) {
                warnings.add("timeline " + key + ": fit " + record.number() + " on " + record.fittedOn() + " was "
                        + record.fit().outcome().word() + " and is not used: "
                        + record.fit().explanation());
            }
            atTheLimit += record.fit().outcome() == Outcome.ITERATION_LIMIT ? 1 : 0;
        }
        if (atTheLimit > 0) {
            warnings.add("timeline " + key + ": " + atTheLimit + " of "
                    + timeline.fits().size()
                    + " fits stopped at the iteration limit while the likelihood was still rising");
        }
    }

    private static void addWindows(Compared compared, List<String> warnings) {
        long windows = compared.ranked().stream()
                .map(one -> one.strategy().from() + " to " + one.strategy().to())
                .distinct()
                .count();
        if (windows > 1) {
            warnings.add("the variants are judged over " + windows
                    + " different windows; compare only rows with the same dates");
        }
    }
}
