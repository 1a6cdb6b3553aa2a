package sojourn.evidence;

import java.util.ArrayList;
import java.util.List;
import sojourn.regime.Gauge;
import sojourn.regime.GaugeFilter;
import sojourn.regime.Observations;
import sojourn.regime.RegimeModel;

/** What one fit says at each bar from its window's start on, its parameters frozen; and what it would have said without a bar. */
final class FrozenFilter {
    private final int states;
    /** Whether the probabilities are all that the gauge remembers, so that equal ones stay equal. */
    private final boolean forgetful;

    private final Observations nothing;
    private final Observations rows;
    private final int start;
    private final List<GaugeFilter> after;

    private FrozenFilter(Gauge gauge, Observations rows, int start) {
        this.states = gauge.states();
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
        return new FrozenFilter(gauge, subject.rows(stretch.windowStart(), end), stretch.windowStart());
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
        return states;
    }

    /** Probability of a regime at a bar. */
    double probability(int bar, int k) {
        return after.get(bar - start + 1).probability(k);
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
        for (int k = 0; k < states; k++) {
            apart = Math.max(apart, Math.abs(one.probability(k) - other.probability(k)));
        }
        return apart < 1e-12;
    }

    private int mostLikely(GaugeFilter filter) {
        int best = 0;
        for (int k = 1; k < states; k++) {
            best = filter.probability(k) > filter.probability(best) ? k : best;
        }
        return best;
    }
}
