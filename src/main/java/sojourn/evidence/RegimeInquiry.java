package sojourn.evidence;

import java.util.List;
import java.util.Optional;
import sojourn.compare.Compared;
import sojourn.compare.Comparison;
import sojourn.compare.Prepared;
import sojourn.compare.Progress;
import sojourn.compare.Workers;
import sojourn.document.InputException;
import sojourn.strategy.Strategy;
import sojourn.strategy.StrategyFile;
import sojourn.walk.RegimeTimeline;

/**
 * One strategy's regimes, questioned: walked as a comparison walks them, so that the findings belong to that comparison's digest.
 *
 * @param ready the strategy with its market
 * @param comparisonDigest of a comparison of this strategy alone
 * @param findings what was found
 */
public record RegimeInquiry(Prepared.Ready ready, String comparisonDigest, RegimeFindings findings) {
    /** Compares the strategy alone, then questions its timeline. Refuses files that cannot be read. */
    public static RegimeInquiry of(StrategyFile file, Workers workers, Progress progress) {
        Compared compared = new Comparison(workers, progress).run(List.of(file));
        if (!compared.faults().isEmpty()) {
            throw compared.faults().get(0);
        }
        Prepared prepared = compared.prepared().get(0);
        if (!(prepared instanceof Prepared.Ready ready)) {
            throw new InputException(((Prepared.Unreadable) prepared).problems());
        }
        RegimeTimeline timeline = Optional.ofNullable(compared.timelines().get(ready.timelineKey()))
                .orElseThrow(() -> new IllegalStateException("a comparison without faults walked every timeline"));
        Strategy strategy = file.strategy();
        WalkedRegimes subject =
                WalkedRegimes.of(ready.market().table(), strategy.regimes(), strategy.refit(), timeline);
        return new RegimeInquiry(ready, compared.digest(), RegimeEvidence.of(subject, workers, progress));
    }
}
