package sojourn.report;

import java.util.List;
import sojourn.evidence.Influence;
import sojourn.evidence.PseudoResiduals;
import sojourn.evidence.WalkedRegimes;

/** What hangs on single bars, and which bars surprised most, for a terminal. */
final class SingleBarsText {
    private static final int SHOWN = 5;

    private SingleBarsText() {}

    static String of(WalkedRegimes subject, Influence influence) {
        List<Influence.LeftOut> decisive = influence.decisive();
        String told = Lines.wrapped(
                "Of " + influence.bars().size() + " observations, " + influence.atTheirOwnClose()
                        + " decided which regime was most likely at their own close, and " + decisive.size()
                        + " did at that or a later close before the next fit: left out, it would have been another.",
                0);
        if (decisive.isEmpty()) {
            return told;
        }
        Grid grid = new Grid(
                List.of("Most decisive", "observed", "return", "most likely", "without it", "closes", "until"));
        for (Influence.LeftOut one : decisive.subList(0, Math.min(SHOWN, decisive.size()))) {
            grid.add(List.of(
                    "  " + subject.date(one.bar()),
                    Figures.plain(subject.observed().at(one.bar()), "%.4f"),
                    Figures.percent(subject.returns().at(one.bar())),
                    subject.timeline().regimes().get(one.mostLikely()),
                    subject.timeline().regimes().get(one.without()),
                    Integer.toString(one.changed()),
                    subject.date(one.until()).toString()));
        }
        return told
                + '\n'
                + grid.text()
                + Lines.wrapped(
                        "closes: how many would have had another most likely regime; until: the last of them.", 0);
    }

    static String of(WalkedRegimes subject, PseudoResiduals residuals) {
        List<Integer> most = residuals.surprising();
        Grid grid = new Grid(List.of("", "observed", "return", "z", "once in bars"));
        for (int bar : most.subList(0, Math.min(SHOWN, most.size()))) {
            grid.add(List.of(
                    subject.date(bar).toString(),
                    Figures.plain(subject.observed().at(bar), "%.4f"),
                    Figures.percent(subject.returns().at(bar)),
                    Figures.plain(residuals.normal().at(bar), "%.2f"),
                    Figures.plain(residuals.onceIn(bar), "%.3g")));
        }
        return grid.text()
                + Lines.wrapped(
                        "once in bars: how often something so far out on either side comes, by the distribution forecast the close"
                                + " before.",
                        0);
    }
}
