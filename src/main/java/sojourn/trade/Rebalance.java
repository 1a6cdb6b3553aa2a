package sojourn.trade;

import sojourn.allocate.Weights;

/**
 * Wealth after an order whose target weights refer to wealth after its own costs: V solves V = V0 - sum_i c_i(w_i V - h_i), with V0
 * wealth before, h_i values held, w_i target weights and c_i what a trade costs, cut to the part that may happen on one bar. The
 * iteration that puts V into the right-hand side contracts if the slopes of c_i times |w_i| sum to less than 1; otherwise bisection,
 * on the part right of the top where the right-hand side, less V, falls. Trades below {@value #TINY} of wealth are left out before.
 */
final class Rebalance {
    /** Smaller trades, as a part of wealth, do not happen. */
    static final double TINY = 1e-9;

    private static final double CONVERGED = 1e-13;
    private static final int ITERATIONS = 100;
    private static final int HALVINGS = 200;
    private static final int THIRDS = 120;

    private final Tariff tariff;
    private final int assets;
    private final double[] weights;
    private final double[] held;
    private final boolean[] traded;
    private double before;
    private double after;

    /** At the costs of {@code tariff}, as they stand whenever an order is solved. */
    Rebalance(Tariff tariff) {
        this.tariff = tariff;
        this.assets = tariff.assets();
        this.weights = new double[assets];
        this.held = new double[assets];
        this.traded = new boolean[assets];
    }

    /**
     * Solves for one order; the other methods then tell the answer.
     *
     * @param wealth before, above 0
     * @param values held, one an asset. Not modified.
     */
    Result solve(double wealth, double[] values, Weights target) {
        before = wealth;
        Result result = Result.NOTHING_TO_DO;
        for (int i = 0; i < assets; i++) {
            weights[i] = target.at(i);
            held[i] = values[i];
            traded[i] = Math.abs(weights[i] * wealth - held[i]) >= TINY * wealth;
            result = traded[i] ? Result.SOLVED : result;
        }
        after = before;
        return result == Result.NOTHING_TO_DO || iterate() ? result : bisect();
    }

    /** What came of it. */
    enum Result {
        /** No trade is large enough to happen. */
        NOTHING_TO_DO,
        /** Wealth after the order is above 0. */
        SOLVED,
        /** Costs would eat all wealth. */
        RUIN
    }

    /** Whether an asset is traded. */
    boolean traded(int asset) {
        return traded[asset];
    }

    /** Wealth after all costs. */
    double wealthAfter() {
        return after;
    }

    /** Value held after the order. */
    double valueAfter(int asset) {
        if (!traded[asset]) {
            return held[asset];
        }
        return capped(asset) ? held[asset] + tariff.within(asset, wanted(asset, after)) : weights[asset] * after;
    }

    /** Whether only a part of a trade may happen on this bar. */
    boolean capped(int asset) {
        double wanted = wanted(asset, after);
        return traded[asset] && tariff.within(asset, wanted) != wanted;
    }

    private double wanted(int asset, double wealth) {
        return weights[asset] * wealth - held[asset];
    }

    private boolean iterate() {
        for (int m = 0; m < ITERATIONS; m++) {
            double next = before - costs(after);
            boolean converged = Math.abs(next - after) <= CONVERGED * before;
            after = next;
            if (converged) {
                return after > 0;
            }
        }
        return false;
    }

    /** V0 - costs - V is concave in V (but for the cut) and at most 0 at V0: its largest root lies right of its top, which is at 0 or a kink. */
    private Result bisect() {
        double low = 0;
        double best = excess(0);
        for (int i = 0; i < assets; i++) {
            double kink = traded[i] && weights[i] != 0 ? held[i] / weights[i] : 0;
            if (kink > 0 && kink < before && excess(kink) > best) {
                low = kink;
                best = excess(kink);
            }
        }
        if (!(best > 0) && !tariff.onlyProportional()) {
            low = top();
            best = excess(low);
        }
        if (!(best > 0)) {
            return Result.RUIN;
        }
        double high = before;
        for (int halving = 0; halving < HALVINGS; halving++) {
            double middle = low + (high - low) / 2;
            if (excess(middle) > 0) {
                low = middle;
            } else {
                high = middle;
            }
        }
        after = low;
        return Result.SOLVED;
    }

    /** Where a concave excess is greatest, by thirds; its top need not be at a kink where costs curve. */
    private double top() {
        double low = 0;
        double high = before;
        for (int third = 0; third < THIRDS; third++) {
            double left = low + (high - low) / 3;
            double right = high - (high - low) / 3;
            if (excess(left) < excess(right)) {
                low = left;
            } else {
                high = right;
            }
        }
        return low;
    }

    private double excess(double wealth) {
        return before - costs(wealth) - wealth;
    }

    private double costs(double wealth) {
        return tariff.onlyProportional() ? proportional(wealth) : itemised(wealth);
    }

    private double proportional(double wealth) {
        double costs = 0;
        for (int i = 0; i < assets; i++) {
            if (traded[i]) {
                costs += tariff.rate(i) * Math.abs(weights[i] * wealth - held[i]);
            }
        }
        return costs;
    }

    private double itemised(double wealth) {
        double costs = 0;
        for (int i = 0; i < assets; i++) {
            if (traded[i]) {
                costs += tariff.cost(i, tariff.within(i, wanted(i, wealth)));
            }
        }
        return costs;
    }
}
