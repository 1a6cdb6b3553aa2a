package sojourn.evidence;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.function.IntConsumer;
import java.util.function.Supplier;
import sojourn.compare.Attempt;
import sojourn.compare.Progress;
import sojourn.compare.Workers;
import sojourn.regime.StartRunner;
import sojourn.walk.RegimeSettings;
import sojourn.walk.RegimeTimeline;
import sojourn.walk.Walk;

/** Questions the regimes of a strategy: walks the rival gauges beside it, then asks everything there is to ask. */
public final class RegimeEvidence {
    /** Volatility that weighs squared returns less the older they are. */
    public static final String EXPONENTIAL = "ewma";
    /** Volatility of the last 21 returns. */
    public static final String ROLLING = "rolling";

    private RegimeEvidence() {}

    /**
     * Walks the rivals over the subject's prices on {@code workers}, then asks. Depends on the subject alone, not on threads. A fault
     * of the program in a rival's walk costs that rival only and is told.
     */
    public static RegimeFindings of(WalkedRegimes subject, Workers workers, Progress progress) {
        return of(subject, Rivals.of(subject.regimes()), workers, progress);
    }

    /** The same beside those rivals. */
    static RegimeFindings of(WalkedRegimes subject, List<RegimeSettings> rivals, Workers workers, Progress progress) {
        progress.begin("other gauges", (long) rivals.size() * subject.table().size());
        Map<String, Attempt<Rival>> walked = new LinkedHashMap<>();
        try {
            for (RegimeSettings rival : rivals) {
                walked.put(rival.model().word(), Attempt.at(() -> walked(subject, rival, workers, progress)));
            }
        } finally {
            progress.end();
        }
        return asked(subject, walked);
    }

    private static Rival walked(WalkedRegimes subject, RegimeSettings rival, Workers workers, Progress progress) {
        StartRunner starts = new StartRunner() {
            @Override
            public <T> List<T> run(List<Supplier<T>> all) {
                return workers.run(all, Supplier::get);
            }
        };
        IntConsumer tell = bar -> progress.advance(1);
        RegimeTimeline timeline = Walk.forward(subject.table(), rival, subject.refit(), starts, tell);
        return new Rival(WalkedRegimes.of(subject.table(), rival, subject.refit(), timeline));
    }

    /** What there is to say, the rivals being walked already. */
    static RegimeFindings asked(WalkedRegimes subject, Map<String, Attempt<Rival>> rivals) {
        Contenders contenders = Contenders.of(subject, rivals);
        List<RuntimeException> faults =
                rivals.values().stream().flatMap(one -> one.fault().stream()).toList();
        return new RegimeFindings(
                subject,
                FitsTold.of(subject.timeline()),
                IdentityCards.of(subject),
                Lineage.of(subject),
                contenders.ofObservation(),
                contenders.ofReturn(),
                contenders.ofSquaredReturn(),
                PseudoResiduals.of(subject),
                Reproduction.of(subject),
                Influence.of(subject),
                contenders.secondMoments(),
                contenders.absent(),
                faults);
    }
}
