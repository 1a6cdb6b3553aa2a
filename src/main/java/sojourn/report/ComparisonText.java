package sojourn.report;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import sojourn.archive.Caution;
import sojourn.archive.ComparisonRow;
import sojourn.archive.ComparisonRow.Judged;
import sojourn.compare.Compared;
import sojourn.compare.Judgement;
import sojourn.compare.Run;
import sojourn.measure.Measure;
import sojourn.measure.Yardstick;

/** A comparison as a terminal shows it, at most 100 columns wide: caution, risk and return, what it took, failures. */
public final class ComparisonText {
    private static final int LONGEST_NAME = 25;

    private ComparisonText() {}

    /** The whole text. */
    public static String of(Compared compared) {
        StringBuilder text = new StringBuilder();
        text.append(Paragraph.wrapped(Caution.TEXT, 0)).append('\n');
        if (!compared.ranked().isEmpty()) {
            text.append(headline(compared)).append('\n');
            text.append(riskAndReturn(compared)).append('\n');
            text.append(whatItTook(compared)).append('\n');
        }
        for (Run.Failed one : compared.failed()) {
            text.append(Paragraph.wrapped("FAILED " + one.file().slug() + ": " + one.reason(), 2));
        }
        return text.toString();
    }

    private static String headline(Compared compared) {
        Judged first = compared.ranked().get(0).strategy();
        boolean same = compared.ranked().stream()
                .allMatch(one -> one.strategy().from().equals(first.from())
                        && one.strategy().to().equals(first.to()));
        String window = same
                ? first.from() + " to " + first.to() + ", " + first.bars() + " bars"
                : "windows differ, see the dates in comparison.csv";
        return Paragraph.wrapped(
                compared.ranked().size() + (compared.ranked().size() == 1 ? " variant" : " variants") + " over "
                        + window
                        + ", ranked by " + compared.rankBy().label().toLowerCase(Locale.ROOT)
                        + " as declared; risk first. The interval is 95 %, robust to serial correlation; it does not know how"
                        + " many variants were tried.",
                0);
    }

    private static String riskAndReturn(Compared compared) {
        Grid grid = new Grid(List.of(
                "", "worst fall", "bars under", "bad bar", "volatility", "growth", "vs hold", "Sharpe", "interval"));
        int rank = 1;
        for (Judgement one : compared.ranked()) {
            grid.add(risk(rank++ + " " + shortened(one.run().file().slug()), one.strategy()));
        }
        for (ComparisonRow row : compared.rows()) {
            if (row.kind() == ComparisonRow.Kind.YARDSTICK
                    && row.variant().startsWith(Yardstick.BUY_AND_HOLD.column())) {
                grid.add(risk(
                        shortened(row.variant().replace('_', '-')), row.judged().orElseThrow()));
            }
        }
        return grid.text()
                + Paragraph.wrapped(
                        "worst fall: deepest drawdown at closes; bars under: longest time below an earlier peak; bad bar: mean loss"
                                + " of the worst 5 % of bars; growth after costs; vs hold: growth less buy-and-hold's.",
                        0);
    }

    private static List<String> risk(String name, Judged judged) {
        return List.of(
                name,
                Figures.percent(judged.get(Measure.WORST_DRAWDOWN)),
                Figures.count(judged.get(Measure.LONGEST_UNDERWATER_BARS)),
                Figures.percent(judged.get(Measure.EXPECTED_SHORTFALL_95)),
                Figures.percent(judged.get(Measure.VOLATILITY_PER_YEAR)),
                Figures.percent(judged.get(Measure.GROWTH_PER_YEAR)),
                Figures.percent(judged.get(Measure.GROWTH_MINUS_BUY_AND_HOLD)),
                Figures.ratio(judged.get(Measure.SHARPE)),
                Figures.interval(judged.get(Measure.SHARPE_LOW), judged.get(Measure.SHARPE_HIGH)));
    }

    private static String whatItTook(Compared compared) {
        Grid grid = new Grid(List.of(
                "per year, except exposure",
                "exposure",
                "switches",
                "turnover",
                "cost",
                "growth",
                "same exp.",
                "so far",
                "Sharpe",
                "same exp.",
                "so far"));
        for (Judgement one : compared.ranked()) {
            Judged own = one.strategy();
            List<String> cells = new ArrayList<>(List.of(
                    shortened(one.run().file().slug()),
                    Figures.percent(own.get(Measure.AVERAGE_EXPOSURE)),
                    Figures.times(own.get(Measure.SWITCHES_PER_YEAR)),
                    Figures.times(own.get(Measure.TURNOVER_PER_YEAR)),
                    Figures.finePercent(own.get(Measure.COST_PER_YEAR)),
                    Figures.percent(own.get(Measure.GROWTH_PER_YEAR))));
            cells.add(of(one, Yardstick.SAME_EXPOSURE, Measure.GROWTH_PER_YEAR));
            cells.add(of(one, Yardstick.SAME_EXPOSURE_SO_FAR, Measure.GROWTH_PER_YEAR));
            cells.add(Figures.ratio(own.get(Measure.SHARPE)));
            cells.add(of(one, Yardstick.SAME_EXPOSURE, Measure.SHARPE));
            cells.add(of(one, Yardstick.SAME_EXPOSURE_SO_FAR, Measure.SHARPE));
            grid.add(cells);
        }
        return grid.text()
                + Paragraph.wrapped(
                        "same exp.: a constant mix at the strategy's average weights, same costs, known only after the fact; so far:"
                                + " at its mean weights up to each close. A claim of timing must beat these, not only buy-and-hold.",
                        0);
    }

    private static String of(Judgement one, Yardstick yardstick, Measure measure) {
        Map<String, Judged> yardsticks = one.yardsticks();
        Judged judged = yardsticks.get(yardstick.column());
        if (judged == null) {
            return Figures.NONE;
        }
        return measure == Measure.SHARPE ? Figures.ratio(judged.get(measure)) : Figures.percent(judged.get(measure));
    }

    private static String shortened(String name) {
        return name.length() <= LONGEST_NAME ? name : name.substring(0, LONGEST_NAME - 1) + "…";
    }
}
