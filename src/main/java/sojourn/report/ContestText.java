package sojourn.report;

import java.util.LinkedHashSet;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import sojourn.evidence.Calibration;
import sojourn.evidence.Duel;
import sojourn.evidence.ForecastContest;
import sojourn.evidence.RegimeFindings;
import sojourn.evidence.ScoreContest;
import sojourn.evidence.Subject;

/** How the strategy's own gauge forecasts beside others, for a terminal. */
final class ContestText {
    private ContestText() {}

    static String of(RegimeFindings found) {
        Subject subject = found.subject();
        StringBuilder text = new StringBuilder();
        text.append(RegimesText.section(
                "Does it score what is observed better than cruder models?",
                found.ofObservation().map(contest -> scores(subject, contest))));
        text.append(RegimesText.section(
                "Does it score the next return better than other gauges?",
                found.ofReturn().map(contest -> scores(subject, contest))));
        text.append(RegimesText.section(
                "Which forecasts volatility best?", found.forecasts().map(contest -> forecasts(subject, contest))));
        found.absent()
                .forEach((gauge, why) -> text.append(Lines.wrapped("Not compared: " + gauge + ", " + why + ".", 2)));
        if (!found.absent().isEmpty()) {
            text.append('\n');
        }
        return text.toString();
    }

    private static String scores(Subject subject, ScoreContest contest) {
        Grid grid = new Grid(List.of("log score, out of sample", "nats a bar", "ahead of it", "DM", "p", "GW p"));
        Set<String> grounds = new LinkedHashSet<>();
        for (ScoreContest.Row row : contest.rows()) {
            grid.add(cells("  " + row.gauge(), Figures.plain(OptionalDouble.of(row.mean()), "%.4f"), row.duel()));
            row.duel().ifPresent(duel -> grounds.add(duel.ground().words()));
        }
        return grid.text() + window(subject, contest.bars(), contest.firstBar(), contest.lastBar()) + grounds(grounds);
    }

    private static List<String> cells(String name, String mean, Optional<Duel> duel) {
        return List.of(name, mean, ahead(duel, "%+.4f"), statistic(duel), p(duel), conditional(duel));
    }

    private static String forecasts(Subject subject, ForecastContest contest) {
        Grid grid = new Grid(List.of(
                "forecast of r^2",
                "QLIKE",
                "ahead of it",
                "DM",
                "p",
                "sq. error",
                "p",
                "came/forecast",
                "slope",
                "a=0, b=1: p"));
        Set<String> grounds = new LinkedHashSet<>();
        for (ForecastContest.Row row : contest.rows()) {
            Calibration right = row.calibration();
            grid.add(List.of(
                    "  " + row.gauge(),
                    Figures.plain(OptionalDouble.of(row.qlike()), "%.4f"),
                    ahead(row.byQlike(), "%+.4f"),
                    statistic(row.byQlike()),
                    p(row.byQlike()),
                    relative(row, contest),
                    p(row.bySquaredError()),
                    Figures.plain(right.ratio().number(), "%.2f"),
                    Figures.plain(right.slope().number(), "%.2f"),
                    Figures.pValue(right.right().pValue().number())));
            row.byQlike().ifPresent(duel -> grounds.add(duel.ground().words()));
        }
        return grid.text()
                + window(subject, contest.bars(), contest.firstBar(), contest.lastBar())
                + Lines.wrapped(
                        "QLIKE: mean of ln h + r^2/h; sq. error: mean of (r^2 - h)^2 over that of the strategy's own gauge, p of the"
                                + " difference; came/forecast: mean r^2 over mean h; slope b of r^2 = a + b h.",
                        0)
                + grounds(grounds)
                + verdict(contest);
    }

    private static String relative(ForecastContest.Row row, ForecastContest contest) {
        double own = contest.rows().get(0).squaredError();
        return own > 0 ? Figures.plain(OptionalDouble.of(row.squaredError() / own), "%.3f") : Figures.NONE;
    }

    private static String verdict(ForecastContest contest) {
        String text = "Best by QLIKE: " + contest.best() + ".";
        if (contest.bestAgainstNext().isPresent()) {
            Duel duel = contest.bestAgainstNext().get();
            OptionalDouble p = duel.robust().corrected().pValue().number();
            text += " It is ahead of " + duel.second() + " by "
                    + Figures.plain(duel.robust().mean().number(), "%.4f") + " a bar (p " + Figures.pValue(p) + ")"
                    + (p.isPresent() && p.getAsDouble() < 0.05 ? "." : ", which is no more than chance would give.");
        }
        return Lines.wrapped(text, 0);
    }

    private static String window(Subject subject, int bars, int first, int last) {
        return Lines.wrapped(
                bars + " bars that all of them forecast, " + subject.date(first) + " to " + subject.date(last)
                        + ". ahead of it: how much better the strategy's own is than this one, a bar; DM: Diebold and Mariano's"
                        + " statistic, robust to serial correlation, with its p-value.",
                0);
    }

    private static String grounds(Set<String> grounds) {
        StringBuilder text = new StringBuilder();
        grounds.forEach(words -> text.append(Lines.wrapped("Mind: " + words + ".", 2)));
        return text.toString();
    }

    private static String ahead(Optional<Duel> duel, String format) {
        return duel.map(one -> Figures.plain(one.robust().mean().number(), format))
                .orElse("");
    }

    private static String statistic(Optional<Duel> duel) {
        return duel.map(one ->
                        Figures.plain(one.robust().corrected().statistic().number(), "%.2f"))
                .orElse("");
    }

    private static String p(Optional<Duel> duel) {
        return duel.map(one -> Figures.pValue(one.robust().corrected().pValue().number()))
                .orElse("");
    }

    private static String conditional(Optional<Duel> duel) {
        return duel.map(one -> Figures.pValue(one.conditional().pValue().number()))
                .orElse("");
    }
}
