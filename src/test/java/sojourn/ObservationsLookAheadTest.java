package sojourn;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Path;
import java.util.List;
import java.util.Set;
import java.util.TreeSet;
import java.util.function.IntFunction;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import sojourn.PrefixCheck.Rows;

/** No look-ahead with any kind of observation, through the whole job: closes of the NYSE composite, ranges made up around them. */
class ObservationsLookAheadTest {
    private static final PriceHistory STOCKS = PriceHistory.stocks().withRanges(20260101);
    private static final int ROWS = 800;
    private static final int FIRST_FIT = 300;

    @TempDir
    private Path folder;

    @ParameterizedTest
    @ValueSource(
            strings = {
                "log-return: {of: stocks, known-after: 1}",
                "simple-return: stocks",
                "absolute-return: stocks",
                "log-realised-volatility: {of: stocks, bars: 21}",
                "log-realised-volatility: {of: stocks, bars: 5, known-after: 3}",
                "log-parkinson-volatility: stocks",
                "log-garman-klass-volatility: stocks",
                "log-garman-klass-volatility: {of: stocks, known-after: 2}",
                "change: stocks"
            })
    void everyKindSaysTheSameOfEveryBarUpToTheCut(String observation) {
        WholeJob job = WholeJob.of("""
                strategy: Lean with the odds
                prices: {stocks: {csv: stocks.csv}}
                cash: {percent-per-year: 4}
                regimes: {observe: [{%s}], states: [calm, stormy]}
                refit: {first-fit-after: 300, every: 50, starts: 2, seed: 7}
                allocate: {blend: {weights: {calm: {stocks: 1}, stormy: {stocks: 0}}}}
                judge: {against: [buy-and-hold], buy-and-hold: {stocks: 1}, rank-by: sharpe}
                """.formatted(observation), folder);
        IntFunction<Rows> onRows = rows -> {
            STOCKS.write(folder.resolve("stocks.csv"), rows);
            return job.run(job.read());
        };
        PrefixCheck check = PrefixCheck.of(onRows, ROWS);
        assertThat(check.whole().rows().stream().filter(row -> row.table().equals("fits")))
                .hasSizeGreaterThanOrEqualTo(8);
        assertThat(check.whole().rows().stream().map(row -> row.table()).distinct())
                .contains("timeline", "path", "trades", "ledger");
        Set<Integer> cuts = new TreeSet<>(List.of(2, FIRST_FIT + 1, 452, 555, ROWS - 1));
        for (int late = 0; late < 25; late += 3) {
            cuts.add(FIRST_FIT + 50 + late); // around the second fit, wherever the first observation was
        }
        for (int cut : cuts) {
            assertThat(check.difference(cut)).as("cut " + cut).isEmpty();
        }
    }
}
