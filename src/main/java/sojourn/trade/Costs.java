package sojourn.trade;

import java.util.Optional;
import sojourn.document.Field;
import sojourn.document.NumberShape;
import sojourn.document.Shape;
import sojourn.document.Shapes;
import sojourn.numeric.Check;

/**
 * What trading and holding cost. A leg of an order of value a pays max(minimum fee, commission × a) + fixed fee + half-spread × a
 * + impact, and stamp duty × a if it buys; fill prices are taken as the middle between bid and ask. Held short positions pay a
 * fee for borrowing, negative cash a margin above the cash rate.
 *
 * @param commissionBps basis points (1/10,000) of the traded value
 * @param minimumFee the least commission of a leg, money
 * @param fixedFee of a leg, whatever its size, money
 * @param halfSpreadBps basis points of the traded value
 * @param spreadOfVolatility a half-spread that comes on top and moves with volatility
 * @param stampDutyBps basis points of the value bought
 * @param impact what an order loses by its own size
 * @param borrowPercentPerYear fee on the value held short at the close before, percent a year
 * @param marginPercentPerYear what negative cash pays above the cash rate, percent a year
 */
public record Costs(
        double commissionBps,
        double minimumFee,
        double fixedFee,
        double halfSpreadBps,
        Optional<SpreadOfVolatility> spreadOfVolatility,
        double stampDutyBps,
        Optional<Impact> impact,
        double borrowPercentPerYear,
        double marginPercentPerYear) {
    private static final double BPS = 10_000;
    private static final double MOST_BPS = 1_000;
    private static final double MOST_MONEY = 1e9;

    private static final Field<Double> COMMISSION =
            Field.defaulted("commission-bps", bps(), "0", "commission in basis points (1/10,000) of the traded value");
    private static final Field<Optional<Double>> MINIMUM =
            Field.maybe("minimum-fee", money(), "the least commission of one leg of an order, money; 0 if not given");
    private static final Field<Optional<Double>> FIXED =
            Field.maybe("fixed-fee", money(), "fee of one leg of an order whatever its size, money; 0 if not given");
    private static final Field<Double> HALF_SPREAD = Field.defaulted(
            "half-spread-bps",
            bps(),
            "0",
            "half the distance between bid and ask in basis points (1/10,000) of the traded value");
    private static final Field<Optional<SpreadOfVolatility>> OF_VOLATILITY = Field.maybe(
            "spread-by-volatility",
            SpreadOfVolatility.SHAPE,
            "a half-spread that comes on top of the constant one and moves with trailing volatility");
    private static final Field<Optional<Double>> STAMP_DUTY =
            Field.maybe("stamp-duty-bps", bps(), "tax on buying, in basis points of the value bought; 0 if not given");
    private static final Field<Optional<Impact>> IMPACT = Field.maybe(
            "impact",
            Impact.SHAPE,
            "what an order loses because its own size moves the price; needs a column of volumes");
    private static final Field<Optional<Double>> BORROW = Field.maybe(
            "borrow-percent-per-year",
            Shapes.number().atLeast(0).atMost(100),
            "fee on what is held short, percent a year of its value at the close before; 0 if not given");
    private static final Field<Optional<Double>> MARGIN = Field.maybe(
            "margin-percent-per-year",
            Shapes.number().atLeast(0).atMost(100),
            "what negative cash pays above the cash rate, percent a year; 0 if not given");

    /** Reads the map {@code costs}. */
    public static final Shape<Costs> SHAPE = Shapes.object(
            "costs",
            f -> new Costs(
                    f.get(COMMISSION),
                    f.get(MINIMUM).orElse(0.0),
                    f.get(FIXED).orElse(0.0),
                    f.get(HALF_SPREAD),
                    f.get(OF_VOLATILITY),
                    f.get(STAMP_DUTY).orElse(0.0),
                    f.get(IMPACT),
                    f.get(BORROW).orElse(0.0),
                    f.get(MARGIN).orElse(0.0)),
            COMMISSION,
            MINIMUM,
            FIXED,
            HALF_SPREAD,
            OF_VOLATILITY,
            STAMP_DUTY,
            IMPACT,
            BORROW,
            MARGIN);

    /** Refuses negative costs. */
    public Costs {
        Check.atLeast(commissionBps, 0, "commissionBps");
        Check.atLeast(minimumFee, 0, "minimumFee");
        Check.atLeast(fixedFee, 0, "fixedFee");
        Check.atLeast(halfSpreadBps, 0, "halfSpreadBps");
        Check.atLeast(stampDutyBps, 0, "stampDutyBps");
        Check.atLeast(borrowPercentPerYear, 0, "borrowPercentPerYear");
        Check.atLeast(marginPercentPerYear, 0, "marginPercentPerYear");
    }

    /** Commission and a constant half-spread, nothing else. */
    public Costs(double commissionBps, double halfSpreadBps) {
        this(commissionBps, 0, 0, halfSpreadBps, Optional.empty(), 0, Optional.empty(), 0, 0);
    }

    private static NumberShape bps() {
        return Shapes.number().atLeast(0).atMost(MOST_BPS);
    }

    private static NumberShape money() {
        return Shapes.number().atLeast(0).atMost(MOST_MONEY);
    }

    /** Trading that costs nothing. */
    public static Costs none() {
        return new Costs(0, 0);
    }

    /** The same with a least commission and a fixed fee of each leg, money. */
    public Costs withFees(double minimum, double fixed) {
        return new Costs(
                commissionBps,
                minimum,
                fixed,
                halfSpreadBps,
                spreadOfVolatility,
                stampDutyBps,
                impact,
                borrowPercentPerYear,
                marginPercentPerYear);
    }

    /** The same with a half-spread that moves with volatility on top. */
    public Costs withSpreadOf(SpreadOfVolatility spread) {
        return new Costs(
                commissionBps,
                minimumFee,
                fixedFee,
                halfSpreadBps,
                Optional.of(spread),
                stampDutyBps,
                impact,
                borrowPercentPerYear,
                marginPercentPerYear);
    }

    /** The same with a tax on buying. */
    public Costs withStampDuty(double bps) {
        return new Costs(
                commissionBps,
                minimumFee,
                fixedFee,
                halfSpreadBps,
                spreadOfVolatility,
                bps,
                impact,
                borrowPercentPerYear,
                marginPercentPerYear);
    }

    /** The same with market impact. */
    public Costs withImpact(Impact ofSize) {
        return new Costs(
                commissionBps,
                minimumFee,
                fixedFee,
                halfSpreadBps,
                spreadOfVolatility,
                stampDutyBps,
                Optional.of(ofSize),
                borrowPercentPerYear,
                marginPercentPerYear);
    }

    /** The same with a fee for borrowing what is held short and a margin on negative cash, both percent a year. */
    public Costs withFinancing(double borrowPercent, double marginPercent) {
        return new Costs(
                commissionBps,
                minimumFee,
                fixedFee,
                halfSpreadBps,
                spreadOfVolatility,
                stampDutyBps,
                impact,
                borrowPercent,
                marginPercent);
    }

    /** Commission as a fraction of the traded value. */
    public double commissionRate() {
        return commissionBps / BPS;
    }

    /** The constant half-spread as a fraction of the traded value. */
    public double halfSpreadRate() {
        return halfSpreadBps / BPS;
    }

    /** Tax on buying as a fraction of the value bought. */
    public double stampDutyRate() {
        return stampDutyBps / BPS;
    }

    /** What is in proportion to the traded value whoever buys or sells: commission and constant half-spread, one way. */
    public double oneWayRate() {
        return commissionRate() + halfSpreadRate();
    }

    /** Whether a leg costs {@link #oneWayRate} of its value and nothing else. */
    public boolean onlyProportional() {
        return minimumFee == 0
                && fixedFee == 0
                && spreadOfVolatility.isEmpty()
                && stampDutyBps == 0
                && impact.isEmpty();
    }

    /** Whether holding costs anything: shorts or negative cash. */
    public boolean onHolding() {
        return borrowPercentPerYear > 0 || marginPercentPerYear > 0;
    }
}
