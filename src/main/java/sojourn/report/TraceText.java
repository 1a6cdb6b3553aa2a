package sojourn.report;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import sojourn.allocate.Rule;
import sojourn.allocate.Stance;
import sojourn.allocate.Weights;
import sojourn.archive.Caution;
import sojourn.latest.Asked;
import sojourn.latest.FilterStep;
import sojourn.latest.Standing;
import sojourn.latest.Trace;
import sojourn.latest.WeightWords;
import sojourn.market.QuotedBar;
import sojourn.numeric.ShortestDecimal;
import sojourn.walk.Forecast;
import sojourn.walk.Observation;

/** One bar with every number behind it, as a terminal shows it; numbers in full, so that they can be put into a calculator. */
public final class TraceText {
    private static final int INDENT = 18;

    private final StringBuilder text = new StringBuilder();
    private final Trace trace;
    private final Standing standing;

    private TraceText(Trace trace) {
        this.trace = trace;
        this.standing = trace.standing();
    }

    /** The whole text. */
    public static String of(Trace trace) {
        TraceText all = new TraceText(trace);
        all.headline();
        all.seen();
        all.probability();
        all.parameters();
        all.decision();
        return all.text + TraceMoneyText.of(trace);
    }

    private void headline() {
        text.append(Lines.wrapped(Caution.TEXT, 0)).append('\n');
        text.append(Lines.wrapped(
                        "The close of " + standing.asOf() + ", bar " + (standing.bar() + 1) + ": '"
                                + standing.strategy().name() + "'.",
                        0))
                .append('\n');
    }

    private void seen() {
        text.append("What was seen?\n");
        List<Observation> observe = standing.strategy().regimes().observe();
        for (int i = 0; i < observe.size(); i++) {
            OptionalDouble value = standing.bar() == 0
                    ? OptionalDouble.empty()
                    : observe.get(i).at(standing.known());
            line(observe.get(i).inWords().replace('-', ' '), value.isPresent() ? full(value.getAsDouble()) : "missing");
        }
        List<String> assets = standing.table().assets();
        for (int asset = 0; asset < assets.size() && standing.bar() > 0; asset++) {
            line(assets.get(asset) + " close", closes(asset));
        }
        text.append('\n');
    }

    /** As quoted; where the file has dividends or splits, also these and the return that is taken of all of them. */
    private String closes(int asset) {
        QuotedBar now = QuotedBar.of(standing.table(), asset, standing.bar());
        double before =
                QuotedBar.of(standing.table(), asset, standing.bar() - 1).close();
        StringBuilder words = new StringBuilder(full(now.close()) + ", the bar before " + full(before));
        now.dividend().ifPresent(money -> words.append(", dividend ").append(full(money)));
        now.split().ifPresent(ratio -> words.append(", split ").append(full(ratio)));
        if (now.dividend().isPresent() || now.split().isPresent()) {
            words.append("; return ").append(full(now.simpleReturn(before)));
            words.append(" = split × (close + dividend) / close before − 1");
        }
        return words.toString();
    }

    private void probability() {
        text.append("How probable was each regime?\n");
        if (trace.step().isEmpty()) {
            text.append("Undefined, because there is no accepted fit at this close.\n\n");
            return;
        }
        FilterStep step = trace.step().get();
        boolean densities = !step.logDensities().isEmpty();
        for (int k = 0; k < step.regimes().size(); k++) {
            List<String> parts = new ArrayList<>();
            if (!step.prior().isEmpty()) {
                parts.add("prior " + full(step.prior().get(k)));
            }
            parts.add("predicted " + full(step.predicted().get(k)));
            if (densities) {
                parts.add("ln density " + full(step.logDensities().get(k)));
                parts.add("density " + full(StrictMath.exp(step.logDensities().get(k))));
            }
            parts.add("posterior " + full(step.posterior().get(k)));
            line(step.regimes().get(k), String.join(", ", parts));
        }
        text.append(Lines.wrapped(explanation(step), 0)).append('\n');
    }

    private String explanation(FilterStep step) {
        String prior = step.prior().isEmpty()
                ? "The window begins at this bar: predicted is the initial distribution."
                : "Predicted is prior times the transition matrix below.";
        String posterior;
        if (!step.logDensities().isEmpty()) {
            posterior = " Posterior is predicted times density, divided by the sum of these over the regimes.";
        } else if (step.observed().stream().allMatch(OptionalDouble::isEmpty)) {
            posterior = " Nothing was observed: posterior is what was predicted.";
        } else {
            posterior = " This gauge has no densities: posterior is what it reads off its parameters below.";
        }
        String refit = standing.asOf().toString().equals(trace.parameters().get("fitted_on"))
                ? " The fit was made at this very close: its filter ran through the window anew, so that the prior is by its"
                        + " parameters and not what was published the close before."
                : "";
        return prior + posterior + refit;
    }

    private void parameters() {
        text.append("By which parameters?\n");
        if (trace.parameters().isEmpty()) {
            text.append("Undefined, because there is no accepted fit at this close.\n\n");
            return;
        }
        for (Map.Entry<String, String> one : trace.parameters().entrySet()) {
            line(one.getKey(), one.getValue());
        }
        standing.asked()
                .flatMap(asked -> asked.situation()
                        .reading()
                        .map(reading -> reading.forecast(asked.situation().barsAhead())))
                .ifPresent(this::forecast);
        text.append('\n');
    }

    private void forecast(Forecast forecast) {
        int ahead = standing.asked().orElseThrow().situation().barsAhead();
        List<String> assets = standing.table().assets();
        for (int asset = 0; asset < assets.size(); asset++) {
            line(
                    "forecast of " + assets.get(asset),
                    "mean " + full(forecast.mean(asset)) + ", volatility " + full(forecast.volatility(asset)) + ", "
                            + ahead + (ahead == 1 ? " bar ahead" : " bars ahead, the first whole bar held"));
        }
    }

    private void decision() {
        text.append("What did the rule make of it?\n");
        if (standing.asked().isEmpty()) {
            text.append("Nothing: wealth was gone.\n\n");
            return;
        }
        Asked asked = standing.asked().get();
        List<String> assets = standing.table().assets();
        line("rule", RuleText.of(standing.strategy().rule()));
        line("held", WeightWords.of(asked.situation().weights(), assets) + ", as if every pending order had filled");
        line("stance before", stance(asked.stance()));
        line("stance after", stance(asked.decision().next()));
        line("decision", DecisionText.of(asked.decision(), standing.strategy().trade()));
        asked.decision().target().ifPresent(target -> line("target", exact(target, assets)));
        line("because", asked.decision().because().sentence());
        text.append('\n');
    }

    static String exact(Weights weights, List<String> assets) {
        List<String> parts = new ArrayList<>();
        for (int asset = 0; asset < assets.size(); asset++) {
            parts.add(assets.get(asset) + " " + full(weights.at(asset)));
        }
        return String.join(", ", parts) + ", cash " + full(weights.cash());
    }

    private String stance(Stance stance) {
        if (stance.undecided() && stance.lived() == Stance.NONE) {
            return "nothing seen, nothing decided";
        }
        List<String> parts = new ArrayList<>();
        if (standing.strategy().rule().motion() == Rule.Motion.STATES) {
            parts.add("lived " + state(stance.lived()));
            parts.add("decided " + state(stance.decided()));
            if (stance.run() > 0 && stance.candidate() != Stance.NONE) {
                parts.add(stance.run() + " closes running for " + state(stance.candidate()));
            }
            if (stance.switchedOn() != Stance.NONE) {
                parts.add("last switched on " + standing.known().date(stance.switchedOn()));
            }
        }
        stance.wanted()
                .ifPresent(wanted ->
                        parts.add("wants " + exact(wanted, standing.table().assets())));
        stance.trailing().ifPresent(trailing -> parts.add("trailing probabilities " + trailing));
        return parts.isEmpty() ? "nothing decided" : String.join("; ", parts);
    }

    private String state(int state) {
        return state == Stance.NONE
                ? "nothing yet"
                : standing.strategy()
                        .rule()
                        .state(state, standing.strategy().regimes().states());
    }

    static String full(double value) {
        return ShortestDecimal.of(value);
    }

    private void line(String label, String content) {
        text.append(entry(label, content));
    }

    /** A line of a label and what stands under it, wrapped beside it. */
    static String entry(String label, String content) {
        String head = "  " + label + " ".repeat(Math.max(1, INDENT - 2 - label.length()));
        return Lines.after(head, content, INDENT);
    }
}
