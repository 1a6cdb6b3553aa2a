package sojourn.trade;

import java.util.Optional;
import sojourn.allocate.Schedule;
import sojourn.document.Field;
import sojourn.document.Shape;
import sojourn.document.Shapes;
import sojourn.numeric.Check;

/**
 * The section {@code trade}. When to decide, how long to stay and what is too little to trade for are acted on by the policy; the
 * rest are the {@link #terms}.
 */
public record TradeSettings(
        Schedule decide,
        FillTime fill,
        int delay,
        double noTradeBand,
        int stayAtLeast,
        Costs costs,
        double capital,
        SizeAt sizeAt,
        Lots lots) {
    private static final int LONGEST_DELAY = 250;
    private static final int LONGEST_STAY = 10_000;
    private static final double MOST_CAPITAL = 1e15;

    private static final Field<Schedule> DECIDE = Field.defaulted(
            "decide",
            Schedule.SHAPE,
            Schedule.AT_EVERY_CLOSE.word(),
            "the closes to decide at: every one, the first of each ISO week, or the first of each month");
    private static final Field<FillTime> FILL = Field.defaulted(
            "fill",
            FillTime.SHAPE,
            FillTime.NEXT_CLOSE.word(),
            "when an order fills: at the close or at the open of the bar after the decision");
    private static final Field<Integer> DELAY = Field.defaulted(
            "delay", Shapes.integer().atLeast(0).atMost(LONGEST_DELAY), "0", "further bars until an order fills");
    private static final Field<Double> NO_TRADE_BAND = Field.defaulted(
            "no-trade-band",
            Shapes.number().atLeast(0).atMost(1),
            "0",
            "nothing is traded while every weight is within this of its target, a fraction of wealth");
    private static final Field<Integer> STAY_AT_LEAST = Field.defaulted(
            "stay-at-least",
            Shapes.integer().atLeast(1).atMost(LONGEST_STAY),
            "1",
            "bars that a decided change of state is kept for");
    private static final Field<Costs> COSTS =
            Field.defaulted("costs", Costs.SHAPE, "{}", "what a trade costs, in basis points of the traded value");
    private static final Field<Double> CAPITAL = Field.defaulted(
            "capital",
            Shapes.number().above(0).atMost(MOST_CAPITAL),
            "1000000",
            "wealth to begin with, in the currency of the prices");

    private static final Field<Optional<SizeAt>> SIZE_AT = Field.maybe(
            "size-at",
            SizeAt.SHAPE,
            "the prices that settle an order's quantities: those of its fill (fill, if left out), an approximation, or the closes of the"
                    + " decision");
    private static final Field<Optional<Lots>> LOTS = Field.maybe(
            "lots",
            Lots.SHAPE,
            "units that come together, one number for every asset or one for each named; any fraction if left out");

    /** Reads the section {@code trade}. */
    public static final Shape<TradeSettings> SHAPE = Shapes.object(
            "trade",
            f -> new TradeSettings(
                    f.get(DECIDE),
                    f.get(FILL),
                    f.get(DELAY),
                    f.get(NO_TRADE_BAND),
                    f.get(STAY_AT_LEAST),
                    f.get(COSTS),
                    f.get(CAPITAL),
                    f.get(SIZE_AT).orElse(SizeAt.FILL),
                    f.get(LOTS).orElse(Lots.FRACTIONS)),
            DECIDE,
            FILL,
            DELAY,
            NO_TRADE_BAND,
            STAY_AT_LEAST,
            COSTS,
            CAPITAL,
            SIZE_AT,
            LOTS);

    /** Refuses numbers out of range. */
    public TradeSettings {
        Check.within(delay, 0, Integer.MAX_VALUE, "delay");
        Check.atLeast(noTradeBand, 0, "noTradeBand");
        Check.within(stayAtLeast, 1, Integer.MAX_VALUE, "stayAtLeast");
        Check.above(capital, 0, "capital");
    }

    /** Quantities settled at the fill, in fractions of a unit. */
    public TradeSettings(
            Schedule decide,
            FillTime fill,
            int delay,
            double noTradeBand,
            int stayAtLeast,
            Costs costs,
            double capital) {
        this(decide, fill, delay, noTradeBand, stayAtLeast, costs, capital, SizeAt.FILL, Lots.FRACTIONS);
    }

    /** What the simulation needs to know. */
    public Terms terms() {
        return new Terms(fill.delayed(delay), costs, capital, sizeAt, lots);
    }
}
