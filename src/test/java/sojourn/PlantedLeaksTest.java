package sojourn;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Path;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.IntFunction;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import sojourn.PrefixCheck.Difference;
import sojourn.PrefixCheck.Rows;
import sojourn.allocate.Because;
import sojourn.allocate.Decision;
import sojourn.allocate.Policy;
import sojourn.allocate.Weights;
import sojourn.market.BarLength;
import sojourn.market.Calendar;
import sojourn.market.CashRates;
import sojourn.market.DayCount;
import sojourn.market.FillPrices;
import sojourn.market.Known;
import sojourn.market.Market;
import sojourn.market.PriceSeries;
import sojourn.market.PriceTable;
import sojourn.market.TimeAxis;
import sojourn.regime.FilterState;
import sojourn.regime.Fit;
import sojourn.regime.Observations;
import sojourn.regime.RegimeModel;
import sojourn.regime.Smoothed;
import sojourn.walk.LogReturn;
import sojourn.walk.Observation;
import sojourn.walk.Reading;
import sojourn.walk.RegimeSettings;
import sojourn.walk.RegimeTimeline;
import sojourn.walk.Signal;

/**
 * Dishonest parts put into the whole job, one at a time: the check that {@link NoLookAheadTest} rests on catches each. Nothing of
 * the kind can be written with what {@code walk} and {@code allocate} are shown; here they are handed the whole price table.
 */
class PlantedLeaksTest {
    private static final PriceHistory STOCKS = PriceHistory.stocks();
    private static final int ROWS = 900;
    private static final int FIRST_FIT = 300;
    /** Cuts at the first fit, between fits, at one, and at a month's last day. */
    private static final int[] CUTS = {FIRST_FIT + 1, 360, 401, 500, 650, monthEnd(), ROWS - 1};

    private static final String BLEND = """
            strategy: Lean with the odds
            prices: {stocks: {csv: stocks.csv}}
            cash: {percent-per-year: 4}
            regimes: {observe: [{log-return: stocks}], states: [calm, stormy]}
            refit: {first-fit-after: 300, every: 100, starts: 1, seed: 7}
            allocate: {blend: {weights: {calm: {stocks: 1}, stormy: {stocks: 0}}}}
            judge: {against: [buy-and-hold], buy-and-hold: {stocks: 1}, rank-by: sharpe}
            """;

    @TempDir
    private static Path folder;

    private static WholeJob honest;

    @BeforeAll
    static void readStrategy() {
        honest = WholeJob.of(BLEND, folder);
    }

    @Test
    void theHonestJobPasses() {
        assertThat(differences(rows -> honest.run(market(rows)))).isEmpty();
    }

    @Test
    void smoothedProbabilitiesAreCaught() {
        WholeJob leaky = honest.signalling((table, timeline) -> new Hindsight(table, timeline) {
            @Override
            double[] probabilities(int bar) {
                return new double[] {smoothed.at(bar - 1, 0), smoothed.at(bar - 1, 1)};
            }
        });
        List<Difference> caught = differences(rows -> leaky.run(market(rows)));
        assertThat(caught).hasSize(CUTS.length);
        assertThat(caught)
                .allSatisfy(difference -> assertThat(difference.column()).isEqualTo("target.stocks"));
    }

    @Test
    void parametersOfTheFullSampleAreCaughtEvenIfTheFilterIsHonest() {
        WholeJob leaky = honest.signalling((table, timeline) -> new Hindsight(table, timeline) {
            @Override
            double[] probabilities(int bar) {
                return filtered.get(bar - 1).probabilities();
            }
        });
        List<Difference> caught = differences(rows -> leaky.run(market(rows)));
        assertThat(caught).hasSizeGreaterThanOrEqualTo(CUTS.length - 1); // the last cut has the last fit of the whole
        assertThat(caught)
                .allSatisfy(difference -> assertThat(difference.column()).isEqualTo("target.stocks"));
    }

    @Test
    void aPolicyThatPeeksAtTheNextCloseIsCaughtAtTheLastBar() {
        WholeJob leaky = honest.deciding((table, own) -> peeking(table.fillPrices()));
        List<Difference> caught = differences(rows -> leaky.run(market(rows)));
        assertThat(caught).isNotEmpty().allSatisfy(difference -> {
            assertThat(difference.row()).isEqualTo("path of " + STOCKS.date(difference.cut() - 1));
            assertThat(difference.column()).isEqualTo("target.stocks");
            assertThat(difference.inWhole()).isEqualTo("1.0");
            assertThat(difference.inCut()).isEqualTo("0.0");
        });
    }

    @Test
    void decidingOnTheLastBarOfTheMonthIsCaughtOnThatBar() {
        WholeJob leaky =
                honest.deciding((table, own) -> onLastOfMonth(table.fillPrices().axis(), own));
        List<Difference> caught = differences(rows -> leaky.run(market(rows)));
        assertThat(caught).hasSize(1);
        assertThat(caught.get(0).cut()).isEqualTo(monthEnd());
        assertThat(caught.get(0).row()).isEqualTo("path of " + STOCKS.date(monthEnd() - 1));
        assertThat(caught.get(0).column()).isEqualTo("target.stocks");
    }

    @Test
    void anObservationScaledByTheFullSamplesDeviationIsCaught() {
        WholeJob leaky = honest.observing((table, own) -> new RegimeSettings(
                own.model(),
                List.of(new Scaled(deviation(table))),
                own.states(),
                own.emission(),
                own.orderBy(),
                own.fixed()));
        List<Difference> caught = differences(rows -> leaky.run(market(rows)));
        assertThat(caught).hasSize(CUTS.length);
    }

    @Test
    void aMarketCleanedByTheFullSamplesDeviationIsCaught() {
        List<Difference> caught = differences(rows -> honest.run(daily(cleaned(rows))));
        assertThat(caught).isNotEmpty();
    }

    @Test
    void aWeekThatIsNotOverAndYetABarIsCaught() {
        WholeJob weekly = WholeJob.of(
                BLEND.replace("strategy:", "calendar: {bars: weekly, rows: bars}\nstrategy:")
                        .replace("first-fit-after: 300, every: 100", "first-fit-after: 60, every: 20"),
                folder);
        List<Difference> caught = differences(rows -> weekly.run(hastyWeeks(rows)));
        assertThat(caught).isNotEmpty();
        assertThat(caught).allSatisfy(difference -> {
            LocalDate lastDay = STOCKS.date(difference.cut() - 1);
            assertThat(difference.row() + difference.inCut()).contains(lastDay.toString());
        });
    }

    /** A job's differences at {@link #CUTS}, at most one a cut. */
    private static List<Difference> differences(IntFunction<Rows> job) {
        PrefixCheck check = PrefixCheck.of(job, ROWS);
        List<Difference> found = new ArrayList<>();
        for (int cut : CUTS) {
            check.difference(cut).ifPresent(found::add);
        }
        return found;
    }

    /** A signal from the parameters of the last fit of all, over everything there is. */
    private abstract static class Hindsight implements Signal {
        final Smoothed smoothed;
        final List<FilterState> filtered = new ArrayList<>();
        private final RegimeTimeline timeline;
        private final Fit last;

        Hindsight(PriceTable table, RegimeTimeline timeline) {
            this.timeline = timeline;
            this.last = timeline.fits().get(timeline.fits().size() - 1).fit();
            RegimeModel model = last.model().orElseThrow();
            double[] returns = new double[table.size() - 1];
            for (int bar = 1; bar < table.size(); bar++) {
                returns[bar - 1] =
                        new LogReturn("stocks").at(table.knownAt(bar)).orElseThrow();
            }
            Observations all = Observations.univariate(returns);
            this.smoothed = Smoothed.of(model, all);
            FilterState state = FilterState.before(model);
            for (int row = 0; row < all.size(); row++) {
                state = state.step(model, all, row);
                filtered.add(state);
            }
        }

        abstract double[] probabilities(int bar);

        @Override
        public List<String> regimes() {
            return timeline.regimes();
        }

        @Override
        public Optional<Reading> at(Known known) {
            RegimeModel model = last.model().orElseThrow();
            double[] transition = {
                model.transition(0, 0), model.transition(0, 1), model.transition(1, 0), model.transition(1, 1)
            };
            return timeline.at(known)
                    .map(honest -> Reading.of(
                            honest.fit(),
                            probabilities(known.bar()),
                            transition,
                            last.moments().orElseThrow()));
        }
    }

    private static Policy peeking(FillPrices prices) {
        return (situation, stance) -> {
            int bar = situation.bar();
            boolean rises = bar + 1 < prices.axis().size() && prices.close(0, bar + 1) > prices.close(0, bar);
            Weights target = Weights.of(rises ? 1 : 0);
            return situation.reading().isEmpty()
                    ? Decision.none(stance, Because.of("not yet"))
                    : Decision.order(target, stance, Because.of("tomorrow's close"), Decision.Change.SAME);
        };
    }

    private static Policy onLastOfMonth(TimeAxis axis, Policy own) {
        return (situation, stance) -> {
            int bar = situation.bar();
            boolean last = bar + 1 < axis.size()
                    && axis.date(bar + 1).getMonth() != axis.date(bar).getMonth();
            return last ? own.at(situation, stance) : Decision.none(stance, Because.of("not the last of the month"));
        };
    }

    /** Log returns in units of a deviation. */
    private record Scaled(double deviation) implements Observation {
        @Override
        public OptionalDouble at(Known known) {
            OptionalDouble plain = new LogReturn("stocks").at(known);
            return plain.isPresent() ? OptionalDouble.of(plain.getAsDouble() / deviation) : plain;
        }

        @Override
        public String asset() {
            return "stocks";
        }

        @Override
        public String word() {
            return "scaled";
        }

        @Override
        public String column() {
            return "scaled_stocks";
        }
    }

    private static double deviation(PriceTable table) {
        double square = 0;
        for (int bar = 1; bar < table.size(); bar++) {
            double x = new LogReturn("stocks").at(table.knownAt(bar)).orElseThrow();
            square += x * x;
        }
        return Math.sqrt(square / (table.size() - 1));
    }

    /** Rows without the days whose move exceeds 2.5 deviations of all moves there are. */
    private static List<Integer> cleaned(int rows) {
        double deviation = deviation(market(rows).table());
        List<Integer> kept = new ArrayList<>(List.of(0));
        for (int row = 1; row < rows; row++) {
            double move = StrictMath.log(STOCKS.close(row) / STOCKS.close(row - 1));
            if (Math.abs(move) <= 2.5 * deviation) {
                kept.add(row);
            }
        }
        return kept;
    }

    private static Market market(int rows) {
        List<Integer> all = new ArrayList<>();
        for (int row = 0; row < rows; row++) {
            all.add(row);
        }
        return daily(all);
    }

    private static Market daily(List<Integer> rows) {
        return market(rows, Calendar.DAILY);
    }

    /** The last close of each week, the last week's too, be it over or not. */
    private static Market hastyWeeks(int rows) {
        List<Integer> ends = new ArrayList<>();
        for (int row = 0; row < rows; row++) {
            boolean last = row + 1 == rows
                    || !BarLength.WEEKLY
                            .periodStart(STOCKS.date(row + 1))
                            .equals(BarLength.WEEKLY.periodStart(STOCKS.date(row)));
            if (last) {
                ends.add(row);
            }
        }
        return market(ends, new Calendar(BarLength.WEEKLY, Calendar.Days.COMMON, Calendar.Rows.BARS));
    }

    private static Market market(List<Integer> rows, Calendar calendar) {
        double[] closes = rows.stream().mapToDouble(STOCKS::close).toArray();
        List<LocalDate> dates = rows.stream().map(STOCKS::date).toList();
        PriceSeries series = PriceSeries.of("stocks", dates, PriceTable.Bars.ofCloses(closes));
        return Market.of(List.of(series), calendar, CashRates.constant(4, DayCount.ACTUAL_365));
    }

    /** A number of rows, about halfway, that ends with a month's last day. */
    private static int monthEnd() {
        int rows = 550;
        while (STOCKS.date(rows).getMonth() == STOCKS.date(rows - 1).getMonth()) {
            rows++;
        }
        return rows;
    }
}
