package sojourn.compare;

import java.util.Map;
import java.util.Optional;
import sojourn.allocate.HoldFromStart;
import sojourn.allocate.Pacing;
import sojourn.allocate.Policy;
import sojourn.allocate.Weights;
import sojourn.market.PriceTable;
import sojourn.measure.EvaluatedPath;
import sojourn.measure.Measured;
import sojourn.measure.SameVolatility;
import sojourn.measure.Yardstick;
import sojourn.strategy.Strategy;
import sojourn.trade.Costs;
import sojourn.trade.Simulation;
import sojourn.trade.Terms;
import sojourn.trade.Track;
import sojourn.walk.RegimeTimeline;

/** Runs the yardsticks of one variant through the same simulation, from the variant's first decision on. */
final class Yardsticks {
    /** The name of the same-exposure yardstick that trades for nothing. */
    static final String FREE = "same_exposure_free";

    private static final Measured.Undefined ONE_REGIME = new Measured.Undefined(
            Measured.Reason.ONE_REGIME, "there is one regime alone, and nothing that volatility could tell apart");
    private static final Measured.Undefined NO_WEIGHTS = new Measured.Undefined(
            Measured.Reason.NOT_APPLICABLE, "its rule finds no weights at the strategy's first decision");
    private static final Measured.Undefined ALL_CASH =
            new Measured.Undefined(Measured.Reason.NOT_APPLICABLE, "buy-and-hold is all cash, and nothing to scale");
    private final Prepared.Ready ready;
    private final Strategy file;
    private final PriceTable table;
    private final RegimeTimeline timeline;
    private final Terms terms;
    private final Track strategy;

    Yardsticks(Prepared.Ready ready, RegimeTimeline timeline, Track strategy) {
        this.ready = ready;
        this.file = ready.file().strategy();
        this.table = ready.market().table();
        this.timeline = timeline;
        this.terms = file.trade().terms();
        this.strategy = strategy;
    }

    /** Those that could have been traded, buy-and-hold first; it runs whether it is asked for or not. */
    Alongside<Yardstick> causal() {
        Weights held = Weights.named(file.judge().buyAndHold(), table.assets());
        Alongside<Yardstick> beside =
                Alongside.<Yardstick>none().and(Yardstick.BUY_AND_HOLD, started(new HoldFromStart(held), terms));
        if (asked(Yardstick.SAME_EXPOSURE_SO_FAR)) {
            beside = beside.and(Yardstick.SAME_EXPOSURE_SO_FAR, started(new ExposureSoFar(strategy), terms));
        }
        if (asked(Yardstick.VOLATILITY_GATE)) {
            beside = timeline.regimes().size() == 1
                    ? beside.without(Yardstick.VOLATILITY_GATE, ONE_REGIME)
                    : beside.and(Yardstick.VOLATILITY_GATE, run(gate(), terms), NO_WEIGHTS);
        }
        if (asked(Yardstick.VOLATILITY_TARGET)) {
            beside = held.gross() == 0
                    ? beside.without(Yardstick.VOLATILITY_TARGET, ALL_CASH)
                    : beside.and(Yardstick.VOLATILITY_TARGET, started(steady(held), terms));
        }
        return beside;
    }

    /** Those that need the whole window, by column name. */
    Alongside<String> afterTheFact(Track buyAndHold, Window window) {
        Alongside<String> beside = Alongside.none();
        if (asked(Yardstick.SAME_EXPOSURE)) {
            Policy mix = new ConstantMix(meanWeights(window));
            beside = beside.and(Yardstick.SAME_EXPOSURE.column(), started(mix, terms))
                    .and(FREE, started(mix, free()));
        }
        if (asked(Yardstick.SAME_VOLATILITY)) {
            beside = sameVolatility(beside, buyAndHold, window);
        }
        return beside;
    }

    /** What the strategy did at random times, if that is asked for; {@code own} and {@code held} over the window. */
    RandomDraws randomDraws(Window window, WindowPath paths, EvaluatedPath own, EvaluatedPath held) {
        if (!asked(Yardstick.RANDOM_SWITCHER)) {
            return RandomDraws.none();
        }
        Decided decided = new Decided(table, timeline, file.trade(), strategy, window);
        RandomSwitcher switcher = RandomSwitcher.of(file, table.assets(), decided, strategy);
        return RandomDraws.of(switcher, policy -> started(policy, terms), paths, own, held);
    }

    private boolean asked(Yardstick yardstick) {
        return file.judge().against().contains(yardstick);
    }

    private Policy gate() {
        String asset = file.regimes().orderedBy();
        Weights ordering = Weights.named(Map.of(asset, 1.0), table.assets());
        TrailingVolatility told =
                TrailingVolatility.of(table, ordering).knownAfter(file.regimes().barsLate(asset));
        return new VolatilityGate(ready.policy(), timeline, table, told);
    }

    /** The strategy's decision bars, limits and band; nothing is kept back and every step is taken in full. */
    private Policy steady(Weights mix) {
        Pacing pacing = new Pacing(
                file.trade().decide(), 1, 1, file.limits(), file.trade().noTradeBand());
        return new SteadyVolatility(mix, pacing, TrailingVolatility.of(table, mix));
    }

    private Alongside<String> sameVolatility(Alongside<String> beside, Track buyAndHold, Window window) {
        String column = Yardstick.SAME_VOLATILITY.column();
        Measured multiple = SameVolatility.multiple(
                strategy.simpleReturns(window.base() + 1, window.last()),
                buyAndHold.simpleReturns(window.base() + 1, window.last()));
        if (multiple instanceof Measured.Undefined none) {
            return beside.without(column, none);
        }
        double lambda = multiple.number().orElseThrow();
        return beside.and(
                column, started(new ScaledHolding(lambda, buyAndHold, terms.fill(), table.fillPrices()), free()));
    }

    private Terms free() {
        return new Terms(terms.fill(), Costs.none(), terms.capital());
    }

    private Weights meanWeights(Window window) {
        double[] mean = new double[table.assets().size()];
        for (int asset = 0; asset < mean.length; asset++) {
            for (int bar = window.base() + 1; bar <= window.last(); bar++) {
                mean[asset] += strategy.weight(bar - 1, asset);
            }
            mean[asset] /= Math.max(1, window.last() - window.base());
        }
        return Weights.of(mean);
    }

    private Track started(Policy policy, Terms with) {
        return run(policy, with)
                .orElseThrow(() -> new IllegalStateException("a yardstick decides at the first bar it is asked"));
    }

    /** Empty if the policy does not decide where the strategy first did. */
    private Optional<Track> run(Policy policy, Terms with) {
        return Simulation.run(table, timeline, policy, with, strategy.firstBar())
                .filter(track -> track.firstBar() == strategy.firstBar());
    }
}
