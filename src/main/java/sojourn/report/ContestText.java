package sojourn.report;

import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import sojourn.evidence.Calibration;
import sojourn.evidence.Duel;
import sojourn.evidence.ForecastContest;
import sojourn.evidence.Ground;
import sojourn.evidence.RegimeFindings;
import sojourn.evidence.ScoreContest;
import sojourn.evidence.WalkedRegimes;

/** How the strategy's own gauge forecasts beside others, for a terminal. */
final class ContestText {
    private static final double SIGNIFICANT = 0.05;

    private final WalkedRegimes subject;
    private final Set<Ground> grounds = new LinkedHashSet<>();

    private ContestText(WalkedRegimes subject) {
        this.subject = subject;
    }

    static String of(RegimeFindings found) {
        ContestText contests = new ContestText(found.subject());
        StringBuilder text = new StringBuilder();
        text.append(RegimesText.section(
                "Does it score what is observed better than cruder models?",
                found.ofObservation().map(contests::scores)));
        text.append(RegimesText.section(
                "Does it score the next return better than other gauges?",
                found.ofReturn().map(contests::scores)));
        text.append(RegimesText.section(
                "Which forecasts volatility best?", found.forecasts().map(contests::forecasts)));
        found.absent()
                .forEach((gauge, why) -> text.append(Lines.wrapped("Not compared: " + gauge + ", " + why + ".", 2)));
        if (!contests.grounds.isEmpty()) {
            text.append(Lines.wrapped(
                    "own ahead: by how much a bar the strategy's own gauge is better; DM, p: Diebold and Mariano's test of that,"
                            + " robust to serial correlation; a small p says that it is hardly chance."
                            + (contests.conditional() ? " GW p: Giacomini and White's." : ""),
                    0));
        }
        contests.grounds.forEach(ground -> text.append(Lines.wrapped("Mind: " + ground.words() + ".", 2)));
        return text.append('\n').toString();
    }

    /** Whether Giacomini and White's test means anything here, so that its p-value has a column. */
    private boolean conditional() {
        return subject.refit().rolling().isPresent()
                && subject.regimes().fixed().isEmpty()
                && subject.regimes().given().isEmpty();
    }

    private String scores(ScoreContest contest) {
        Grid grid = new Grid(headings("log score, nats a bar", "mean", "own ahead", "DM", "p"));
        for (ScoreContest.Row row : contest.rows()) {
            List<String> cells =
                    new ArrayList<>(List.of("  " + row.gauge(), Figures.plain(OptionalDouble.of(row.mean()), "%.4f")));
            cells.addAll(duel(row.duel()));
            grid.add(cells);
        }
        return grid.text() + window(contest.bars(), contest.firstBar(), contest.lastBar());
    }

    private String forecasts(ForecastContest contest) {
        Grid losses = new Grid(headings("loss of forecasts of r^2", "QLIKE", "own ahead", "DM", "p"));
        Grid right = new Grid(
                List.of("right on average, one for one?", "came/forecast", "slope", "a=0, b=1: p", "sq. error", "p"));
        double own = contest.rows().get(0).squaredError();
        for (ForecastContest.Row row : contest.rows()) {
            List<String> cells =
                    new ArrayList<>(List.of("  " + row.gauge(), Figures.plain(OptionalDouble.of(row.qlike()), "%.4f")));
            cells.addAll(duel(row.byQlike()));
            losses.add(cells);
            Calibration calibration = row.calibration();
            right.add(List.of(
                    "  " + row.gauge(),
                    ContestText.withError(calibration),
                    Figures.plain(calibration.slope().number(), "%.2f"),
                    Figures.pValue(calibration.right().pValue().number()),
                    own > 0 ? Figures.plain(OptionalDouble.of(row.squaredError() / own), "%.3f") : Figures.NONE,
                    row.bySquaredError().map(ContestText::p).orElse("")));
        }
        return losses.text()
                + window(contest.bars(), contest.firstBar(), contest.lastBar())
                + '\n'
                + right.text()
                + Lines.wrapped(
                        "QLIKE: mean of ln h + r^2/h, the less the better; came/forecast: mean r^2 over mean h ± one standard"
                                + " error; slope b of r^2 = a + b h; sq. error: mean of (r^2 - h)^2 over the strategy's own, p"
                                + " of the difference.",
                        0)
                + verdict(contest);
    }

    private List<String> headings(String... always) {
        List<String> headings = new ArrayList<>(List.of(always));
        if (conditional()) {
            headings.add("GW p");
        }
        return headings;
    }

    private List<String> duel(Optional<Duel> duel) {
        duel.ifPresent(one -> grounds.add(one.ground()));
        List<String> cells = new ArrayList<>();
        cells.add(duel.map(one -> Figures.plain(one.robust().mean().number(), "%+.4f"))
                .orElse(""));
        cells.add(duel.map(one ->
                        Figures.plain(one.robust().corrected().statistic().number(), "%.2f"))
                .orElse(""));
        cells.add(duel.map(ContestText::p).orElse(""));
        if (conditional()) {
            cells.add(duel.map(one -> Figures.pValue(one.conditional().pValue().number()))
                    .orElse(""));
        }
        return cells;
    }

    private static String withError(Calibration calibration) {
        return Figures.plain(calibration.ratio().number(), "%.2f") + " ± "
                + Figures.plain(calibration.ratioError().number(), "%.2f");
    }

    private String verdict(ForecastContest contest) {
        StringBuilder text =
                new StringBuilder("Best by QLIKE: ").append(contest.best()).append('.');
        contest.bestAgainstNext()
                .ifPresent(
                        duel -> text.append(" It is ahead of ")
                                .append(duel.second())
                                .append(" by ")
                                .append(Figures.plain(duel.robust().mean().number(), "%.4f"))
                                .append(" a bar")
                                .append(howSure(duel))
                                .append(
                                        " The same losses chose the two; the test takes them as named beforehand, so its p is too small."));
        for (ForecastContest.Row row : contest.rows()) {
            boolean told = contest.bestAgainstNext()
                    .map(Duel::second)
                    .filter(subject.gauge()::equals)
                    .isPresent();
            if (row.gauge().equals(contest.best()) && row.byQlike().isPresent() && !told) {
                Duel duel = row.byQlike().get();
                text.append(" The strategy's own, ")
                        .append(subject.gauge())
                        .append(", is behind it by ")
                        .append(Figures.plain(
                                OptionalDouble.of(-duel.robust().mean().number().orElseThrow()), "%.4f"))
                        .append(howSure(duel));
            }
        }
        return Lines.wrapped(text.toString(), 0);
    }

    private static String howSure(Duel duel) {
        OptionalDouble p = duel.robust().corrected().pValue().number();
        boolean sure = p.isPresent() && p.getAsDouble() < SIGNIFICANT;
        return " (p " + p(duel) + ")" + (sure ? "." : ", which may be chance.");
    }

    private static String p(Duel duel) {
        return Figures.pValue(duel.robust().corrected().pValue().number());
    }

    private String window(int bars, int first, int last) {
        return Lines.wrapped(
                "Out of sample, the " + bars + " bars that all of them forecast, " + subject.date(first) + " to "
                        + subject.date(last) + ".",
                0);
    }
}
