package sojourn.allocate;

import java.util.Optional;
import sojourn.document.Field;
import sojourn.document.Shape;
import sojourn.document.Shapes;
import sojourn.numeric.Check;

/**
 * An exponentially weighted average of probabilities over the closes so far: s_t = s_{t-1} + (1 - 2^(-1/h)) (p_t - s_{t-1}),
 * s_1 = p_1, h the half-life. It looks back only; it has nothing to do with probabilities that are revised by what came later.
 *
 * @param halfLife bars after which a close counts half, above 0
 */
public record Smoothing(double halfLife) {
    private static final double LONGEST = 10_000;

    private static final Field<Double> HALF_LIFE = Field.required(
            "half-life", Shapes.number().above(0).atMost(LONGEST), "bars after which a close counts half as much");

    /** Reads the map under {@code smooth}. */
    public static final Shape<Smoothing> SHAPE =
            Shapes.object("smooth", f -> new Smoothing(f.get(HALF_LIFE)), HALF_LIFE);

    /** Refuses a half-life that is not positive. */
    public Smoothing {
        Check.above(halfLife, 0, "halfLife");
    }

    /** The average after one more close. {@code now} is not modified. */
    Trailing after(Optional<Trailing> before, double[] now) {
        return before.isEmpty() ? Trailing.of(now) : before.get().toward(now, 1 - StrictMath.pow(2, -1 / halfLife));
    }
}
