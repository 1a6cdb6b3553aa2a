package sojourn.compare;

import java.nio.file.InvalidPathException;
import java.nio.file.Path;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import sojourn.allocate.RulePolicy;
import sojourn.document.InputException;
import sojourn.document.Problem;
import sojourn.market.InputFile;
import sojourn.market.Market;
import sojourn.market.PriceReader;
import sojourn.strategy.Strategy;
import sojourn.strategy.StrategyFile;
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
        RulePolicy policy() {
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
                    file.folder(), strategy.prices(), strategy.calendar(), strategy.cash(), strategy.usedAssets());
            return new Ready(file, market, TimelineAddress.of(file.walkSettings(), market.table()));
        } catch (InputException e) {
            return new Unreadable(file, e.problems());
        }
    }
}
