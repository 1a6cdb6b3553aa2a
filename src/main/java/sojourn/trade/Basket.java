package sojourn.trade;

import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import sojourn.allocate.Because;
import sojourn.allocate.Weights;
import sojourn.market.FillPrices;
import sojourn.market.PriceTable;

/**
 * What it would take to come from given holdings to target weights at the closes of one bar, with every cost estimated from what was
 * known at that close: the same sums as a fill in the simulation. An estimate, because an order fills later and at other prices.
 */
public final class Basket {
    private static final Because ESTIMATED = Because.of("an estimate at the last closes");

    private final List<Fill> legs;
    private final List<Hindrance> hindrances;
    private final Quantities wanted;
    private final double cash;

    private Basket(List<Fill> legs, List<Hindrance> hindrances, Quantities wanted, double cash) {
        this.legs = List.copyOf(legs);
        this.hindrances = List.copyOf(hindrances);
        this.wanted = wanted;
        this.cash = cash;
    }

    /**
     * The basket at the closes of {@code bar}; empty if nothing would be left after its costs, or is left before.
     *
     * @param held units of each asset of the table
     * @param cash money held; negative if owed
     * @param terms of which costs and lots count
     */
    public static Optional<Basket> at(
            PriceTable table, int bar, Quantities held, double cash, Weights target, Terms terms) {
        return of(table, bar, held, cash, new Order(bar, bar, target, ESTIMATED), terms);
    }

    /** The same for an order as it waits: what its quantities were settled at, or what of it is left, counts. */
    public static Optional<Basket> of(
            PriceTable table, int bar, Quantities held, double cash, Order order, Terms terms) {
        Account account = new Account(table, terms).holding(held, cash);
        Account.Outcome outcome = account.fill(order, bar, Basket::lastClose, table.knownAt(bar));
        if (outcome == Account.Outcome.RUIN || outcome == Account.Outcome.WORTHLESS) {
            return Optional.empty();
        }
        Quantities after = outcome == Account.Outcome.PART ? account.carried().orElseThrow() : account.units();
        return Optional.of(new Basket(account.fills(), account.hindrances(), after, account.cash()));
    }

    /** Also one that is carried: an estimate has no better. */
    private static OptionalDouble lastClose(FillPrices prices, int asset, int bar) {
        return OptionalDouble.of(prices.close(asset, bar));
    }

    /** What would be traded on the first bar, leg by leg, with what it costs; no leg where nothing needs to be traded. */
    public List<Fill> legs() {
        return legs;
    }

    /** What would be in the way; if it blocks the basket, there are no legs. */
    public List<Hindrance> hindrances() {
        return hindrances;
    }

    /** Units in the end, also of legs that take more than one bar. */
    public Quantities wanted() {
        return wanted;
    }

    /** Cash after the legs and their costs. */
    public double cash() {
        return cash;
    }

    /** What all legs cost, money. */
    public double cost() {
        double cost = 0;
        for (Fill leg : legs) {
            cost += leg.charges().total();
        }
        return cost;
    }
}
