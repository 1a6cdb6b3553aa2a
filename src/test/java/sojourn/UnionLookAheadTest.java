package sojourn;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.List;
import java.util.function.IntFunction;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import sojourn.PrefixCheck.Difference;
import sojourn.PrefixCheck.Rows;

/**
 * No look-ahead where closes are carried over days that a series lacks: the NYSE composite with every seventh row taken out and gold,
 * through the whole job; a price that is carried backwards is caught.
 */
class UnionLookAheadTest {
    private static final PriceHistory STOCKS = PriceHistory.stocks();
    private static final PriceHistory GOLD = PriceHistory.of("gold_silver/gold_silver_1977_2012.csv");
    private static final int ROWS = 620;
    private static final int FIRST_FIT = 300;

    private static final String STRATEGY = """
            strategy: Lean with the odds
            calendar: {days: union}
            prices: {stocks: {csv: stocks.csv}, gold: {csv: gold.csv, close: gold}}
            cash: {percent-per-year: 4}
            regimes: {observe: [{log-return: stocks}, {log-return: gold}], states: [calm, stormy]}
            refit: {first-fit-after: 300, every: 60, starts: 2, seed: 7}
            allocate: {blend: {weights: {calm: {stocks: 1}, stormy: {gold: 1}}}}
            judge: {against: [buy-and-hold], buy-and-hold: {stocks: 1}, rank-by: sharpe}
            """;

    @TempDir
    private Path folder;

    /** What stands in the file of stocks on the days that it lacks. */
    private enum Lacking {
        NOTHING,
        THE_NEXT_CLOSE
    }

    private IntFunction<Rows> onRows(Lacking lacking) {
        WholeJob job = WholeJob.of(STRATEGY, folder);
        return rows -> {
            GOLD.write(folder.resolve("gold.csv"), STOCKS.date(rows - 1));
            write(folder.resolve("stocks.csv"), rows, lacking);
            return job.run(job.read());
        };
    }

    private static boolean lacks(int row) {
        return row % 7 == 6;
    }

    private static void write(Path file, int rows, Lacking lacking) {
        List<String> lines = new ArrayList<>(List.of("date,close"));
        for (int row = 0; row < rows; row++) {
            LocalDate date = STOCKS.date(row);
            if (!lacks(row)) {
                lines.add(date + "," + STOCKS.close(row));
            } else if (lacking == Lacking.THE_NEXT_CLOSE && row + 1 < rows) {
                lines.add(date + "," + STOCKS.close(row + 1));
            }
        }
        try {
            Files.write(file, lines);
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }

    private static int[] cuts() {
        // every cut after the first fit that ends with a day that stocks lack, and some beside them
        return IntStream.range(FIRST_FIT + 80, ROWS)
                .filter(cut -> (lacks(cut - 1) && cut % 5 == 0) || cut % 50 == 1)
                .toArray();
    }

    @Test
    void everyBarUpToTheCutIsTheSame() {
        PrefixCheck check = PrefixCheck.of(onRows(Lacking.NOTHING), ROWS);
        assertThat(check.whole().rows().stream().filter(row -> row.table().equals("fits")))
                .hasSizeGreaterThanOrEqualTo(4)
                .allSatisfy(row -> assertThat(row.cells()).contains("converged"));
        assertThat(check.rowsOf("trades")).isPositive();
        assertThat(check.differences(cuts())).isEmpty();
    }

    @Test
    void thePriceAfterCarriedBackwardsIsCaught() {
        PrefixCheck check = PrefixCheck.of(onRows(Lacking.THE_NEXT_CLOSE), ROWS);
        int[] inGaps = IntStream.of(cuts()).filter(cut -> lacks(cut - 1)).toArray();
        List<Difference> caught = check.differences(inGaps);
        assertThat(inGaps).hasSizeGreaterThan(3);
        assertThat(caught).hasSize(inGaps.length);
        assertThat(caught)
                .allSatisfy(difference -> assertThat(difference.column()).startsWith("probability."));
    }
}
