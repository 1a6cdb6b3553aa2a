package sojourn.walk;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import sojourn.GivenPrices;
import sojourn.archive.TimelineFiles;
import sojourn.regime.RegimeModel;
import sojourn.regime.StartRunner;

/** A timeline that goes on with new bars is the timeline of the longer history. */
class WalkOnwardTest {
    private static final int BARS = 420;
    private static final int[] CUTS = {2, 199, 200, 201, 202, 250, 260, 261, 262, 300, BARS - 1, BARS};

    @Test
    void onExpandingWindowsItEqualsAFreshOneToTheBit() {
        GivenPrices prices = Walks.weathers(11, BARS, 2);
        assertOnward(prices, Walks.twoRegimes(), Walks.expanding(200, Walks.every(20)));
    }

    @Test
    void onRollingWindowsWithGapsItEqualsAFreshOneToTheBit() {
        GivenPrices prices = Walks.weathers(12, BARS, 2);
        RegimeSettings gappy = Walks.observing(new Walks.Gappy(bar -> bar % 7 == 3), "calm", "stormy");
        assertOnward(prices, gappy, Walks.rolling(120, 150, RefitSchedule.FirstBarOf.MONTH));
    }

    @Test
    void whereFitsAreRefusedItEqualsAFreshOneToTheBit() {
        double[] closes = new double[BARS];
        GivenPrices prices = Walks.weathers(13, BARS, 1);
        for (int bar = 0; bar < BARS; bar++) {
            closes[bar] = prices.close(0, bar >= 230 && bar < 300 ? 230 : bar);
        }
        for (RefitSettings.OnFailure onFailure : RefitSettings.OnFailure.values()) {
            RefitSettings refit = Walks.rolling(50, 100, Walks.every(10), onFailure);
            RegimeTimeline whole = assertOnward(GivenPrices.closes(closes), Walks.twoRegimes(), refit);
            assertThat(whole.fits())
                    .anySatisfy(record ->
                            assertThat(record.fit().outcome().accepted()).isFalse());
        }
    }

    @Test
    void withAThresholdOnVolatilityItEqualsAFreshOneToTheBit() {
        GivenPrices prices = Walks.weathers(14, BARS, 2);
        Observation gappy = new Walks.Gappy(bar -> bar % 7 == 3);
        assertOnward(prices, Walks.threshold(new LogReturn("a")), Walks.expanding(200, Walks.every(20)));
        assertOnward(prices, Walks.threshold(gappy), Walks.rolling(120, 150, RefitSchedule.FirstBarOf.MONTH));
    }

    @Test
    void withAJumpModelItEqualsAFreshOneToTheBit() {
        GivenPrices prices = Walks.weathers(15, BARS, 2);
        RegimeSettings jump = Walks.jump(new AbsoluteReturn("a"), 6);
        assertOnward(prices, jump, Walks.expanding(200, Walks.every(20)));
        assertOnward(prices, jump, Walks.rolling(120, 150, RefitSchedule.FirstBarOf.MONTH));
        assertOnward(
                prices,
                Walks.jump(new Walks.Gappy(bar -> bar % 7 == 3), 6),
                Walks.rolling(120, 150, RefitSchedule.FirstBarOf.MONTH));
    }

    @Test
    void whereTheNumberOfRegimesIsChosenItEqualsAFreshOneToTheBit() {
        GivenPrices prices = Walks.changing(16, BARS);
        for (StateChoice.By by : StateChoice.By.values()) {
            RegimeSettings choosing = Walks.choosing(by, new LogReturn("a"));
            RegimeTimeline whole = assertOnward(prices, choosing, Walks.expanding(200, Walks.every(20)));
            assertThat(whole.fits().stream().map(FitRecord::regimes).distinct()).hasSizeGreaterThan(1);
            RegimeSettings gappy = Walks.choosing(by, new Walks.Gappy(bar -> bar % 7 == 3));
            assertOnward(prices, gappy, Walks.rolling(120, 150, RefitSchedule.FirstBarOf.MONTH));
        }
    }

    @Test
    void whereNumbersOfRegimesAreRefusedItEqualsAFreshOneToTheBit() {
        double[] closes = new double[BARS];
        GivenPrices prices = Walks.weathers(13, BARS, 1);
        for (int bar = 0; bar < BARS; bar++) {
            closes[bar] = prices.close(0, bar >= 230 && bar < 300 ? 230 : bar);
        }
        for (RefitSettings.OnFailure onFailure : RefitSettings.OnFailure.values()) {
            RegimeSettings choosing = Walks.choosing(StateChoice.By.PREDICTIVE, new LogReturn("a"));
            assertOnward(GivenPrices.closes(closes), choosing, Walks.rolling(50, 100, Walks.every(10), onFailure));
        }
    }

    @Test
    void onlyNewFitsAreMade() {
        GivenPrices prices = Walks.weathers(11, BARS, 1);
        RefitSettings refit = Walks.expanding(200, Walks.every(20));
        RegimeTimeline earlier = Walks.forward(prices.first(381), Walks.twoRegimes(), refit);
        List<Integer> walked = new ArrayList<>();
        RegimeTimeline later =
                Walk.onward(earlier, prices.table(), Walks.twoRegimes(), refit, StartRunner.sequential(), walked::add);
        assertThat(walked).first().isEqualTo(381);
        assertThat(walked).hasSize(BARS - 381);
        for (int i = 0; i < earlier.fits().size(); i++) {
            assertThat(later.fits().get(i)).isSameAs(earlier.fits().get(i));
        }
        assertThat(later.fits()).hasSize(earlier.fits().size() + 1);
    }

    @Test
    void anotherHistoryOrOtherRegimesAreRefused() {
        GivenPrices prices = Walks.weathers(11, BARS, 1);
        RefitSettings refit = Walks.expanding(200, Walks.every(100));
        RegimeTimeline earlier = Walks.forward(prices, Walks.twoRegimes(), refit);
        assertThatThrownBy(() -> onward(earlier, prices.first(300), Walks.twoRegimes(), refit))
                .isInstanceOf(IllegalArgumentException.class)
                .hasMessageContaining("ends after bar 420 of 300");
        RegimeSettings renamed = Walks.observing(new LogReturn("a"), "quiet", "loud");
        assertThatThrownBy(() -> onward(earlier, prices, renamed, refit))
                .isInstanceOf(IllegalArgumentException.class)
                .hasMessageContaining("[calm, stormy], now [quiet, loud]");
        assertThatThrownBy(() -> onward(earlier, Walks.weathers(11, BARS, 2), Walks.twoRegimes(), refit))
                .isInstanceOf(IllegalArgumentException.class)
                .hasMessageContaining("the assets were [a]");
    }

    private static RegimeTimeline assertOnward(GivenPrices prices, RegimeSettings regimes, RefitSettings refit) {
        RegimeTimeline whole = Walks.forward(prices, regimes, refit);
        assertThat(whole.fits()).hasSizeGreaterThan(5);
        for (int cut : CUTS) {
            RegimeTimeline earlier = Walks.forward(prices.first(cut), regimes, refit);
            assertSame(whole, onward(earlier, prices, regimes, refit));
        }
        return whole;
    }

    private static RegimeTimeline onward(
            RegimeTimeline earlier, GivenPrices prices, RegimeSettings regimes, RefitSettings refit) {
        return Walk.onward(earlier, prices.table(), regimes, refit, StartRunner.sequential(), bar -> {});
    }

    private static void assertSame(RegimeTimeline expected, RegimeTimeline got) {
        assertThat(got.firstBar()).isEqualTo(expected.firstBar());
        assertThat(got.endBar()).isEqualTo(expected.endBar());
        for (int bar = expected.firstBar().orElseThrow(); bar < expected.endBar(); bar++) {
            assertThat(got.date(bar)).isEqualTo(expected.date(bar));
            assertThat(got.fitInForce(bar)).isEqualTo(expected.fitInForce(bar));
            assertThat(got.logScore(bar)).isEqualTo(expected.logScore(bar));
            assertThat(got.reading(bar).map(WalkOnwardTest::numbers))
                    .isEqualTo(expected.reading(bar).map(WalkOnwardTest::numbers));
            for (int k = 0; k < expected.regimes().size(); k++) {
                assertThat(got.probability(bar, k)).isEqualTo(expected.probability(bar, k));
            }
        }
        assertThat(TimelineFiles.fits(got, List.of("x")).csv())
                .isEqualTo(TimelineFiles.fits(expected, List.of("x")).csv());
        assertThat(got.fits()).hasSameSizeAs(expected.fits());
        for (int i = 0; i < expected.fits().size(); i++) {
            FitRecord a = expected.fits().get(i);
            FitRecord b = got.fits().get(i);
            assertThat(List.of(b.number(), b.bar(), b.fittedOn(), b.windowStart(), b.events()))
                    .isEqualTo(List.of(a.number(), a.bar(), a.fittedOn(), a.windowStart(), a.events()));
            assertThat(b.fit().outcome()).isEqualTo(a.fit().outcome());
            assertThat(parameters(b.fit().model())).isEqualTo(parameters(a.fit().model()));
        }
    }

    private static List<Double> numbers(Reading reading) {
        List<Double> numbers = new ArrayList<>();
        for (int k = 0; k < reading.states(); k++) {
            numbers.add(reading.filtered(k));
            numbers.add(reading.predicted(1)[k]);
        }
        Forecast next = reading.forecast(1);
        numbers.add(next.mean(0));
        numbers.add(next.volatility(0));
        return numbers;
    }

    private static List<Double> parameters(Optional<RegimeModel> model) {
        List<Double> parameters = new ArrayList<>();
        model.ifPresent(m -> {
            for (int i = 0; i < m.states(); i++) {
                parameters.add(m.initial(i));
                parameters.add(m.emission().mean(i, 0));
                parameters.add(m.emission().standardDeviation(i, 0));
                for (int j = 0; j < m.states(); j++) {
                    parameters.add(m.transition(i, j));
                }
            }
        });
        return parameters;
    }
}
