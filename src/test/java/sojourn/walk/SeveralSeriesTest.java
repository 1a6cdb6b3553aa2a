package sojourn.walk;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.time.LocalDate;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import sojourn.GivenPrices;
import sojourn.archive.Table;
import sojourn.archive.TimelineFiles;
import sojourn.market.Known;
import sojourn.regime.EmissionFamily;
import sojourn.regime.ModelKind;
import sojourn.regime.StartRunner;

/**
 * A walk that watches two series: its probabilities computed again from the table of fits and the prices alone, with the density of
 * two correlated normals as textbooks print it; numbers missing in one series only; names of the series in files and messages.
 */
class SeveralSeriesTest {
    private static final int BARS = 360;
    private static final List<Observation> OBSERVED =
            List.of(new Walks.Gappy(bar -> bar % 9 == 4), new KnownAfter(new LogReturn("b"), 2));
    private static final String FIRST = "gappy_a";
    private static final String SECOND = "log_return_b_known_after_2";

    private static RegimeSettings watching(List<Observation> observed, EmissionFamily family) {
        return new RegimeSettings(
                ModelKind.HIDDEN_MARKOV,
                observed,
                List.of("calm", "stormy"),
                family,
                Optional.empty(),
                Optional.empty());
    }

    @ParameterizedTest
    @CsvSource({"true, NORMAL", "false, NORMAL", "false, NORMAL_DIAGONAL"})
    void everyProbabilityFollowsFromTheTableOfFits(boolean rolling, EmissionFamily.Form form) {
        GivenPrices prices = Walks.weathers(21, BARS, 2);
        EmissionFamily family =
                form == EmissionFamily.Form.NORMAL ? EmissionFamily.NORMAL : EmissionFamily.NORMAL_DIAGONAL;
        RegimeSettings regimes = watching(OBSERVED, family);
        RefitSettings refit =
                rolling ? Walks.rolling(120, 100, Walks.every(30)) : Walks.expanding(150, Walks.every(30));
        RegimeTimeline timeline = Walks.forward(prices, regimes, refit);
        Table fits = TimelineFiles.fits(timeline, List.of(FIRST, SECOND));
        assertThat(fits.rows()).hasSizeGreaterThanOrEqualTo(6);
        int checked = 0;
        for (int bar = timeline.firstBar().orElseThrow(); bar < BARS; bar += 7) {
            int row = timeline.fitInForce(bar).orElseThrow() - 1;
            int start = prices.dates().indexOf(LocalDate.parse(PlainFilter.cell(fits, row, "window_start")));
            double[] expected = filtered(fits, row, prices, start, bar);
            assertThat(timeline.probability(bar, 0)).as("bar %d", bar).isCloseTo(expected[0], within(1e-11));
            assertThat(timeline.probability(bar, 1)).as("bar %d", bar).isCloseTo(expected[1], within(1e-11));
            checked++;
        }
        assertThat(checked).isGreaterThan(25);
        if (family.equals(EmissionFamily.NORMAL_DIAGONAL)) {
            assertThat(number(fits, 0, "correlation." + FIRST + "." + SECOND + ".calm"))
                    .isZero();
        }
    }

    /** Hamilton (1989), Econometrica 57, 357-384, from parameters as the file has them. */
    private static double[] filtered(Table fits, int row, GivenPrices prices, int start, int bar) {
        double[] p = new double[2];
        for (int t = start; t <= bar; t++) {
            double[] next = new double[2];
            for (int j = 0; j < 2; j++) {
                if (t == start) {
                    next[j] = number(fits, row, "initial." + name(j));
                } else {
                    next[j] = p[0] * number(fits, row, "transition.calm." + name(j))
                            + p[1] * number(fits, row, "transition.stormy." + name(j));
                }
                next[j] *= density(fits, row, name(j), first(prices, t), second(prices, t));
            }
            p[0] = next[0] / (next[0] + next[1]);
            p[1] = next[1] / (next[0] + next[1]);
        }
        return p;
    }

    private static double density(Table fits, int row, String state, OptionalDouble x, OptionalDouble y) {
        double sx = number(fits, row, "sd." + FIRST + "." + state);
        double sy = number(fits, row, "sd." + SECOND + "." + state);
        double u = (x.orElse(0) - number(fits, row, "mean." + FIRST + "." + state)) / sx;
        double v = (y.orElse(0) - number(fits, row, "mean." + SECOND + "." + state)) / sy;
        double one = Math.exp(-u * u / 2) / (sx * Math.sqrt(2 * Math.PI));
        double other = Math.exp(-v * v / 2) / (sy * Math.sqrt(2 * Math.PI));
        if (x.isEmpty() || y.isEmpty()) {
            return (x.isPresent() ? one : 1) * (y.isPresent() ? other : 1);
        }
        double r = number(fits, row, "correlation." + FIRST + "." + SECOND + "." + state);
        double q = (u * u - 2 * r * u * v + v * v) / (1 - r * r);
        return Math.exp(-q / 2) / (2 * Math.PI * sx * sy * Math.sqrt(1 - r * r));
    }

    private static OptionalDouble first(GivenPrices prices, int bar) {
        return bar % 9 == 4
                ? OptionalDouble.empty()
                : OptionalDouble.of(Math.log(prices.close(0, bar) / prices.close(0, bar - 1)));
    }

    private static OptionalDouble second(GivenPrices prices, int bar) {
        return bar < 3
                ? OptionalDouble.empty()
                : OptionalDouble.of(Math.log(prices.close(1, bar - 2) / prices.close(1, bar - 3)));
    }

    private static String name(int state) {
        return state == 0 ? "calm" : "stormy";
    }

    private static double number(Table fits, int row, String column) {
        return Double.parseDouble(PlainFilter.cell(fits, row, column));
    }

    @Test
    void aBarWithOneOfTwoSeriesIsAnObservation() {
        GivenPrices prices = Walks.weathers(22, BARS, 2);
        List<Observation> apart = List.of(new Walks.Gappy(bar -> bar % 3 == 1), new KnownAfter(new LogReturn("b"), 5));
        FitPlan plan = FitPlan.of(
                prices.table(), watching(apart, EmissionFamily.NORMAL), Walks.expanding(150, Walks.every(50)));
        // every bar from 2 on holds a number, but the first five only where the first series has one: bars 2, 3 and 5
        assertThat(plan.observations()).isEqualTo(3 + BARS - 6);
        RegimeTimeline timeline =
                Walks.forward(prices, watching(apart, EmissionFamily.NORMAL), Walks.expanding(150, Walks.every(50)));
        assertThat(timeline.fits().stream().map(FitRecord::fittedOn).toList()).isEqualTo(plan.fitDates());
        assertThat(timeline.fits().get(0).fit().observations()).isEqualTo(150);
        assertThat(timeline.fits().get(0).windowStart())
                .isEqualTo(prices.dates().get(2));
    }

    @Test
    void theFirstObservationsAssetOrdersTheRegimes() {
        GivenPrices prices = Walks.weathers(23, BARS, 2); // b is quiet where a is wild
        RefitSettings refit = Walks.expanding(300, Walks.every(100));
        List<Observation> both = List.of(new LogReturn("a"), new LogReturn("b"));
        List<Observation> turned = List.of(new LogReturn("b"), new LogReturn("a"));
        RegimeTimeline byA = Walks.forward(prices, watching(both, EmissionFamily.NORMAL), refit);
        RegimeTimeline byB = Walks.forward(prices, watching(turned, EmissionFamily.NORMAL), refit);
        for (int bar = 320; bar < BARS; bar++) {
            assertThat(byB.probability(bar, 0)).isCloseTo(byA.probability(bar, 1), within(1e-6));
        }
    }

    @Test
    void aTimelineGoesOnToTheBit() {
        GivenPrices prices = Walks.weathers(24, BARS, 2);
        RegimeSettings regimes = watching(OBSERVED, EmissionFamily.NORMAL);
        RefitSettings refit = Walks.rolling(120, 100, Walks.every(30));
        RegimeTimeline whole = Walks.forward(prices, regimes, refit);
        for (int cut : new int[] {90, 105, 161, 200, BARS - 1}) {
            RegimeTimeline earlier = Walks.forward(prices.first(cut), regimes, refit);
            RegimeTimeline later =
                    Walk.onward(earlier, prices.table(), regimes, refit, StartRunner.sequential(), bar -> {});
            assertThat(TimelineFiles.bars(later).csv())
                    .isEqualTo(TimelineFiles.bars(whole).csv());
            assertThat(TimelineFiles.fits(later, List.of(FIRST, SECOND)).csv())
                    .isEqualTo(TimelineFiles.fits(whole, List.of(FIRST, SECOND)).csv());
        }
    }

    @Test
    void aRefusalNamesTheSeries() {
        double[][] closes = new double[2][BARS];
        GivenPrices prices = Walks.weathers(25, BARS, 1);
        for (int bar = 0; bar < BARS; bar++) {
            closes[0][bar] = prices.close(0, bar);
            closes[1][bar] = 50;
        }
        List<Observation> both = List.of(new LogReturn("a"), new LogReturn("b"));
        RegimeTimeline timeline = Walks.forward(
                GivenPrices.closes(closes),
                watching(both, EmissionFamily.NORMAL),
                Walks.expanding(100, Walks.every(100)));
        assertThat(timeline.fits())
                .isNotEmpty()
                .allSatisfy(record -> assertThat(record.explanation())
                        .isEqualTo("all observations of log-return of b in the window are equal"));
        assertThat(TimelineFiles.fits(timeline, List.of("x", "y")).csv()).doesNotContain("NaN");
    }

    @Test
    void theAddressKnowsWhatTheSecondSeriesReads() {
        byte[] settings = {1};
        List<Observation> both = List.of(new LogReturn("a"), new Opening("b"));
        GivenPrices prices = Walks.weathers(26, 40, 2);
        double[][] opens = new double[2][40];
        for (int bar = 0; bar < 40; bar++) {
            opens[0][bar] = prices.close(0, bar);
            opens[1][bar] = prices.close(1, bar);
        }
        String before = TimelineAddress.of(settings, prices.withOpens(opens).table(), both);
        opens[1][20] = Math.nextUp(opens[1][20]);
        assertThat(TimelineAddress.of(settings, prices.withOpens(opens).table(), both))
                .isNotEqualTo(before);
        assertThat(TimelineAddress.at(settings, prices.withOpens(opens).table(), both, 19))
                .isEqualTo(TimelineAddress.at(settings, prices.table(), both, 19));
    }

    /** An observation that reads opens. */
    private record Opening(String asset) implements Observation {
        @Override
        public OptionalDouble at(Known known) {
            return OptionalDouble.empty();
        }

        @Override
        public String word() {
            return "opening";
        }

        @Override
        public String column() {
            return "opening_" + asset;
        }

        @Override
        public List<BarColumn> reads() {
            return List.of(BarColumn.OPEN);
        }
    }
}
