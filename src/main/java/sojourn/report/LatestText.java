package sojourn.report;

import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import sojourn.allocate.Decision;
import sojourn.archive.Caution;
import sojourn.evidence.Answer;
import sojourn.latest.AssetOutlook;
import sojourn.latest.Latest;
import sojourn.latest.NextBar;
import sojourn.latest.RegimeNow;
import sojourn.latest.Standing;
import sojourn.latest.TippingReturns;
import sojourn.latest.WeightWords;
import sojourn.market.Calendar;

/** What a strategy would do now as a terminal shows it, at most 100 columns wide: the caution first, then question by question. */
public final class LatestText {
    private final StringBuilder text = new StringBuilder();
    private final Latest latest;

    private LatestText(Latest latest) {
        this.latest = latest;
    }

    /**
     * The whole text.
     *
     * @param tipping by observed asset
     * @param from where the orders start: a file's name, or empty for what the simulation holds
     */
    public static String of(Latest latest, Map<String, Answer<TippingReturns>> tipping, Optional<String> from) {
        LatestText all = new LatestText(latest);
        all.headline();
        all.regimes();
        all.outlook();
        all.decision();
        all.orders(from);
        all.text.append(TippingText.of(latest, tipping));
        return all.text.toString();
    }

    private void headline() {
        text.append(Lines.wrapped(Caution.TEXT, 0)).append('\n');
        Standing standing = latest.standing();
        String assets = String.join(", ", standing.table().assets());
        String name = latest.ready().file().strategy().name();
        StringBuilder head = new StringBuilder("As of the close of ")
                .append(standing.asOf())
                .append(common(standing) ? ", the last common bar of " : ", the last bar of ")
                .append(assets)
                .append(": '")
                .append(name)
                .append("'.");
        if (!latest.ahead().isEmpty()) {
            head.append(" Later rows wait for the other files or for the end of their period: ")
                    .append(String.join(", ", latest.ahead()))
                    .append('.');
        }
        for (String asset : standing.table().assets()) {
            if (standing.known().carried(asset, standing.bar())) {
                head.append(
                        " " + asset + " has no price of that day: its last close is carried, and orders that hold or"
                                + " trade it wait for its next price.");
            }
        }
        if (standing.strategy().regimes().fixed().isPresent()) {
            head.append(" Parameters are an external prior: declared, not fitted.");
        }
        if (standing.strategy().regimes().given().isPresent()) {
            head.append(" Probabilities were computed elsewhere and are not audited for how.");
        }
        text.append(Lines.wrapped(head.toString(), 0)).append('\n');
    }

    private static boolean common(Standing standing) {
        return standing.table().assets().size() > 1
                && standing.strategy().calendar().days() == Calendar.Days.COMMON;
    }

    private void regimes() {
        text.append("What regime is it?\n");
        if (latest.regime().isEmpty()) {
            text.append(Lines.wrapped("Undefined, because there is no accepted fit at this close.", 0))
                    .append('\n');
            return;
        }
        RegimeNow now = latest.regime().get();
        double p = now.filtered().get(now.mostLikely());
        text.append(Lines.wrapped(
                "Most likely " + now.regimes().get(now.mostLikely()) + ", " + probability(p) + ", for "
                        + (now.ageBars() == 1 ? "1 bar so far." : now.ageBars() + " bars running."),
                0));
        Grid grid = new Grid(List.of("regime", "probability now", "at the next bar"));
        for (int k = 0; k < now.regimes().size(); k++) {
            grid.add(List.of(
                    now.regimes().get(k),
                    probability(now.filtered().get(k)),
                    probability(now.predicted().get(k))));
        }
        text.append(grid.text());
        text.append(Lines.wrapped(
                        "By fit " + now.fit().number() + " of " + now.fit().fittedOn() + " on the window from "
                                + now.fit().windowStart() + "."
                                + latest.next().map(LatestText::refit).orElse(""),
                        0))
                .append('\n');
    }

    private static String refit(NextBar next) {
        return switch (next.refit()) {
            case NOT_DUE -> " No fit is due at the next bar.";
            case MADE, FROZEN -> " The next bar is one to fit at.";
        };
    }

    private static String probability(double p) {
        return String.format(Locale.ROOT, "%.4f", p);
    }

    private void outlook() {
        text.append("What is forecast of the next bar?\n");
        if (latest.outlook().isEmpty()) {
            text.append(Lines.wrapped("Undefined, because nothing is known of the regimes at this close.", 0))
                    .append('\n');
            return;
        }
        double root = Math.sqrt(latest.standing().table().barLength().periodsPerYear());
        Grid grid = new Grid(List.of("asset", "last close", "mean return", "volatility", "volatility a year"));
        for (AssetOutlook one : latest.outlook()) {
            grid.add(List.of(
                    one.asset(),
                    Amounts.price(one.close()),
                    Amounts.percent(one.mean(), 3),
                    Amounts.percent(one.volatility(), 2),
                    Figures.percent(root * one.volatility())));
        }
        text.append(grid.text()).append('\n');
    }

    private void decision() {
        text.append("What does the strategy decide?\n");
        Optional<Decision> asked = latest.decision();
        if (asked.isEmpty()) {
            String when = latest.standing().track().isPresent()
                    ? " on "
                            + latest.standing()
                                    .known()
                                    .date(latest.standing()
                                            .track()
                                            .get()
                                            .ruinedOn()
                                            .orElse(0))
                    : "";
            text.append(Lines.wrapped("Nothing any more: wealth was gone" + when + ".", 0))
                    .append('\n');
            return;
        }
        Decision decision = asked.get();
        List<String> assets = latest.standing().table().assets();
        text.append(Lines.after(
                "  ", DecisionText.of(decision, latest.standing().strategy().trade()), 2));
        decision.target()
                .or(latest.standing()::target)
                .ifPresent(target -> text.append(Lines.after(
                        "  Target    ",
                        WeightWords.of(target, assets) + (decision.target().isEmpty() ? ", decided earlier" : ""),
                        12)));
        latest.standing()
                .asked()
                .ifPresent(one -> text.append(Lines.after(
                        "  Held      ",
                        WeightWords.of(one.situation().weights(), assets)
                                + (latest.holdings().isPresent()
                                        ? " by the simulation"
                                        : latest.standing().pending().isEmpty()
                                                ? ""
                                                : " if every earlier order had filled"),
                        12)));
        text.append(Lines.after("  Because   ", decision.because().sentence() + ".", 12))
                .append('\n');
    }

    private void orders(Optional<String> from) {
        text.append(OrdersText.of(latest, from)).append('\n');
    }

    /** A number of bars in words. */
    static String bars(int bars) {
        return bars == 1 ? "the next bar" : "the bar " + bars + " bars on";
    }

    /** A probability in percent, in words. */
    static String chance(double p) {
        return p > 0 && p < 0.0005 ? "less than 0.1 %" : Figures.percent(OptionalDouble.of(p));
    }
}
