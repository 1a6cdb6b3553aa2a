package sojourn.measure;

import java.util.Locale;
import java.util.function.Function;

/**
 * The catalogue of measures of one path: key of a column, label, unit, direction and a definition in one sentence. W_0..W_n is wealth,
 * r_1..r_n its simple returns, c_1..c_n those of cash, e = r - c, P the declared periods per year, years = calendar days / 365.25.
 * The order is that of the comparison's columns: risk, then return, then trading, then the rest.
 */
@SuppressWarnings("ImmutableEnumChecker") // every formula is a function of its argument alone
public enum Measure {
    /** Worst drawdown. */
    WORST_DRAWDOWN(
            "Worst drawdown",
            Unit.FRACTION,
            Direction.HIGHER,
            "The deepest fall of wealth below its running peak at closes, min over t of W_t / max(W_0..W_t) - 1, a number from -1 to 0.",
            facts -> Measured.of(facts.drawdown().worst())),
    /** Longest time under water. */
    LONGEST_UNDERWATER_BARS(
            "Longest time under water",
            Unit.BARS,
            Direction.LOWER,
            "The longest run of bars whose closing wealth lies below an earlier peak; a run still open at the end counts as far as it goes.",
            facts -> Measured.of(facts.drawdown().longestUnderwaterBars())),
    /** Expected shortfall at 95 %. */
    EXPECTED_SHORTFALL_95(
            "Expected shortfall (95 %)",
            Unit.FRACTION,
            Direction.LOWER,
            "The mean loss per bar in the worst 5 % of bars, -(1/m)[x_(1) + … + x_(floor m) + (m - floor m) x_(floor m + 1)]"
                    + " with m = 0.05 n and x_(i) the returns in ascending order.",
            facts -> facts.tail().expectedShortfall()),
    /** Volatility per year. */
    VOLATILITY_PER_YEAR(
            "Volatility",
            Unit.FRACTION_PER_YEAR,
            Direction.LOWER,
            "The standard deviation of simple returns, annualised: sqrt(P) sd(r), divisor n - 1.",
            PathFacts::volatilityPerYear),
    /** Growth per year. */
    GROWTH_PER_YEAR(
            "Growth",
            Unit.FRACTION_PER_YEAR,
            Direction.HIGHER,
            "The compound growth of wealth after costs per calendar year, (W_n / W_0)^(365.25 / calendar days) - 1.",
            PathFacts::growthPerYear),
    /** Growth less that of buy-and-hold. */
    GROWTH_MINUS_BUY_AND_HOLD(
            "Growth less buy-and-hold",
            Unit.FRACTION_PER_YEAR,
            Direction.HIGHER,
            "Growth per year less the growth per year of buy-and-hold over the same window, a plain difference.",
            PathFacts::growthMinusBuyAndHold),
    /** Lower end of the Sharpe ratio's interval. */
    SHARPE_LOW(
            "Sharpe ratio, low",
            Unit.RATIO_PER_YEAR,
            Direction.HIGHER,
            "The lower end of the Sharpe ratio's 95 % interval, ratio - 1.96 sqrt(P) se, se the standard error per bar robust to serial"
                    + " correlation (Bartlett weights, floor(4 (n/100)^(2/9)) lags) and to the shape of the returns.",
            facts -> Sharpe.low(facts.sharpe())),
    /** Sharpe ratio. */
    SHARPE(
            "Sharpe ratio",
            Unit.RATIO_PER_YEAR,
            Direction.HIGHER,
            "The mean return over cash per unit of its standard deviation, annualised: sqrt(P) mean(e) / sd(e), divisor n - 1"
                    + " (its error per bar is that of the ratio with divisor n, which differs by sqrt(n / (n - 1))).",
            PathFacts::sharpe),
    /** Upper end of the Sharpe ratio's interval. */
    SHARPE_HIGH(
            "Sharpe ratio, high",
            Unit.RATIO_PER_YEAR,
            Direction.HIGHER,
            "The upper end of the Sharpe ratio's 95 % interval, ratio + 1.96 sqrt(P) se, with the same se as the lower end.",
            facts -> Sharpe.high(facts.sharpe())),
    /** One-way turnover per year. */
    TURNOVER_PER_YEAR(
            "Turnover, one way",
            Unit.FRACTION_PER_YEAR,
            Direction.LOWER,
            "Half of all that was bought and sold, as a fraction of wealth before trading, per year: P times the mean per bar.",
            PathFacts::turnoverPerYear),
    /** Decided switches per year. */
    SWITCHES_PER_YEAR(
            "Switches",
            Unit.TIMES_PER_YEAR,
            Direction.LOWER,
            "The number of decided changes of state per calendar year, count / years.",
            PathFacts::switchesPerYear),
    /** Cost of trading per year. */
    COST_PER_YEAR(
            "Cost of trading",
            Unit.FRACTION_PER_YEAR,
            Direction.LOWER,
            "All costs of trading as a fraction of mean wealth per calendar year, sum of costs / mean(W_0..W_n) / years; borrow fee and"
                    + " margin interest are costs of holding and left out, though growth is after them.",
            PathFacts::costPerYear),
    /** Average exposure. */
    AVERAGE_EXPOSURE(
            "Average exposure",
            Unit.FRACTION,
            Direction.NEITHER,
            "The mean over bars of the net weight of risky assets at the start of the bar.",
            PathFacts::averageExposure),
    /** Sortino ratio. */
    SORTINO(
            "Sortino ratio",
            Unit.RATIO_PER_YEAR,
            Direction.HIGHER,
            "sqrt(P) (mean(r) - h) / sqrt((1/n) sum min(r - h, 0)^2) over all n bars, with the hurdle h = mean(c), what cash earned per bar on average.",
            PathFacts::sortino),
    /** Calmar ratio. */
    CALMAR(
            "Calmar ratio",
            Unit.RATIO_PER_YEAR,
            Direction.HIGHER,
            "Growth per year divided by the size of the worst drawdown, both over the whole window.",
            PathFacts::calmar),
    /** Total return. */
    TOTAL_RETURN(
            "Total return",
            Unit.FRACTION,
            Direction.HIGHER,
            "The growth of wealth after costs over the whole window, not annualised, W_n / W_0 - 1.",
            PathFacts::totalReturn),
    /** Growth per year before costs. */
    GROWTH_BEFORE_COSTS_PER_YEAR(
            "Growth before costs",
            Unit.FRACTION_PER_YEAR,
            Direction.HIGHER,
            "What growth per year would have been had the same fractions been held and every trade been free, borrow fee and margin interest paid all the same: the product of (W_i + cost_i) / W_{i-1},"
                    + " raised to 365.25 / calendar days, less 1.",
            PathFacts::growthBeforeCosts),
    /** Ulcer index. */
    ULCER(
            "Ulcer index",
            Unit.FRACTION,
            Direction.LOWER,
            "The root of the mean squared depth below the running peak over all n + 1 closes.",
            facts -> Measured.of(facts.drawdown().ulcer())),
    /** Value at risk at 95 %. */
    VALUE_AT_RISK_95(
            "Value at risk (95 %)",
            Unit.FRACTION,
            Direction.LOWER,
            "The loss per bar at the edge of the worst 5 % of bars, -x_(ceil(0.05 n)), x_(i) the returns in ascending order.",
            facts -> facts.tail().valueAtRisk()),
    /** Skewness. */
    SKEW(
            "Skewness",
            Unit.NUMBER,
            Direction.NEITHER,
            "G1 = g1 sqrt(n (n - 1)) / (n - 2) of the returns, g1 = m3 / m2^1.5 from central moments with divisor n.",
            facts -> Measured.from(facts.moments().sampleSkewness())),
    /** Excess kurtosis. */
    EXCESS_KURTOSIS(
            "Excess kurtosis",
            Unit.NUMBER,
            Direction.NEITHER,
            "G2 = (n - 1)((n + 1) g2 + 6) / ((n - 2)(n - 3)) of the returns, g2 = m4 / m2^2 - 3, 0 for a normal distribution.",
            facts -> Measured.from(facts.moments().sampleExcessKurtosis())),
    /** Share of bars with a gain. */
    HIT_RATE(
            "Bars with a gain",
            Unit.FRACTION,
            Direction.NEITHER,
            "The share of all bars with a return above 0.",
            PathFacts::hitRate),
    /** Share of bars in the market with a gain. */
    HIT_RATE_IN_MARKET(
            "Bars with a gain, while invested",
            Unit.FRACTION,
            Direction.NEITHER,
            "The share of bars with a return above 0 among those that began with a gross exposure above 1e-9.",
            PathFacts::hitRateInMarket),
    /** Share of bars in the market. */
    TIME_IN_MARKET(
            "Time invested",
            Unit.FRACTION,
            Direction.NEITHER,
            "The share of bars that began with a gross exposure, the sum of absolute weights, above 1e-9.",
            PathFacts::timeInMarket),
    /** Best bar. */
    BEST_BAR("Best bar", Unit.FRACTION, Direction.HIGHER, "The highest return of one bar.", PathFacts::bestBar),
    /** Worst bar. */
    WORST_BAR("Worst bar", Unit.FRACTION, Direction.HIGHER, "The lowest return of one bar.", PathFacts::worstBar),
    /** Best month. */
    BEST_MONTH(
            "Best month",
            Unit.FRACTION,
            Direction.HIGHER,
            "The highest compounded return of a calendar month that lies whole in the window.",
            facts -> facts.bestOf(facts.calendar().months())),
    /** Worst month. */
    WORST_MONTH(
            "Worst month",
            Unit.FRACTION,
            Direction.HIGHER,
            "The lowest compounded return of a calendar month that lies whole in the window.",
            facts -> facts.worstOf(facts.calendar().months())),
    /** Best year. */
    BEST_YEAR(
            "Best year",
            Unit.FRACTION,
            Direction.HIGHER,
            "The highest compounded return of a calendar year that lies whole in the window.",
            facts -> facts.bestOf(facts.calendar().years())),
    /** Worst year. */
    WORST_YEAR(
            "Worst year",
            Unit.FRACTION,
            Direction.HIGHER,
            "The lowest compounded return of a calendar year that lies whole in the window.",
            facts -> facts.worstOf(facts.calendar().years()));

    private final String label;
    private final Unit unit;
    private final Direction direction;
    private final String definition;
    private final Function<PathFacts, Measured> formula;

    Measure(String label, Unit unit, Direction direction, String definition, Function<PathFacts, Measured> formula) {
        this.label = label;
        this.unit = unit;
        this.direction = direction;
        this.definition = definition;
        this.formula = formula;
    }

    /** The name of the column and of the setting that ranks by it, such as {@code worst_drawdown}. */
    public String key() {
        return name().toLowerCase(Locale.ROOT);
    }

    /** A short heading. */
    public String label() {
        return label;
    }

    /** What the number counts. */
    public Unit unit() {
        return unit;
    }

    /** Which numbers are better. */
    public Direction direction() {
        return direction;
    }

    /** The definition, one sentence with the formula. */
    public String definition() {
        return definition;
    }

    Measured of(PathFacts facts) {
        return formula.apply(facts);
    }
}
