package sojourn.report;

import java.util.List;
import sojourn.compare.Judgement;
import sojourn.measure.Attribution;

/** Where each variant's difference to buy-and-hold comes from, a line a variant. */
final class DifferenceText {
    private DifferenceText() {}

    static String of(List<Judgement> shown) {
        Grid grid = new Grid(List.of("Against buy-and-hold, a year", "vs hold", "exposure", "timing", "cash", "costs"));
        for (Judgement one : shown) {
            Attribution parts = one.difference().perYear();
            grid.add(List.of(
                    "  " + ComparisonText.named(one),
                    Figures.finePercent(parts.difference()),
                    Figures.finePercent(parts.exposure()),
                    Figures.finePercent(parts.timing()),
                    Figures.finePercent(parts.cash()),
                    Figures.finePercent(parts.allCosts())));
        }
        return grid.text()
                + Lines.wrapped(
                        "vs hold is the sum of: exposure, what the strategy's average weights held all the time would have gained, with"
                                + " dividends, less buy-and-hold's gains; timing, what it gained by holding more or less than that average when it did;"
                                + " cash, its interest less buy-and-hold's; costs, what trading and borrowing cost it more.",
                        0);
    }
}
