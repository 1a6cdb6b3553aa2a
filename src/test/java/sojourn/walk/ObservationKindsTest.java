package sojourn.walk;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import sojourn.GivenPrices;
import sojourn.market.Known;
import sojourn.market.PriceTable;
import sojourn.regime.StartRunner;

/** Every kind of observation: its value, when it is missing, what it reads. Expected values: decimal arithmetic of 40 digits. */
class ObservationKindsTest {
    /** A few units in the last place of a logarithm. */
    private static final double EXACT = 1e-14;

    private static final double NONE = Double.NaN;
    private static final GivenPrices CLOSES = GivenPrices.closes(new double[] {100, 102, 101, 101, 105});

    static List<Observation> kinds() {
        return List.of(
                new LogReturn("a"),
                new SimpleReturn("a"),
                new AbsoluteReturn("a"),
                new LogRealisedVolatility("a", 2),
                new LogParkinsonVolatility("a"),
                new LogGarmanKlassVolatility("a"),
                new Change("a"),
                new KnownAfter(new LogGarmanKlassVolatility("a"), 3),
                new KnownAfter(new LogRealisedVolatility("a", 3), 1));
    }

    @Test
    void everyKindThatAFileCanNameIsTestedHere() {
        List<String> known = new ArrayList<>();
        Observation.shape().schema().get("properties").fieldNames().forEachRemaining(known::add);
        assertThat(kinds().stream().map(Observation::word).distinct()).containsExactlyElementsOf(known);
    }

    @Test
    void absoluteReturns() {
        assertValues(
                new AbsoluteReturn("a"),
                CLOSES,
                NONE,
                0.019802627296179712,
                0.00985229644301163,
                0,
                0.03883983331626392);
    }

    @Test
    void realisedVolatilityOfTwoAndOfThreeBars() {
        assertValues(
                new LogRealisedVolatility("a", 2),
                CLOSES,
                NONE,
                NONE,
                -4.1579311141153745,
                -4.96662429982885,
                -3.594882517396497);
        assertValues(
                new LogRealisedVolatility("a", 3), CLOSES, NONE, NONE, NONE, -4.360663668169456, -3.7664349008718094);
    }

    @Test
    void realisedVolatilityOfPricesThatStandStillIsMissing() {
        GivenPrices still = GivenPrices.closes(new double[] {100, 100, 100, 101});
        assertValues(
                new LogRealisedVolatility("a", 2),
                still,
                NONE,
                NONE,
                NONE,
                StrictMath.log(StrictMath.log(1.01) / Math.sqrt(2)));
    }

    @Test
    void changesAreInTheSeriesOwnUnit() {
        assertValues(new Change("a"), CLOSES, NONE, 2, -1, 0, 4);
    }

    @Test
    void rangesOfABar() {
        PriceTable bar = Candles.of(new double[] {100.5, 102, 100, 101.5}).table();
        assertThat(new LogParkinsonVolatility("a").at(bar.knownAt(0)).orElseThrow())
                .isCloseTo(-4.4318313786272805, within(EXACT));
        assertThat(new LogGarmanKlassVolatility("a").at(bar.knownAt(0)).orElseThrow())
                .isCloseTo(-4.375815385450215, within(EXACT));
    }

    @Test
    void aRangeOfNothingOrWithoutAllItsPricesIsMissing() {
        Candles bar = Candles.of(new double[] {100.5, 102, 100, 101.5});
        for (Candles other : List.of(
                bar.with(0, 1, 100), // low and high the same
                bar.with(0, 1, 99), // high below low
                bar.with(0, 1, Double.NaN),
                bar.with(0, 2, Double.NaN))) {
            assertThat(new LogParkinsonVolatility("a").at(other.table().knownAt(0)))
                    .isEmpty();
            assertThat(new LogGarmanKlassVolatility("a").at(other.table().knownAt(0)))
                    .isEmpty();
        }
        for (Candles other :
                List.of(bar.with(0, 0, Double.NaN), bar.with(0, 3, 200))) { // no open; close far above high
            assertThat(new LogParkinsonVolatility("a").at(other.table().knownAt(0)))
                    .isPresent();
            assertThat(new LogGarmanKlassVolatility("a").at(other.table().knownAt(0)))
                    .isEmpty();
        }
    }

    /**
     * Without gaps and drift both estimate the variance of a bar, with 1/4.9 and 1/7.4 of the variance that a squared return has
     * (Parkinson 1980 and Garman and Klass 1980). 2,000 bars, so a standard error of 1.5 % of the means and about 8 % of the ratios; a
     * path of 2,000 moves misses about 2 % of its range.
     */
    @Test
    void rangesEstimateVarianceAsWellAsTheirAuthorsSay() {
        int bars = 2000;
        double variance = 1e-4;
        PriceTable table = Candles.random(20260101, bars, 2000, 0.01).table();
        double[] parkinson = meanAndVariance(new LogParkinsonVolatility("a"), table);
        double[] garmanKlass = meanAndVariance(new LogGarmanKlassVolatility("a"), table);
        assertThat(parkinson[0] / variance).isBetween(0.9, 1.03);
        assertThat(garmanKlass[0] / variance).isBetween(0.9, 1.03);
        double ofSquaredReturn = 2 * variance * variance;
        assertThat(ofSquaredReturn / parkinson[1]).isBetween(0.8 * 4.9, 1.3 * 4.9);
        assertThat(ofSquaredReturn / garmanKlass[1]).isBetween(0.8 * 7.4, 1.3 * 7.4);
    }

    @Test
    void whatIsKnownLateIsTheNumberOfBefore() {
        Observation late = new KnownAfter(new Change("a"), 2);
        assertValues(late, CLOSES, NONE, NONE, NONE, 2, -1);
        assertThat(late.inWords()).isEqualTo("change of a, known 2 bars late");
        assertThat(late.column()).isEqualTo("change_a_known_after_2");
    }

    @Test
    void sizesAndTheirLogarithmsAreNotAroundZero() {
        assertThat(kinds().stream().filter(Observation::aroundZero).map(Observation::word))
                .containsExactly(LogReturn.WORD, SimpleReturn.WORD, Change.WORD);
    }

    @ParameterizedTest
    @MethodSource("kinds")
    void namesInFilesAreLettersDigitsAndUnderscores(Observation kind) {
        assertThat(kind.column())
                .matches("[a-z][a-z0-9_]*")
                .endsWith(kind instanceof KnownAfter late ? "_" + late.bars() : "_a");
        assertThat(kind.inWords()).startsWith(kind.word() + " of a");
    }

    /** What a kind reads, and only that, moves its numbers and the address; the address moves whenever a number does. */
    @ParameterizedTest
    @MethodSource("kinds")
    void theAddressTakesInWhatIsRead(Observation kind) {
        Candles before = Candles.random(7, 12, 20, 0.01);
        byte[] settings = "{}".getBytes(StandardCharsets.UTF_8);
        List<String> columns = List.of("open", "high", "low", "close");
        for (int column = 0; column < 4; column++) {
            String name = columns.get(column);
            boolean read = name.equals("close")
                    || kind.reads().stream().anyMatch(one -> one.word().equals(name));
            Candles after = before.with(5, column, before.at(5, column) * (column == 2 ? 0.999 : 1.001));
            boolean moved = !values(kind, after).equals(values(kind, before));
            assertThat(moved).isEqualTo(read && !(name.equals("close") && kind instanceof LogParkinsonVolatility));
            String address = TimelineAddress.of(settings, after.table(), List.of(kind));
            assertThat(address.equals(TimelineAddress.of(settings, before.table(), List.of(kind))))
                    .isEqualTo(!read);
            for (int bar = 0; bar < 12; bar++) {
                boolean same = TimelineAddress.at(settings, after.table(), List.of(kind), bar)
                        .equals(TimelineAddress.at(settings, before.table(), List.of(kind), bar));
                assertThat(same).isEqualTo(!read || bar < 5);
            }
        }
    }

    @ParameterizedTest
    @MethodSource("kinds")
    void thePlanCountsWhatAWalkObserves(Observation kind) {
        PriceTable table = Candles.random(9, 60, 20, 0.01).table();
        ObservationLog log = new ObservationLog(List.of(kind), List.of("a"));
        for (int bar = 0; bar < table.size(); bar++) {
            log.append(table.knownAt(bar));
        }
        FitPlan plan = FitPlan.of(table, Walks.oneRegime(kind), Walks.expanding(20, Walks.every(7)));
        assertThat(plan.observations()).isEqualTo(log.present());
        RegimeTimeline timeline = Walk.forward(
                table, Walks.oneRegime(kind), Walks.expanding(20, Walks.every(7)), StartRunner.sequential(), bar -> {});
        assertThat(timeline.fits().stream().map(FitRecord::fittedOn)).containsExactlyElementsOf(plan.fitDates());
    }

    /** A series that never moves: a failed fit or no observation at all, and never a number that is none. */
    @ParameterizedTest
    @MethodSource("kinds")
    void aConstantSeriesIsRefusedInWords(Observation kind) {
        double[][] rows = new double[40][];
        Arrays.setAll(rows, bar -> new double[] {100, 101, 99, 100});
        PriceTable table = Candles.of(rows).table();
        RegimeTimeline timeline = Walk.forward(
                table,
                Walks.observing(kind, "calm", "stormy"),
                Walks.expanding(20, Walks.every(5)),
                StartRunner.sequential(),
                bar -> {});
        assertThat(timeline.firstBar()).isEmpty();
        if (kind.word().equals(LogRealisedVolatility.WORD)) {
            assertThat(timeline.fits()).isEmpty();
        } else {
            assertThat(timeline.fits())
                    .isNotEmpty()
                    .allSatisfy(record -> assertThat(record.fit().explanation())
                            .isEqualTo("all observations of the window are equal"));
        }
    }

    /** Why there is no key for scaling: another unit and another origin of the one series leave every probability alone. */
    @Test
    void unitAndOriginOfTheObservationDoNotMatter() {
        GivenPrices prices = Walks.weathers(5, 600, 1);
        Observation plain = new LogRealisedVolatility("a", 5);
        RefitSettings refit = Walks.expanding(400, Walks.every(50));
        RegimeTimeline one = Walks.forward(prices, Walks.observing(plain, "calm", "stormy"), refit);
        for (double scale : new double[] {1e-3, 1e3}) {
            Observation other = new Moved(plain, 7 * scale, scale);
            RegimeTimeline two = Walks.forward(prices, Walks.observing(other, "calm", "stormy"), refit);
            assertThat(two.endBar()).isEqualTo(one.endBar());
            for (int bar = one.firstBar().orElseThrow(); bar < one.endBar(); bar++) {
                assertThat(two.probability(bar, 1)).isCloseTo(one.probability(bar, 1), within(1e-9));
            }
        }
    }

    private record Moved(Observation plain, double origin, double unit) implements Observation {
        @Override
        public OptionalDouble at(Known known) {
            OptionalDouble value = plain.at(known);
            return value.isEmpty() ? value : OptionalDouble.of(origin + unit * value.getAsDouble());
        }

        @Override
        public String asset() {
            return plain.asset();
        }

        @Override
        public String word() {
            return "moved";
        }

        @Override
        public String column() {
            return "moved_a";
        }
    }

    private static void assertValues(Observation kind, GivenPrices prices, double... expected) {
        for (int bar = 0; bar < expected.length; bar++) {
            OptionalDouble value = kind.at(prices.table().knownAt(bar));
            if (Double.isNaN(expected[bar])) {
                assertThat(value).as("bar " + bar).isEmpty();
            } else {
                assertThat(value.orElseThrow()).as("bar " + bar).isCloseTo(expected[bar], within(EXACT));
            }
        }
    }

    private static List<Optional<Double>> values(Observation kind, Candles candles) {
        PriceTable table = candles.table();
        List<Optional<Double>> values = new ArrayList<>();
        for (int bar = 1; bar < table.size(); bar++) {
            OptionalDouble value = kind.at(table.knownAt(bar));
            values.add(value.isEmpty() ? Optional.empty() : Optional.of(value.getAsDouble()));
        }
        return values;
    }

    /** Mean and variance over bars of the variance that an observed log volatility stands for. */
    private static double[] meanAndVariance(Observation kind, PriceTable table) {
        double sum = 0;
        double squares = 0;
        for (int bar = 0; bar < table.size(); bar++) {
            double variance = StrictMath.exp(2 * kind.at(table.knownAt(bar)).orElseThrow());
            sum += variance;
            squares += variance * variance;
        }
        double mean = sum / table.size();
        return new double[] {mean, squares / table.size() - mean * mean};
    }
}
