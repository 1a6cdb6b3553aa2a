package sojourn.walk;

import static org.assertj.core.api.Assertions.assertThat;

import java.time.LocalDate;
import java.util.Arrays;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import sojourn.GivenPrices;
import sojourn.market.Known;
import sojourn.regime.RegimeModel;

/** Which observations a fit uses. */
class WindowTest {
    private static final int BARS = 170;

    @Test
    void anExpandingWindowHoldsEverythingSoFar() {
        GivenPrices prices = Walks.weathers(4, BARS, 1);
        RegimeTimeline timeline =
                Walks.forward(prices, Walks.oneRegime(new LogReturn("a")), Walks.expanding(40, Walks.every(10)));
        assertThat(timeline.fits()).hasSize(13);
        for (FitRecord record : timeline.fits()) {
            assertThat(record.windowStart()).isEqualTo(prices.dates().get(1));
            assertThat(record.fit().observations()).isEqualTo(record.bar());
        }
    }

    @Test
    void aRollingWindowHoldsTheLastSoManyAndAllWhileFewer() {
        GivenPrices prices = Walks.weathers(4, BARS, 1);
        RegimeTimeline timeline =
                Walks.forward(prices, Walks.oneRegime(new LogReturn("a")), Walks.rolling(60, 40, Walks.every(10)));
        assertThat(timeline.fits()).hasSize(13);
        for (FitRecord record : timeline.fits()) {
            int used = Math.min(60, record.bar());
            assertThat(record.fit().observations()).isEqualTo(used);
            assertThat(record.windowStart()).isEqualTo(prices.dates().get(record.bar() - used + 1));
        }
    }

    @Test
    void aRollingWindowCountsObservationsNotBars() {
        GivenPrices prices = Walks.weathers(5, BARS, 1);
        Walks.Gappy gappy = new Walks.Gappy(bar -> bar % 4 == 1 || bar / 20 == 3);
        RegimeTimeline timeline = Walks.forward(prices, Walks.oneRegime(gappy), Walks.rolling(30, 20, Walks.every(7)));
        for (FitRecord record : timeline.fits()) {
            int seen = 0;
            int bar = record.bar() + 1;
            while (seen < 30 && bar > 2) {
                bar--;
                seen += gappy.gap().test(bar) ? 0 : 1;
            }
            assertThat(record.fit().observations()).isEqualTo(seen);
            assertThat(record.windowStart()).isEqualTo(prices.dates().get(bar));
        }
        assertThat(timeline.fits().get(timeline.fits().size() - 1).fit().observations())
                .isEqualTo(30);
    }

    @Test
    void whatLiesBeforeARollingWindowHasNoInfluence() {
        int dropped = 40;
        GivenPrices prices = Walks.weathers(6, BARS, 2);
        double[][] tails = new double[2][];
        LocalDate[] days = prices.dates().subList(dropped, BARS).toArray(LocalDate[]::new);
        for (int asset = 0; asset < 2; asset++) {
            double[] tail = new double[BARS - dropped];
            for (int bar = 0; bar < tail.length; bar++) {
                tail[bar] = prices.close(asset, bar + dropped);
            }
            tails[asset] = tail;
        }
        RegimeTimeline whole = Walks.forward(prices, Walks.twoRegimes(), Walks.rolling(80, 120, Walks.every(1000)));
        RegimeTimeline tail = Walks.forward(
                GivenPrices.closes(tails).on(days), Walks.twoRegimes(), Walks.expanding(80, Walks.every(1000)));
        assertThat(bits(whole)).isEqualTo(bits(tail));
        for (int bar = 120; bar < BARS; bar++) {
            assertThat(whole.reading(bar).orElseThrow().filtered())
                    .containsExactly(tail.reading(bar - dropped).orElseThrow().filtered());
        }
    }

    @Test
    void barsBeforeTheFirstObservationBelongToNoWindow() {
        GivenPrices prices = Walks.weathers(7, 90, 1);
        RegimeTimeline timeline = Walks.forward(
                prices, Walks.oneRegime(new Walks.Gappy(bar -> bar < 25)), Walks.expanding(30, Walks.every(10)));
        assertThat(timeline.fits().get(0).bar()).isEqualTo(54);
        assertThat(timeline.fits().get(0).windowStart())
                .isEqualTo(prices.dates().get(25));
    }

    @Test
    void theFilesFirstBarIsNoObservationEvenIfSomethingCouldBeSeenThere() {
        Observation level = new Observation() {
            @Override
            public OptionalDouble at(Known known) {
                return OptionalDouble.of(known.close(0, known.bar()));
            }

            @Override
            public String asset() {
                return "a";
            }

            @Override
            public String word() {
                return "level";
            }

            @Override
            public String column() {
                return "level_a";
            }
        };
        GivenPrices prices = Walks.weathers(8, 60, 1);
        RegimeTimeline timeline = Walks.forward(prices, Walks.oneRegime(level), Walks.expanding(30, Walks.every(1000)));
        assertThat(timeline.firstBar()).hasValue(30);
        assertThat(timeline.fits().get(0).windowStart())
                .isEqualTo(prices.dates().get(1));
    }

    /** Everything a single fit found; boxed doubles compare their bits. */
    private static Object bits(RegimeTimeline timeline) {
        assertThat(timeline.fits()).hasSize(1);
        FitRecord record = timeline.fits().get(0);
        RegimeModel model = record.fit().model().orElseThrow();
        Object[] facts = {
            record.fittedOn(),
            record.windowStart(),
            record.fit().logLikelihood(),
            record.fit().iterations(),
            model.initial(0),
            model.transition(0, 0),
            model.transition(1, 1),
            model.emission().mean(0, 0),
            model.emission().standardDeviation(1, 0),
            record.fit().moments().orElseThrow().covariance(1, 0, 1)
        };
        return Arrays.asList(facts);
    }
}
