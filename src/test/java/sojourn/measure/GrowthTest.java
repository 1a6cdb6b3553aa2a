package sojourn.measure;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;
import static sojourn.measure.Undefinedness.reason;

import java.time.LocalDate;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class GrowthTest {
    private static final LocalDate START = LocalDate.of(2020, 1, 1);
    /** 1461 days are four years of 365.25 days. */
    private static final LocalDate FOUR_YEARS_ON = START.plusDays(1461);

    private static final double ROUNDING = 1e-15;

    @ParameterizedTest
    @ValueSource(strings = {"measures_daily", "measures_monthly"})
    void agreesWithTheWorkedCases(String id) {
        PerformanceCase one = PerformanceCase.byId(id);
        EvaluatedPath path = one.path();
        double[] wealth = path.wealth();
        double last = wealth[path.bars()];
        one.assertExpected("total_return", Growth.total(wealth[0], last));
        one.assertExpected(
                "cagr_calendar",
                Growth.perYear(
                        wealth[0], last, path.dates().get(0), path.dates().get(path.bars())));
        one.assertExpected("cagr_periods", Growth.perYear(wealth[0], last, path.bars(), one.periodsPerYear()));
    }

    @Test
    void sixteenfoldInFourYearsIsDoublingEveryYear() {
        assertThat(Growth.perYear(5, 80, START, FOUR_YEARS_ON).number()).hasValueCloseTo(1.0, within(ROUNDING));
        assertThat(Growth.perYear(5, 80, 48, 12).number()).hasValueCloseTo(1.0, within(ROUNDING));
        assertThat(Growth.total(5, 80).number()).hasValue(15);
    }

    @Test
    void ruinIsMinusOne() {
        assertThat(Growth.total(100, 0).number()).hasValue(-1);
        assertThat(Growth.perYear(100, 0, START, FOUR_YEARS_ON).number()).hasValue(-1);
        assertThat(Growth.perYear(100, 0, 48, 12).number()).hasValue(-1);
    }

    @Test
    void noTimeHasNoGrowthPerYear() {
        assertThat(reason(Growth.perYear(1, 1, START, START))).isEqualTo(Measured.Reason.TOO_FEW_BARS);
        assertThat(reason(Growth.perYear(1, 1, 0, 252))).isEqualTo(Measured.Reason.TOO_FEW_BARS);
    }

    @Test
    void oneWildDayAnnualisedIsOutOfRangeAndNotInfinite() {
        assertThat(reason(Growth.perYear(1, 1000, START, START.plusDays(1)))).isEqualTo(Measured.Reason.OUT_OF_RANGE);
    }

    @Test
    void compoundingMultiplies() {
        assertThat(Growth.compounded()).isZero();
        assertThat(Growth.compounded(0.5, -0.5)).isEqualTo(-0.25);
        assertThat(Growth.compounded(0.1, -1, 5)).isEqualTo(-1);
    }

    @Test
    void negativeWealthIsRefused() {
        assertThatThrownBy(() -> Growth.total(100, -1)).hasMessageContaining("last wealth is -1.0");
        assertThatThrownBy(() -> Growth.total(0, 1)).hasMessageContaining("first wealth is 0.0");
    }
}
