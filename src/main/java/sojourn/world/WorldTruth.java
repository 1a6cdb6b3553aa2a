package sojourn.world;

import java.time.LocalDate;
import java.util.List;
import sojourn.numeric.Check;

/**
 * The true state of every trading day, which in a real market nobody knows. Bars are counted from 0; the state of a bar is
 * the one its return was drawn in.
 */
public final class WorldTruth {
    private final List<String> states;
    private final List<LocalDate> dates;
    private final int[] path;

    private WorldTruth(List<String> states, List<LocalDate> dates, int[] path) {
        this.states = states;
        this.dates = dates;
        this.path = path;
    }

    /** Copies all three. {@code path}: the index in {@code states} of each date's state. */
    static WorldTruth of(List<String> states, List<LocalDate> dates, int[] path) {
        Check.that(dates.size() == path.length, dates.size() + " dates for " + path.length + " states");
        return new WorldTruth(List.copyOf(states), List.copyOf(dates), path.clone());
    }

    /** The names of the states. */
    public List<String> states() {
        return states;
    }

    /** The number of bars. */
    public int size() {
        return path.length;
    }

    /** The date of a bar. */
    public LocalDate date(int bar) {
        return dates.get(bar);
    }

    /** The index of a bar's state in {@link #states()}. */
    public int stateIndex(int bar) {
        return path[bar];
    }

    /** The name of a bar's state. */
    public String state(int bar) {
        return states.get(path[bar]);
    }
}
