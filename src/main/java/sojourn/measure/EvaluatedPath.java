package sojourn.measure;

import java.time.LocalDate;
import java.time.temporal.ChronoUnit;
import java.util.Arrays;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import sojourn.numeric.Check;

/**
 * The wealth of a strategy or yardstick over the window in which it is judged: n + 1 points, the base point first, and n returns
 * between them. Bar i of 0..n-1 runs from point i to point i + 1. What the path cost and held is optional, so that a
 * yardstick without trades can be judged too; a measure that needs what is not there is undefined. Immutable; all arrays are copied in and out.
 */
public final class EvaluatedPath {
    private static final double DAYS_PER_YEAR = 365.25;
    private static final double ROUNDING = 1e-9;

    private final List<LocalDate> dates;
    private final double[] wealth;
    private final double periodsPerYear;
    private final double[] cash;
    private final Map<Part, double[]> recorded;

    /** What a path may record besides wealth, n values each. */
    private enum Part {
        TURNOVER,
        COST,
        NET_EXPOSURE,
        GROSS_EXPOSURE,
        SWITCHES
    }

    private EvaluatedPath(
            List<LocalDate> dates,
            double[] wealth,
            double periodsPerYear,
            double[] cash,
            Map<Part, double[]> recorded) {
        this.dates = dates;
        this.wealth = wealth;
        this.periodsPerYear = periodsPerYear;
        this.cash = cash;
        this.recorded = recorded;
    }

    /**
     * A path that records wealth and the return of cash.
     *
     * @param dates n + 1 >= 1 dates in ascending order, the base date first
     * @param wealth n + 1 amounts: the first above 0, none below 0, and 0 ever after the first 0 (ruin)
     * @param cashReturns n simple returns of cash, per bar, above -1
     * @param periodsPerYear bars per year, as declared
     */
    public static EvaluatedPath of(
            List<LocalDate> dates, double[] wealth, double[] cashReturns, double periodsPerYear) {
        Check.that(!dates.isEmpty(), "there are no dates, a path needs at least its base date");
        Check.that(wealth.length == dates.size(), wealth.length + " amounts of wealth for " + dates.size() + " dates");
        requireAscending(dates);
        requireRuinToLast(wealth);
        requireLength(wealth.length - 1, cashReturns, "cash returns");
        for (double one : cashReturns) {
            Check.above(one, -1, "a cash return");
        }
        Check.above(periodsPerYear, 0, "periodsPerYear");
        return new EvaluatedPath(
                List.copyOf(dates), wealth.clone(), periodsPerYear, cashReturns.clone(), new EnumMap<>(Part.class));
    }

    /**
     * A copy that records trading.
     *
     * @param oneWayTurnover n fractions: sum |traded notional| / 2 / wealth before trading
     * @param costMoney n amounts of money paid for trading
     */
    public EvaluatedPath withTrading(double[] oneWayTurnover, double[] costMoney) {
        requireNotNegative(oneWayTurnover, "turnovers");
        requireNotNegative(costMoney, "costs");
        return with(Part.TURNOVER, oneWayTurnover).with(Part.COST, costMoney);
    }

    /**
     * A copy that records what was held at the start of each bar.
     *
     * @param net n sums of the risky weights
     * @param gross n sums of their absolute values, nowhere below the absolute net but for rounding
     */
    public EvaluatedPath withExposure(double[] net, double[] gross) {
        requireLength(bars(), net, "net exposures");
        requireNotNegative(gross, "gross exposures");
        for (int i = 0; i < net.length; i++) {
            double reach = gross[i] * (1 + ROUNDING) + ROUNDING;
            Check.within(net[i], -reach, reach, "net exposure", i);
        }
        return with(Part.NET_EXPOSURE, net).with(Part.GROSS_EXPOSURE, gross);
    }

    /** A copy that records how many changes of state were decided on each of the n bars. */
    public EvaluatedPath withSwitches(int[] perBar) {
        double[] counts = Arrays.stream(perBar).asDoubleStream().toArray();
        requireNotNegative(counts, "counts of switches");
        return with(Part.SWITCHES, counts);
    }

    /** The number n of returns. */
    public int bars() {
        return wealth.length - 1;
    }

    /** n + 1 dates, the base date first. */
    public List<LocalDate> dates() {
        return dates;
    }

    /** n + 1 amounts of wealth. A copy. */
    public double[] wealth() {
        return wealth.clone();
    }

    /** Bars per year, as declared. */
    public double periodsPerYear() {
        return periodsPerYear;
    }

    /** Calendar days from the base date to the last. */
    public long calendarDays() {
        return ChronoUnit.DAYS.between(dates.get(0), dates.get(dates.size() - 1));
    }

    /** Calendar days / 365.25. */
    public double years() {
        return calendarDays() / DAYS_PER_YEAR;
    }

    /** Whether wealth reached 0. */
    public boolean ruined() {
        return wealth[wealth.length - 1] == 0;
    }

    /** n simple returns W_{i+1} / W_i - 1; 0 after ruin. */
    public double[] returns() {
        double[] returns = new double[bars()];
        for (int i = 0; i < returns.length; i++) {
            returns[i] = wealth[i] > 0 ? wealth[i + 1] / wealth[i] - 1 : 0;
        }
        return returns;
    }

    /** n simple returns of cash. A copy. */
    public double[] cashReturns() {
        return cash.clone();
    }

    /** n returns over cash, the simple difference. */
    public double[] excessReturns() {
        double[] excess = returns();
        for (int i = 0; i < excess.length; i++) {
            excess[i] -= cash[i];
        }
        return excess;
    }

    /** n one-way turnovers, if recorded. A copy. */
    public Optional<double[]> turnover() {
        return part(Part.TURNOVER);
    }

    /** n costs in money, if recorded. A copy. */
    public Optional<double[]> costs() {
        return part(Part.COST);
    }

    /** n net exposures, if recorded. A copy. */
    public Optional<double[]> netExposure() {
        return part(Part.NET_EXPOSURE);
    }

    /** n gross exposures, if recorded. A copy. */
    public Optional<double[]> grossExposure() {
        return part(Part.GROSS_EXPOSURE);
    }

    /** n counts of decided switches, whole numbers, if recorded. A copy. */
    public Optional<double[]> switches() {
        return part(Part.SWITCHES);
    }

    private Optional<double[]> part(Part part) {
        return Optional.ofNullable(recorded.get(part)).map(double[]::clone);
    }

    private EvaluatedPath with(Part part, double[] values) {
        Map<Part, double[]> all = new EnumMap<>(recorded);
        all.put(part, values.clone());
        return new EvaluatedPath(dates, wealth, periodsPerYear, cash, all);
    }

    private static void requireAscending(List<LocalDate> dates) {
        for (int i = 1; i < dates.size(); i++) {
            if (!dates.get(i).isAfter(dates.get(i - 1))) {
                throw new IllegalArgumentException("date " + dates.get(i) + " does not come after " + dates.get(i - 1));
            }
        }
    }

    private static void requireRuinToLast(double[] wealth) {
        Check.above(wealth[0], 0, "wealth 0");
        for (int i = 1; i < wealth.length; i++) {
            Check.atLeast(wealth[i], 0, "wealth", i);
            if (wealth[i - 1] == 0 && wealth[i] != 0) {
                throw new IllegalArgumentException("wealth " + i + " is " + wealth[i] + " after ruin");
            }
            if (wealth[i - 1] > 0 && !Double.isFinite(wealth[i] / wealth[i - 1])) {
                throw new IllegalArgumentException("wealth " + i + " is " + wealth[i] + " after " + wealth[i - 1]
                        + ", beyond the range of a return");
            }
        }
    }

    private void requireNotNegative(double[] values, String name) {
        requireLength(bars(), values, name);
        String oneOfThem = "one of the " + name;
        for (double one : values) {
            Check.atLeast(one, 0, oneOfThem);
        }
    }

    private static void requireLength(int bars, double[] values, String name) {
        Check.that(values.length == bars, values.length + " " + name + " for " + bars + " bars");
    }
}
