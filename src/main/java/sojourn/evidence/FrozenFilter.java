package sojourn.evidence;

import java.util.ArrayList;
import java.util.List;
import java.util.OptionalInt;
import sojourn.regime.Gauge;
import sojourn.regime.GaugeFilter;
import sojourn.regime.Observations;
import sojourn.regime.RegimeModel;

/** What one fit says at each bar from its window's start on, its parameters frozen; and what it would have said without a bar. */
final class FrozenFilter {
    /** The gauge's state of each regime of the timeline; empty for one that it has none of, whose probability is 0. */
    private final List<OptionalInt> states;

    /** Whether the probabilities are all that the gauge remembers, so that equal ones stay equal. */
    private final boolean forgetful;

    private final Observations nothing;
    private final Observations rows;
    private final int start;
    private final List<GaugeFilter> after;

    private FrozenFilter(Gauge gauge, List<OptionalInt> states, Observations rows, int start) {
        this.states = states;
        this.forgetful = gauge instanceof RegimeModel;
        this.nothing = Observations.of(rows.dimension(), new double[rows.dimension()], new boolean[] {true});
        this.rows = rows;
        this.start = start;
        this.after = new ArrayList<>(rows.size() + 1);
        after.add(gauge.filter());
        for (int row = 0; row < rows.size(); row++) {
            after.add(after.get(row).step(rows, row));
        }
    }

    /** Of a stretch's fit, from its window's start up to, not including, bar {@code end}. */
    static FrozenFilter of(WalkedRegimes subject, Stretch stretch, int end) {
        Gauge gauge = stretch.record()
                .fit()
                .gauge()
                .orElseThrow(() -> new IllegalStateException("an accepted fit has a gauge"));
        List<OptionalInt> states = stretch.states(subject.timeline().regimes());
        return new FrozenFilter(gauge, states, subject.rows(stretch.windowStart(), end), stretch.windowStart());
    }

    /** Its first bar. */
    int start() {
        return start;
    }

    /** One past its last bar. */
    int end() {
        return start + rows.size();
    }

    int states() {
        return states.size();
    }

    /** Probability of a regime at a bar. */
    double probability(int bar, int k) {
        return probability(after.get(bar - start + 1), k);
    }

    private double probability(GaugeFilter filter, int k) {
        return states.get(k).isPresent() ? filter.probability(states.get(k).getAsInt()) : 0;
    }

    /** The most likely regime at a bar; ties to the lower volatility. */
    int mostLikely(int bar) {
        return mostLikely(after.get(bar - start + 1));
    }

    /**
     * The most likely regimes from a bar to the end, had nothing been observed on that bar. Once the probabilities of a model with a
     * likelihood are within 1e-12 of those that were, they count as the same from there on; other gauges remember more than that.
     */
    int[] mostLikelyWithout(int bar) {
        int[] regimes = new int[end() - bar];
        GaugeFilter now = after.get(bar - start).step(nothing, 0);
        regimes[0] = mostLikely(now);
        boolean met = false;
        for (int later = bar + 1; later < end(); later++) {
            if (!met) {
                now = now.step(rows, later - start);
                met = forgetful && near(now, after.get(later - start + 1));
            }
            regimes[later - bar] = met ? mostLikely(later) : mostLikely(now);
        }
        return regimes;
    }

    private boolean near(GaugeFilter one, GaugeFilter other) {
        double apart = 0;
        for (int k = 0; k < states.size(); k++) {
            apart = Math.max(apart, Math.abs(probability(one, k) - probability(other, k)));
        }
        return apart < 1e-12;
    }

    private int mostLikely(GaugeFilter filter) {
        int best = 0;
        for (int k = 1; k < states.size(); k++) {
            best = probability(filter, k) > probability(filter, best) ? k : best;
        }
        return best;
    }
}
