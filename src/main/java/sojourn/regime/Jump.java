package sojourn.regime;

import java.util.OptionalDouble;
import sojourn.numeric.Check;

/**
 * Regimes as the nearest of a few centres, every change of regime costing a penalty: the path s that minimises
 * sum_t ||(x_t - m_{s_t}) / scale||^2 + penalty #{t : s_t != s_{t-1}}, no factor 1/2. Its filter gives the last regime of the best
 * path through all bars so far, the centres frozen: probabilities are 0 or 1. Numbers that are missing add nothing to the distance.
 * Source: Bemporad, Breschi, Piga and Boyd (2018), Automatica 96, 11-21; Nystrup, Lindström and Madsen (2020), Expert Systems with
 * Applications 150, 113307.
 */
public final class Jump implements Gauge {
    private final JumpCentres centres;
    private final double penalty;
    private final double[] transition;

    private Jump(JumpCentres centres, double penalty, double[] transition) {
        this.centres = centres;
        this.penalty = penalty;
        this.transition = transition;
    }

    /** {@code transition}, row-major, is what a forecast goes by. Copied; not modified. */
    static Jump of(JumpCentres centres, double penalty, double[] transition) {
        int states = centres.states();
        Check.that(transition.length == states * states, transition.length + " transitions of " + states + " states");
        Check.that(penalty >= 0 && Double.isFinite(penalty), "a penalty of " + penalty);
        return new Jump(centres, penalty, transition.clone());
    }

    /** The centres of the regimes. */
    public JumpCentres centres() {
        return centres;
    }

    /** What a change of regime costs, in squared deviations. */
    public double penalty() {
        return penalty;
    }

    @Override
    public int states() {
        return centres.states();
    }

    @Override
    public double transition(int i, int j) {
        return transition[i * states() + j];
    }

    @Override
    public Jump ordered(int[] order) {
        return new Jump(centres.ordered(order), penalty, Order.applyToSquare(order, transition));
    }

    @Override
    public GaugeFilter filter() {
        return new Filter(this, JumpCosts.before(states(), penalty));
    }

    private record Filter(Jump gauge, JumpCosts costs) implements GaugeFilter {
        @Override
        public GaugeFilter step(Observations x, int row) {
            return x.missing(row) ? this : new Filter(gauge, costs.after(gauge.centres.distances(x, row)));
        }

        @Override
        public double probability(int k) {
            return k == costs.cheapest() ? 1 : 0;
        }

        @Override
        public double[] probabilities() {
            double[] probabilities = new double[gauge.states()];
            probabilities[costs.cheapest()] = 1;
            return probabilities;
        }

        @Override
        public OptionalDouble lastLogDensity() {
            return OptionalDouble.empty();
        }
    }
}
