package sojourn;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Path;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;
import java.util.function.BiFunction;
import java.util.function.IntFunction;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import sojourn.PrefixCheck.Difference;
import sojourn.PrefixCheck.Row;
import sojourn.PrefixCheck.Rows;
import sojourn.archive.Table;
import sojourn.compare.LocalWorkers;
import sojourn.compare.Progress;
import sojourn.evidence.RegimeEvidence;
import sojourn.evidence.RegimeFindings;
import sojourn.evidence.RegimeTables;
import sojourn.evidence.WalkedRegimes;
import sojourn.market.FillPrices;
import sojourn.market.Known;
import sojourn.market.Market;
import sojourn.market.PriceTable;
import sojourn.walk.LogReturn;
import sojourn.walk.Observation;
import sojourn.walk.RegimeSettings;

/** What the questions to a strategy's regimes say of a bar, they say whatever comes after: forecasts, scores, residuals, lineage. */
class RegimesLookAheadTest {
    private static final PriceHistory STOCKS = PriceHistory.stocks();
    private static final int ROWS = 700;
    private static final int FIRST_FIT = 300;
    /** Around fits (bars 300, 350, …), between them, and one bar short of all. */
    private static final int[] CUTS = {2, FIRST_FIT + 1, FIRST_FIT + 2, 351, 352, 377, 401, 500, 651, ROWS - 1};

    private static final String STRATEGY = """
            strategy: Lean with the odds
            prices: {stocks: {csv: stocks.csv}}
            cash: {percent-per-year: 4}
            regimes: {observe: [{log-return: stocks}], states: [calm, stormy], emission: %s}
            refit: {first-fit-after: 300, every: 50, window: %s, starts: 2, seed: 7}
            allocate: {blend: {weights: {calm: {stocks: 1}, stormy: {stocks: 0}}}}
            judge: {against: [buy-and-hold], buy-and-hold: {stocks: 1}, rank-by: sharpe}
            """;

    @TempDir
    private Path folder;

    @Test
    void everyBarByBarFigureIsTheSameOnACutFile() {
        assertHonest("normal", "expanding");
        assertHonest("student-t", "{rolling: 250}");
    }

    private void assertHonest(String emission, String window) {
        PrefixCheck check = PrefixCheck.of(questioned(emission, window, (table, own) -> own), ROWS);
        assertThat(check.whole().rows().stream().map(Row::table).distinct())
                .containsExactly("bars", "forecasts", "lineage");
        assertThat(check.whole().rows()).hasSizeGreaterThan(2 * (ROWS - FIRST_FIT - 2));
        for (int cut : CUTS) {
            assertThat(check.difference(cut))
                    .as("%s, %s, cut %s", emission, window, cut)
                    .isEmpty();
        }
    }

    /** An observation that sees the next close is caught in the same tables. */
    @Test
    void aLeakIsCaught() {
        IntFunction<Rows> leaking = questioned(
                "normal",
                "expanding",
                (table, own) -> new RegimeSettings(
                        own.model(),
                        List.of(new NextReturn(table.fillPrices())),
                        own.states(),
                        own.emission(),
                        own.orderBy(),
                        own.fixed()));
        PrefixCheck check = PrefixCheck.of(leaking, ROWS);
        List<String> caught = new ArrayList<>();
        for (int cut : new int[] {351, 377, 500}) {
            check.difference(cut).map(Difference::row).ifPresent(caught::add);
        }
        assertThat(caught).hasSize(3).allMatch(row -> row.startsWith("bars"));
    }

    /** The log return of the bar after. */
    private record NextReturn(FillPrices all) implements Observation {
        @Override
        public OptionalDouble at(Known known) {
            int next = Math.min(known.bar() + 1, all.axis().size() - 1);
            return OptionalDouble.of(StrictMath.log(all.close(0, next) / all.close(0, next - 1)));
        }

        @Override
        public String asset() {
            return "stocks";
        }

        @Override
        public String word() {
            return new LogReturn("stocks").word();
        }

        @Override
        public String column() {
            return "next_return";
        }
    }

    private IntFunction<Rows> questioned(
            String emission, String window, BiFunction<PriceTable, RegimeSettings, RegimeSettings> seeing) {
        WholeJob job = WholeJob.of(STRATEGY.formatted(emission, window), folder).observing(seeing);
        return rows -> {
            STOCKS.write(folder.resolve("stocks.csv"), rows);
            Market market = job.read();
            PriceTable table = market.table();
            WalkedRegimes subject = WalkedRegimes.of(
                    table,
                    seeing.apply(table, job.strategy().regimes()),
                    job.strategy().refit(),
                    job.walk(market));
            try (LocalWorkers workers = new LocalWorkers(1)) {
                RegimeFindings found = RegimeEvidence.of(subject, workers, Progress.silent());
                List<Row> all = new ArrayList<>();
                add(all, "bars", RegimeTables.bars(found), "date");
                add(all, "forecasts", RegimeTables.forecasts(found), "date");
                add(all, "lineage", RegimeTables.lineage(found), "fitted_on");
                return new Rows(table.knownAt(table.size() - 1).date(), all);
            }
        };
    }

    private static void add(List<Row> rows, String name, Table table, String dateColumn) {
        int date = table.columns().indexOf(dateColumn);
        for (List<String> cells : table.rows()) {
            rows.add(new Row(name, LocalDate.parse(cells.get(date)), table.columns(), cells));
        }
    }
}
