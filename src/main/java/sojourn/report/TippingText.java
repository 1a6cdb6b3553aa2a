package sojourn.report;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import sojourn.evidence.Answer;
import sojourn.latest.Latest;
import sojourn.latest.NextBar;
import sojourn.latest.TippingReturns;
import sojourn.latest.TippingReturns.Border;
import sojourn.latest.TippingReturns.Interval;
import sojourn.latest.TippingReturns.Side;

/** Which returns of the next bar would change a decision. */
final class TippingText {
    private static final int DECIMALS = 4;

    private TippingText() {}

    static String of(Latest latest, Map<String, Answer<TippingReturns>> tipping) {
        StringBuilder text = new StringBuilder("Which returns of the next bar would change that?\n");
        boolean found = false;
        for (Map.Entry<String, Answer<TippingReturns>> one : tipping.entrySet()) {
            Optional<TippingReturns> returns = one.getValue().found();
            found |= returns.isPresent();
            String told = returns.map(TippingText::returns)
                    .orElseGet(() -> Lines.after(
                            "  " + one.getKey() + ": ",
                            "undefined, because " + one.getValue().because() + ".",
                            4));
            text.append(told);
        }
        if (found) {
            latest.next().ifPresent(next -> text.append(Lines.wrapped(assumed(latest, next), 0)));
        }
        return text.toString();
    }

    private static String returns(TippingReturns returns) {
        StringBuilder text = new StringBuilder(Lines.after("  " + returns.asset() + ": ", calm(returns), 4));
        for (Border border : returns.borders()) {
            String side = border.tips() == Side.BELOW ? "below " : "above ";
            text.append(Lines.after(
                    "    " + side + Amounts.signed(border.at(), DECIMALS) + ": ",
                    border.target() + "; " + border.because() + ".",
                    6));
        }
        String chance = LatestText.chance(returns.chance());
        return text.append(Lines.after("    ", "By the forecast it tips with probability " + chance + ".", 6))
                .toString();
    }

    private static String calm(TippingReturns returns) {
        if (returns.borders().isEmpty()) {
            return returns.calm().isEmpty()
                    ? "every return from -25 % to +25 % leads to an order of other weights."
                    : "no return from -25 % to +25 % changes it.";
        }
        List<String> parts = new ArrayList<>();
        for (Interval one : returns.calm()) {
            String low = one.openBelow() ? "-25 % or less" : Amounts.signed(one.low(), DECIMALS);
            String high = one.openAbove() ? "+25 % or more" : Amounts.signed(one.high(), DECIMALS);
            parts.add("from " + low + " to " + high);
        }
        return "it stays as it is " + String.join(", and ", parts) + ".";
    }

    private static String assumed(Latest latest, NextBar next) {
        String others =
                latest.standing().table().assets().size() == 1 ? "" : " every other asset returns its forecast mean,";
        String refit = switch (next.refit()) {
            case NOT_DUE -> "";
            case MADE -> " The fit that is due then is made anew for every return tried.";
            case FROZEN -> " A fit is due then and was not made: parameters frozen.";
        };
        return "Assumed: the next bar is of " + next.date() + "," + others
                + " prices run straight from the last close to the next (so high and low are those two), and cash earns what"
                + " it earns now." + refit
                + (latest.holdings().isPresent()
                        ? " Weights are those that the simulation holds, not those of your holdings."
                        : "");
    }
}
