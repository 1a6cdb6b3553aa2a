package sojourn.regime;

import java.util.OptionalDouble;
import sojourn.numeric.Check;

/**
 * Two regimes told apart by recent volatility alone: calm turns to storm when the volatility lies above one level, storm to calm
 * when it lies at or below another, and in between the regime stays as it is. It begins calm, and stays as it is on missing rows
 * and while there is no volatility yet. Probabilities are 0 or 1.
 */
public final class VolatilityThreshold implements Gauge {
    private static final int STATES = 2;

    private final RecentVolatility volatility;
    private final Levels levels;
    private final double[] transition;
    private final int calm;

    /**
     * The levels, in units of the observation per bar.
     *
     * @param stormAbove a volatility above it is a storm
     * @param calmBelow a volatility at or below it is calm; at most {@code stormAbove}
     */
    public record Levels(double stormAbove, double calmBelow) {
        /** Refuses levels the wrong way round. */
        public Levels {
            Check.that(
                    calmBelow <= stormAbove && calmBelow >= 0,
                    "calm below " + calmBelow + ", storm above " + stormAbove + ": the first must not be the higher");
        }

        /** Whether there is a storm at that volatility, after a bar that was or was not stormy. */
        private int next(int state, double now) {
            if (state == 0) {
                return now > stormAbove ? 1 : 0;
            }
            return now <= calmBelow ? 0 : 1;
        }
    }

    private VolatilityThreshold(RecentVolatility volatility, Levels levels, double[] transition, int calm) {
        this.volatility = volatility;
        this.levels = levels;
        this.transition = transition;
        this.calm = calm;
    }

    /** State 0 is calm, state 1 storm; {@code transition}, row-major, is what a forecast goes by. Copied; not modified. */
    static VolatilityThreshold of(RecentVolatility volatility, Levels levels, double[] transition) {
        return new VolatilityThreshold(volatility, levels, transition.clone(), 0);
    }

    /** What it measures. */
    public RecentVolatility volatility() {
        return volatility;
    }

    /** Where it draws the line. */
    public Levels levels() {
        return levels;
    }

    @Override
    public int states() {
        return STATES;
    }

    @Override
    public double transition(int i, int j) {
        return transition[i * STATES + j];
    }

    @Override
    public VolatilityThreshold ordered(int[] order) {
        return new VolatilityThreshold(
                volatility, levels, Order.applyToSquare(order, transition), order[calm] == calm ? calm : 1 - calm);
    }

    @Override
    public GaugeFilter filter() {
        return new Filter(this, volatility.start(), 0);
    }

    /** Storm is 1, whatever the order of the states. */
    private record Filter(VolatilityThreshold gauge, RecentVolatility.SoFar soFar, int storm) implements GaugeFilter {
        @Override
        public GaugeFilter step(Observations x, int row) {
            if (x.missing(row)) {
                return this;
            }
            RecentVolatility.SoFar next = soFar.with(x.at(row, 0));
            OptionalDouble now = next.value();
            return new Filter(gauge, next, now.isPresent() ? gauge.levels.next(storm, now.getAsDouble()) : storm);
        }

        @Override
        public double probability(int k) {
            int state = storm == 0 ? gauge.calm : 1 - gauge.calm;
            return k == state ? 1 : 0;
        }

        @Override
        public double[] probabilities() {
            return new double[] {probability(0), probability(1)};
        }

        @Override
        public OptionalDouble lastLogDensity() {
            return OptionalDouble.empty();
        }
    }
}
