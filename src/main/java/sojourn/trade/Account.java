package sojourn.trade;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import sojourn.allocate.Because;
import sojourn.allocate.Weights;
import sojourn.market.FillPrices;
import sojourn.market.Known;
import sojourn.market.PriceTable;

/** Cash and units during one simulation, and what moved on the bar at hand. */
final class Account {
    private static final Because RUINED = Because.of("ruin: wealth is gone, positions are closed at the mark");

    private final FillPrices prices;
    private final Costs costs;
    private final Accruals accruals;
    private final Tariff tariff;
    private final Rebalance rebalance;
    private final Restraint restraint;
    private final double[] units;
    private final double[] price;
    private final double[] value;
    private final double[] bought;
    private final double[] lots;
    private final boolean whole;
    private final List<Fill> fills = new ArrayList<>();
    private final List<Hindrance> hindrances = new ArrayList<>();
    private Optional<Quantities> carried = Optional.empty();
    private double cash;
    private double interest;
    private double cost;
    private double turnover;
    private double writtenOff;

    Account(PriceTable table, Terms terms) {
        int assets = table.assets().size();
        this.prices = table.fillPrices();
        this.costs = terms.costs();
        this.accruals = new Accruals(prices, costs);
        this.cash = terms.capital();
        this.units = new double[assets];
        this.price = new double[assets];
        this.value = new double[assets];
        this.bought = new double[assets];
        this.tariff = Tariff.of(costs, assets);
        this.rebalance = new Rebalance(tariff);
        this.lots = terms.lots().of(table.assets());
        this.restraint = new Restraint(tariff, lots);
        this.whole = Arrays.stream(lots).anyMatch(lot -> lot > 0);
    }

    /** The same account with something in it. */
    Account holding(Quantities quantities, double money) {
        for (int i = 0; i < units.length; i++) {
            units[i] = quantities.at(i);
        }
        cash = money;
        return this;
    }

    /** Begins a bar: interest on the cash of the close before, then what else holding brings and costs. */
    void accrue(int bar) {
        double before = cash;
        interest = before * prices.cashReturn(bar);
        cash += interest;
        cash += accruals.on(bar, before, units);
        cost = 0;
        turnover = 0;
    }

    /** Begins a bar on which nothing can move any more. */
    void rest() {
        interest = 0;
        accruals.clear();
        cost = 0;
        turnover = 0;
    }

    /** Wealth at the close of a bar. */
    double wealth(int bar) {
        double wealth = cash;
        for (int i = 0; i < units.length; i++) {
            wealth += units[i] * prices.close(i, bar);
        }
        return wealth;
    }

    /** What an asset trades at on a bar: a fill rule's price, or for an estimate the last close known. */
    interface Quote {
        OptionalDouble price(FillPrices prices, int asset, int bar);
    }

    /** What came of trying to fill an order. */
    enum Outcome {
        /** The order is done with. */
        FILLED,
        /** A part was traded; what is left waits as {@link #carried}. */
        PART,
        /** A leg cannot be traded; the order waits. */
        BLOCKED,
        /** Wealth is gone at the prices of the fill; the order waits, and the close decides whether it is ruin. */
        WORTHLESS,
        /** Nothing would be left after its costs. */
        RUIN
    }

    /**
     * Fills an order as one basket.
     *
     * @param before what was known at the close before the bar, from which costs that depend on past trading are taken
     */
    Outcome fill(Order order, int bar, Quote quote, Known before) {
        double wealth = cash;
        for (int i = 0; i < units.length; i++) {
            OptionalDouble quoted = quote.price(prices, i, bar);
            if (involved(order, i)) {
                Optional<Hindrance.Kind> missing =
                        quoted.isEmpty() ? Optional.of(Hindrance.Kind.NO_PRICE) : observe(before, i);
                if (missing.isPresent()) {
                    hindrances.add(new Hindrance(bar, order.decidedOn(), i, missing.get()));
                    return Outcome.BLOCKED;
                }
            }
            price[i] = quoted.isPresent() ? quoted.getAsDouble() : lastPrice(i, bar);
            value[i] = units[i] * price[i];
            wealth += value[i];
        }
        if (!(wealth > 0)) {
            hindrances.add(new Hindrance(bar, order.decidedOn(), firstOf(order), Hindrance.Kind.NO_WEALTH));
            return Outcome.WORTHLESS;
        }
        return order.quantities().isPresent()
                ? exchange(order, bar, wealth, order.quantities().get())
                : rebalance(order, bar, wealth);
    }

    /** Whether a leg may have to be traded: where quantities are settled, only if they are not those that are held. */
    private boolean involved(Order order, int asset) {
        return order.quantities().isPresent()
                ? order.quantities().get().at(asset) != units[asset]
                : units[asset] != 0 || order.target().at(asset) != 0;
    }

    private int firstOf(Order order) {
        int asset = 0;
        while (asset < units.length - 1 && !involved(order, asset)) {
            asset++;
        }
        return asset;
    }

    /** What an asset that is not traded now is marked at: its close before, in the units after the bar's split. */
    private double lastPrice(int asset, int bar) {
        return bar == 0 ? prices.close(asset, 0) : prices.close(asset, bar - 1) / prices.split(asset, bar);
    }

    private Optional<Hindrance.Kind> observe(Known before, int asset) {
        return costs.onlyProportional() ? Optional.empty() : tariff.observe(before, asset);
    }

    private Outcome rebalance(Order order, int bar, double before) {
        Rebalance.Result result = rebalance.solve(before, value, order.target());
        if (result == Rebalance.Result.RUIN) {
            return Outcome.RUIN;
        }
        if (result == Rebalance.Result.NOTHING_TO_DO) {
            return Outcome.FILLED;
        }
        if (whole || anyCapped()) {
            return exchange(order, bar, before, targeted(order, bar));
        }
        book(order, bar, before);
        return Outcome.FILLED;
    }

    private boolean anyCapped() {
        for (int i = 0; i < units.length; i++) {
            if (rebalance.capped(i)) {
                return true;
            }
        }
        return false;
    }

    /** The units that the solved order comes to, in whole lots. */
    private Quantities targeted(Order order, int bar) {
        double after = rebalance.wealthAfter();
        double[] wanted = units.clone();
        for (int i = 0; i < wanted.length; i++) {
            if (rebalance.traded(i)) {
                double exact = order.target().at(i) * after / price[i];
                wanted[i] = Lots.whole(lots[i], exact);
                if (wanted[i] == 0 && exact != 0) {
                    hindrances.add(new Hindrance(bar, order.decidedOn(), i, Hindrance.Kind.LOT));
                }
            }
        }
        return Quantities.of(wanted);
    }

    private void book(Order order, int bar, double before) {
        Weights target = order.target();
        double after = rebalance.wealthAfter();
        double left =
                after * target.cash(); // exactly 0 at full weight, where a running difference leaves a rounding error
        for (int i = 0; i < units.length; i++) {
            if (rebalance.traded(i)) {
                double valueAfter = rebalance.valueAfter(i);
                double notional = valueAfter - value[i];
                // a position that is given up is gone to the last unit
                double changed = valueAfter == 0 ? -units[i] : notional / price[i];
                book(order, bar, i, changed, notional, before, valueAfter / after);
            } else {
                left += target.at(i) * after - value[i];
            }
        }
        cash = left;
    }

    /**
     * Trades towards known quantities, as far as each leg may on one bar; cash takes what it comes to. An order that takes several
     * bars is held to its weights on each of them.
     */
    private Outcome exchange(Order order, int bar, double before, Quantities wanted) {
        boolean cut = false;
        for (int i = 0; i < units.length; i++) {
            double all = wanted.at(i) - units[i];
            double most = tariff.within(i, all * price[i]);
            boolean here = most != all * price[i];
            bought[i] = here ? Lots.whole(lots[i], most / price[i]) : all;
            cut |= here;
        }
        dropTiny(before);
        restraint.none();
        if (cut || order.stage() == Order.Stage.REST) {
            restraint.hold(before, cash, value, price, order.target(), bought);
            dropTiny(before);
        }
        double after = before;
        for (int i = 0; i < units.length; i++) {
            after -= bought[i] == 0 ? 0 : tariff.cost(i, bought[i] * price[i]);
        }
        if (!(after > 0)) {
            return Outcome.RUIN;
        }
        carried = rest(order, bar, before, wanted);
        book(order, bar, before, after);
        return carried.isEmpty() ? Outcome.FILLED : Outcome.PART;
    }

    private void dropTiny(double before) {
        for (int i = 0; i < units.length; i++) {
            if (Math.abs(bought[i] * price[i]) < Rebalance.TINY * before) {
                bought[i] = 0;
            }
        }
    }

    /** What is left after this bar's part; a leg that was only held back waits for what is still to be reduced, and else is done. */
    private Optional<Quantities> rest(Order order, int bar, double before, Quantities wanted) {
        boolean reducing = false;
        for (int i = 0; i < units.length; i++) {
            double left = (wanted.at(i) - units[i] - bought[i]) * price[i];
            reducing |= Math.abs(left) >= Rebalance.TINY * before && !restraint.reached(i) && reduces(wanted, i);
        }
        double[] end = new double[units.length];
        boolean done = true;
        for (int i = 0; i < end.length; i++) {
            double left = (wanted.at(i) - units[i] - bought[i]) * price[i];
            boolean open = Math.abs(left) >= Rebalance.TINY * before
                    && !restraint.reached(i)
                    && (reducing || !restraint.shared());
            end[i] = open ? wanted.at(i) : units[i] + bought[i];
            if (open) {
                done = false;
                hindrances.add(new Hindrance(bar, order.decidedOn(), i, why(i, wanted)));
            }
        }
        return done ? Optional.empty() : Optional.of(Quantities.of(end));
    }

    private boolean reduces(Quantities wanted, int asset) {
        return Math.abs(wanted.at(asset)) < Math.abs(units[asset]);
    }

    private Hindrance.Kind why(int asset, Quantities wanted) {
        if (restraint.shared() && !reduces(wanted, asset)) {
            return Hindrance.Kind.HELD_BACK;
        }
        return bought[asset] == 0 ? Hindrance.Kind.LOT_BEYOND_PARTICIPATION : Hindrance.Kind.PARTICIPATION;
    }

    private void book(Order order, int bar, double before, double after) {
        for (int i = 0; i < units.length; i++) {
            if (bought[i] != 0) {
                double notional = bought[i] * price[i];
                cash -= notional + tariff.cost(i, notional);
                book(order, bar, i, bought[i], notional, before, (value[i] + notional) / after);
            }
        }
    }

    private void book(
            Order order, int bar, int asset, double changed, double notional, double before, double weightAfter) {
        Charges charges = tariff.charges(asset, notional);
        units[asset] += changed;
        cost += charges.total();
        turnover += Math.abs(notional) / 2 / before;
        fills.add(new Fill(
                order.decidedOn(),
                bar,
                asset,
                changed,
                price[asset],
                notional,
                charges,
                value[asset] / before,
                weightAfter,
                order.because()));
    }

    /** Closes every position at the close of {@code bar} and leaves nothing. */
    void ruin(int bar) {
        double wealth = wealth(bar);
        for (int i = 0; i < units.length; i++) {
            if (units[i] != 0) {
                double close = prices.close(i, bar);
                double notional = -units[i] * close;
                double share = wealth > 0 ? -notional / wealth : 0;
                fills.add(new Fill(bar, bar, i, -units[i], close, notional, Charges.NONE, share, 0, RUINED));
                units[i] = 0;
            }
        }
        writtenOff = -wealth;
        cash = 0;
    }

    /** The weights at the close of a bar. */
    Weights weights(int bar, double wealth) {
        return Weights.each(units.length, i -> units[i] * prices.close(i, bar) / wealth);
    }

    /** What the order that was filled in part is still to come to. */
    Optional<Quantities> carried() {
        return carried;
    }

    double cash() {
        return cash;
    }

    double units(int asset) {
        return units[asset];
    }

    Quantities units() {
        return Quantities.of(units);
    }

    /** At the cash rate. */
    double interest() {
        return interest;
    }

    /** What holding brought and cost. */
    Accruals accruals() {
        return accruals;
    }

    double cost() {
        return cost;
    }

    double turnover() {
        return turnover;
    }

    /** What ruin added to cash to bring wealth to 0; 0 without ruin. */
    double writtenOff() {
        return writtenOff;
    }

    List<Fill> fills() {
        return fills;
    }

    List<Hindrance> hindrances() {
        return hindrances;
    }
}
