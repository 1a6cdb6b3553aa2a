package sojourn.trade;

import sojourn.allocate.Weights;

/**
 * Wealth after an order whose target weights refer to wealth after its own costs: V solves
 * V = V0 - sum_i c_i |w_i V - h_i|, with V0 wealth before, h_i values held, w_i target weights and c_i cost rates. The iteration
 * that puts V into the right-hand side contracts if sum c_i |w_i| < 1; otherwise bisection, on the part right of the largest gap
 * where the right-hand side, less V, falls. Trades below {@value #TINY} of wealth are left out before.
 */
final class Rebalance {
    /** Smaller trades, as a part of wealth, do not happen. */
    private static final double TINY = 1e-9;

    private static final double CONVERGED = 1e-13;
    private static final int ITERATIONS = 100;
    private static final int HALVINGS = 200;

    private final double[] rates;
    private final double[] weights;
    private final double[] held;
    private final boolean[] traded;
    private double before;
    private double after;

    /** One cost rate an asset, a fraction of the traded value. Not modified. */
    Rebalance(double[] rates) {
        this.rates = rates.clone();
        this.weights = new double[rates.length];
        this.held = new double[rates.length];
        this.traded = new boolean[rates.length];
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
        for (int i = 0; i < rates.length; i++) {
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
        return traded[asset] ? weights[asset] * after : held[asset];
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

    /** V0 - costs - V is concave in V and at most 0 at V0: its largest root lies right of its top, which is at 0 or a kink. */
    private Result bisect() {
        double low = 0;
        double best = excess(0);
        for (int i = 0; i < rates.length; i++) {
            double kink = traded[i] && weights[i] != 0 ? held[i] / weights[i] : 0;
            if (kink > 0 && kink < before && excess(kink) > best) {
                low = kink;
                best = excess(kink);
            }
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

    private double excess(double wealth) {
        return before - costs(wealth) - wealth;
    }

    private double costs(double wealth) {
        double costs = 0;
        for (int i = 0; i < rates.length; i++) {
            if (traded[i]) {
                costs += rates[i] * Math.abs(weights[i] * wealth - held[i]);
            }
        }
        return costs;
    }
}
