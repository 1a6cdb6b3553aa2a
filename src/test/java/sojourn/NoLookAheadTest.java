package sojourn;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Path;
import java.time.DayOfWeek;
import java.time.LocalDate;
import java.time.temporal.TemporalAdjusters;
import java.util.List;
import java.util.Set;
import java.util.TreeSet;
import java.util.function.IntFunction;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import sojourn.PrefixCheck.Row;
import sojourn.PrefixCheck.Rows;
import sojourn.numeric.RandomStream;
import sojourn.walk.RegimeTimeline;

/**
 * The core promise, on real prices and through the whole job: file, market, walk, policy, simulation, tables. Whatever the file is
 * cut off after, what was said of the bars before stays as it was, to the bit.
 */
class NoLookAheadTest {
    private static final PriceHistory STOCKS = PriceHistory.stocks();
    private static final PriceHistory METALS = PriceHistory.of("gold_silver/gold_silver_1977_2012.csv");
    private static final int FIRST_FIT = 750;
    private static final int EVERY = 63;

    private static final String SWITCH_DAILY = """
            strategy: Step aside in storms
            prices: {stocks: {csv: stocks.csv}}
            cash: {percent-per-year: 4}
            regimes: {observe: [{log-return: stocks}], states: [calm, stormy]}
            refit: {first-fit-after: 750, every: 63, starts: 2, seed: 20260101}
            allocate:
              switch: {regime: stormy, leave-above: 0.7, re-enter-below: 0.3, in: {stocks: 1}, out: {stocks: 0}}
            trade: {decide: at-every-close, costs: {commission-bps: 5, half-spread-bps: 5}}
            judge: {against: [buy-and-hold], buy-and-hold: {stocks: 1}, rank-by: sharpe}
            """;

    private static final String TABLE_MONTHLY = """
            strategy: Shelter in gold
            prices: {stocks: {csv: stocks.csv}, gold: {csv: metals.csv, close: gold}}
            cash: {percent-per-year: 4, day-count: actual/360}
            regimes: {observe: [{log-return: stocks}], states: [calm, stormy], emission: normal-zero-mean}
            refit: {first-fit-after: 750, every: month, window: {rolling: 500}, starts: 2, seed: 7, on-failure: stand-aside}
            allocate:
              table: {confirm: 2, weights: {calm: {stocks: 0.9}, stormy: {stocks: 0.3, gold: 0.4}}}
            trade: {decide: first-of-month, delay: 1, no-trade-band: 0.02, costs: {commission-bps: 5, half-spread-bps: 5}}
            judge: {against: [buy-and-hold], buy-and-hold: {stocks: 1}, rank-by: sharpe}
            """;

    private static final String BLEND_WEEKLY = """
            strategy: Lean with the odds, week by week
            calendar: {bars: weekly}
            prices: {stocks: {csv: stocks.csv}}
            cash: {percent-per-year: 4}
            regimes: {observe: [{log-return: stocks}], states: [calm, stormy]}
            refit: {first-fit-after: 150, every: quarter, starts: 2, seed: 7}
            allocate:
              blend: {probability: predicted, weights: {calm: {stocks: 1}, stormy: {stocks: 0.2}}}
            trade: {no-trade-band: 0.05, costs: {commission-bps: 5, half-spread-bps: 5}}
            judge: {against: [buy-and-hold], buy-and-hold: {stocks: 1}, rank-by: sharpe}
            """;

    @TempDir
    private Path folder;

    @Test
    void aDailySwitchSaysTheSameOfEveryBarUpToTheCut() {
        WholeJob job = WholeJob.of(SWITCH_DAILY, folder);
        assertPrefixes(rows -> onStocks(job, STOCKS, rows), 70);
    }

    @Test
    void aMonthlyTableOnRollingWindowsSaysTheSameOfEveryBarUpToTheCut() {
        WholeJob job = WholeJob.of(TABLE_MONTHLY, folder);
        assertPrefixes(
                rows -> {
                    METALS.write(folder.resolve("metals.csv"), STOCKS.date(rows - 1));
                    return onStocks(job, STOCKS, rows);
                },
                20);
    }

    @Test
    void weeklyBarsBuiltFromDaysSayTheSameOfEveryWeekThatWasOver() {
        WholeJob job = WholeJob.of(BLEND_WEEKLY, folder);
        PrefixCheck check = PrefixCheck.of(rows -> onStocks(job, STOCKS, rows), STOCKS.rows());
        List<LocalDate> weeks = dates(check.whole(), "timeline");
        Set<DayOfWeek> cutOn = new TreeSet<>();
        for (int cut : IntStream.iterate(800, rows -> rows < STOCKS.rows(), rows -> rows + 137)
                .toArray()) {
            Rows part = onStocks(job, STOCKS, cut);
            assertThat(check.difference(cut, part)).isEmpty();
            LocalDate lastDay = STOCKS.date(cut - 1);
            cutOn.add(lastDay.getDayOfWeek());
            // the last bar is the last week that was over when the week of the last day began
            LocalDate monday = lastDay.with(TemporalAdjusters.previousOrSame(DayOfWeek.MONDAY));
            LocalDate lastOver = weeks.stream()
                    .filter(week -> week.isBefore(monday))
                    .reduce((a, b) -> b)
                    .orElseThrow();
            assertThat(part.through()).isEqualTo(lastOver);
        }
        assertThat(cutOn).hasSize(5);
    }

    @Test
    void anotherLastCloseMovesTheLastProbabilityAndNothingEarlier() {
        WholeJob job = WholeJob.of(SWITCH_DAILY, folder);
        for (int rows : new int[] {FIRST_FIT + 1, FIRST_FIT + 2, 1000, FIRST_FIT + 1 + 5 * EVERY, 1500}) {
            Rows before = onStocks(job, STOCKS, rows);
            double[] last = lastProbabilities(job);
            Rows after = onStocks(job, STOCKS.with(rows - 1, 0.97 * STOCKS.close(rows - 1)), rows);
            assertThat(lastProbabilities(job)[1]).isNotEqualTo(last[1]);
            assertThat(earlier(after)).isEqualTo(earlier(before));
            assertThat(after).isNotEqualTo(before);
        }
    }

    private void assertPrefixes(IntFunction<Rows> job, int tradesAtLeast) {
        PrefixCheck check = PrefixCheck.of(job, STOCKS.rows());
        assertThat(dates(check.whole(), "trades")).hasSizeGreaterThan(tradesAtLeast);
        assertThat(dates(check.whole(), "fits")).hasSizeGreaterThan(50);
        Set<Integer> cuts = cuts();
        assertThat(cuts).hasSizeGreaterThanOrEqualTo(25);
        for (int cut : cuts) {
            Rows part = job.apply(cut);
            assertThat(part.through()).isEqualTo(STOCKS.date(cut - 1));
            assertThat(check.difference(cut, part)).isEmpty();
        }
    }

    /** Numbers of price rows. A fit made on bar b is the last bar of a file of b + 1 rows. */
    private static Set<Integer> cuts() {
        Set<Integer> cuts = new TreeSet<>(List.of(2, STOCKS.rows() - 1));
        for (int fit : new int[] {0, 1, 4, 9, 20, 51}) {
            int bar = FIRST_FIT + fit * EVERY;
            cuts.addAll(List.of(bar, bar + 1, bar + 2));
        }
        RandomStream random = RandomStream.of(20260101, "cuts");
        while (cuts.size() < 27) {
            cuts.add(FIRST_FIT + random.nextInt(STOCKS.rows() - FIRST_FIT));
        }
        return cuts;
    }

    private Rows onStocks(WholeJob job, PriceHistory stocks, int rows) {
        stocks.write(folder.resolve("stocks.csv"), rows);
        return job.run(job.read());
    }

    private double[] lastProbabilities(WholeJob job) {
        RegimeTimeline timeline = job.walk(job.read());
        return timeline.reading(timeline.endBar() - 1).orElseThrow().filtered();
    }

    private static List<Row> earlier(Rows rows) {
        return rows.rows().stream()
                .filter(row -> row.knownOn().isBefore(rows.through()))
                .toList();
    }

    private static List<LocalDate> dates(Rows rows, String table) {
        return rows.rows().stream()
                .filter(row -> row.table().equals(table))
                .map(Row::knownOn)
                .toList();
    }
}
