package sojourn.compare;

import java.nio.file.InvalidPathException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import sojourn.allocate.RulePolicy;
import sojourn.document.InputException;
import sojourn.document.Problem;
import sojourn.market.InputFile;
import sojourn.market.Market;
import sojourn.market.PriceReader;
import sojourn.market.PriceTable;
import sojourn.strategy.Strategy;
import sojourn.strategy.StrategyFile;
import sojourn.trade.Needed;
import sojourn.walk.BarColumn;
import sojourn.walk.Observation;
import sojourn.walk.TimelineAddress;

/** A strategy with its market read, ready to be walked; or the reason why it cannot be. */
public sealed interface Prepared {
    /** The strategy. */
    StrategyFile file();

    /**
     * Ready.
     *
     * @param market prices on the strategy's calendar
     * @param timelineKey address of the timeline it rests on
     */
    record Ready(StrategyFile file, Market market, String timelineKey) implements Prepared {
        /** What the strategy decides by. */
        public RulePolicy policy() {
            Strategy strategy = file.strategy();
            return RulePolicy.of(
                    strategy.rule(),
                    strategy.limits(),
                    strategy.trade().decide(),
                    strategy.trade().stayAtLeast(),
                    strategy.trade().noTradeBand(),
                    strategy.regimes().states(),
                    market.table().assets());
        }

        /** Digest of what was read, by asset and {@code cash}. */
        Map<String, String> contents() {
            Map<String, String> contents = new LinkedHashMap<>();
            for (InputFile input : market.files()) {
                contents.put(input.role(), input.contentDigest());
            }
            return contents;
        }

        /** What cash earns, by content. */
        String cashContent() {
            return contents().getOrDefault("cash", file.strategy().cash().toString());
        }

        /** Digests of the price series in the table, whatever they are called and wherever they lie. */
        List<String> usedContents() {
            Map<String, String> contents = contents();
            return market.table().assets().stream()
                    .map(asset -> contents.getOrDefault(asset, ""))
                    .toList();
        }
    }

    /**
     * Unusable inputs.
     *
     * @param problems every fault of its files
     */
    record Unreadable(StrategyFile file, List<Problem> problems) implements Prepared {
        /** Copies the list. */
        public Unreadable {
            problems = List.copyOf(problems);
        }

        /** One line. It names files as the strategy does: where they lie on this machine is no part of a result. */
        String reason() {
            Problem first = problems.get(0);
            String text = first.toString();
            Optional<Path> read = readFrom(first.file());
            if (read.isPresent()) {
                text = text.replace(read.get().toString(), first.file());
            }
            return problems.size() == 1 ? text : text + " (and " + (problems.size() - 1) + " more)";
        }

        private Optional<Path> readFrom(String name) {
            try {
                return Optional.of(file.folder().resolve(name).normalize());
            } catch (InvalidPathException e) {
                return Optional.empty(); // the problem is that this is no path, so its text holds none
            }
        }
    }

    /** Reads the market of a strategy. */
    static Prepared of(StrategyFile file) {
        Strategy strategy = file.strategy();
        try {
            Market market = PriceReader.read(
                    file.folder(),
                    strategy.prices(),
                    strategy.calendar(),
                    strategy.cash(),
                    strategy.usedAssets(),
                    strategy.levels(),
                    strategy.regimes().given());
            List<Observation> observed = strategy.regimes().observe();
            List<Problem> lacking = lacking(strategy, market.table());
            return lacking.isEmpty()
                    ? new Ready(file, market, TimelineAddress.of(file.walkSettings(), market.table(), observed))
                    : new Unreadable(file, lacking);
        } catch (InputException e) {
            return new Unreadable(file, e.problems());
        }
    }

    /** Columns that an observation or trading needs and a file does not have, or has on another scale than its closes. */
    private static List<Problem> lacking(Strategy strategy, PriceTable table) {
        List<Problem> problems = new ArrayList<>();
        for (Observation one : strategy.regimes().observe()) {
            String csv = Objects.requireNonNull(strategy.prices().get(one.asset()), one.asset())
                    .layout()
                    .csv();
            for (BarColumn column : one.lacking(table)) {
                problems.add(new Problem(
                        csv,
                        1,
                        1,
                        one.asset() + " has no " + column.word() + " on any bar, and " + one.word()
                                + " cannot be computed without",
                        "name the column under prices (" + column.word() + ": ...), or observe something else"));
            }
        }
        for (Needed one : Needed.lacking(strategy.trade(), table, strategy.tradedAssets())) {
            String csv = Objects.requireNonNull(strategy.prices().get(one.asset()), one.asset())
                    .layout()
                    .csv();
            problems.add(new Problem(
                    csv,
                    1,
                    1,
                    one.asset() + " has no " + one.column() + " on any bar, and " + one.what() + " needs it",
                    "name the column under prices (" + one.column() + ": ...), or trade without " + one.what()));
        }
        problems.addAll(OpensBesideCloses.problems(strategy, table));
        return problems;
    }
}
