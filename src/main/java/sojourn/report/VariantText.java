package sojourn.report;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import sojourn.compare.Judgement;
import sojourn.measure.CalendarTable;
import sojourn.measure.Drawdown;
import sojourn.measure.RegimeTable;

/** What a comparison of one strategy shows besides: its worst fall, returns by regime and by year. */
final class VariantText {
    private VariantText() {}

    static String of(Judgement one) {
        return worstFall(one) + '\n' + byRegime(one) + '\n' + byYear(one);
    }

    private static String worstFall(Judgement one) {
        Optional<Drawdown.Episode> episode =
                one.strategy().scorecard().drawdown().episode();
        if (episode.isEmpty()) {
            return "Wealth never fell below an earlier peak.\n";
        }
        String recovered = episode.get()
                .recoveryDate()
                .map(date -> "recovered on " + date)
                .orElse("not recovered by the end of the window");
        return Lines.wrapped(
                "The worst fall ran from " + episode.get().peakDate() + " to "
                        + episode.get().troughDate() + ", " + episode.get().barsDown() + " bars; " + recovered + ".",
                0);
    }

    private static String byRegime(Judgement one) {
        Grid grid = new Grid(List.of("By regime", "bars", "share", "mean a bar", "deviation", "compounded"));
        for (RegimeTable.Row row : one.byRegime().rows()) {
            grid.add(List.of(
                    "  " + one.run().timeline().regimes().get(row.regime()),
                    Integer.toString(row.bars()),
                    Figures.percent(row.share()),
                    Figures.thousandths(row.mean()),
                    Figures.finePercent(row.deviation()),
                    Figures.percent(row.compounded())));
        }
        return grid.text()
                + Lines.wrapped(
                        "The strategy's returns on the bars whose regime, the most likely at the close before, was this one.",
                        0);
    }

    private static String byYear(Judgement one) {
        Map<String, CalendarTable.Period> held = new LinkedHashMap<>();
        for (CalendarTable.Period year : one.buyAndHold().scorecard().calendar().years()) {
            held.put(year.name(), year);
        }
        Grid grid = new Grid(List.of("By year", "bars", "strategy", "buy-and-hold", "difference"));
        for (CalendarTable.Period year : one.strategy().scorecard().calendar().years()) {
            double other = Optional.ofNullable(held.get(year.name()))
                    .map(CalendarTable.Period::compounded)
                    .orElseThrow(() -> new IllegalStateException("both paths share their dates"));
            String partial = year.coverage() == CalendarTable.Coverage.PARTIAL ? " (part)" : "";
            grid.add(List.of(
                    "  " + year.name() + partial,
                    String.format(Locale.ROOT, "%d", year.bars()),
                    Figures.percent(year.compounded()),
                    Figures.percent(other),
                    Figures.percent(year.compounded() - other)));
        }
        return grid.text();
    }
}
