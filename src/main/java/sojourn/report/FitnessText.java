package sojourn.report;

import java.util.List;
import sojourn.evidence.PseudoResiduals;
import sojourn.evidence.Reproduction;
import sojourn.inference.TestResult;

/** Whether a model's distributions are right, for a terminal. */
final class FitnessText {
    private static final List<Integer> SHOWN_LAGS = List.of(0, 1, 5, 20);

    private FitnessText() {}

    static String of(PseudoResiduals residuals) {
        Grid grid = new Grid(List.of("pseudo-residuals z, out of sample", "statistic", "p"));
        add(grid, "  z is normal (Jarque and Bera)", residuals.jarqueBera(), "%.1f");
        add(grid, "  z has no memory (Ljung and Box)", residuals.ljungBox(), "%.1f");
        add(grid, "  z^2 has no memory (Ljung and Box)", residuals.ljungBoxOfSquares(), "%.1f");
        add(grid, "  u is uniform (Kolmogorov and Smirnov)", residuals.kolmogorovSmirnov(), "%.4f");
        return grid.text()
                + Lines.wrapped(
                        residuals.count()
                                + " observations, each placed in the distribution forecast for it the close before; "
                                + PseudoResiduals.LAGS + " lags; " + residuals.clipped()
                                + " clipped. A small p speaks against the line; all are approximate, for parameters were"
                                + " estimated.",
                        0);
    }

    private static void add(Grid grid, String name, TestResult test, String format) {
        grid.add(List.of(
                name,
                Figures.plain(test.statistic().number(), format),
                Figures.pValue(test.pValue().number())));
    }

    static String of(Reproduction reproduction) {
        Grid grid = new Grid(List.of("Last fit's window", "sample", "model", "95 % of series drawn", "reproduced"));
        for (Reproduction.Figure figure : reproduction.figures()) {
            if (SHOWN_LAGS.contains(figure.lag())) {
                grid.add(List.of(
                        "  " + figure.what().words() + (figure.lag() == 0 ? "" : ", lag " + figure.lag()),
                        Figures.plain(figure.sample().number(), "%.3f"),
                        Figures.plain(figure.implied().number(), "%.3f"),
                        Figures.plain(figure.low().number(), "%.3f") + " to "
                                + Figures.plain(figure.high().number(), "%.3f"),
                        figure.reproduced().map(yes -> yes ? "yes" : "no").orElse(Figures.NONE)));
            }
        }
        return grid.text()
                + Lines.wrapped(
                        "A normal has kurtosis 3; an independent mixture has autocorrelations of 0. model: its own long run; drawn: "
                                + Reproduction.DRAWN + " series of " + reproduction.observations()
                                + " observations from it, which is what the sample is held to.",
                        0);
    }
}
