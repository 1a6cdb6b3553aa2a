package sojourn;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Path;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.TreeSet;
import java.util.function.IntFunction;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import sojourn.PrefixCheck.Difference;
import sojourn.PrefixCheck.Rows;
import sojourn.market.FillPrices;
import sojourn.market.Known;
import sojourn.walk.Observation;
import sojourn.walk.RegimeSettings;

/**
 * No look-ahead with several series observed together, known at different times and missing on different bars: closes of the NYSE
 * composite and of gold, through the whole job; and a series that looks ahead beside an honest one is caught.
 */
class SeveralSeriesLookAheadTest {
    private static final PriceHistory STOCKS = PriceHistory.stocks();
    private static final PriceHistory GOLD = PriceHistory.of("gold_silver/gold_silver_1977_2012.csv");
    private static final int ROWS = 700;
    private static final int FIRST_FIT = 300;

    @TempDir
    private Path folder;

    private WholeJob job(String observed, String emission) {
        return WholeJob.of("""
                strategy: Lean with the odds
                prices: {stocks: {csv: stocks.csv}, gold: {csv: gold.csv, close: gold}}
                cash: {percent-per-year: 4}
                regimes: {observe: [%s], states: [calm, stormy], emission: %s}
                refit: {first-fit-after: 300, every: 60, starts: 2, seed: 7}
                allocate: {blend: {weights: {calm: {stocks: 1}, stormy: {gold: 1}}}}
                judge: {against: [buy-and-hold], buy-and-hold: {stocks: 1}, rank-by: sharpe}
                """.formatted(observed, emission), folder);
    }

    private IntFunction<Rows> onRows(WholeJob job) {
        return rows -> {
            LocalDate last = STOCKS.date(rows - 1);
            int gold = 0;
            while (gold < GOLD.rows() && !GOLD.date(gold).isAfter(last)) {
                gold++;
            }
            STOCKS.write(folder.resolve("stocks.csv"), rows);
            GOLD.write(folder.resolve("gold.csv"), gold);
            return job.run(job.read());
        };
    }

    private static Set<Integer> cuts() {
        Set<Integer> cuts = new TreeSet<>(List.of(2, FIRST_FIT + 1, 452, 555, ROWS - 1));
        for (int late = 0; late < 28; late += 3) {
            cuts.add(FIRST_FIT + 60 + late); // around the second fit
        }
        return cuts;
    }

    @ParameterizedTest
    @CsvSource(
            delimiter = ';',
            value = {
                "{log-return: stocks}, {log-return: {of: gold, known-after: 2}}; normal",
                "{log-return: {of: stocks, known-after: 1}}, {log-return: gold}, {change: gold}; normal-diagonal",
                "{log-return: gold}, {log-realised-volatility: {of: stocks, bars: 21, known-after: 1}}; normal"
            })
    void severalSeriesSayTheSameOfEveryBarUpToTheCut(String observed, String emission) {
        PrefixCheck check = PrefixCheck.of(onRows(job(observed, emission)), ROWS);
        assertThat(check.whole().rows().stream().filter(row -> row.table().equals("fits")))
                .hasSizeGreaterThanOrEqualTo(5)
                .allSatisfy(row -> assertThat(row.cells()).contains("converged"));
        assertThat(check.whole().rows().stream().map(row -> row.table()).distinct())
                .contains("timeline", "path", "trades", "ledger");
        for (int cut : cuts()) {
            assertThat(check.difference(cut)).as("cut " + cut).isEmpty();
        }
    }

    @Test
    void aSecondSeriesThatShowsTomorrowIsCaught() {
        WholeJob leaky = job("{log-return: stocks}", "normal")
                .observing((table, own) -> new RegimeSettings(
                        own.model(),
                        List.of(own.observe().get(0), new Tomorrow(table.fillPrices())),
                        own.states(),
                        own.emission(),
                        own.orderBy(),
                        own.fixed()));
        PrefixCheck check = PrefixCheck.of(onRows(leaky), ROWS);
        List<Difference> caught = new ArrayList<>();
        int afterFirstFit = 0;
        for (int cut : cuts()) {
            afterFirstFit += cut > FIRST_FIT + 2 ? 1 : 0;
            check.difference(cut).ifPresent(caught::add);
        }
        assertThat(caught).hasSizeGreaterThanOrEqualTo(afterFirstFit);
        assertThat(caught)
                .anySatisfy(difference -> assertThat(difference.column()).startsWith("probability."));
    }

    /** The log return of gold on the bar after: missing on the last. */
    private record Tomorrow(FillPrices prices) implements Observation {
        @Override
        public OptionalDouble at(Known known) {
            int next = known.bar() + 1;
            return next < prices.axis().size()
                    ? OptionalDouble.of(StrictMath.log(prices.close(1, next) / prices.close(1, known.bar())))
                    : OptionalDouble.empty();
        }

        @Override
        public String asset() {
            return "gold";
        }

        @Override
        public String word() {
            return "tomorrow";
        }

        @Override
        public String column() {
            return "tomorrow_gold";
        }
    }
}
