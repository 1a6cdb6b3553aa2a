package sojourn.regime;

import java.util.OptionalDouble;
import sojourn.numeric.Check;

/** How volatile a series has been lately, observation by observation, the last one included. Per bar, not annualised. */
public sealed interface RecentVolatility {
    /** Observations from the first until there is a volatility. */
    int needs();

    /** Before any observation. */
    SoFar start();

    /** The volatility after some observations. Immutable. */
    interface SoFar {
        /** After one more observation. */
        SoFar with(double observation);

        /** The volatility; empty while there are too few observations. */
        OptionalDouble value();
    }

    /**
     * sqrt(sum (x - mean)^2 / (n - 1)) over the last n observations.
     *
     * @param observations n, at least 2
     */
    record Rolling(int observations) implements RecentVolatility {
        /** Refuses fewer than 2. */
        public Rolling {
            Check.within(observations, 2, Integer.MAX_VALUE, "observations");
        }

        @Override
        public int needs() {
            return observations;
        }

        @Override
        public SoFar start() {
            return new Last(new double[0], observations);
        }
    }

    /**
     * sqrt(v_t), v_t = decay v_{t-1} + (1 - decay) x_t^2, v_1 = x_1^2: exponentially weighted squares, no mean taken off.
     *
     * @param decay above 0 and below 1, e.g. 0.94
     */
    record Exponential(double decay) implements RecentVolatility {
        /** Refuses a decay that is no fraction. */
        public Exponential {
            Check.that(decay > 0 && decay < 1, "a decay of " + decay + ", must lie between 0 and 1");
        }

        @Override
        public int needs() {
            return 1;
        }

        @Override
        public SoFar start() {
            return new Weighted(decay, OptionalDouble.empty());
        }
    }

    /** The last observations. */
    final class Last implements SoFar {
        private final double[] values;
        private final int wanted;

        private Last(double[] values, int wanted) {
            this.values = values;
            this.wanted = wanted;
        }

        @Override
        public SoFar with(double observation) {
            int kept = StrictMath.min(values.length, wanted - 1);
            double[] next = new double[kept + 1];
            System.arraycopy(values, values.length - kept, next, 0, kept);
            next[kept] = observation;
            return new Last(next, wanted);
        }

        @Override
        public OptionalDouble value() {
            if (values.length < wanted) {
                return OptionalDouble.empty();
            }
            double sum = 0;
            for (double x : values) {
                sum += x;
            }
            double mean = sum / wanted;
            double squares = 0;
            for (double x : values) {
                squares += (x - mean) * (x - mean);
            }
            return OptionalDouble.of(Math.sqrt(squares / (wanted - 1)));
        }
    }

    /** The weighted squares. */
    record Weighted(double decay, OptionalDouble square) implements SoFar {
        @Override
        public SoFar with(double observation) {
            double now = observation * observation;
            double next = square.isPresent() ? decay * square.getAsDouble() + (1 - decay) * now : now;
            return new Weighted(decay, OptionalDouble.of(next));
        }

        @Override
        public OptionalDouble value() {
            return square.isPresent() ? OptionalDouble.of(Math.sqrt(square.getAsDouble())) : square;
        }
    }
}
