package sojourn.report;

import java.util.Locale;
import java.util.Map;
import java.util.stream.Collectors;
import sojourn.allocate.Blend;
import sojourn.allocate.ProbabilityKind;
import sojourn.allocate.Rule;
import sojourn.allocate.Sizing;
import sojourn.allocate.Switch;
import sojourn.allocate.Table;

/** A rule in plain English. */
final class RuleText {
    private RuleText() {}

    static String of(Rule rule) {
        String which = rule.probability() == ProbabilityKind.PREDICTED ? "predicted" : "filtered";
        String text = sentence(rule, which);
        if (rule.smooth().isPresent()) {
            text += " Probabilities are averaged over the closes so far, a close counting half as much after "
                    + rule.smooth().get().halfLife() + " bars.";
        }
        if (rule.confirm() > 1) {
            text += " A change must hold on " + rule.confirm() + " closes running.";
        }
        if (rule.stepToward() < 1) {
            text += String.format(Locale.ROOT, " Each decision goes %.0f %% of the way.", 100 * rule.stepToward());
        }
        return text;
    }

    private static String sentence(Rule rule, String which) {
        if (rule instanceof Switch one) {
            return "holds " + weights(one.in()) + "; leaves for " + weights(one.out()) + " when the " + which
                    + " probability of " + one.regime() + " is at or above " + one.leaveAbove()
                    + ", and comes back at or below "
                    + one.reEnterBelow() + ".";
        }
        if (rule instanceof Table one) {
            return "holds the mix of the most likely regime (" + which + "): " + mixes(one.weights()) + ".";
        }
        if (rule instanceof Blend one) {
            return "averages these mixes by the " + which + " probabilities: " + mixes(one.weights()) + ".";
        }
        if (rule instanceof Sizing one) {
            return SizingText.of(one);
        }
        throw new IllegalArgumentException("no words for the rule '" + rule.word() + "'");
    }

    private static String mixes(Map<String, Map<String, Double>> byRegime) {
        return byRegime.entrySet().stream()
                .map(entry -> entry.getKey() + ": " + weights(entry.getValue()))
                .collect(Collectors.joining("; "));
    }

    /** {@code 60 % stocks, 40 % bonds}; what is left of 100 % is cash. */
    static String weights(Map<String, Double> weights) {
        double rest = 1;
        StringBuilder text = new StringBuilder();
        for (Map.Entry<String, Double> one : weights.entrySet()) {
            rest -= one.getValue();
            if (one.getValue() != 0) {
                text.append(text.isEmpty() ? "" : ", ")
                        .append(share(one.getValue()))
                        .append(one.getKey());
            }
        }
        if (rest > 1e-9) {
            text.append(text.isEmpty() ? "" : ", ").append(share(rest)).append("cash");
        }
        return text.isEmpty() ? "nothing" : text.toString();
    }

    private static String share(double weight) {
        return percent(weight) + " ";
    }

    /** {@code 12.5 %}. */
    static String percent(double fraction) {
        return String.format(Locale.ROOT, "%.2f", 100 * fraction).replaceAll("\\.?0+$", "") + " %";
    }
}
