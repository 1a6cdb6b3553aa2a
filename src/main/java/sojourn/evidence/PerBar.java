package sojourn.evidence;

import java.util.OptionalDouble;
import java.util.function.IntFunction;
import java.util.function.IntPredicate;
import java.util.stream.IntStream;

/** A number for some of the bars of a history. Immutable. */
public final class PerBar {
    /** NaN where there is none. */
    private final double[] values;

    private PerBar(double[] values) {
        this.values = values;
    }

    /** What {@code number} says of the bars 0 to {@code bars} - 1. */
    static PerBar of(int bars, IntFunction<OptionalDouble> number) {
        double[] values = new double[bars];
        for (int bar = 0; bar < bars; bar++) {
            values[bar] = number.apply(bar).orElse(Double.NaN);
        }
        return new PerBar(values);
    }

    /** The number of a bar; empty where there is none. */
    public OptionalDouble at(int bar) {
        return has(bar) ? OptionalDouble.of(values[bar]) : OptionalDouble.empty();
    }

    boolean has(int bar) {
        return !Double.isNaN(values[bar]);
    }

    /** Number of bars of the history. */
    int bars() {
        return values.length;
    }

    /** The bars that have a number, in order. */
    int[] present() {
        return where(this::has);
    }

    int[] where(IntPredicate wanted) {
        return IntStream.range(0, values.length).filter(wanted).toArray();
    }

    /** The numbers of bars that all have one. {@code bars} is not modified. */
    double[] at(int[] bars) {
        double[] some = new double[bars.length];
        for (int i = 0; i < bars.length; i++) {
            some[i] = at(bars[i]).orElseThrow();
        }
        return some;
    }
}
