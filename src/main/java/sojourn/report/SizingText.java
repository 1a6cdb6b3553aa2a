package sojourn.report;

import java.util.stream.Collectors;
import sojourn.allocate.Formula;
import sojourn.allocate.MeanVariance;
import sojourn.allocate.MinimumVariance;
import sojourn.allocate.ProbabilityKind;
import sojourn.allocate.Sizing;
import sojourn.allocate.VolatilityTarget;

/** A rule that works its weights out, in plain English. */
final class SizingText {
    private static final String FORECAST = "the forecast is of the first whole bar held.";

    private SizingText() {}

    static String of(Sizing rule) {
        if (rule instanceof VolatilityTarget one) {
            return volatilityTarget(one);
        }
        if (rule instanceof MinimumVariance one) {
            return "holds the mix of " + String.join(", ", one.among()) + " that adds up to "
                    + RuleText.percent(one.invested()) + " with the least forecast variance within the limits; "
                    + FORECAST;
        }
        if (rule instanceof Formula one) {
            String which = one.probability() == ProbabilityKind.PREDICTED ? "predicted" : "filtered";
            return "weights by formula, " + which + " probabilities: "
                    + one.weights().entrySet().stream()
                            .map(entry ->
                                    entry.getKey() + " = " + entry.getValue().strip())
                            .collect(Collectors.joining("; "))
                    + "; " + FORECAST;
        }
        if (rule instanceof MeanVariance one) {
            return meanVariance(one);
        }
        throw new IllegalArgumentException("no words for the rule '" + rule.word() + "'");
    }

    private static String meanVariance(MeanVariance rule) {
        String risk = rule.risk() instanceof MeanVariance.GrowthFraction kelly
                ? kelly.fraction() + " of the weights that maximise expected growth"
                : "risk aversion " + rule.risk().aversion();
        String shrunk = rule.shrinkMeans() == 0
                ? "mean returns of regimes as estimated"
                : "mean returns of regimes moved " + RuleText.percent(rule.shrinkMeans())
                        + " of the way to the window's mean";
        return "holds the mix of " + String.join(", ", rule.among())
                + " whose forecast return over cash best pays for its" + " variance within the limits: " + risk + ", "
                + shrunk + "; " + FORECAST;
    }

    private static String volatilityTarget(VolatilityTarget rule) {
        String what = rule.together() == VolatilityTarget.Together.MIX
                ? "as much of the mix " + RuleText.weights(rule.mix()) + " as makes its"
                : "of " + RuleText.weights(rule.mix()) + " as much of each asset as makes its own";
        return "holds " + what + " forecast volatility " + rule.percentPerYear() + " % a year, at most " + rule.atMost()
                + " times; " + FORECAST;
    }
}
