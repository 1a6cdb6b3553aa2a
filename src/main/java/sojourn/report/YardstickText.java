package sojourn.report;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.Function;
import java.util.stream.Collectors;
import sojourn.archive.ComparisonRow.Judged;
import sojourn.compare.Judgement;
import sojourn.measure.Luck;
import sojourn.measure.Measure;
import sojourn.measure.Measured;
import sojourn.measure.RandomSwitches;
import sojourn.measure.Yardstick;

/** Growth and Sharpe ratio of each variant beside its yardsticks, those that any of the variants asked for. */
final class YardstickText {
    private static final int BOTH_IN_ONE_GRID = 2;

    /** How a yardstick is headed and explained. */
    private record Column(String heading, String meaning) {}

    private static final Map<Yardstick, Column> COLUMNS = columns();

    private YardstickText() {}

    private static Map<Yardstick, Column> columns() {
        Map<Yardstick, Column> columns = new LinkedHashMap<>();
        columns.put(
                Yardstick.SAME_EXPOSURE,
                new Column(
                        "same exp.",
                        "a constant mix at the strategy's average weights, same costs, known only after the fact"));
        columns.put(Yardstick.SAME_EXPOSURE_SO_FAR, new Column("so far", "at its mean weights up to each close"));
        columns.put(
                Yardstick.SAME_VOLATILITY,
                new Column("same vol.", "buy-and-hold at the strategy's volatility, free, known only after the fact"));
        columns.put(
                Yardstick.VOLATILITY_GATE,
                new Column("gate", "the strategy's rule told its regimes by a 21-bar volatility alone, each as often"));
        columns.put(
                Yardstick.VOLATILITY_TARGET,
                new Column("target", "buy-and-hold's mix scaled by its 21-bar volatility"));
        return columns;
    }

    /** Empty if no variant asked for any but buy-and-hold. */
    static String of(List<Judgement> shown) {
        List<Yardstick> asked = COLUMNS.keySet().stream()
                .filter(one -> shown.stream().anyMatch(judged -> asks(judged, one)))
                .toList();
        StringBuilder text = new StringBuilder();
        if (!asked.isEmpty()) {
            text.append(beside(shown, asked)).append('\n');
        }
        if (shown.stream().anyMatch(one -> asks(one, Yardstick.RANDOM_SWITCHER))) {
            text.append(amongRandomSwitchers(shown)).append('\n');
        }
        return text.toString();
    }

    private static boolean asks(Judgement one, Yardstick yardstick) {
        return one.run().file().strategy().judge().against().contains(yardstick);
    }

    private static String beside(List<Judgement> shown, List<Yardstick> asked) {
        String grids = asked.size() <= BOTH_IN_ONE_GRID
                ? grid(shown, asked, "Growth and Sharpe beside", List.of(Measure.GROWTH_PER_YEAR, Measure.SHARPE))
                : grid(shown, asked, "Growth beside", List.of(Measure.GROWTH_PER_YEAR))
                        + '\n'
                        + grid(shown, asked, "Sharpe beside", List.of(Measure.SHARPE));
        String meanings = asked.stream()
                .map(YardstickText::column)
                .map(column -> column.heading() + ": " + column.meaning())
                .collect(Collectors.joining("; "));
        return grids
                + Lines.wrapped(
                        meanings + ". A claim of timing must beat " + (asked.size() == 1 ? "it" : "these")
                                + ", not only buy-and-hold.",
                        0);
    }

    private static String grid(List<Judgement> shown, List<Yardstick> asked, String title, List<Measure> measures) {
        List<String> headings = new ArrayList<>(List.of(title));
        for (Measure measure : measures) {
            headings.add(measure == Measure.SHARPE ? "Sharpe" : "growth");
            asked.forEach(one -> headings.add(column(one).heading()));
        }
        Grid grid = new Grid(headings);
        for (Judgement one : shown) {
            List<String> cells = new ArrayList<>(List.of("  " + ComparisonText.named(one)));
            for (Measure measure : measures) {
                cells.add(figure(measure, one.strategy().get(measure)));
                asked.forEach(yardstick -> cells.add(of(one, yardstick, measure)));
            }
            grid.add(cells);
        }
        return grid.text();
    }

    private static Column column(Yardstick yardstick) {
        return Optional.ofNullable(COLUMNS.get(yardstick)).orElseThrow();
    }

    /** Empty if the variant does not ask for the yardstick. */
    private static String of(Judgement one, Yardstick yardstick, Measure measure) {
        if (!asks(one, yardstick)) {
            return "";
        }
        Judged judged = one.yardsticks().get(yardstick.column());
        return judged == null ? Figures.NONE : figure(measure, judged.get(measure));
    }

    private static String figure(Measure measure, Measured measured) {
        return measure == Measure.SHARPE ? Figures.ratio(measured) : Figures.percent(measured);
    }

    private static String amongRandomSwitchers(List<Judgement> shown) {
        Grid grid = new Grid(
                List.of("Among random switchers", "growth", "5 %", "95 %", "beats", "Sharpe", "5 %", "95 %", "beats"));
        for (Judgement one : shown) {
            if (!asks(one, Yardstick.RANDOM_SWITCHER)) {
                continue;
            }
            List<String> cells = new ArrayList<>(List.of("  " + ComparisonText.named(one)));
            for (Measure measure : List.of(Measure.GROWTH_PER_YEAR, Measure.SHARPE)) {
                Optional<Luck> luck =
                        one.randomSwitches().map(RandomSwitches::figures).map(all -> all.get(measure));
                cells.add(figure(measure, one.strategy().get(measure)));
                cells.add(luck(luck, measure, Luck::low));
                cells.add(luck(luck, measure, Luck::high));
                cells.add(luck.map(Luck::worse).map(Figures::percent).orElse(Figures.NONE));
            }
            grid.add(cells);
        }
        return grid.text()
                + Lines.wrapped(
                        "Draws that do what the strategy did at random times, at its costs: the range that holds nine in ten of them, and the"
                                + " share of them that it beats. What timing there is shows here.",
                        0);
    }

    private static String luck(Optional<Luck> luck, Measure measure, Function<Luck, Measured> part) {
        return luck.map(part).map(measured -> figure(measure, measured)).orElse(Figures.NONE);
    }
}
