package sojourn.compare;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import sojourn.allocate.HoldFromStart;
import sojourn.allocate.Policy;
import sojourn.allocate.Weights;
import sojourn.market.PriceTable;
import sojourn.measure.Yardstick;
import sojourn.trade.Costs;
import sojourn.trade.Simulation;
import sojourn.trade.Terms;
import sojourn.trade.Track;
import sojourn.walk.Signal;

/** Runs the yardsticks of one variant through the same simulation, from the variant's first decision on. */
final class Yardsticks {
    /** The name of the same-exposure yardstick that trades for nothing. */
    static final String FREE = "same_exposure_free";

    private final PriceTable table;
    private final Signal signal;
    private final Terms terms;
    private final Track strategy;

    Yardsticks(PriceTable table, Signal signal, Terms terms, Track strategy) {
        this.table = table;
        this.signal = signal;
        this.terms = terms;
        this.strategy = strategy;
    }

    /** Those that could have been traded, buy-and-hold first. */
    Map<Yardstick, Track> causal(Map<String, Double> buyAndHold, List<Yardstick> asked) {
        Map<Yardstick, Track> tracks = new LinkedHashMap<>();
        Weights held = Weights.named(buyAndHold, table.assets());
        tracks.put(Yardstick.BUY_AND_HOLD, run(new HoldFromStart(held), terms));
        if (asked.contains(Yardstick.SAME_EXPOSURE_SO_FAR)) {
            tracks.put(Yardstick.SAME_EXPOSURE_SO_FAR, run(new ExposureSoFar(strategy), terms));
        }
        return tracks;
    }

    /**
     * The constant mix at the strategy's mean weights at the start of the bars from {@code from} + 1 to {@code to}; with the
     * strategy's costs, and free.
     */
    Map<String, Track> sameExposure(int from, int to) {
        Policy mix = new ConstantMix(meanWeights(from, to));
        Map<String, Track> tracks = new LinkedHashMap<>();
        tracks.put(Yardstick.SAME_EXPOSURE.column(), run(mix, terms));
        tracks.put(FREE, run(mix, new Terms(terms.fill(), Costs.none(), terms.capital())));
        return tracks;
    }

    private Weights meanWeights(int from, int to) {
        double[] mean = new double[table.assets().size()];
        for (int asset = 0; asset < mean.length; asset++) {
            for (int bar = from + 1; bar <= to; bar++) {
                mean[asset] += strategy.weight(bar - 1, asset);
            }
            mean[asset] /= Math.max(1, to - from);
        }
        return Weights.of(mean);
    }

    private Track run(Policy policy, Terms with) {
        return Simulation.run(table, signal, policy, with, strategy.firstBar())
                .orElseThrow(() -> new IllegalStateException("a yardstick decides at the first bar it is asked"));
    }
}
