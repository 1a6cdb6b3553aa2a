package sojourn;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Path;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import sojourn.PrefixCheck.Difference;
import sojourn.PrefixCheck.Row;
import sojourn.PrefixCheck.Rows;
import sojourn.allocate.Because;
import sojourn.allocate.Decision;
import sojourn.allocate.Policy;
import sojourn.allocate.Stance;
import sojourn.allocate.Weights;
import sojourn.archive.PathFile;
import sojourn.archive.Table;
import sojourn.compare.Compared;
import sojourn.compare.Comparison;
import sojourn.compare.LocalWorkers;
import sojourn.compare.Progress;
import sojourn.compare.Run;
import sojourn.document.Problems;
import sojourn.market.FillPrices;
import sojourn.market.PriceTable;
import sojourn.measure.Yardstick;
import sojourn.strategy.StrategyFile;
import sojourn.strategy.StrategyReader;
import sojourn.trade.Simulation;
import sojourn.trade.Track;

/**
 * Yardsticks that claim they could have been traded, through the whole comparison on real prices: cut short, the file says the same
 * of their wealth on every bar before. A gate and a target whose level is that of the whole file are caught by it.
 */
class YardsticksLookAheadTest {
    private static final PriceHistory STOCKS = PriceHistory.stocks();
    private static final int ROWS = 900;
    /** At the first fit, between fits, on fit bars and just after. */
    private static final int[] CUTS = {305, 340, 401, 402, 555, 701, ROWS - 1};

    private static final String STRATEGY = """
            strategy: Step aside in storms
            prices: {stocks: {csv: stocks.csv}}
            cash: {percent-per-year: 4}
            regimes: {observe: [{log-return: stocks}], states: [calm, stormy]}
            refit: {first-fit-after: 300, every: 100, starts: 1, seed: 7}
            allocate:
              switch: {regime: stormy, leave-above: 0.7, re-enter-below: 0.3, in: {stocks: 1}, out: {stocks: 0.2}}
            limits: {gross: 1.5, per-asset: [0, 1.5]}
            trade: {no-trade-band: 0.02, costs: {commission-bps: 5, half-spread-bps: 5}}
            judge:
              against: [buy-and-hold, same-exposure-so-far, volatility-gate, volatility-target]
              buy-and-hold: {stocks: 1}
            """;

    @TempDir
    private Path folder;

    @Test
    void yardsticksThatCouldHaveBeenTradedSayTheSameOfEveryBarUpToTheCut() {
        PrefixCheck check = PrefixCheck.of(rows -> path(rows, Optional.empty()), ROWS);
        List<String> columns = check.whole().rows().get(0).columns();
        assertThat(columns).contains("volatility_gate.wealth", "volatility_target.wealth");
        assertThat(check.differences(CUTS)).isEmpty();
    }

    @Test
    void aGateAtTheQuantileOfTheWholeFileIsCaught() {
        List<Difference> caught = leaking(Yardstick.VOLATILITY_GATE);
        assertThat(caught).hasSizeGreaterThan(2);
        assertThat(caught)
                .allSatisfy(difference -> assertThat(difference.column()).isEqualTo("volatility_gate.wealth"));
    }

    @Test
    void aTargetAtTheVolatilityOfTheWholeFileIsCaught() {
        List<Difference> caught = leaking(Yardstick.VOLATILITY_TARGET);
        assertThat(caught).hasSizeGreaterThan(2);
        assertThat(caught)
                .allSatisfy(difference -> assertThat(difference.column()).isEqualTo("volatility_target.wealth"));
    }

    private List<Difference> leaking(Yardstick leaky) {
        return PrefixCheck.of(rows -> path(rows, Optional.of(leaky)), ROWS).differences(CUTS);
    }

    /** The path of the variant; {@code leaky} is run with hindsight instead. */
    private Rows path(int rows, Optional<Yardstick> leaky) {
        STOCKS.write(folder.resolve("stocks.csv"), rows);
        Problems problems = new Problems();
        StrategyFile file = StrategyReader.parse(STRATEGY, folder, "strategy.yaml", problems)
                .orElseThrow();
        try (LocalWorkers workers = new LocalWorkers(1)) {
            Compared compared = new Comparison(workers, Progress.silent()).run(List.of(file));
            Run.Traded run = compared.ranked().get(0).run();
            PriceTable table = run.ready().market().table();
            Table path = leaky.map(one -> leaking(one, run))
                    .orElseGet(() -> run.path().table());
            List<Row> said = new ArrayList<>();
            for (List<String> cells : path.rows()) {
                said.add(new Row("path", LocalDate.parse(cells.get(0)), path.columns(), cells));
            }
            return new Rows(table.fillPrices().axis().date(table.size() - 1), said);
        }
    }

    private static Table leaking(Yardstick leaky, Run.Traded run) {
        PriceTable table = run.ready().market().table();
        Policy policy = leaky == Yardstick.VOLATILITY_GATE ? gate(table) : target(table);
        Track track = Simulation.run(
                        table,
                        run.timeline(),
                        policy,
                        run.file().strategy().trade().terms(),
                        run.track().firstBar())
                .orElseThrow();
        return PathFile.of(table.fillPrices().axis(), run.timeline(), run.track(), Map.of(leaky, track))
                .table();
    }

    /** In below the median size of a return, of all returns there are. */
    private static Policy gate(PriceTable table) {
        double median = sizes(table)[table.size() / 2];
        return (situation, stance) -> ordered(size(table, situation.bar()) > median ? 0 : 1, stance);
    }

    /** Half, by the mean size of a return, of all returns there are. */
    private static Policy target(PriceTable table) {
        double mean = Arrays.stream(sizes(table)).sum() / table.size();
        return (situation, stance) -> ordered(Math.min(1, mean / (2 * size(table, situation.bar()) + mean)), stance);
    }

    private static Decision ordered(double weight, Stance stance) {
        return Decision.order(Weights.of(weight), stance, Because.of("a test says so"), Decision.Change.SAME);
    }

    private static double[] sizes(PriceTable table) {
        double[] sizes = new double[table.size()];
        for (int bar = 1; bar < sizes.length; bar++) {
            sizes[bar] = size(table, bar);
        }
        Arrays.sort(sizes);
        return sizes;
    }

    private static double size(PriceTable table, int bar) {
        FillPrices prices = table.fillPrices();
        return Math.abs(prices.close(0, bar) / prices.close(0, bar - 1) - 1);
    }
}
