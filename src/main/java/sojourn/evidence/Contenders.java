package sojourn.evidence;

import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.TreeMap;
import sojourn.compare.Attempt;

/** Everybody who forecast, the subject's own gauge first, and what each said; who said too little is not compared, and why is told. */
final class Contenders {
    private final WalkedRegimes subject;
    private final Map<String, PerBar> secondMoments = new LinkedHashMap<>();
    private final Map<String, PerBar> ofReturn = new LinkedHashMap<>();
    private final Map<String, PerBar> ofObservation = new LinkedHashMap<>();
    private final Map<String, String> absent = new TreeMap<>();

    private Contenders(WalkedRegimes subject) {
        this.subject = subject;
    }

    /** The subject's own gauge, its rivals, and two forecasts of volatility that know no regimes. */
    static Contenders of(WalkedRegimes subject, Map<String, Attempt<Rival>> rivals) {
        Contenders all = new Contenders(subject);
        all.enter(subject);
        int own = all.forecasts(subject.gauge());
        rivals.forEach((gauge, attempt) -> {
            attempt.result()
                    .ifPresentOrElse(rival -> all.enter(rival, own), () -> all.absent.put(gauge, attempt.reason()));
        });
        all.secondMoments.put(
                RegimeEvidence.EXPONENTIAL, plain(subject, PlainVolatility.exponential(subject.returns())));
        all.secondMoments.put(RegimeEvidence.ROLLING, plain(subject, PlainVolatility.rolling(subject.returns())));
        return all;
    }

    private static PerBar plain(WalkedRegimes subject, PerBar forecasts) {
        return PlainVolatility.knownAfter(subject.barsLate(), forecasts);
    }

    private void enter(Rival rival, int own) {
        enter(rival.subject());
        tooLittle(rival, own).ifPresent(why -> absent.put(rival.gauge(), why));
    }

    private void enter(WalkedRegimes one) {
        ReturnForecasts forecasts = ReturnForecasts.of(one);
        secondMoments.put(one.gauge(), forecasts.secondMoment());
        ofReturn.put(one.gauge(), forecasts.logScore());
        PerBar scores = PerBar.of(
                one.table().size(), bar -> one.walked(bar) ? one.timeline().logScore(bar) : OptionalDouble.empty());
        if (scores.present().length > 0) {
            ofObservation.put(one.gauge(), scores);
        }
    }

    /** The bars in common would be few, and would say little of the others. */
    private Optional<String> tooLittle(Rival rival, int own) {
        int forecast = forecasts(rival.gauge());
        return rival.nothing()
                .or(() -> impossible(rival.subject()))
                .or(() -> 2 * forecast < own
                        ? Optional.of("it forecast " + forecast + " bars of the " + own
                                + " that the strategy's own gauge did, less than half")
                        : Optional.empty());
    }

    /** A score of minus infinity would be left out of a mean that it decides. */
    private static Optional<String> impossible(WalkedRegimes one) {
        return one.timeline().impossible().stream()
                .findFirst()
                .map(bar -> "it held what came on " + one.date(bar)
                        + " for impossible, density 0 in every regime, so its mean log score is minus infinity");
    }

    private int forecasts(String gauge) {
        return CommonBars.required(secondMoments, gauge).present().length;
    }

    private boolean speechless() {
        return subject.timeline().firstBar().isEmpty();
    }

    /** Log scores of the observation. */
    Answer<ScoreContest> ofObservation() {
        if (speechless()) {
            return Answer.none("no fit was accepted");
        }
        Optional<String> impossible = impossible(subject);
        if (impossible.isPresent()) {
            return Answer.none(impossible.get());
        }
        return ofObservation.containsKey(subject.gauge())
                ? ScoreContest.of(subject, compared(ofObservation))
                : Answer.none("this gauge gives its observation no density");
    }

    /** Log scores of the next return. */
    Answer<ScoreContest> ofReturn() {
        return speechless() ? Answer.none("no fit was accepted") : ScoreContest.of(subject, compared(ofReturn));
    }

    /** Forecasts of the next squared return. */
    Answer<ForecastContest> ofSquaredReturn() {
        return speechless() ? Answer.none("no fit was accepted") : ForecastContest.of(subject, compared(secondMoments));
    }

    private Map<String, PerBar> compared(Map<String, PerBar> all) {
        Map<String, PerBar> some = new LinkedHashMap<>(all);
        some.keySet().removeAll(absent.keySet());
        return some;
    }

    /** Every forecast of the squared return, also of those who are not compared. */
    Map<String, PerBar> secondMoments() {
        return secondMoments;
    }

    /** Who is not compared, and why. */
    Map<String, String> absent() {
        return absent;
    }
}
