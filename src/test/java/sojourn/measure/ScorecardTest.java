package sojourn.measure;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;
import static sojourn.measure.Undefinedness.reason;

import java.time.LocalDate;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;

class ScorecardTest {
    private static final LocalDate START = LocalDate.of(2020, 1, 1);
    /** Four bars of 365.25 days make 1461 days. */
    private static final List<LocalDate> FOUR_YEARS =
            List.of(START, START.plusDays(365), START.plusDays(730), START.plusDays(1096), START.plusDays(1461));

    private static final double ROUNDING = 1e-13;

    @Test
    void threeYearsOfMonthsAgreeWithTheWorkedCase() {
        PerformanceCase one = PerformanceCase.byId("measures_monthly");
        EvaluatedPath path = one.path();
        Scorecard card = Scorecard.of(path, path);
        one.assertExpected("total_return", card.get(Measure.TOTAL_RETURN));
        one.assertExpected("cagr_calendar", card.get(Measure.GROWTH_PER_YEAR));
        one.assertExpected("ann_vol", card.get(Measure.VOLATILITY_PER_YEAR));
        one.assertExpected("sharpe_ann", card.get(Measure.SHARPE));
        one.assertExpected("calmar", card.get(Measure.CALMAR));
        one.assertExpected("skew_G1", card.get(Measure.SKEW));
        one.assertExpected("excess_kurt_G2", card.get(Measure.EXCESS_KURTOSIS));
        one.assertExpected("var_hist", card.get(Measure.VALUE_AT_RISK_95));
        one.assertExpected("es_hist", card.get(Measure.EXPECTED_SHORTFALL_95));
        one.assertExpected("hit_rate", card.get(Measure.HIT_RATE));
        one.assertExpected("best", card.get(Measure.BEST_BAR));
        one.assertExpected("worst", card.get(Measure.WORST_BAR));
        assertThat(number(card, Measure.GROWTH_MINUS_BUY_AND_HOLD)).hasValue(0);
        assertThat(number(card, Measure.SHARPE_LOW).orElseThrow())
                .isLessThan(number(card, Measure.SHARPE).orElseThrow());
        assertThat(number(card, Measure.SHARPE_HIGH).orElseThrow())
                .isGreaterThan(number(card, Measure.SHARPE).orElseThrow());
    }

    @Test
    void nothingIsAnnualisedUnderOneYearAndTheRestStands() {
        PerformanceCase one = PerformanceCase.byId("measures_daily"); // 83 calendar days
        EvaluatedPath path = one.path();
        Scorecard card = Scorecard.of(path, path);
        for (Measure measure : Measure.values()) {
            if (measure.unit().annualised()) {
                assertThat(card.get(measure))
                        .as(measure.key())
                        .isEqualTo(Measured.undefined(
                                Measured.Reason.UNDER_ONE_YEAR,
                                "the window spans " + path.calendarDays()
                                        + " calendar days, and nothing is annualised under 365"));
            }
        }
        one.assertExpected("total_return", card.get(Measure.TOTAL_RETURN));
        one.assertExpected("es_hist", card.get(Measure.EXPECTED_SHORTFALL_95));
        one.worked()
                .assertClose(
                        "max_drawdown",
                        number(card, Measure.WORST_DRAWDOWN).orElseThrow(),
                        one.worked().expected("drawdown").get("max_drawdown"));
    }

    @Test
    void theYearIsFullAt365Days() {
        double[] wealth = {100, 110};
        EvaluatedPath short364 = bare(List.of(START, START.plusDays(364)), wealth);
        EvaluatedPath full365 = bare(List.of(START, START.plusDays(365)), wealth);
        assertThat(reason(Scorecard.of(short364, short364).get(Measure.GROWTH_PER_YEAR)))
                .isEqualTo(Measured.Reason.UNDER_ONE_YEAR);
        assertThat(number(Scorecard.of(full365, full365), Measure.GROWTH_PER_YEAR))
                .isPresent();
    }

    @Test
    void tradingAndExposureAgreeWithAnExampleOnPaper() {
        EvaluatedPath path = EvaluatedPath.of(FOUR_YEARS, new double[] {100, 100, 100, 100, 100}, new double[4], 1)
                .withTrading(new double[] {0.5, 0, 0.25, 0.25}, new double[] {1, 1, 1, 1})
                .withExposure(new double[] {1, 0, -0.5, 0.5}, new double[] {1, 0, 1.5, 0.5})
                .withSwitches(new int[] {1, 0, 5, 2});
        EvaluatedPath doubled = bare(FOUR_YEARS, new double[] {1, 2, 4, 8, 16});
        Scorecard card = Scorecard.of(path, doubled);
        close(card, Measure.TURNOVER_PER_YEAR, 0.25);
        close(card, Measure.SWITCHES_PER_YEAR, 2);
        close(card, Measure.COST_PER_YEAR, 0.01); // 4 / 100 / 4 years
        close(card, Measure.AVERAGE_EXPOSURE, 0.25);
        close(card, Measure.TIME_IN_MARKET, 0.75);
        close(card, Measure.GROWTH_BEFORE_COSTS_PER_YEAR, 0.01); // 1.01^4 in four years
        close(card, Measure.GROWTH_MINUS_BUY_AND_HOLD, -1); // buy-and-hold doubles every year
        close(card, Measure.HIT_RATE_IN_MARKET, 0);
    }

    @Test
    void costsAreHeldAgainstMeanWealth() {
        EvaluatedPath path = bare(FOUR_YEARS, new double[] {50, 100, 150, 100, 100}) // mean 100
                .withTrading(new double[4], new double[] {1, 0, 2, 1});
        close(Scorecard.of(path, path), Measure.COST_PER_YEAR, 0.01); // 4 / 100 / 4 years
    }

    @Test
    void sortinoIsHeldAgainstWhatCashEarnedOnAverage() {
        // Mean return 0.25, mean cash 0.05; shortfalls below 0.05: 0, 0.3, 0, 0.
        double[] returns = {0.5, -0.25, 0.5, 0.25};
        EvaluatedPath path =
                EvaluatedPath.of(FOUR_YEARS, PerformanceCase.wealth(64, returns), new double[] {0.1, 0, 0.1, 0}, 1);
        close(Scorecard.of(path, path), Measure.SORTINO, 0.2 / 0.15);
    }

    @Test
    void whatAPathDoesNotRecordIsUndefined() {
        EvaluatedPath path = bare(FOUR_YEARS, new double[] {10, 11, 9, 12, 13});
        Scorecard card = Scorecard.of(path, path);
        for (Measure measure : List.of(
                Measure.TURNOVER_PER_YEAR,
                Measure.SWITCHES_PER_YEAR,
                Measure.COST_PER_YEAR,
                Measure.AVERAGE_EXPOSURE,
                Measure.TIME_IN_MARKET,
                Measure.HIT_RATE_IN_MARKET,
                Measure.GROWTH_BEFORE_COSTS_PER_YEAR)) {
            assertThat(reason(card.get(measure))).as(measure.key()).isEqualTo(Measured.Reason.NOT_RECORDED);
        }
    }

    @Test
    void ruinLosesEverythingAndLeavesNoRatio() {
        EvaluatedPath path = bare(FOUR_YEARS, new double[] {100, 120, 0, 0, 0})
                .withTrading(new double[4], new double[] {1, 1, 0, 0});
        Scorecard card = Scorecard.of(path, bare(FOUR_YEARS, new double[] {1, 1, 1, 1, 1}));
        assertThat(number(card, Measure.GROWTH_PER_YEAR)).hasValue(-1);
        assertThat(number(card, Measure.TOTAL_RETURN)).hasValue(-1);
        assertThat(number(card, Measure.WORST_DRAWDOWN)).hasValue(-1);
        assertThat(number(card, Measure.GROWTH_MINUS_BUY_AND_HOLD)).hasValue(-1);
        for (Measure measure : List.of(
                Measure.SHARPE,
                Measure.SHARPE_LOW,
                Measure.SHARPE_HIGH,
                Measure.SORTINO,
                Measure.CALMAR,
                Measure.GROWTH_BEFORE_COSTS_PER_YEAR)) {
            assertThat(reason(card.get(measure))).as(measure.key()).isEqualTo(Measured.Reason.RUIN);
        }
    }

    @Test
    void cashAloneHasGrowthAndNoRatio() {
        double[] cash = {0.03, 0.03, 0.03, 0.03};
        EvaluatedPath path = EvaluatedPath.of(FOUR_YEARS, PerformanceCase.wealth(100, cash), cash, 1)
                .withExposure(new double[4], new double[4]);
        Scorecard card = Scorecard.of(path, path);
        close(card, Measure.GROWTH_PER_YEAR, 0.03);
        assertThat(reason(card.get(Measure.SHARPE))).isEqualTo(Measured.Reason.ZERO_VARIANCE);
        assertThat(reason(card.get(Measure.SORTINO))).isEqualTo(Measured.Reason.NO_DOWNSIDE);
        assertThat(reason(card.get(Measure.CALMAR))).isEqualTo(Measured.Reason.NO_DRAWDOWN);
        assertThat(number(card, Measure.TIME_IN_MARKET)).hasValue(0);
        assertThat(reason(card.get(Measure.HIT_RATE_IN_MARKET))).isEqualTo(Measured.Reason.TOO_FEW_BARS);
    }

    @Test
    void constantWealthHasNoVolatilityAndNoShape() {
        EvaluatedPath path = bare(FOUR_YEARS, new double[] {7, 7, 7, 7, 7});
        Scorecard card = Scorecard.of(path, path);
        assertThat(number(card, Measure.VOLATILITY_PER_YEAR)).hasValue(0);
        assertThat(number(card, Measure.WORST_DRAWDOWN)).hasValue(0);
        assertThat(number(card, Measure.LONGEST_UNDERWATER_BARS)).hasValue(0);
        assertThat(reason(card.get(Measure.SKEW))).isEqualTo(Measured.Reason.ZERO_VARIANCE);
    }

    @ParameterizedTest
    @EnumSource
    void aPathOfItsBaseDateAloneHasNoMeasures(Measure measure) {
        EvaluatedPath path = bare(List.of(START), new double[] {100});
        assertThat(reason(Scorecard.of(path, path).get(measure))).isEqualTo(Measured.Reason.TOO_FEW_BARS);
    }

    @Test
    void oneBarHasAReturnAndNoSpread() {
        EvaluatedPath path = bare(List.of(START, START.plusYears(1)), new double[] {100, 90});
        Scorecard card = Scorecard.of(path, path);
        close(card, Measure.TOTAL_RETURN, -0.1);
        close(card, Measure.EXPECTED_SHORTFALL_95, 0.1);
        assertThat(reason(card.get(Measure.VOLATILITY_PER_YEAR))).isEqualTo(Measured.Reason.TOO_FEW_BARS);
        assertThat(reason(card.get(Measure.SHARPE))).isEqualTo(Measured.Reason.TOO_FEW_BARS);
    }

    @Test
    void bestAndWorstMonthsLeaveCutMonthsOut() {
        List<LocalDate> dates = List.of(
                LocalDate.of(2024, 1, 15), // cuts January
                LocalDate.of(2024, 1, 31),
                LocalDate.of(2024, 2, 29),
                LocalDate.of(2024, 3, 29),
                LocalDate.of(2024, 4, 10)); // cuts April
        EvaluatedPath path =
                EvaluatedPath.of(dates, PerformanceCase.wealth(100, 0.9, 0.25, -0.125, -0.9), new double[4], 252);
        Scorecard card = Scorecard.of(path, path);
        close(card, Measure.BEST_MONTH, 0.25);
        close(card, Measure.WORST_MONTH, -0.125);
        assertThat(reason(card.get(Measure.BEST_YEAR))).isEqualTo(Measured.Reason.NO_WHOLE_PERIOD);
        assertThat(reason(card.get(Measure.WORST_YEAR))).isEqualTo(Measured.Reason.NO_WHOLE_PERIOD);
    }

    @Test
    void theUnitOfMoneyDoesNotMatter() {
        PerformanceCase one = PerformanceCase.byId("measures_monthly");
        double[] costs = new double[36];
        Arrays.fill(costs, 2);
        double[] wealth = one.path().wealth();
        List<LocalDate> dates = one.path().dates();
        EvaluatedPath path =
                EvaluatedPath.of(dates, wealth, one.cashReturns(), 12).withTrading(new double[36], costs);
        // A power of two: not even the rounding changes.
        EvaluatedPath pennies = EvaluatedPath.of(dates, scaled(wealth, 64), one.cashReturns(), 12)
                .withTrading(new double[36], scaled(costs, 64));
        assertThat(Scorecard.of(pennies, pennies).measures())
                .isEqualTo(Scorecard.of(path, path).measures());
    }

    @Test
    void anotherBarOfLossNeverImprovesGrowthOrDrawdown() {
        EvaluatedPath path = bare(FOUR_YEARS, new double[] {10, 14, 9, 12, 13});
        List<LocalDate> longer = new ArrayList<>(FOUR_YEARS);
        longer.add(START.plusDays(1500));
        EvaluatedPath lost = bare(longer, new double[] {10, 14, 9, 12, 13, 5});
        Scorecard before = Scorecard.of(path, path);
        Scorecard after = Scorecard.of(lost, lost);
        for (Measure measure : List.of(Measure.WORST_DRAWDOWN, Measure.GROWTH_PER_YEAR, Measure.WORST_BAR)) {
            assertThat(number(after, measure).orElseThrow())
                    .as(measure.key())
                    .isLessThan(number(before, measure).orElseThrow());
        }
    }

    @Test
    void measuresStandInTheOrderOfTheCatalogueAndCannotBeChanged() {
        EvaluatedPath path = bare(FOUR_YEARS, new double[] {10, 11, 9, 12, 13});
        Scorecard card = Scorecard.of(path, path);
        assertThat(card.measures().keySet()).containsExactly(Measure.values());
        assertThatThrownBy(() -> card.measures().clear()).isInstanceOf(UnsupportedOperationException.class);
        assertThat(card.drawdown().episode().orElseThrow().troughDate()).isEqualTo(FOUR_YEARS.get(2));
        assertThat(card.calendar().months()).hasSize(4);
    }

    @Test
    void aBenchmarkOverOtherDatesIsRefused() {
        EvaluatedPath path = bare(FOUR_YEARS, new double[] {10, 11, 9, 12, 13});
        EvaluatedPath shorter = bare(FOUR_YEARS.subList(0, 4), new double[] {10, 11, 9, 12});
        assertThatThrownBy(() -> Scorecard.of(path, shorter))
                .isInstanceOf(IllegalArgumentException.class)
                .hasMessageContaining("4 bars from 2020-01-01 to 2024-01-01 and 3 bars");
    }

    private static EvaluatedPath bare(List<LocalDate> dates, double[] wealth) {
        return EvaluatedPath.of(dates, wealth, new double[wealth.length - 1], 1);
    }

    private static double[] scaled(double[] values, double factor) {
        return Arrays.stream(values).map(value -> value * factor).toArray();
    }

    private static OptionalDouble number(Scorecard card, Measure measure) {
        return card.get(measure).number();
    }

    private static void close(Scorecard card, Measure measure, double expected) {
        assertThat(number(card, measure)).as(measure.key()).hasValueCloseTo(expected, within(ROUNDING));
    }
}
