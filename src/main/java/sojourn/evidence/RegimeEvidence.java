package sojourn.evidence;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import java.util.TreeMap;
import java.util.function.IntConsumer;
import java.util.function.Supplier;
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

    /** Walks the rivals over the subject's prices on {@code workers}, then asks. Depends on the subject alone, not on threads. */
    public static RegimeFindings of(Subject subject, Workers workers, Progress progress) {
        List<RegimeSettings> rivals = Rivals.of(subject.regimes());
        progress.begin("other gauges", (long) rivals.size() * subject.table().size());
        List<Walked> walked = new ArrayList<>();
        try {
            for (RegimeSettings rival : rivals) {
                walked.add(walked(subject, rival, workers, progress));
            }
        } finally {
            progress.end();
        }
        return asked(subject, walked);
    }

    private static Walked walked(Subject subject, RegimeSettings rival, Workers workers, Progress progress) {
        StartRunner starts = new StartRunner() {
            @Override
            public <T> List<T> run(List<Supplier<T>> all) {
                return workers.run(all, Supplier::get);
            }
        };
        IntConsumer tell = bar -> progress.advance(1);
        RegimeTimeline timeline = Walk.forward(subject.table(), rival, subject.refit(), starts, tell);
        return new Walked(Subject.of(subject.table(), rival, subject.refit(), timeline));
    }

    /** What there is to say, the rivals being walked already. */
    static RegimeFindings asked(Subject subject, List<Walked> rivals) {
        Map<String, String> absent = new TreeMap<>();
        List<Subject> present = new ArrayList<>(List.of(subject));
        for (Walked rival : rivals) {
            rival.nothing().ifPresentOrElse(why -> absent.put(rival.gauge(), why), () -> present.add(rival.subject()));
        }
        Map<String, PerBar> moments = new LinkedHashMap<>();
        Map<String, PerBar> ofReturn = new LinkedHashMap<>();
        Map<String, PerBar> ofObservation = new LinkedHashMap<>();
        for (Subject one : present) {
            ReturnForecasts forecasts = ReturnForecasts.of(one);
            moments.put(one.gauge(), forecasts.secondMoment());
            ofReturn.put(one.gauge(), forecasts.logScore());
            PerBar scores = ofObservation(one);
            if (scores.present().length > 0) {
                ofObservation.put(one.gauge(), scores);
            }
        }
        moments.put(EXPONENTIAL, PlainVolatility.exponential(subject.returns()));
        moments.put(ROLLING, PlainVolatility.rolling(subject.returns()));
        boolean forecast = subject.timeline().firstBar().isPresent();
        Answer<ScoreContest> unheard = Answer.none("no fit was accepted");
        return new RegimeFindings(
                subject,
                FitsTold.of(subject.timeline()),
                IdentityCards.of(subject),
                Lineage.of(subject),
                forecast ? scored(subject, ofObservation) : unheard,
                forecast ? ScoreContest.of(subject, ofReturn) : unheard,
                forecast ? ForecastContest.of(subject, moments) : Answer.none("no fit was accepted"),
                PseudoResiduals.of(subject),
                Reproduction.of(subject),
                Influence.of(subject),
                moments,
                absent);
    }

    private static Answer<ScoreContest> scored(Subject subject, Map<String, PerBar> scores) {
        return scores.containsKey(subject.gauge())
                ? ScoreContest.of(subject, scores)
                : Answer.none("this gauge gives its observation no density");
    }

    private static PerBar ofObservation(Subject subject) {
        return PerBar.of(
                subject.table().size(),
                bar -> subject.timeline().firstBar().isPresent()
                                && bar >= subject.timeline().firstBar().getAsInt()
                                && bar < subject.timeline().endBar()
                        ? subject.timeline().logScore(bar)
                        : OptionalDouble.empty());
    }
}
