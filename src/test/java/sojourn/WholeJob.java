package sojourn;

import java.nio.file.Path;
import java.time.LocalDate;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.function.BiFunction;
import sojourn.PrefixCheck.Row;
import sojourn.PrefixCheck.Rows;
import sojourn.allocate.HoldFromStart;
import sojourn.allocate.Policy;
import sojourn.allocate.RulePolicy;
import sojourn.allocate.Weights;
import sojourn.archive.PathFile;
import sojourn.archive.Table;
import sojourn.archive.TimelineFiles;
import sojourn.archive.TradeFiles;
import sojourn.document.Problems;
import sojourn.market.Known;
import sojourn.market.Market;
import sojourn.market.PriceReader;
import sojourn.market.PriceTable;
import sojourn.market.TimeAxis;
import sojourn.measure.Yardstick;
import sojourn.regime.StartRunner;
import sojourn.strategy.Strategy;
import sojourn.strategy.StrategyFile;
import sojourn.strategy.StrategyReader;
import sojourn.trade.Simulation;
import sojourn.trade.Terms;
import sojourn.trade.Track;
import sojourn.walk.Observation;
import sojourn.walk.RegimeSettings;
import sojourn.walk.RegimeTimeline;
import sojourn.walk.Signal;
import sojourn.walk.Walk;

/**
 * From a strategy's text and a market to the tables that a comparison writes: timeline, fits, path, trades, ledger. One part at a
 * time can be replaced by a dishonest one, which is given the whole price table.
 */
final class WholeJob {
    private final StrategyFile file;
    private final BiFunction<PriceTable, RegimeSettings, RegimeSettings> regimes;
    private final BiFunction<PriceTable, RegimeTimeline, Signal> signal;
    private final BiFunction<PriceTable, Policy, Policy> policy;

    private WholeJob(
            StrategyFile file,
            BiFunction<PriceTable, RegimeSettings, RegimeSettings> regimes,
            BiFunction<PriceTable, RegimeTimeline, Signal> signal,
            BiFunction<PriceTable, Policy, Policy> policy) {
        this.file = file;
        this.regimes = regimes;
        this.signal = signal;
        this.policy = policy;
    }

    /** The honest job of a strategy whose paths start at {@code folder}. */
    static WholeJob of(String yaml, Path folder) {
        Problems problems = new Problems();
        Optional<StrategyFile> file = StrategyReader.parse(yaml, folder, "strategy.yaml", problems);
        problems.throwIfAny();
        return new WholeJob(file.orElseThrow(), (table, own) -> own, (table, own) -> own, (table, own) -> own);
    }

    WholeJob observing(BiFunction<PriceTable, RegimeSettings, RegimeSettings> other) {
        return new WholeJob(file, other, signal, policy);
    }

    WholeJob signalling(BiFunction<PriceTable, RegimeTimeline, Signal> other) {
        return new WholeJob(file, regimes, other, policy);
    }

    WholeJob deciding(BiFunction<PriceTable, Policy, Policy> other) {
        return new WholeJob(file, regimes, signal, other);
    }

    Strategy strategy() {
        return file.strategy();
    }

    /** The market as the strategy's files have it now. */
    Market read() {
        Strategy strategy = file.strategy();
        return PriceReader.read(
                file.folder(),
                strategy.prices(),
                strategy.calendar(),
                strategy.cash(),
                strategy.usedAssets(),
                strategy.levels(),
                strategy.regimes().given());
    }

    /** The timeline of a market. */
    RegimeTimeline walk(Market market) {
        Strategy strategy = file.strategy();
        return Walk.forward(
                market.table(),
                regimes.apply(market.table(), strategy.regimes()),
                strategy.refit(),
                StartRunner.sequential(),
                bar -> {});
    }

    /** Everything the job says of a market. */
    Rows run(Market market) {
        PriceTable table = market.table();
        Known last = table.knownAt(table.size() - 1);
        RegimeTimeline timeline = walk(market);
        List<Row> rows = new ArrayList<>();
        add(rows, "timeline", TimelineFiles.bars(timeline), "date");
        List<String> observed = file.strategy().regimes().observe().stream()
                .map(Observation::column)
                .toList();
        add(rows, "fits", TimelineFiles.fits(timeline, observed), "fitted_on");
        Optional<Track> traded = trade(table, timeline);
        if (traded.isPresent()) {
            Track track = traded.get();
            TimeAxis axis = table.fillPrices().axis();
            Map<Yardstick, Track> beside = Map.of(Yardstick.BUY_AND_HOLD, hold(table, timeline, track.firstBar()));
            add(rows, "path", PathFile.of(axis, timeline, track, beside).table(), "date");
            add(rows, "trades", TradeFiles.trades(axis, track), "filled_on");
            add(rows, "ledger", TradeFiles.ledger(axis, track), "date");
        }
        return new Rows(last.date(), rows);
    }

    private Optional<Track> trade(PriceTable table, RegimeTimeline timeline) {
        Strategy strategy = file.strategy();
        Policy honest = RulePolicy.of(
                strategy.rule(),
                strategy.limits(),
                strategy.trade().decide(),
                strategy.trade().stayAtLeast(),
                strategy.trade().noTradeBand(),
                strategy.regimes().states(),
                table.assets());
        return Simulation.run(
                table,
                signal.apply(table, timeline),
                policy.apply(table, honest),
                strategy.trade().terms(),
                0);
    }

    private Track hold(PriceTable table, RegimeTimeline timeline, int from) {
        Terms terms = file.strategy().trade().terms();
        Weights weights = Weights.named(file.strategy().judge().buyAndHold(), table.assets());
        return Simulation.run(table, timeline, new HoldFromStart(weights), terms, from)
                .orElseThrow();
    }

    private static void add(List<Row> rows, String name, Table table, String dateColumn) {
        int date = table.columns().indexOf(dateColumn);
        for (List<String> cells : table.rows()) {
            rows.add(new Row(name, LocalDate.parse(cells.get(date)), table.columns(), cells));
        }
    }
}
