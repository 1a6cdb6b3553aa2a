package sojourn.report;

import sojourn.allocate.Sizing;
import sojourn.allocate.VolatilityTarget;

/** A rule that works its weights out, in plain English. */
final class SizingText {
    private SizingText() {}

    static String of(Sizing rule) {
        if (rule instanceof VolatilityTarget one) {
            return volatilityTarget(one);
        }
        throw new IllegalArgumentException("no words for the rule '" + rule.word() + "'");
    }

    private static String volatilityTarget(VolatilityTarget rule) {
        String what = rule.together() == VolatilityTarget.Together.MIX
                ? "as much of the mix " + RuleText.weights(rule.mix()) + " as makes its"
                : "of " + RuleText.weights(rule.mix()) + " as much of each asset as makes its own";
        return "holds " + what + " forecast volatility " + rule.percentPerYear() + " % a year, at most " + rule.atMost()
                + " times; the forecast is of the first whole bar held.";
    }
}
