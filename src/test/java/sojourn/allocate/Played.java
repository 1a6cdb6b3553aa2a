package sojourn.allocate;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import sojourn.market.PriceTable;
import sojourn.walk.Signal;

/** A policy asked close by close, in a world where every order fills at once and weights never drift. */
record Played(List<Decision> decisions) {
    static Played of(Policy policy, PriceTable table, Signal signal) {
        return of(policy, table, signal, 2);
    }

    /** As {@link #of(Policy, PriceTable, Signal)}, an order's first whole bar ending {@code barsAhead} after its decision. */
    static Played of(Policy policy, PriceTable table, Signal signal, int barsAhead) {
        List<Decision> decisions = new ArrayList<>();
        Stance stance = Stance.first();
        Weights held = Weights.none(table.assets().size());
        for (int bar = 0; bar < table.size(); bar++) {
            Situation situation =
                    new Situation(table.knownAt(bar), signal.at(table.knownAt(bar)), signal.regimes(), held, barsAhead);
            Decision decision = policy.at(situation, stance);
            decisions.add(decision);
            stance = decision.next();
            held = decision.kind() == Decision.Kind.ORDER ? decision.target().orElseThrow() : held;
        }
        return new Played(decisions);
    }

    /** The weights of one asset as ordered so far, bar by bar. */
    double[] weight(int asset) {
        double[] weight = new double[decisions.size()];
        double now = 0;
        for (int bar = 0; bar < weight.length; bar++) {
            Decision decision = decisions.get(bar);
            now = decision.kind() == Decision.Kind.ORDER
                    ? decision.target().orElseThrow().at(asset)
                    : now;
            weight[bar] = now;
        }
        return weight;
    }

    /** The target of one asset at each decision; NaN at closes without one. */
    double[] target(int asset) {
        double[] target = new double[decisions.size()];
        for (int bar = 0; bar < target.length; bar++) {
            Optional<Weights> decided = decisions.get(bar).target();
            target[bar] = decided.isPresent() ? decided.get().at(asset) : Double.NaN;
        }
        return target;
    }

    List<Integer> switches() {
        List<Integer> bars = new ArrayList<>();
        for (int bar = 0; bar < decisions.size(); bar++) {
            if (decisions.get(bar).change() == Decision.Change.SWITCHED) {
                bars.add(bar);
            }
        }
        return bars;
    }

    String because(int bar) {
        return decisions.get(bar).because().sentence();
    }
}
