package sojourn.market;

import java.util.Arrays;
import java.util.OptionalDouble;
import sojourn.numeric.Check;

/** The given probabilities in force at each close of a calendar; none before the first row became known. Immutable. */
final class GivenByBar {
    private final int states;
    private final int firstBar;
    private final double[] byBar;

    private GivenByBar(int states, int firstBar, double[] byBar) {
        this.states = states;
        this.firstBar = firstBar;
        this.byBar = byBar;
    }

    /** {@code byBar} is bars × states, row-major, and counts from {@code firstBar} on. Copied; not modified. */
    static GivenByBar of(int states, int firstBar, double[] byBar) {
        return new GivenByBar(states, firstBar, byBar.clone());
    }

    /** Over so many bars: cut, or the last row in force going on. */
    GivenByBar over(int bars) {
        double[] other = Arrays.copyOf(byBar, bars * states);
        for (int cell = byBar.length; cell < other.length; cell++) {
            other[cell] = other[cell - states];
        }
        int last = bars() - 1;
        return new GivenByBar(states, last < firstBar ? bars : firstBar, other);
    }

    int bars() {
        return byBar.length / states;
    }

    OptionalDouble at(int bar, int state) {
        Check.within(state, 0, states - 1, "state");
        return bar < firstBar ? OptionalDouble.empty() : OptionalDouble.of(byBar[bar * states + state]);
    }
}
