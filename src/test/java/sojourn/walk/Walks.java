package sojourn.walk;

import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import java.util.function.IntPredicate;
import sojourn.GivenPrices;
import sojourn.market.Known;
import sojourn.numeric.RandomStream;
import sojourn.regime.EmissionFamily;
import sojourn.regime.ModelKind;
import sojourn.regime.RecentVolatility;
import sojourn.regime.StartRunner;
import sojourn.regime.VolatilityThresholdSettings;

/** Prices with a calm and a stormy weather in them, and walks over them that are quick to fit. */
final class Walks {
    static final long SEED = 20260101;

    static final List<List<String>> COUNTS =
            List.of(List.of("all"), List.of("calm", "stormy"), List.of("calm", "uneasy", "stormy"));

    private Walks() {}

    /** The first asset's weather changes about every 40 bars; the others move against it: quiet in its storms, wild in its calm. */
    static GivenPrices weathers(long seed, int bars, int assets) {
        RandomStream random = RandomStream.of(seed, "weathers");
        double[][] closes = new double[assets][bars];
        boolean stormy = false;
        for (int bar = 0; bar < bars; bar++) {
            stormy = random.nextDouble() < 0.025 != stormy;
            for (int asset = 0; asset < assets; asset++) {
                double deviation = stormy == (asset == 0) ? 0.025 : 0.006;
                double before = bar == 0 ? 100 : closes[asset][bar - 1];
                closes[asset][bar] = before * StrictMath.exp(0.0003 + deviation * random.nextNormal());
            }
        }
        return GivenPrices.closes(closes);
    }

    /** One asset: one weather for half of the bars, then two that change about every 20 bars. */
    static GivenPrices changing(long seed, int bars) {
        RandomStream random = RandomStream.of(seed, "changing");
        double[] closes = new double[bars];
        closes[0] = 100;
        for (int bar = 1; bar < bars; bar++) {
            boolean stormy = bar > bars / 2 && (bar / 20) % 2 == 0;
            closes[bar] = closes[bar - 1] * StrictMath.exp((stormy ? 0.03 : 0.01) * random.nextNormal());
        }
        return GivenPrices.closes(closes);
    }

    /** Two regimes of the log return of asset a. */
    static RegimeSettings twoRegimes() {
        return observing(new LogReturn("a"), "calm", "stormy");
    }

    static RegimeSettings observing(Observation observation, String... states) {
        return new RegimeSettings(
                ModelKind.HIDDEN_MARKOV,
                List.of(observation),
                List.of(states),
                EmissionFamily.NORMAL,
                Optional.empty(),
                Optional.empty());
    }

    /** Calm and stormy by the exponentially weighted volatility. */
    static RegimeSettings threshold(Observation observation) {
        return new RegimeSettings(
                ModelKind.VOLATILITY_THRESHOLD,
                List.of(observation),
                List.of("calm", "stormy"),
                EmissionFamily.NORMAL,
                Optional.empty(),
                Optional.empty(),
                Optional.empty(),
                Particulars.threshold(
                        new VolatilityThresholdSettings(new RecentVolatility.Exponential(0.9), 0.7, 0.5)));
    }

    /** Calm and stormy by a jump model of that penalty. */
    static RegimeSettings jump(Observation observation, double penalty) {
        return new RegimeSettings(
                ModelKind.JUMP,
                List.of(observation),
                List.of("calm", "stormy"),
                EmissionFamily.NORMAL,
                Optional.empty(),
                Optional.empty(),
                Optional.empty(),
                Particulars.penalty(penalty));
    }

    /** One regime (all), two (calm, stormy) or three (calm, uneasy, stormy) of the log return of asset a. */
    static RegimeSettings choosing(StateChoice.By by, Observation observation) {
        return new RegimeSettings(
                ModelKind.HIDDEN_MARKOV,
                List.of(observation),
                List.of("all", "calm", "uneasy", "stormy"),
                EmissionFamily.NORMAL,
                Optional.empty(),
                Optional.empty(),
                Optional.empty(),
                Particulars.choosing(new StateChoice(COUNTS, by)));
    }

    /** One regime, which is fitted by a closed form: for tests that ask when fits are made, not what they find. */
    static RegimeSettings oneRegime(Observation observation) {
        return new RegimeSettings(
                ModelKind.ONE_REGIME,
                List.of(observation),
                List.of("any"),
                EmissionFamily.NORMAL,
                Optional.empty(),
                Optional.empty());
    }

    static RefitSettings expanding(int firstFitAfter, RefitSchedule schedule) {
        return new RefitSettings(
                firstFitAfter, schedule, OptionalInt.empty(), 2, SEED, RefitSettings.OnFailure.KEEP_PREVIOUS);
    }

    static RefitSettings rolling(int observations, int firstFitAfter, RefitSchedule schedule) {
        return rolling(observations, firstFitAfter, schedule, RefitSettings.OnFailure.KEEP_PREVIOUS);
    }

    static RefitSettings rolling(
            int observations, int firstFitAfter, RefitSchedule schedule, RefitSettings.OnFailure onFailure) {
        return new RefitSettings(firstFitAfter, schedule, OptionalInt.of(observations), 2, SEED, onFailure);
    }

    static RefitSchedule every(int observations) {
        return new RefitSchedule.EveryObservations(observations);
    }

    static RegimeTimeline forward(GivenPrices prices, RegimeSettings regimes, RefitSettings refit) {
        return Walk.forward(prices.table(), regimes, refit, StartRunner.sequential(), bar -> {});
    }

    /** The bars at which fits were made, accepted or not. */
    static List<Integer> fitBars(RegimeTimeline timeline) {
        return timeline.fits().stream().map(FitRecord::bar).toList();
    }

    /** The log return of asset a, which nobody observes on some bars. */
    record Gappy(IntPredicate gap) implements Observation {
        @Override
        public OptionalDouble at(Known known) {
            return gap.test(known.bar()) ? OptionalDouble.empty() : new LogReturn("a").at(known);
        }

        @Override
        public String asset() {
            return "a";
        }

        @Override
        public String word() {
            return "gappy";
        }

        @Override
        public String column() {
            return "gappy_a";
        }
    }
}
