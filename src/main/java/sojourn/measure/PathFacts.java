package sojourn.measure;

import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.function.Supplier;
import java.util.function.ToDoubleFunction;
import sojourn.inference.Moments;
import sojourn.numeric.CompensatedSum;

/** What the measures of one path share, worked out once: a path with at least one bar, and the growth it is held against. */
final class PathFacts {
    static final double TAIL = 0.05;
    private static final double IN_THE_MARKET = 1e-9;

    private final EvaluatedPath path;
    private final double[] wealth;
    private final double[] returns;
    private final Moments moments;
    private final Drawdown drawdown;
    private final Supplier<CalendarTable> calendar;
    private final Measured growthPerYear;
    private final Measured buyAndHoldGrowthPerYear;
    private final Measured sharpe;

    PathFacts(EvaluatedPath path, EvaluatedPath buyAndHold, Drawdown drawdown, Supplier<CalendarTable> calendar) {
        this.path = path;
        wealth = path.wealth();
        returns = path.returns();
        moments = Moments.of(returns);
        this.drawdown = drawdown;
        this.calendar = calendar;
        growthPerYear = growth(path);
        buyAndHoldGrowthPerYear = growth(buyAndHold);
        sharpe = unlessRuined(Sharpe.perYear(path.excessReturns(), path.periodsPerYear()));
    }

    Moments moments() {
        return moments;
    }

    Drawdown drawdown() {
        return drawdown;
    }

    CalendarTable calendar() {
        return calendar.get();
    }

    Measured totalReturn() {
        return Growth.total(wealth[0], wealth[wealth.length - 1]);
    }

    Measured growthPerYear() {
        return growthPerYear;
    }

    Measured growthMinusBuyAndHold() {
        return growthPerYear.minus(buyAndHoldGrowthPerYear);
    }

    /** prod (1 + (W_{i+1} + cost) / W_i - 1) per year: the same holdings' growth, had every trade been free. */
    Measured growthBeforeCosts() {
        Optional<double[]> costs = path.costs();
        if (costs.isEmpty()) {
            return notRecorded("costs");
        }
        double factor = 1;
        for (int i = 0; i < returns.length && wealth[i] > 0; i++) {
            factor *= (wealth[i + 1] + costs.get()[i]) / wealth[i];
        }
        return unlessRuined(
                Growth.perYear(1, factor, path.dates().get(0), path.dates().get(path.bars())));
    }

    Measured volatilityPerYear() {
        return Measured.from(moments.standardDeviation()).times(Math.sqrt(path.periodsPerYear()));
    }

    Measured sharpe() {
        return sharpe;
    }

    Measured sortino() {
        double hurdle = CompensatedSum.of(path.cashReturns()) / path.bars();
        return unlessRuined(Sortino.perYear(returns, hurdle, path.periodsPerYear()));
    }

    Measured calmar() {
        return unlessRuined(Calmar.of(growthPerYear, drawdown.worst()));
    }

    Tail tail() {
        return Tail.of(returns, TAIL);
    }

    Measured turnoverPerYear() {
        return path.turnover()
                .map(perBar -> Turnover.perYear(perBar, path.periodsPerYear()))
                .orElseGet(() -> notRecorded("turnover"));
    }

    Measured switchesPerYear() {
        return path.switches()
                .map(perBar -> Measured.of(CompensatedSum.of(perBar) / path.years()))
                .orElseGet(() -> notRecorded("switches"));
    }

    Measured costPerYear() {
        double meanWealth = CompensatedSum.of(wealth) / wealth.length;
        return path.costs()
                .map(perBar -> Measured.of(CompensatedSum.of(perBar) / meanWealth / path.years()))
                .orElseGet(() -> notRecorded("costs"));
    }

    Measured averageExposure() {
        return path.netExposure()
                .map(perBar -> Measured.of(CompensatedSum.of(perBar) / perBar.length))
                .orElseGet(() -> notRecorded("exposure"));
    }

    Measured timeInMarket() {
        return path.grossExposure()
                .map(perBar -> Measured.of(share(perBar, IN_THE_MARKET)))
                .orElseGet(() -> notRecorded("exposure"));
    }

    Measured hitRate() {
        return Measured.of(share(returns, 0));
    }

    Measured hitRateInMarket() {
        Optional<double[]> gross = path.grossExposure();
        if (gross.isEmpty()) {
            return notRecorded("exposure");
        }
        int held = 0;
        int gains = 0;
        for (int i = 0; i < returns.length; i++) {
            if (gross.get()[i] > IN_THE_MARKET) {
                held++;
                gains += returns[i] > 0 ? 1 : 0;
            }
        }
        return held == 0 ? Measured.tooFew(0, 1) : Measured.of((double) gains / held);
    }

    Measured bestBar() {
        return Measured.of(Arrays.stream(returns).max().orElseThrow());
    }

    Measured worstBar() {
        return Measured.of(Arrays.stream(returns).min().orElseThrow());
    }

    Measured bestOf(List<CalendarTable.Period> periods) {
        return extreme(periods, CalendarTable.Period::compounded, 1);
    }

    Measured worstOf(List<CalendarTable.Period> periods) {
        return extreme(periods, period -> -period.compounded(), -1);
    }

    private static Measured extreme(
            List<CalendarTable.Period> periods, ToDoubleFunction<CalendarTable.Period> merit, int sign) {
        return periods.stream()
                .filter(period -> period.coverage() == CalendarTable.Coverage.WHOLE)
                .max(Comparator.comparingDouble(merit))
                .map(period -> Measured.of(sign * merit.applyAsDouble(period)))
                .orElseGet(() -> Measured.undefined(
                        Measured.Reason.NO_WHOLE_PERIOD, "no whole period of the calendar lies in the window"));
    }

    private static Measured growth(EvaluatedPath path) {
        double[] wealth = path.wealth();
        int last = path.bars();
        return Growth.perYear(
                wealth[0], wealth[last], path.dates().get(0), path.dates().get(last));
    }

    private static double share(double[] values, double above) {
        return (double) Arrays.stream(values).filter(value -> value > above).count() / values.length;
    }

    private Measured unlessRuined(Measured measured) {
        return path.ruined()
                ? Measured.undefined(Measured.Reason.RUIN, "wealth reached 0 inside the window")
                : measured;
    }

    private static Measured notRecorded(String what) {
        return Measured.undefined(Measured.Reason.NOT_RECORDED, "the path does not record " + what);
    }
}
