package sojourn.evidence;

import java.util.List;
import java.util.OptionalDouble;

/**
 * How one regime changed over all accepted fits.
 *
 * @param deviation of the order-by returns, per bar
 * @param stay expected bars of a stay
 */
public record Drift(Range deviation, Range stay) {
    /**
     * First, least, most and last value; all empty where there is none.
     *
     * @param undefined fits without a value
     */
    public record Range(
            OptionalDouble first, OptionalDouble least, OptionalDouble most, OptionalDouble last, int undefined) {
        private static Range of(List<OptionalDouble> values) {
            double[] present = values.stream()
                    .flatMap(one -> one.stream().boxed())
                    .mapToDouble(Double::doubleValue)
                    .toArray();
            if (present.length == 0) {
                OptionalDouble none = OptionalDouble.empty();
                return new Range(none, none, none, none, values.size());
            }
            double least = present[0];
            double most = present[0];
            for (double value : present) {
                least = Math.min(least, value);
                most = Math.max(most, value);
            }
            return new Range(
                    OptionalDouble.of(present[0]),
                    OptionalDouble.of(least),
                    OptionalDouble.of(most),
                    OptionalDouble.of(present[present.length - 1]),
                    values.size() - present.length);
        }
    }

    /** Of regime {@code k}. */
    public static Drift of(Lineage lineage, int k) {
        return new Drift(
                Range.of(lineage.steps().stream()
                        .map(step -> step.regimes().get(k).deviation())
                        .toList()),
                Range.of(lineage.steps().stream()
                        .map(step -> step.regimes().get(k).stay())
                        .toList()));
    }
}
