package sojourn.walk;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import java.util.List;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import sojourn.GivenPrices;
import sojourn.archive.TimelineFiles;
import sojourn.regime.Outcome;

/** What a refused fit leads to: nothing before the first accepted one, the previous one or no reading afterwards. */
class RefusedFitsTest {
    private static final int STILL_FROM = 160;
    private static final int STILL_TO = 260;
    private static final RefitSettings KEEP = settings(RefitSettings.OnFailure.KEEP_PREVIOUS);
    private static final RefitSettings ASIDE = settings(RefitSettings.OnFailure.STAND_ASIDE);

    /** Weather, a hundred closes that do not move, weather again: some rolling windows are constant. */
    private static final GivenPrices PRICES = stillBetween(Walks.weathers(21, 400, 1), STILL_FROM, STILL_TO);

    @Test
    void aWindowThatCannotBeFittedIsListedWithItsReason() {
        RegimeTimeline timeline = Walks.forward(PRICES, Walks.twoRegimes(), KEEP);
        for (FitRecord record : timeline.fits()) {
            boolean still = record.bar() - 60 >= STILL_FROM && record.bar() < STILL_TO; // all 60 returns are 0
            assertThat(record.fit().outcome() == Outcome.FAILED).isEqualTo(still);
            if (still) {
                assertThat(record.fit().explanation()).isEqualTo("all observations of the window are equal");
            }
        }
        assertThat(refused(timeline)).hasSizeGreaterThan(2);
        assertThat(timeline.fits().stream().map(FitRecord::number))
                .containsExactlyElementsOf(IntStream.rangeClosed(1, 16).boxed().toList());
    }

    @Test
    void thePreviousFitStaysInForceAndFiltersOn() {
        RegimeTimeline timeline = Walks.forward(PRICES, Walks.twoRegimes(), KEEP);
        int kept = refused(timeline).get(0).number() - 1;
        FitRecord nextAccepted = timeline.fits().stream()
                .filter(record ->
                        record.number() > kept && record.fit().outcome().accepted())
                .findFirst()
                .orElseThrow();
        int from = refused(timeline).get(0).bar();
        FitRecord inForce = timeline.fits().get(kept - 1);
        int start = inForce.bar() - 59;
        double[] x = new double[nextAccepted.bar() - start];
        Arrays.setAll(x, row -> Math.log(PRICES.close(0, start + row) / PRICES.close(0, start + row - 1)));
        List<PlainFilter.Step> steps = PlainFilter.of(
                        TimelineFiles.fits(timeline, List.of("log_return_a")),
                        kept - 1,
                        timeline.regimes(),
                        "log_return_a")
                .over(x);
        assertThat(nextAccepted.bar()).isGreaterThan(from);
        for (int bar = from; bar < nextAccepted.bar(); bar++) {
            assertThat(timeline.fitInForce(bar)).hasValue(kept);
            assertThat(timeline.reading(bar)).isPresent();
            assertThat(timeline.logScore(bar)).isPresent();
            assertThat(timeline.probability(bar, 1))
                    .isCloseTo(steps.get(bar - start).filtered().get(1), within(1e-12));
        }
        assertThat(timeline.fitInForce(nextAccepted.bar())).hasValue(nextAccepted.number());
    }

    @Test
    void standingAsideThereIsNoReadingUntilAFitIsAccepted() {
        RegimeTimeline timeline = Walks.forward(PRICES, Walks.twoRegimes(), ASIDE);
        RegimeTimeline keeping = Walks.forward(PRICES, Walks.twoRegimes(), KEEP);
        boolean aside = false;
        int barsAside = 0;
        int returns = 0;
        for (int bar = timeline.firstBar().orElseThrow(); bar < timeline.endBar(); bar++) {
            boolean before = aside;
            for (FitRecord record : timeline.fits()) {
                aside = record.bar() == bar ? !record.fit().outcome().accepted() : aside;
            }
            assertThat(timeline.reading(bar).isEmpty()).as("bar %d", bar).isEqualTo(aside);
            assertThat(timeline.at(PRICES.table().knownAt(bar)).isEmpty()).isEqualTo(aside);
            assertThat(timeline.fitInForce(bar).isEmpty()).isEqualTo(aside);
            // the bar is scored by the fit in force before it; while standing aside there is none
            assertThat(timeline.logScore(bar).isPresent())
                    .as("score of bar %d", bar)
                    .isEqualTo(!before && bar > timeline.firstBar().orElseThrow());
            if (!aside) {
                assertThat(timeline.reading(bar).orElseThrow().filtered())
                        .containsExactly(keeping.reading(bar).orElseThrow().filtered());
            }
            barsAside += aside ? 1 : 0;
            returns += before && !aside ? 1 : 0;
        }
        assertThat(barsAside).isGreaterThan(40);
        assertThat(returns).isPositive();
    }

    @Test
    void beforeTheFirstAcceptedFitThereIsNoReading() {
        GivenPrices stillAtFirst = stillBetween(Walks.weathers(22, 200, 1), 0, 70);
        RegimeTimeline timeline =
                Walks.forward(stillAtFirst, Walks.twoRegimes(), Walks.rolling(40, 30, Walks.every(20)));
        FitRecord accepted = timeline.fits().stream()
                .filter(record -> record.fit().outcome().accepted())
                .findFirst()
                .orElseThrow();
        assertThat(accepted.number()).isGreaterThan(2);
        assertThat(timeline.firstBar()).hasValue(accepted.bar());
        for (int bar = 0; bar < accepted.bar(); bar++) {
            assertThat(timeline.reading(bar)).isEmpty();
        }
        assertThat(timeline.reading(accepted.bar())).isPresent();
    }

    @Test
    void withoutAnAcceptedFitThereIsAnEmptyTimelineThatListsTheRefusals() {
        RegimeTimeline timeline =
                Walks.forward(GivenPrices.flat(100, 1), Walks.twoRegimes(), Walks.expanding(30, Walks.every(20)));
        assertThat(timeline.fits()).hasSize(4);
        assertThat(timeline.firstBar()).isEmpty();
        assertThat(timeline.endBar()).isZero();
        assertThat(timeline.reading(50)).isEmpty();
    }

    @Test
    void withoutEnoughObservationsNoFitIsDue() {
        RegimeTimeline timeline =
                Walks.forward(Walks.weathers(23, 50, 1), Walks.twoRegimes(), Walks.expanding(50, Walks.every(20)));
        assertThat(timeline.fits()).isEmpty();
        assertThat(timeline.firstBar()).isEmpty();
    }

    @Test
    void aDegenerateFitIsRefusedToo() {
        double[] closes = new double[120];
        double price = 100;
        for (int bar = 0; bar < closes.length; bar++) {
            price *= bar == 40 ? 1.5 : 1 + 0.001 * (bar % 2); // one leap among returns of two sizes
            closes[bar] = price;
        }
        RegimeTimeline timeline =
                Walks.forward(GivenPrices.closes(closes), Walks.twoRegimes(), Walks.expanding(60, Walks.every(1000)));
        assertThat(timeline.fits()).hasSize(1);
        assertThat(timeline.fits().get(0).fit().outcome()).isEqualTo(Outcome.DEGENERATE);
        assertThat(timeline.fits().get(0).fit().model()).isPresent();
        assertThat(timeline.firstBar()).isEmpty();
    }

    private static List<FitRecord> refused(RegimeTimeline timeline) {
        return timeline.fits().stream()
                .filter(record -> !record.fit().outcome().accepted())
                .toList();
    }

    private static RefitSettings settings(RefitSettings.OnFailure onFailure) {
        return Walks.rolling(60, 80, Walks.every(20), onFailure);
    }

    private static GivenPrices stillBetween(GivenPrices prices, int from, int to) {
        double[] closes = new double[prices.size()];
        for (int bar = 0; bar < closes.length; bar++) {
            closes[bar] = prices.close(0, bar >= from && bar < to ? from : bar);
        }
        return GivenPrices.closes(closes);
    }
}
