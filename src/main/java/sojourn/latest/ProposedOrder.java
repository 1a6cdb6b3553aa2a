package sojourn.latest;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import sojourn.allocate.Decision;
import sojourn.allocate.Situation;
import sojourn.allocate.Weights;
import sojourn.document.InputException;
import sojourn.document.Problem;
import sojourn.market.AssetName;
import sojourn.market.FillPrices;
import sojourn.trade.Basket;
import sojourn.trade.Holdings;
import sojourn.trade.Order;

/**
 * An order in units and money, as it would fill at the last closes.
 *
 * @param order weights, and the bars of its decision and its fill
 * @param basket the legs, their estimated costs and what is in their way; empty if nothing would be left after its costs
 */
public record ProposedOrder(Order order, Optional<Basket> basket) {
    /** The simulation's orders that wait, one after the other, from what it holds; the one decided at this close is the last. */
    static List<ProposedOrder> simulated(Standing standing) {
        List<ProposedOrder> proposed = new ArrayList<>();
        Optional<Holdings> held = standing.track().map(track -> Holdings.of(track, standing.bar()));
        for (Order order : standing.pending()) {
            ProposedOrder next = of(held.orElseThrow(), order, standing);
            held = next.basket().isPresent()
                    ? held.map(one -> one.after(next.basket().get()))
                    : held;
            proposed.add(next);
        }
        return proposed;
    }

    /** What the rule orders at this close from {@code holdings}, remembering what it remembers; empty if it orders nothing. */
    static Optional<ProposedOrder> from(Holdings holdings, Standing standing) {
        Optional<Decision> decision = decision(holdings, standing);
        if (decision.isEmpty() || decision.get().kind() != Decision.Kind.ORDER) {
            return Optional.empty();
        }
        Weights target = decision.get().target().orElseThrow();
        int due = standing.terms().fill().dueOn(standing.bar());
        Order order = new Order(standing.bar(), due, target, decision.get().because());
        return Optional.of(of(holdings, order, standing));
    }

    /** How many bars after the last close it fills if nothing is in its way: at least 1, also for one that should have filled before. */
    public int barsToFill(Standing standing) {
        return Math.max(1, order.dueOn() - standing.bar());
    }

    private static ProposedOrder of(Holdings holdings, Order order, Standing standing) {
        return new ProposedOrder(
                order,
                Basket.of(
                        standing.table(),
                        standing.bar(),
                        holdings.quantities(),
                        holdings.cash(),
                        order,
                        standing.terms()));
    }

    /** What is decided at this close if these are held; empty if nobody is asked any more. */
    static Optional<Decision> decision(Holdings holdings, Standing standing) {
        FillPrices prices = standing.table().fillPrices();
        return standing.asked().map(asked -> {
            Situation seen = asked.situation();
            Weights held = holdings.weights(prices, standing.bar());
            Situation own = new Situation(seen.known(), seen.reading(), seen.regimes(), held, seen.barsAhead());
            return standing.policy().at(own, asked.stance());
        });
    }

    /** Holdings by name as the assets of a table stand; refuses, naming {@code file}, what is worth nothing. */
    static Holdings holdings(Map<String, Double> byName, Standing standing, String file) {
        List<Double> units = standing.table().assets().stream()
                .map(asset -> byName.getOrDefault(asset, 0.0))
                .toList();
        Holdings holdings = new Holdings(units, byName.getOrDefault(AssetName.CASH, 0.0));
        double wealth = holdings.wealth(standing.table().fillPrices(), standing.bar());
        if (!(wealth > 0)) {
            throw new InputException(new Problem(
                    file,
                    0,
                    0,
                    "at the closes of " + standing.asOf() + " these holdings are worth " + wealth + ", and weights need"
                            + " something to be shares of",
                    "give what is held, cash included"));
        }
        return holdings;
    }
}
