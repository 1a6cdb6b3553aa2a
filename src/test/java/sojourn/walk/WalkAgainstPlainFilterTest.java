package sojourn.walk;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.time.LocalDate;
import java.util.Arrays;
import java.util.List;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import sojourn.GivenPrices;
import sojourn.archive.Table;
import sojourn.archive.TimelineFiles;
import sojourn.market.PriceTable;

/**
 * Every probability of a timeline, computed again by {@link PlainFilter} from the table of fits alone: restarted at the window's
 * start with the fit's initial distribution, parameters frozen until the next accepted fit.
 */
class WalkAgainstPlainFilterTest {
    /** Two ways to sum a few hundred products of numbers below 1. */
    private static final double ROUNDING = 1e-12;

    private static final int BARS = 320;

    @Test
    void expandingWindow() {
        assertFiltered(Walks.twoRegimes(), Walks.expanding(150, Walks.every(20)), 9);
    }

    @Test
    void rollingWindow() {
        assertFiltered(Walks.twoRegimes(), Walks.rolling(100, 80, Walks.every(20)), 12);
    }

    @Test
    void monthlyFits() {
        assertFiltered(Walks.twoRegimes(), Walks.rolling(100, 80, RefitSchedule.FirstBarOf.MONTH), 11);
    }

    @Test
    void missingObservations() {
        Walks.Gappy gappy = new Walks.Gappy(bar -> bar % 7 == 3 || bar / 12 == 15);
        assertFiltered(Walks.observing(gappy, "calm", "stormy"), Walks.rolling(100, 80, Walks.every(20)), 10);
    }

    @Test
    void threeRegimes() {
        assertFiltered(
                Walks.observing(new SimpleReturn("a"), "calm", "uneasy", "stormy"),
                Walks.expanding(200, Walks.every(60)),
                2);
    }

    private static void assertFiltered(RegimeSettings regimes, RefitSettings refit, int fitsExpected) {
        GivenPrices prices = Walks.weathers(11, BARS, 1);
        Observation observation = regimes.observe().get(0);
        RegimeTimeline timeline = Walks.forward(prices, regimes, refit);
        Table fits = TimelineFiles.fits(timeline, List.of(observation.column()));
        assertThat(fits.rows()).hasSize(fitsExpected);
        double[] x = observed(prices.table(), observation);
        int checked = 0;
        for (int row = 0; row < fitsExpected; row++) {
            assertThat(timeline.fits().get(row).fit().outcome().accepted()).isTrue();
            int start = bar(prices, PlainFilter.cell(fits, row, "window_start"));
            int from = bar(prices, PlainFilter.cell(fits, row, "first_used_on"));
            int to = row + 1 < fitsExpected ? bar(prices, PlainFilter.cell(fits, row + 1, "first_used_on")) : BARS - 1;
            List<PlainFilter.Step> steps = PlainFilter.of(fits, row, regimes.states(), observation.column())
                    .over(Arrays.copyOfRange(x, start, to + 1));
            for (int bar = from; bar <= to; bar++) {
                PlainFilter.Step step = steps.get(bar - start);
                if (bar < to || row + 1 == fitsExpected) {
                    assertThat(timeline.fitInForce(bar)).hasValue(row + 1);
                    assertThat(timeline.reading(bar).orElseThrow().fit()).isEqualTo(row + 1);
                    double[] filtered = timeline.reading(bar).orElseThrow().filtered();
                    assertThat(filtered).hasSize(step.filtered().size());
                    for (int k = 0; k < filtered.length; k++) {
                        assertThat(filtered[k])
                                .as("bar %d", bar)
                                .isCloseTo(step.filtered().get(k), within(ROUNDING));
                    }
                    checked++;
                }
                if (bar > from) { // the fit made at the close of bar `to` has not scored it
                    assertSame(timeline.logScore(bar), step.logDensity(), bar);
                }
            }
        }
        assertThat(timeline.logScore(timeline.firstBar().orElseThrow())).isEmpty();
        assertThat(timeline.reading(timeline.firstBar().orElseThrow() - 1)).isEmpty();
        assertThat(checked).isEqualTo(BARS - timeline.firstBar().orElseThrow());
    }

    private static void assertSame(OptionalDouble got, OptionalDouble expected, int bar) {
        assertThat(got.isPresent()).as("bar %d has a score", bar).isEqualTo(expected.isPresent());
        assertThat(got.orElse(0)).as("score of bar %d", bar).isCloseTo(expected.orElse(0), within(1e-11));
    }

    private static double[] observed(PriceTable table, Observation observation) {
        double[] x = new double[table.size()];
        Arrays.setAll(x, bar -> observation.at(table.knownAt(bar)).orElse(Double.NaN));
        return x;
    }

    private static int bar(GivenPrices prices, String date) {
        int bar = prices.dates().indexOf(LocalDate.parse(date));
        assertThat(bar).isNotNegative();
        return bar;
    }
}
