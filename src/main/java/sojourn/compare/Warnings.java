package sojourn.compare;

import java.time.LocalDate;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import sojourn.market.BarLength;
import sojourn.market.CashSource;
import sojourn.market.Finding;
import sojourn.regime.Outcome;
import sojourn.trade.Costs;
import sojourn.trade.Hindrance;
import sojourn.trade.Track;
import sojourn.trade.Undecided;
import sojourn.walk.FitRecord;
import sojourn.walk.RegimeTimeline;

/** What a reader of the result should know before believing it. */
public final class Warnings {
    private static final String EXTERNAL_PRIOR =
            "its parameters are declared, an external prior; if they were estimated on this"
                    + " period, the result has seen its own future";

    private static final String COMPUTED_ELSEWHERE =
            "its probabilities were computed elsewhere and are not audited for how they were computed: if that looked at this"
                    + " period, or the file says that they became known earlier than they did, the result has seen its own future";

    /** Cash below 0 by less than this part of wealth is a rounding error. */
    private static final double ROUNDING = 1e-9;

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
                if (one.file().strategy().regimes().given().isPresent()) {
                    told(shared, COMPUTED_ELSEWHERE, one);
                }
                if (one.file().strategy().cash() instanceof CashSource.Constant cash && cash.percentPerYear() == 0) {
                    told(
                            shared,
                            "cash earns nothing, and ratios are taken over zero; say under 'cash' what it earned",
                            one);
                }
                one.file().strategy().neverHolds().ifPresent(why -> told(shared, why, one));
                one.file().strategy().paysForEveryDrift().ifPresent(why -> told(shared, why, one));
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
            one.absent()
                    .forEach((yardstick, none) -> warnings.add(one.run().file().slug() + ": its yardstick " + yardstick
                            + " is undefined: " + none.because()));
        }
        compared.ranked().forEach(one -> addUndecided(one.run(), warnings));
        compared.ranked().forEach(one -> addHindrances(one.run(), warnings));
        addWindows(compared, warnings);
        return warnings;
    }

    private static void told(Map<String, List<String>> shared, String text, Prepared by) {
        shared.computeIfAbsent(text, unused -> new ArrayList<>()).add(by.file().slug());
    }

    private static void addFits(String key, RegimeTimeline timeline, List<String> warnings) {
        for (FitRecord record : timeline.fits()) {
            if (!record.fit().outcome().accepted()) {
                warnings.add("timeline " + key + ": fit " + record.number() + " on " + record.fittedOn() + " was "
                        + record.fit().outcome().word() + " and is not used: "
                        + record.explanation());
            }
        }
        if (!timeline.impossible().isEmpty()) {
            int count = timeline.impossible().size();
            warnings.add("timeline " + key + ": " + count + (count == 1 ? " observation was" : " observations were")
                    + " impossible by the fit in force, of density 0 in every regime, the first on "
                    + timeline.date(timeline.impossible().get(0))
                    + "; the log score is minus infinity there, its cell empty, and the probabilities are those predicted the"
                    + " close before");
        }
        FitTally tally = FitTally.of(timeline);
        List<String> doubts = new ArrayList<>();
        doubt(
                doubts,
                tally.outcomes().getOrDefault(Outcome.ITERATION_LIMIT.word(), 0),
                "stopped at the iteration limit");
        doubt(doubts, tally.withEvent("absorbing"), "have a regime that is never left");
        doubt(doubts, tally.withEvent("collapsed"), "have a regime of hardly any bars");
        doubt(doubts, tally.withEvent("duplicated"), "have two regimes that are nearly the same");
        int spiked = tally.withEvent("degenerate-starts");
        doubt(doubts, 4 * spiked >= tally.fits() ? spiked : 0, "had starts that ran into a spike");
        if (!doubts.isEmpty()) {
            warnings.add("timeline " + key + ": of " + tally.fits() + " fits " + String.join(", ", doubts)
                    + "; see timelines/" + key + ".fits.csv before trusting its regimes");
        }
    }

    private static void doubt(List<String> doubts, int count, String what) {
        if (count > 0) {
            doubts.add(count + " " + what);
        }
    }

    private static void addUndecided(Run.Traded run, List<String> warnings) {
        List<Undecided> undecided = run.track().undecided();
        if (!undecided.isEmpty()) {
            Undecided first = undecided.get(0);
            LocalDate date = run.ready().market().table().fillPrices().axis().date(first.bar());
            warnings.add(
                    run.file().slug() + ": at " + undecided.size() + " closes a decision was due and the rule had no"
                            + " weights, so nothing was ordered; the first on " + date + ": "
                            + first.because().sentence());
        }
    }

    private static void addHindrances(Run.Traded run, List<String> warnings) {
        for (Hindrance.Kind kind : Hindrance.Kind.values()) {
            List<Hindrance> met = run.track().hindrances().stream()
                    .filter(one -> one.kind() == kind)
                    .toList();
            if (!met.isEmpty()) {
                Hindrance first = met.get(0);
                warnings.add(run.file().slug() + ": on " + met.size() + " bars an asset " + kind.sentence()
                        + "; the first was " + run.track().assets().get(first.asset()) + " on "
                        + run.ready().market().table().fillPrices().axis().date(first.bar()));
            }
        }
    }

    /** Whether money or assets were borrowed for nothing, as the track shows it. */
    private static void addFreeBorrowing(Run.Traded run, List<String> warnings) {
        Track track = run.track();
        Costs costs = run.file().strategy().trade().costs();
        int owing = 0;
        int shorting = 0;
        for (int bar = track.firstBar(); bar <= track.lastBar(); bar++) {
            owing += track.cash(bar) < -ROUNDING * track.wealth(bar) ? 1 : 0;
            shorting += isShort(track, bar) ? 1 : 0;
        }
        if (owing > 0 && costs.marginPercentPerYear() == 0) {
            warnings.add(run.file().slug() + " owed cash on " + owing + (owing == 1 ? " bar" : " bars")
                    + ", and owing costs it no more than what cash earns: no margin-percent-per-year is stated");
        }
        if (shorting > 0 && costs.borrowPercentPerYear() == 0) {
            warnings.add(run.file().slug() + " was short on " + shorting + (shorting == 1 ? " bar" : " bars")
                    + ", and borrowing what it sold costs it nothing: no borrow-percent-per-year is stated");
        }
    }

    private static boolean isShort(Track track, int bar) {
        for (int asset = 0; asset < track.assets().size(); asset++) {
            if (track.units(bar, asset) < 0) {
                return true;
            }
        }
        return false;
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
        Set<BarLength> lengths = new LinkedHashSet<>();
        Set<String> cash = new LinkedHashSet<>();
        for (Judgement one : compared.ranked()) {
            lengths.add(one.run().ready().market().table().barLength());
            cash.add(one.run().ready().cashContent());
            addFreeBorrowing(one.run(), warnings);
        }
        if (lengths.size() > 1) {
            warnings.add(
                    "the variants have bars of different lengths: figures that count or measure single bars (deepest, under,"
                            + " bad bar) do not compare across them");
        }
        if (cash.size() > 1) {
            warnings.add("the variants earn differently on cash, so their Sharpe ratios are over different rates");
        }
    }
}
