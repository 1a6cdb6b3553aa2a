package sojourn.report;

import java.util.List;
import java.util.Optional;
import sojourn.latest.Latest;
import sojourn.latest.ProposedOrder;
import sojourn.trade.Basket;
import sojourn.trade.Fill;
import sojourn.trade.Hindrance;
import sojourn.trade.Holdings;
import sojourn.trade.SizeAt;

/** Which orders a decision means, in units at the last closes. */
final class OrdersText {
    private OrdersText() {}

    /** {@code from} names the file of holdings; empty if they are the simulation's. */
    static String of(Latest latest, Optional<String> from) {
        StringBuilder text = new StringBuilder("Which orders are that?\n");
        text.append(Lines.wrapped("From " + source(latest, from), 0));
        if (latest.orders().isEmpty()) {
            return text.append("Nothing to trade.\n").toString();
        }
        for (ProposedOrder one : latest.orders()) {
            text.append(order(latest, one));
        }
        text.append(Lines.wrapped(
                latest.standing().strategy().trade().terms().sizeAt() == SizeAt.DECISION
                        ? "Quantities are settled at the close of the decision; values and costs are estimated at the last"
                                + " closes and settled at the prices of the fill."
                        : "Estimated at the last closes: quantities and costs are settled at the prices of the fill.",
                0));
        return text.toString();
    }

    private static String source(Latest latest, Optional<String> from) {
        Optional<Holdings> held = latest.holdings()
                .or(() -> latest.standing()
                        .track()
                        .map(track -> Holdings.of(track, latest.standing().bar())));
        if (held.isEmpty()) {
            return "nothing: no decision has been taken yet.";
        }
        StringBuilder text = new StringBuilder();
        for (int asset = 0; asset < held.get().units().size(); asset++) {
            String units = Amounts.units(held.get().units().get(asset));
            text.append(units.startsWith("+") ? units.substring(1) : units)
                    .append(' ')
                    .append(latest.standing().table().assets().get(asset))
                    .append(", ");
        }
        double wealth = held.get()
                .wealth(
                        latest.standing().table().fillPrices(),
                        latest.standing().bar());
        return text + "cash " + Amounts.money(held.get().cash()) + " ("
                + from.map(file -> "held by " + file).orElse("held by the simulation") + "), worth "
                + Amounts.money(wealth) + ".";
    }

    private static String order(Latest latest, ProposedOrder one) {
        boolean now = one.order().decidedOn() == latest.standing().bar();
        String when = now
                ? "Decided at this close"
                : "Pending, decided on "
                        + latest.standing().known().date(one.order().decidedOn());
        String head = when + ", fills at " + LatestText.bars(one.barsToFill(latest.standing())) + ":\n";
        if (one.basket().isEmpty()) {
            return head + "  it could not fill: nothing would be left after its costs.\n";
        }
        Basket basket = one.basket().get();
        if (basket.legs().isEmpty() && basket.hindrances().isEmpty()) {
            return head + "  nothing to trade, what is held is what is wanted.\n";
        }
        return head + legs(latest, basket) + hindrances(latest, basket);
    }

    private static String legs(Latest latest, Basket basket) {
        if (basket.legs().isEmpty()) {
            return "";
        }
        Grid grid = new Grid(List.of("  asset", "units", "at", "value", "weight before", "weight after"));
        for (Fill leg : basket.legs()) {
            grid.add(List.of(
                    "  " + latest.standing().table().assets().get(leg.asset()),
                    Amounts.units(leg.units()),
                    Amounts.price(leg.price()),
                    Amounts.money(leg.notional()),
                    Amounts.percent(leg.weightBefore(), 2),
                    Amounts.percent(leg.weightAfter(), 2)));
        }
        return grid.text() + "  estimated costs " + Amounts.money(basket.cost()) + "\n";
    }

    private static String hindrances(Latest latest, Basket basket) {
        StringBuilder text = new StringBuilder();
        for (Hindrance one : basket.hindrances()) {
            text.append("  if it filled at this close: ")
                    .append(latest.standing().table().assets().get(one.asset()))
                    .append(' ')
                    .append(one.kind().sentence())
                    .append('\n');
        }
        return text.toString();
    }
}
