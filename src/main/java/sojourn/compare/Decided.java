package sojourn.compare;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;
import sojourn.allocate.Weights;
import sojourn.market.PriceTable;
import sojourn.trade.FillRule;
import sojourn.trade.Track;
import sojourn.trade.TradeSettings;
import sojourn.trade.Undecided;
import sojourn.walk.RegimeTimeline;

/**
 * What a strategy's rule decided, decision by decision, and which of these decisions a window judges: from the last one that was due
 * by the window's base, the one in force there, to the last one inside. Bars on which the strategy stood aside are no decisions of
 * its rule.
 */
final class Decided {
    private final Track track;
    private final List<Integer> bars = new ArrayList<>();
    private final int first;
    private final int end;

    Decided(PriceTable table, RegimeTimeline timeline, TradeSettings trade, Track track, Window window) {
        FillRule fill = trade.terms().fill();
        this.track = track;
        int before = 0;
        int inside = 0;
        for (int bar = track.firstBar(); bar <= track.lastBar(); bar++) {
            if (trade.decide().decides(table.knownAt(bar))
                    && timeline.reading(bar).isPresent()) {
                before = fill.dueOn(bar) <= window.base() ? bars.size() : before;
                bars.add(bar);
                inside = bar <= window.last() ? bars.size() : inside;
            }
        }
        this.first = before;
        this.end = inside;
    }

    /** The bar of the {@code i}-th decision. */
    int bar(int i) {
        return bars.get(i);
    }

    int size() {
        return bars.size();
    }

    /** The first decision that is judged. */
    int first() {
        return first;
    }

    /** One past the last decision that is judged; above {@link #first}. */
    int end() {
        return end;
    }

    /** The state behind each decision of a rule with two states, 0 and 1: told from the last one back, through every switch. */
    int[] states() {
        int[] states = new int[bars.size()];
        int state = track.stance().decided();
        for (int i = states.length - 1; i >= 0; i--) {
            states[i] = state;
            state = track.switched(bar(i)) ? 1 - state : state;
        }
        return states;
    }

    /** The weights decided; empty where the rule found none. */
    List<Optional<Weights>> targets() {
        Set<Integer> without = new TreeSet<>();
        for (Undecided one : track.undecided()) {
            without.add(one.bar());
        }
        List<Optional<Weights>> targets = new ArrayList<>();
        for (int bar : bars) {
            targets.add(
                    without.contains(bar)
                            ? Optional.empty()
                            : Optional.of(Weights.each(track.assets().size(), asset -> track.target(bar, asset))));
        }
        return targets;
    }
}
