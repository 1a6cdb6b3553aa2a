package sojourn.report;

import java.time.LocalDate;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeSet;
import java.util.stream.Collectors;
import sojourn.archive.Caution;
import sojourn.archive.ComparisonRow.Judged;
import sojourn.compare.Compared;
import sojourn.compare.Judgement;
import sojourn.compare.Run;
import sojourn.measure.Measure;

/** A comparison as a terminal shows it, at most 100 columns wide: caution, risk and return, what it took, failures. */
public final class ComparisonText {
    private static final int FEW = 10;
    private static final int NAMED = 3;

    private ComparisonText() {}

    /** The whole text. */
    public static String of(Compared compared) {
        StringBuilder text = new StringBuilder();
        text.append(Lines.wrapped(Caution.TEXT, 0)).append('\n');
        if (!compared.ranked().isEmpty()) {
            text.append(headline(compared)).append('\n');
            text.append(riskAndReturn(compared)).append('\n');
            text.append(whatItTook(compared)).append('\n');
            text.append(DifferenceText.of(few(compared))).append('\n');
            text.append(YardstickText.of(few(compared)));
            text.append(others(compared));
            text.append(marked(compared));
        }
        if (compared.ranked().size() == 1) {
            text.append(VariantText.of(compared.ranked().get(0))).append('\n');
        }
        for (Run.Failed one : compared.failed()) {
            text.append(Lines.wrapped("FAILED " + one.file().slug() + ": " + one.reason(), 2));
        }
        return text.toString();
    }

    /** Those that stand in more than the first tables: the first of the ranking. */
    private static List<Judgement> few(Compared compared) {
        return compared.ranked().subList(0, Math.min(FEW, compared.ranked().size()));
    }

    private static String others(Compared compared) {
        return compared.ranked().size() <= FEW
                ? ""
                : Lines.wrapped(
                                "From 'Against buy-and-hold' on, the tables show the first " + FEW
                                        + " of the ranking; comparison.csv has the yardsticks of all.",
                                0)
                        + '\n';
    }

    private static String headline(Compared compared) {
        int variants = compared.ranked().size();
        String failed = compared.failed().isEmpty()
                ? ""
                : " (and " + compared.failed().size() + " that failed, told at the end)";
        return Lines.wrapped(
                variants + (variants == 1 ? " variant" : " variants") + failed + " over " + window(compared)
                        + ", ranked by "
                        + compared.rankBy().key().replace('_', ' ')
                        + " as declared; risk first. The interval is 95 %, robust to serial correlation; it does not know how"
                        + " many variants were tried." + latest(compared),
                0);
    }

    /** Why the window begins where it does, if others could have begun earlier. */
    private static String latest(Compared compared) {
        List<String> holding = new ArrayList<>();
        TreeSet<LocalDate> firsts = new TreeSet<>();
        for (Judgement one : compared.ranked()) {
            LocalDate first = one.run().firstFill();
            firsts.add(first);
            if (!first.isBefore(one.strategy().from())) {
                holding.add(one.run().file().slug());
            }
        }
        if (holding.isEmpty() || holding.size() == compared.ranked().size()) {
            return "";
        }
        int named = Math.min(NAMED, holding.size());
        String more = holding.size() > named ? " and " + (holding.size() - named) + " more" : "";
        return " The window begins when the last variant first trades (" + String.join(", ", holding.subList(0, named))
                + more + "); the first did on " + firsts.first() + ". Set judge: window to choose it.";
    }

    private static String window(Compared compared) {
        Set<String> dates = new LinkedHashSet<>();
        TreeSet<Integer> bars = new TreeSet<>();
        for (Judgement one : compared.ranked()) {
            dates.add(one.strategy().from() + " to " + one.strategy().to());
            bars.add(one.strategy().bars());
        }
        String count = bars.size() == 1 ? bars.first() + " bars" : bars.first() + " to " + bars.last() + " bars";
        return (dates.size() == 1 ? dates.iterator().next() : dates.size() + " different windows (see comparison.csv)")
                + ", " + count;
    }

    private static String riskAndReturn(Compared compared) {
        Grid grid =
                new Grid(List.of("", "deepest", "under", "bad bar", "vol.", "growth", "vs hold", "Sharpe", "interval"));
        int rank = 1;
        for (Judgement one : compared.ranked()) {
            grid.add(risk(rank++ + " " + named(one), one.strategy()));
        }
        buyAndHold(compared).forEach(grid::add);
        return grid.text()
                + Lines.wrapped(
                        "deepest: worst drawdown at closes; under: most bars in a row below an earlier peak; bad bar: mean loss of the"
                                + " worst 5 % of bars; vol., growth, Sharpe: per year, after costs; vs hold: growth less"
                                + " buy-and-hold's." + (compared.ranked().size() > 1 ? " Numbers are ranks." : ""),
                        0);
    }

    /** One line for all variants whose buy-and-hold reads alike; their ranks behind it if there are several lines. */
    private static List<List<String>> buyAndHold(Compared compared) {
        Map<List<String>, List<String>> owners = new LinkedHashMap<>();
        int rank = 1;
        for (Judgement one : compared.ranked()) {
            List<String> figures = risk("", one.buyAndHold());
            owners.computeIfAbsent(figures.subList(1, figures.size()), unused -> new ArrayList<>())
                    .add(Integer.toString(rank++));
        }
        List<List<String>> lines = new ArrayList<>();
        owners.forEach((figures, ranks) -> {
            List<String> line = new ArrayList<>();
            String of = owners.size() == 1 ? "" : " of " + String.join(" ", ranks);
            line.add("  buy-and-hold" + of);
            line.addAll(figures);
            lines.add(line);
        });
        return lines;
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
        Grid grid = new Grid(
                List.of("What it took, a year", "exposure", "switches", "turnover", "before costs", "cost", "growth"));
        for (Judgement one : compared.ranked()) {
            Judged own = one.strategy();
            grid.add(List.of(
                    "  " + named(one),
                    Figures.percent(own.get(Measure.AVERAGE_EXPOSURE)),
                    Figures.times(own.get(Measure.SWITCHES_PER_YEAR)),
                    Figures.times(own.get(Measure.TURNOVER_PER_YEAR)),
                    Figures.percent(own.get(Measure.GROWTH_BEFORE_COSTS_PER_YEAR)),
                    Figures.finePercent(own.get(Measure.COST_PER_YEAR)),
                    Figures.percent(own.get(Measure.GROWTH_PER_YEAR))));
        }
        return grid.text()
                + Lines.wrapped(
                        "exposure: average net weight of all assets but cash; switches: changes of the rule's state or most likely regime, 0"
                                + " for rules that have neither; turnover: half of all bought and sold, in units of"
                                + " wealth; before costs: growth of the same holdings, every trade free; cost: of trading."
                                + " Borrow fee and margin interest are costs of holding: both growths are after them, cost"
                                + " leaves them out.",
                        0);
    }

    static String named(Judgement one) {
        return one.run().file().slug() + mark(one);
    }

    /** One star marks parameters that are an external prior, two mark probabilities that were computed elsewhere. */
    private static String mark(Judgement one) {
        return switch (Compared.parameters(one.run())) {
            case FITTED -> "";
            case EXTERNAL_PRIOR -> "*";
            case COMPUTED_ELSEWHERE -> "**";
        };
    }

    /** What the marks mean, of those that stand above. */
    private static String marked(Compared compared) {
        Set<String> marks = compared.ranked().stream().map(ComparisonText::mark).collect(Collectors.toSet());
        StringBuilder text = new StringBuilder();
        if (marks.contains("*")) {
            text.append(Lines.wrapped(
                            "* its parameters are an external prior: declared in the strategy file, not fitted. If they were"
                                    + " estimated on this period, the result has seen its own future.",
                            0))
                    .append('\n');
        }
        if (marks.contains("**")) {
            text.append(Lines.wrapped(
                            "** its probabilities were computed elsewhere, and are not audited for how they were computed. What"
                                    + " is sure is that none counted before the day on which the file says it became known.",
                            0))
                    .append('\n');
        }
        return text.toString();
    }
}
