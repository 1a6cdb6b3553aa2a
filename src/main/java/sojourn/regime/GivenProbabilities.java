package sojourn.regime;

import java.util.Arrays;
import java.util.OptionalDouble;
import sojourn.numeric.Check;

/**
 * Probabilities of regimes that were computed elsewhere: each row of observations is the probabilities themselves, one column a
 * regime. Its filter repeats the last row that was there; before any row every regime is as probable as the next.
 */
public final class GivenProbabilities implements Gauge {
    private final int[] columns;
    private final double[] transition;

    private GivenProbabilities(int[] columns, double[] transition) {
        this.columns = columns;
        this.transition = transition;
    }

    /** {@code transition}, row-major, is what a forecast goes by. Copied; not modified. */
    static GivenProbabilities of(int states, double[] transition) {
        Check.that(transition.length == states * states, transition.length + " transitions of " + states + " states");
        int[] columns = new int[states];
        for (int k = 0; k < states; k++) {
            columns[k] = k;
        }
        return new GivenProbabilities(columns, transition.clone());
    }

    @Override
    public int states() {
        return columns.length;
    }

    @Override
    public double transition(int i, int j) {
        return transition[i * states() + j];
    }

    @Override
    public GivenProbabilities ordered(int[] order) {
        int[] turned = new int[columns.length];
        for (int k = 0; k < turned.length; k++) {
            turned[k] = columns[order[k]];
        }
        return new GivenProbabilities(turned, Order.applyToSquare(order, transition));
    }

    @Override
    public GaugeFilter filter() {
        double[] even = new double[states()];
        Arrays.fill(even, 1.0 / states());
        return new Filter(columns, even);
    }

    private static final class Filter implements GaugeFilter {
        private final int[] columns;
        private final double[] now;

        Filter(int[] columns, double[] now) {
            this.columns = columns;
            this.now = now;
        }

        @Override
        public GaugeFilter step(Observations x, int row) {
            if (x.missing(row)) {
                return this;
            }
            double[] next = new double[columns.length];
            for (int k = 0; k < next.length; k++) {
                next[k] = x.at(row, columns[k]);
            }
            return new Filter(columns, next);
        }

        @Override
        public double probability(int k) {
            return now[k];
        }

        @Override
        public double[] probabilities() {
            return now.clone();
        }

        @Override
        public OptionalDouble lastLogDensity() {
            return OptionalDouble.empty();
        }
    }
}
