package sojourn.latest;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import sojourn.allocate.Decision;
import sojourn.compare.Comparison;
import sojourn.compare.Prepared;
import sojourn.compare.Progress;
import sojourn.compare.Workers;
import sojourn.document.InputException;
import sojourn.evidence.Answer;
import sojourn.market.AnotherEnd;
import sojourn.market.PriceTable;
import sojourn.strategy.StrategyFile;
import sojourn.trade.Holdings;
import sojourn.walk.RegimeTimeline;

/**
 * What a strategy would do now: all that is known of it at one close.
 *
 * @param ready the strategy with its market
 * @param standing where it stands after that close
 * @param regime what is thought of the regimes; empty if nothing is
 * @param outlook what the next bar is expected to bring, one an asset; none without a reading
 * @param holdings what the orders start from: given by the user, or empty for what the simulation holds
 * @param orders what to trade, the oldest decision first; from given holdings one at most
 */
public record Latest(
        Prepared.Ready ready,
        Standing standing,
        Optional<RegimeNow> regime,
        List<AssetOutlook> outlook,
        Optional<Holdings> holdings,
        List<ProposedOrder> orders) {
    /** Copies the lists. */
    public Latest {
        outlook = List.copyOf(outlook);
        orders = List.copyOf(orders);
    }

    /** Reads the market of a strategy; every fault of its files is told at once. */
    public static Prepared.Ready prepared(StrategyFile file) {
        Prepared prepared = Prepared.of(file);
        if (prepared instanceof Prepared.Ready ready) {
            return ready;
        }
        throw new InputException(((Prepared.Unreadable) prepared).problems());
    }

    /** Where a strategy stands at the last common close of its files. */
    public static Standing standing(Prepared.Ready ready, Workers workers, Progress progress) {
        return standing(ready, ready.market().table().size(), workers, progress);
    }

    /** Where it stood when its files ended with so many bars, by what they hold now. */
    static Standing standing(Prepared.Ready ready, int bars, Workers workers, Progress progress) {
        PriceTable table = AnotherEnd.cut(ready.market().table(), bars);
        RegimeTimeline timeline = new Comparison(workers, progress).timeline(ready, table);
        return Standing.of(ready.file().strategy(), ready.policy(), table, timeline);
    }

    /** All of it, orders from what the simulation holds. */
    public static Latest of(Prepared.Ready ready, Standing standing) {
        return of(ready, standing, Optional.empty(), ProposedOrder.simulated(standing));
    }

    /**
     * All of it, orders from what the user holds.
     *
     * @param byName units by asset, and cash
     * @param file where they stand, for messages
     */
    public static Latest of(Prepared.Ready ready, Standing standing, Map<String, Double> byName, String file) {
        Holdings holdings = ProposedOrder.holdings(byName, standing, file);
        List<ProposedOrder> orders =
                ProposedOrder.from(holdings, standing).stream().toList();
        return of(ready, standing, Optional.of(holdings), orders);
    }

    private static Latest of(
            Prepared.Ready ready, Standing standing, Optional<Holdings> holdings, List<ProposedOrder> orders) {
        List<AssetOutlook> outlook = standing.reading()
                .map(reading -> AssetOutlook.of(standing, reading))
                .orElse(List.of());
        return new Latest(ready, standing, RegimeNow.of(standing), outlook, holdings, orders);
    }

    /** What was decided at this close: by the simulation, or from the holdings that were given; empty after ruin. */
    public Optional<Decision> decision() {
        return holdings.isPresent()
                ? ProposedOrder.decision(holdings.get(), standing)
                : standing.asked().map(Asked::decision);
    }

    /** The observed assets, with the returns of the next bar that leave the decision as it is. */
    public Map<String, Answer<TippingReturns>> tipping(Workers workers) {
        return TippingSearch.of(standing, workers);
    }

    /** The bar that tipping returns are of; empty if nothing can be said of it. */
    public Optional<NextBar> next() {
        return standing.reading().map(reading -> NextBar.of(standing, reading));
    }

    /** Files that go on after the last common close: their later rows wait for the others. */
    public List<String> ahead() {
        List<String> ahead = new ArrayList<>();
        ready.market().files().stream()
                .filter(file -> file.last().isAfter(standing.asOf()))
                .filter(file -> standing.table().assets().contains(file.role()))
                .forEach(file -> ahead.add(file.role() + " goes on to " + file.last()));
        return ahead;
    }
}
