package sojourn.report;

import java.util.Comparator;
import java.util.List;
import java.util.OptionalDouble;
import sojourn.evidence.Influence;
import sojourn.evidence.PseudoResiduals;
import sojourn.evidence.RegimeFindings;
import sojourn.evidence.Subject;

/** What hangs on single bars, and which bars surprised most, for a terminal. */
final class SingleBarsText {
    private static final int SHOWN = 5;

    private SingleBarsText() {}

    static String of(RegimeFindings found, Influence influence) {
        Subject subject = found.subject();
        List<Influence.LeftOut> decisive = influence.decisive();
        StringBuilder text = new StringBuilder(Lines.wrapped(
                "Of " + influence.bars().size() + " observations, " + influence.atTheirOwnClose()
                        + " decided which regime was most likely at their own close, and " + decisive.size()
                        + " did at that or a later close before the next fit: left out, it would have been another.",
                0));
        if (!decisive.isEmpty()) {
            Grid grid = new Grid(List.of("Most decisive", "return", "most likely", "without it", "closes", "until"));
            for (Influence.LeftOut one : decisive.subList(0, Math.min(SHOWN, decisive.size()))) {
                grid.add(List.of(
                        "  " + subject.date(one.bar()),
                        Figures.percent(subject.returns().at(one.bar())),
                        subject.timeline().regimes().get(one.mostLikely()),
                        subject.timeline().regimes().get(one.without()),
                        Integer.toString(one.changed()),
                        subject.date(one.until()).toString()));
            }
            text.append('\n').append(grid.text());
        }
        found.residuals().found().ifPresent(all -> text.append(surprises(subject, all, influence)));
        return text.toString();
    }

    private static String surprises(Subject subject, PseudoResiduals residuals, Influence influence) {
        List<Influence.LeftOut> most = influence.bars().stream()
                .filter(one -> residuals.onceIn(one.bar()).isPresent())
                .sorted(Comparator.comparingDouble((Influence.LeftOut one) ->
                                -residuals.onceIn(one.bar()).orElse(0))
                        .thenComparingInt(Influence.LeftOut::bar))
                .limit(SHOWN)
                .toList();
        Grid grid = new Grid(List.of("Most surprising", "return", "z", "once in bars", "closes decided"));
        for (Influence.LeftOut one : most) {
            OptionalDouble z = residuals.normal().at(one.bar());
            grid.add(List.of(
                    "  " + subject.date(one.bar()),
                    Figures.percent(subject.returns().at(one.bar())),
                    Figures.plain(z, "%.2f"),
                    Figures.plain(residuals.onceIn(one.bar()), "%.3g"),
                    Integer.toString(one.changed())));
        }
        return '\n'
                + grid.text()
                + Lines.wrapped(
                        "once in bars: how often something so far out on either side comes, by the distribution forecast the close"
                                + " before.",
                        0);
    }
}
