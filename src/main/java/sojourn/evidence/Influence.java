package sojourn.evidence;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;

/**
 * What hangs on single bars: each bar's observation is left out in turn, everything else as it was, and the most likely regime asked again at
 * this close and at every later one until the next fit. That a later fit would have come out otherwise is not counted.
 */
public final class Influence {
    private final List<LeftOut> bars;

    private Influence(List<LeftOut> bars) {
        this.bars = List.copyOf(bars);
    }

    /**
     * One bar left out.
     *
     * @param bar the bar
     * @param fit the number of the fit in force
     * @param mostLikely the most likely regime at its close
     * @param without the same without its observation
     * @param changed closes, its own included, whose most likely regime would have been another
     * @param until the last of them, the bar itself if there is none
     */
    public record LeftOut(int bar, int fit, int mostLikely, int without, int changed, int until) {}

    /** Of every observation while a fit was in force. */
    static Answer<Influence> of(WalkedRegimes subject) {
        if (subject.stretches().isEmpty()) {
            return Answer.none("no fit was accepted");
        }
        if (subject.timeline().regimes().size() == 1) {
            return Answer.none("there is one regime, whatever is left out");
        }
        List<LeftOut> bars = new ArrayList<>();
        for (Stretch stretch : subject.stretches()) {
            FrozenFilter filter = FrozenFilter.of(subject, stretch, stretch.end());
            for (int bar = stretch.from(); bar < stretch.end(); bar++) {
                if (subject.known(bar) && subject.anyObserved(bar)) {
                    bars.add(leftOut(filter, stretch, bar));
                }
            }
        }
        return Answer.of(new Influence(bars));
    }

    private static LeftOut leftOut(FrozenFilter filter, Stretch stretch, int bar) {
        int[] without = filter.mostLikelyWithout(bar);
        int changed = 0;
        int until = bar;
        for (int later = 0; later < without.length; later++) {
            if (without[later] != filter.mostLikely(bar + later)) {
                changed++;
                until = bar + later;
            }
        }
        return new LeftOut(bar, stretch.record().number(), filter.mostLikely(bar), without[0], changed, until);
    }

    /** Every bar that was left out, in order. */
    public List<LeftOut> bars() {
        return bars;
    }

    /** Those that would have changed the most likely regime at some close, the most closes first, then the earlier. */
    public List<LeftOut> decisive() {
        return bars.stream()
                .filter(one -> one.changed() > 0)
                .sorted(Comparator.comparingInt(LeftOut::changed).reversed().thenComparingInt(LeftOut::bar))
                .toList();
    }

    /** Bars whose own close would have had another most likely regime. */
    public long atTheirOwnClose() {
        return bars.stream().filter(one -> one.without() != one.mostLikely()).count();
    }
}
