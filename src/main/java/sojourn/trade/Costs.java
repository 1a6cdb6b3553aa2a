package sojourn.trade;

import sojourn.document.Field;
import sojourn.document.Shape;
import sojourn.document.Shapes;
import sojourn.numeric.Check;

/**
 * What a trade costs, in basis points (1/10,000) of the traded value: commission, and half of the spread between bid and ask, since
 * closes are taken as the middle.
 */
public record Costs(double commissionBps, double halfSpreadBps) {
    private static final double BPS = 10_000;
    private static final double MOST_BPS = 1_000;

    private static final Field<Double> COMMISSION = Field.defaulted(
            "commission-bps",
            Shapes.number().atLeast(0).atMost(MOST_BPS),
            "0",
            "commission in basis points (1/10,000) of the traded value");
    private static final Field<Double> HALF_SPREAD = Field.defaulted(
            "half-spread-bps",
            Shapes.number().atLeast(0).atMost(MOST_BPS),
            "0",
            "half the distance between bid and ask in basis points (1/10,000) of the traded value");

    /** Reads the map {@code costs}. */
    public static final Shape<Costs> SHAPE =
            Shapes.object("costs", f -> new Costs(f.get(COMMISSION), f.get(HALF_SPREAD)), COMMISSION, HALF_SPREAD);

    /** Refuses negative costs. */
    public Costs {
        Check.atLeast(commissionBps, 0, "commissionBps");
        Check.atLeast(halfSpreadBps, 0, "halfSpreadBps");
    }

    /** Trading that costs nothing. */
    public static Costs none() {
        return new Costs(0, 0);
    }

    /** Commission as a fraction of the traded value. */
    public double commissionRate() {
        return commissionBps / BPS;
    }

    /** Half-spread as a fraction of the traded value. */
    public double halfSpreadRate() {
        return halfSpreadBps / BPS;
    }

    /** All of it, one way, as a fraction of the traded value. */
    public double oneWayRate() {
        return commissionRate() + halfSpreadRate();
    }
}
