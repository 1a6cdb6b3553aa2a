package sojourn.report;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.OptionalDouble;
import java.util.stream.Collectors;
import sojourn.evidence.Annual;
import sojourn.evidence.Drift;
import sojourn.evidence.IdentityCard;
import sojourn.evidence.Lineage;
import sojourn.evidence.LineageStep;
import sojourn.evidence.Stretch;
import sojourn.evidence.WalkedRegimes;
import sojourn.inference.Estimate;
import sojourn.inference.WeightedMoments;

/** Identity cards and lineage for a terminal. */
final class RegimeCardsText {
    private RegimeCardsText() {}

    static String of(WalkedRegimes subject, List<IdentityCard> cards) {
        Stretch last = subject.stretches().get(subject.stretches().size() - 1);
        Grid fit = new Grid(List.of("Last fit, " + last.record().fittedOn(), "share", "stay", "volatility", "mean"));
        Grid lived =
                new Grid(List.of("As lived", "share", "likely", "stay", "stays", "vol. next bar", "mean next bar"));
        for (IdentityCard card : cards) {
            fit.add(List.of(
                    "  " + card.regime(),
                    Figures.percent(card.lastFit().share()),
                    bars(card.lastFit().stay()),
                    volatility(subject, card.lastFit().returns()),
                    mean(subject, card.lastFit().returns())));
            IdentityCard.AsLived own = card.asLived();
            lived.add(List.of(
                    "  " + card.regime(),
                    Figures.percent(own.meanProbability()),
                    Figures.percent(own.mostLikely()),
                    bars(own.stay().number()),
                    Integer.toString(own.stays()),
                    volatility(subject, own.nextBar()),
                    mean(subject, own.nextBar())));
        }
        StringBuilder text = new StringBuilder(fit.text());
        text.append(Lines.wrapped(
                "share: of the window's observations, weighted by the probability given the whole window; stay: expected bars;"
                        + " volatility and mean of the simple returns of " + subject.assetName()
                        + ", a year, ± one standard error robust to serial correlation.",
                0));
        text.append('\n').append(lived.text());
        text.append(Lines.wrapped(
                "share: mean filtered probability; likely: share of closes at which it was the most likely; stay: mean bars in a row,"
                        + " stays: how often; next bar: the returns that followed, weighted by the probability forecast for them.",
                0));
        text.append('\n');
        for (IdentityCard card : cards) {
            text.append(largest(subject, card));
        }
        return text.toString();
    }

    private static String largest(WalkedRegimes subject, IdentityCard card) {
        if (card.asLived().largest().isEmpty()) {
            return Lines.wrapped("Never the most likely: " + card.regime() + ".", 2);
        }
        String bars = card.asLived().largest().stream()
                .map(bar -> Figures.percent(bar.earned()) + " on " + subject.date(bar.bar()))
                .collect(Collectors.joining(", "));
        return Lines.wrapped("Largest bars while " + card.regime() + ": " + bars + ".", 2);
    }

    private static String volatility(WalkedRegimes subject, WeightedMoments moments) {
        Annual annual = Annual.of(subject, moments);
        return withError(annual.volatility(), annual.volatilityError());
    }

    private static String mean(WalkedRegimes subject, WeightedMoments moments) {
        Annual annual = Annual.of(subject, moments);
        return withError(annual.mean(), annual.meanError());
    }

    private static String withError(Estimate value, Estimate error) {
        String text = Figures.percent(value.number());
        return error.number().isPresent() && value.number().isPresent()
                ? text
                        + String.format(
                                Locale.ROOT, " ± %.1f", 100 * error.number().getAsDouble())
                : text;
    }

    private static String bars(OptionalDouble bars) {
        return Figures.plain(bars, "%.1f");
    }

    static String of(WalkedRegimes subject, Lineage lineage) {
        List<LineageStep> compared = lineage.compared();
        if (compared.isEmpty()) {
            return Lines.wrapped("There are no two accepted fits in a row to compare.", 0);
        }
        long swaps = compared.stream().filter(step -> before(step).swapped()).count();
        long births =
                compared.stream().filter(step -> before(step).births() > 0).count();
        List<String> told = new ArrayList<>();
        told.add(swaps + " with a swap");
        told.add(births + " with a birth");
        for (String event : List.of("near-tie", "collapsed", "duplicated", "absorbing")) {
            long count = lineage.withEvent(event);
            if (count > 0) {
                told.add(count + " with the event " + event);
            }
        }
        StringBuilder text = new StringBuilder(Lines.wrapped(
                "Of " + compared.size() + " refits beside the fit before: " + String.join(", ", told) + "."
                        + moved(lineage),
                0));
        Grid grid = new Grid(
                List.of("Over all fits", "vol. first", "least", "most", "last", "stay first", "least", "most", "last"));
        double root = Math.sqrt(subject.barsPerYear());
        for (int k = 0; k < subject.timeline().regimes().size(); k++) {
            Drift drift = Drift.of(lineage, k);
            grid.add(List.of(
                    "  " + subject.timeline().regimes().get(k),
                    annual(drift.deviation().first(), root),
                    annual(drift.deviation().least(), root),
                    annual(drift.deviation().most(), root),
                    annual(drift.deviation().last(), root),
                    bars(drift.stay().first()),
                    bars(drift.stay().least()),
                    bars(drift.stay().most()),
                    bars(drift.stay().last())));
        }
        return text.append('\n').append(grid.text()).toString();
    }

    private static String moved(Lineage lineage) {
        return lineage.furthest()
                .map(step -> " A refit changed what it said of the 60 bars before it by at most "
                        + Figures.plain(before(step).moved(), "%.2f") + " of probability, on "
                        + step.record().fittedOn() + "; by more than 0.1 in "
                        + lineage.compared().stream()
                                .filter(one -> before(one).moved().orElse(0) > 0.1)
                                .count()
                        + " of " + lineage.compared().size() + ".")
                .orElse("");
    }

    private static String annual(OptionalDouble perBar, double root) {
        return perBar.isPresent() ? Figures.percent(root * perBar.getAsDouble()) : Figures.NONE;
    }

    private static LineageStep.Before before(LineageStep step) {
        return step.before().orElseThrow();
    }
}
