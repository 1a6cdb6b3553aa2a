package sojourn.report;

import sojourn.allocate.Decision;
import sojourn.trade.TradeSettings;

/** What a decision came to, as a sentence. */
final class DecisionText {
    private DecisionText() {}

    static String of(Decision decision, TradeSettings trade) {
        return switch (decision.kind()) {
            case ORDER -> "It orders new weights.";
            case KEEP ->
                trade.noTradeBand() > 0
                        ? "It leaves things as they are: every weight is within "
                                + Amounts.percent(trade.noTradeBand(), 2) + " of wealth from its target."
                        : "It leaves things as they are: what is held is what is wanted.";
            case NONE ->
                "Nothing is decided at this close (decide: " + trade.decide().word() + ").";
            case UNDEFINED -> "A decision is due and the rule finds no weights, so nothing is ordered.";
        };
    }
}
