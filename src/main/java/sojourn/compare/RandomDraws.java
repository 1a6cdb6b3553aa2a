package sojourn.compare;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.function.Function;
import java.util.function.IntFunction;
import java.util.stream.IntStream;
import sojourn.allocate.Policy;
import sojourn.measure.EvaluatedPath;
import sojourn.measure.Luck;
import sojourn.measure.Measure;
import sojourn.measure.Measured;
import sojourn.measure.RandomSwitches;
import sojourn.measure.Scorecard;
import sojourn.measure.Yardstick;
import sojourn.trade.Track;

/**
 * All draws of a random switcher, simulated and measured.
 *
 * @param switches where the strategy falls among them; empty if nothing could be drawn
 * @param beside the draws whose final wealth stands at a quantile, by column name: {@code random_switcher_05}, …
 */
record RandomDraws(Optional<RandomSwitches> switches, Alongside<String> beside) {
    private static final double[] LEVELS = {Luck.LOW, 0.5, Luck.HIGH};

    /**
     * Runs them one after another; tracks are not kept but run again, because a thousand of them would fill the memory.
     *
     * @param simulation from a policy to its track
     * @param own the strategy's path over the window
     * @param held that of buy-and-hold
     */
    static RandomDraws of(
            RandomSwitcher switcher,
            Function<Policy, Track> simulation,
            WindowPath paths,
            EvaluatedPath own,
            EvaluatedPath held) {
        Optional<Measured.Undefined> whyNot = switcher.whyNot();
        if (whyNot.isPresent()) {
            String name = Yardstick.RANDOM_SWITCHER.column();
            return new RandomDraws(Optional.empty(), Alongside.<String>none().without(name, whyNot.get()));
        }
        List<Map<Measure, Measured>> drawn = new ArrayList<>();
        double[] grown = new double[RandomSwitcher.DRAWS];
        for (int i = 0; i < grown.length; i++) {
            EvaluatedPath path = paths.wealthOf(simulation.apply(switcher.draw(i)));
            double[] wealth = path.wealth();
            grown[i] = wealth[wealth.length - 1] / wealth[0];
            drawn.add(Scorecard.some(RandomSwitches.MEASURES, path, held));
        }
        Map<Measure, Measured> measured = Scorecard.some(RandomSwitches.MEASURES, own, held);
        return new RandomDraws(
                Optional.of(RandomSwitches.of(switcher.how(), measured, drawn)),
                quantiles(grown, draw -> simulation.apply(switcher.draw(draw))));
    }

    static RandomDraws none() {
        return new RandomDraws(Optional.empty(), Alongside.none());
    }

    private static Alongside<String> quantiles(double[] grown, IntFunction<Track> draw) {
        int[] ascending = IntStream.range(0, grown.length)
                .boxed()
                .sorted(Comparator.<Integer>comparingDouble(i -> grown[i]).thenComparing(i -> i))
                .mapToInt(Integer::intValue)
                .toArray();
        Alongside<String> quantiles = Alongside.none();
        for (double level : LEVELS) {
            quantiles = quantiles.and(column(level), draw.apply(ascending[Luck.place(level, grown.length)]));
        }
        return quantiles;
    }

    private static String column(double level) {
        return String.format(Locale.ROOT, "%s_%02.0f", Yardstick.RANDOM_SWITCHER.column(), 100 * level);
    }
}
