package sojourn.latest;

import java.time.LocalDate;
import java.util.List;
import java.util.Optional;
import sojourn.allocate.Policy;
import sojourn.allocate.Weights;
import sojourn.market.Known;
import sojourn.market.PriceTable;
import sojourn.strategy.Strategy;
import sojourn.trade.Order;
import sojourn.trade.Simulation;
import sojourn.trade.Terms;
import sojourn.trade.Track;
import sojourn.walk.Reading;
import sojourn.walk.RegimeTimeline;

/**
 * Where a strategy stands after the last close of a table: the simulation of a comparison, run up to there.
 *
 * @param strategy what the file says
 * @param policy what it decides by
 * @param table prices up to that close
 * @param timeline the regimes as they were known, at least up to that close
 * @param asked what was decided at that close; empty if nobody was asked, which is after ruin
 * @param track the simulated money; empty before the first decision
 */
public record Standing(
        Strategy strategy,
        Policy policy,
        PriceTable table,
        RegimeTimeline timeline,
        Optional<Asked> asked,
        Optional<Track> track) {

    /** Runs {@code policy} through {@code table}; later bars that the timeline may know of are not looked at. */
    public static Standing of(Strategy strategy, Policy policy, PriceTable table, RegimeTimeline timeline) {
        Witness witness = new Witness(policy);
        Optional<Track> track =
                Simulation.run(table, timeline, witness, strategy.trade().terms(), 0);
        return new Standing(strategy, policy, table, timeline, witness.at(table.size() - 1), track);
    }

    /** The last bar. */
    public int bar() {
        return table.size() - 1;
    }

    /** The market as it is known at that close. */
    public Known known() {
        return table.knownAt(bar());
    }

    /** The date of that close. */
    public LocalDate asOf() {
        return known().date();
    }

    /** What is thought of the regimes; empty before the first accepted fit and while the strategy stands aside. */
    public Optional<Reading> reading() {
        return timeline.reading(bar());
    }

    /** On what terms it trades. */
    Terms terms() {
        return strategy.trade().terms();
    }

    /** Orders that wait for a later bar, the oldest first. */
    public List<Order> pending() {
        return track.map(Track::waiting).orElse(List.of());
    }

    /** The weights decided on at this close or, if nothing was, at the last one before; empty before the first decision. */
    public Optional<Weights> target() {
        int assets = table.assets().size();
        return track.map(money -> Weights.each(assets, asset -> money.target(bar(), asset)));
    }
}
