package sojourn.trade;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.OptionalDouble;
import sojourn.allocate.Because;
import sojourn.allocate.Weights;
import sojourn.market.FillPrices;

/** Cash and units during one simulation, and what moved on the bar at hand. */
final class Account {
    private static final Because RUINED = Because.of("ruin: wealth is gone, positions are closed at the mark");

    private final FillPrices prices;
    private final Costs costs;
    private final Rebalance rebalance;
    private final double[] units;
    private final double[] price;
    private final double[] value;
    private final List<Fill> fills = new ArrayList<>();
    private double cash;
    private double interest;
    private double cost;
    private double turnover;
    private double writtenOff;

    Account(FillPrices prices, int assets, Terms terms) {
        this.prices = prices;
        this.costs = terms.costs();
        this.cash = terms.capital();
        this.units = new double[assets];
        this.price = new double[assets];
        this.value = new double[assets];
        double[] rates = new double[assets];
        Arrays.fill(rates, costs.oneWayRate());
        this.rebalance = new Rebalance(rates);
    }

    /** Begins a bar: interest on the cash of the close before. */
    void accrue(int bar) {
        interest = cash * prices.cashReturn(bar);
        cash += interest;
        cost = 0;
        turnover = 0;
    }

    /** Begins a bar on which nothing can move any more. */
    void rest() {
        interest = 0;
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

    /** What came of trying to fill an order. */
    enum Outcome {
        /** The order is done with. */
        FILLED,
        /** A leg has no price; the order waits. */
        BLOCKED,
        /** Nothing would be left after its costs. */
        RUIN
    }

    /** Fills an order as one basket, quantities set at the fill price. */
    Outcome fill(Order order, int bar, FillRule rule) {
        double before = cash;
        for (int i = 0; i < units.length; i++) {
            OptionalDouble quoted = rule.price(prices, i, bar);
            if (quoted.isEmpty() && (units[i] != 0 || order.target().at(i) != 0)) {
                return Outcome.BLOCKED;
            }
            price[i] = quoted.orElse(0);
            value[i] = units[i] * price[i];
            before += value[i];
        }
        if (!(before > 0)) {
            return Outcome.RUIN;
        }
        Rebalance.Result result = rebalance.solve(before, value, order.target());
        if (result == Rebalance.Result.SOLVED) {
            book(order, bar, before);
        }
        return result == Rebalance.Result.RUIN ? Outcome.RUIN : Outcome.FILLED;
    }

    private void book(Order order, int bar, double before) {
        Weights target = order.target();
        double after = rebalance.wealthAfter();
        double left =
                after * target.cash(); // exactly 0 at full weight, where a running difference leaves a rounding error
        for (int i = 0; i < units.length; i++) {
            if (rebalance.traded(i)) {
                book(order, bar, i, before, after);
            } else {
                left += target.at(i) * after - value[i];
            }
        }
        cash = left;
    }

    private void book(Order order, int bar, int asset, double before, double after) {
        double valueAfter = rebalance.valueAfter(asset);
        double notional = valueAfter - value[asset];
        // a position that is given up is gone to the last unit
        double bought = valueAfter == 0 ? -units[asset] : notional / price[asset];
        double commission = costs.commissionRate() * Math.abs(notional);
        double halfSpread = costs.halfSpreadRate() * Math.abs(notional);
        units[asset] += bought;
        cost += commission + halfSpread;
        turnover += Math.abs(notional) / 2 / before;
        fills.add(new Fill(
                order.decidedOn(),
                bar,
                asset,
                bought,
                price[asset],
                notional,
                commission,
                halfSpread,
                value[asset] / before,
                valueAfter / after,
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
                fills.add(new Fill(bar, bar, i, -units[i], close, notional, 0, 0, share, 0, RUINED));
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

    double cash() {
        return cash;
    }

    double units(int asset) {
        return units[asset];
    }

    double interest() {
        return interest;
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
}
