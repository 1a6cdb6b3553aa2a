package sojourn.evidence;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import sojourn.regime.FilterState;
import sojourn.regime.Observations;
import sojourn.regime.RegimeModel;

/** What one fit says at each bar from its window's start on, its parameters frozen; and what it would have said without a bar. */
final class FrozenFilter {
    private static final Observations NOTHING = Observations.of(1, new double[1], new boolean[] {true});

    private final RegimeModel model;
    private final Observations rows;
    private final int start;
    private final List<FilterState> after;

    private FrozenFilter(RegimeModel model, Observations rows, int start) {
        this.model = model;
        this.rows = rows;
        this.start = start;
        this.after = new ArrayList<>(rows.size() + 1);
        after.add(FilterState.before(model));
        for (int row = 0; row < rows.size(); row++) {
            after.add(after.get(row).step(model, rows, row));
        }
    }

    /** Up to, not including, bar {@code end}; empty where the fit has no filter to run. */
    static Optional<FrozenFilter> of(Subject subject, Stretch stretch, int end) {
        return stretch.record()
                .fit()
                .model()
                .map(model -> new FrozenFilter(model, subject.rows(stretch.windowStart(), end), stretch.windowStart()));
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
        return model.states();
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
     * The most likely regimes from a bar to the end, had nothing been observed on that bar. Once the probabilities are within 1e-12 of those
     * that were, they count as the same from there on.
     */
    int[] mostLikelyWithout(int bar) {
        int[] regimes = new int[end() - bar];
        FilterState now = after.get(bar - start).step(model, NOTHING, 0);
        regimes[0] = mostLikely(now);
        boolean met = false;
        for (int later = bar + 1; later < end(); later++) {
            if (!met) {
                now = now.step(model, rows, later - start);
                met = near(now, after.get(later - start + 1));
            }
            regimes[later - bar] = met ? mostLikely(later) : mostLikely(now);
        }
        return regimes;
    }

    private boolean near(FilterState one, FilterState other) {
        double apart = 0;
        for (int k = 0; k < states(); k++) {
            apart = Math.max(apart, Math.abs(one.probability(k) - other.probability(k)));
        }
        return apart < 1e-12;
    }

    private int mostLikely(FilterState filter) {
        int best = 0;
        for (int k = 1; k < states(); k++) {
            best = filter.probability(k) > filter.probability(best) ? k : best;
        }
        return best;
    }
}
