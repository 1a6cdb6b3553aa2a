package sojourn.evidence;

import java.util.List;
import java.util.Map;
import java.util.TreeMap;

/**
 * All that was found of one strategy's regimes.
 *
 * @param subject what was questioned
 * @param fits how the fits went
 * @param cards who the regimes are
 * @param lineage whether they are the same from fit to fit
 * @param ofObservation log scores of the observation, each gauge by its own distribution
 * @param ofReturn log scores of the asset's next return, on equal ground
 * @param forecasts of the next squared return
 * @param residuals how the observations lay in the distributions forecast for them
 * @param reproduction whether the last fit reproduces fat tails and clustering
 * @param influence what hangs on single bars
 * @param secondMoments the forecasts themselves, by gauge, also of those that could not be compared
 * @param absent gauges that could not be compared, and why
 * @param faults of the program, each of which cost one of those
 */
public record RegimeFindings(
        WalkedRegimes subject,
        FitsTold fits,
        Answer<List<IdentityCard>> cards,
        Answer<Lineage> lineage,
        Answer<ScoreContest> ofObservation,
        Answer<ScoreContest> ofReturn,
        Answer<ForecastContest> forecasts,
        Answer<PseudoResiduals> residuals,
        Answer<Reproduction> reproduction,
        Answer<Influence> influence,
        Map<String, PerBar> secondMoments,
        Map<String, String> absent,
        List<RuntimeException> faults) {
    /** Copies its collections, in order. */
    public RegimeFindings {
        secondMoments = java.util.Collections.unmodifiableMap(new java.util.LinkedHashMap<>(secondMoments));
        faults = List.copyOf(faults);
        absent = java.util.Collections.unmodifiableMap(new TreeMap<>(absent));
    }
}
