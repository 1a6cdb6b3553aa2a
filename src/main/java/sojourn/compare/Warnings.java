package sojourn.compare;

import java.util.ArrayList;
import java.util.List;
import sojourn.market.Finding;
import sojourn.walk.FitRecord;

/** What a reader of the result should know before believing it. */
public final class Warnings {
    private Warnings() {}

    /** One sentence each. */
    public static List<String> of(Compared compared) {
        List<String> warnings = new ArrayList<>();
        for (Prepared one : compared.prepared()) {
            if (one instanceof Prepared.Ready ready) {
                for (Finding finding : ready.market().findings()) {
                    String text = one.file().slug() + ": " + finding;
                    warnings.add(text);
                }
                if (one.file().strategy().regimes().fixed().isPresent()) {
                    warnings.add(one.file().slug() + ": its parameters are declared, an external prior; if they were"
                            + " estimated on this period, the result has seen its own future");
                }
            }
        }
        compared.timelines().forEach((key, timeline) -> {
            for (FitRecord record : timeline.fits()) {
                if (!record.fit().outcome().accepted()) {
                    warnings.add("timeline " + key + ": fit " + record.number() + " on " + record.fittedOn() + " was "
                            + record.fit().outcome().word() + " and is not used: "
                            + record.fit().explanation());
                }
            }
        });
        for (Run.Failed one : compared.failed()) {
            warnings.add(one.file().slug() + " failed: " + one.reason());
        }
        long windows = compared.ranked().stream()
                .map(one -> one.strategy().from() + " to " + one.strategy().to())
                .distinct()
                .count();
        if (windows > 1) {
            warnings.add("the variants are judged over " + windows
                    + " different windows; compare only rows with the same dates");
        }
        return warnings;
    }
}
