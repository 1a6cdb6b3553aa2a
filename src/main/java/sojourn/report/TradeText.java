package sojourn.report;

import java.time.LocalDate;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.Collectors;
import sojourn.strategy.Strategy;
import sojourn.trade.Costs;
import sojourn.trade.FillTime;
import sojourn.trade.Impact;
import sojourn.trade.Lots;
import sojourn.trade.SizeAt;
import sojourn.trade.TradeSettings;
import sojourn.walk.FitPlan;

/** How a strategy trades, and what of trading is left out, in words. */
final class TradeText {
    private TradeText() {}

    /** When it decides, when orders fill, what they cost. */
    static String of(Strategy strategy, FitPlan plan) {
        TradeSettings trade = strategy.trade();
        Optional<LocalDate> first = plan.fitDates().stream().findFirst();
        String start = first.map(date -> "decides " + trade.decide().word() + ", at the earliest on " + date
                        + " (if that fit is accepted); ")
                .orElse("never decides; ");
        String price = trade.fill() == FillTime.NEXT_OPEN ? "open" : "close";
        String fill = (trade.delay() == 0
                        ? "fills at the next " + price
                        : "fills at the " + price + " " + (1 + trade.delay()) + " bars after the decision")
                + (trade.sizeAt() == SizeAt.DECISION
                        ? ", in quantities settled at the closes of the decision"
                        : ", in quantities settled at the fill's own prices (an approximation)")
                + lots(trade.lots());
        String band = trade.noTradeBand() > 0
                ? "; leaves weights within " + trade.noTradeBand() + " of their targets alone"
                : "";
        String stay = trade.stayAtLeast() > 1 ? "; keeps a state for at least " + trade.stayAtLeast() + " bars" : "";
        return start + fill + band + stay + "; pays " + costs(trade.costs()) + "; begins with "
                + (long) trade.capital();
    }

    private static String lots(Lots lots) {
        if (lots.equals(Lots.FRACTIONS)) {
            return "";
        }
        return lots.named().isEmpty()
                ? ", in whole lots of " + lots.every()
                : ", in whole lots of "
                        + lots.named().entrySet().stream()
                                .map(one -> one.getValue() + " " + one.getKey())
                                .collect(Collectors.joining(" and "));
    }

    private static String costs(Costs costs) {
        List<String> paid = new ArrayList<>();
        paid.add(costs.commissionBps() + " bps commission and " + costs.halfSpreadBps()
                + " bps half-spread on what is traded");
        costs.spreadOfVolatility()
                .ifPresent(spread -> paid.add("a further half-spread of " + spread.share()
                        + " of the volatility of the last " + spread.bars() + " returns before the fill"));
        amount(paid, costs.minimumFee(), " a leg at least as commission");
        amount(paid, costs.fixedFee(), " a leg as fixed fee");
        amount(paid, costs.stampDutyBps(), " bps stamp duty on what is bought");
        costs.impact().ifPresent(impact -> paid.add(impact(impact)));
        amount(paid, costs.borrowPercentPerYear(), " % a year on what is held short");
        amount(paid, costs.marginPercentPerYear(), " % a year above the cash rate on negative cash");
        return String.join(", ", paid);
    }

    private static void amount(List<String> paid, double amount, String of) {
        if (amount > 0) {
            paid.add(amount + of);
        }
    }

    private static String impact(Impact impact) {
        return "impact of " + impact.coefficient() + " x the volatility of the last " + impact.volatilityBars()
                + " returns x the square root of the order's share in the value traded on the last "
                + impact.volumeBars()
                + " bars before the fill"
                + impact.participationPercent()
                        .map(percent ->
                                ", of which it trades at most " + percent + " % on one bar and carries the rest")
                        .orElse("");
    }

    /** What could move real money and is not in the figures. */
    static String leftOut(Strategy strategy) {
        Costs costs = strategy.trade().costs();
        List<String> left = new ArrayList<>();
        left.add("taxes other than stamp duty");
        leftOut(
                left,
                strategy.prices().values().stream()
                        .noneMatch(source ->
                                source.dividend().isPresent() || source.split().isPresent()),
                "dividends and splits other than those already in the price columns");
        leftOut(left, costs.impact().isEmpty(), "market impact and what an order's size does to how much of it fills");
        leftOut(left, costs.spreadOfVolatility().isEmpty(), "half-spreads that widen with volatility");
        leftOut(left, costs.minimumFee() == 0 && costs.fixedFee() == 0, "minimum and fixed fees");
        leftOut(left, costs.borrowPercentPerYear() == 0, "fees for borrowing what is held short");
        leftOut(left, costs.marginPercentPerYear() == 0, "margins on borrowed cash");
        left.add("currencies");
        left.add("delisting");
        boolean opens = strategy.trade().fill() == FillTime.NEXT_OPEN;
        boolean fractions = strategy.trade().lots().equals(Lots.FRACTIONS);
        return String.join("; ", left) + ". Trades happen at " + (opens ? "opening" : "closing") + " prices"
                + (fractions ? ", in fractional units." : ".");
    }

    private static void leftOut(List<String> left, boolean isLeft, String what) {
        if (isLeft) {
            left.add(what);
        }
    }
}
