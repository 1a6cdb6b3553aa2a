package sojourn.measure;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;
import static sojourn.measure.Undefinedness.reason;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import sojourn.CheckValues;
import sojourn.inference.SharpeError;
import sojourn.numeric.RandomStream;

class SharpeTest {
    /** The 97.5 % point of the standard normal, tabulated. */
    private static final double NORMAL_97_5 = 1.959963984540054;

    @ParameterizedTest
    @ValueSource(strings = {"measures_daily", "measures_monthly"})
    void agreesWithTheWorkedCases(String id) {
        PerformanceCase one = PerformanceCase.byId(id);
        double[] excess = one.path().excessReturns();
        one.assertExpected("sharpe_ann", Sharpe.perYear(excess, one.periodsPerYear()));
        one.assertExpected("sharpe_period", Sharpe.perYear(excess, 1));
    }

    @Test
    void theDisplayedRatioIsThatOfTheErrorFormulaTimesTheStatedFactor() {
        CheckValues worked = CheckValues.byId("sharpe_se_b");
        double[] excess = CheckValues.doubles(worked.input("excess"));
        double displayed = Sharpe.perYear(excess, 1).number().orElseThrow();
        worked.assertExpected("sharpe", displayed * Math.sqrt(120 / 119.0));
    }

    @Test
    void theIntervalReachesTwoStandardErrorsToEitherSide() {
        double[] excess = CheckValues.doubles(CheckValues.byId("sharpe_se_a").input("excess"));
        Measured.Value ratio = (Measured.Value) Sharpe.perYear(excess, 12);
        Measured.Interval interval = ratio.interval().orElseThrow();
        double reach = NORMAL_97_5
                * Math.sqrt(12)
                * SharpeError.hac(excess, 3).number().orElseThrow(); // floor(4 (60/100)^(2/9)) = 3
        assertThat(interval.low()).isCloseTo(ratio.amount() - reach, within(1e-12));
        assertThat(interval.high()).isCloseTo(ratio.amount() + reach, within(1e-12));
        assertThat(interval.definition()).contains("95 %").contains("over 3 bars");
        assertThat(Sharpe.low(ratio).number()).hasValue(interval.low());
        assertThat(Sharpe.high(ratio).number()).hasValue(interval.high());
    }

    /** Independent normal returns with mean 0.1 and deviation 1: the true ratio is 0.1 per period. */
    @Test
    void theIntervalCoversTheTrueRatioAboutAsOftenAsItSays() {
        int trials = 400;
        int covered = 0;
        RandomStream random = RandomStream.of(3, "coverage");
        for (int trial = 0; trial < trials; trial++) {
            double[] excess = new double[500];
            for (int t = 0; t < excess.length; t++) {
                excess[t] = 0.1 + random.nextNormal();
            }
            Measured.Value ratio = (Measured.Value) Sharpe.perYear(excess, 1);
            Measured.Interval interval = ratio.interval().orElseThrow();
            covered += interval.low() <= 0.1 && 0.1 <= interval.high() ? 1 : 0;
        }
        // Binomial deviation of the share is sqrt(0.95 x 0.05 / 400) = 0.011; three of them, seed 3.
        assertThat((double) covered / trials).isBetween(0.95 - 0.033, 0.95 + 0.033);
    }

    @Test
    void isUndefinedForTooFewOrConstantReturns() {
        assertThat(reason(Sharpe.perYear(new double[0], 252))).isEqualTo(Measured.Reason.TOO_FEW_BARS);
        assertThat(reason(Sharpe.perYear(new double[] {0.1}, 252))).isEqualTo(Measured.Reason.TOO_FEW_BARS);
        Measured constant = Sharpe.perYear(new double[] {0.1, 0.1, 0.1}, 252);
        assertThat(reason(constant)).isEqualTo(Measured.Reason.ZERO_VARIANCE);
        assertThat(Sharpe.low(constant)).isEqualTo(constant);
        assertThat(Sharpe.high(constant)).isEqualTo(constant);
    }

    @Test
    void aRatioWithoutAnIntervalHasNoEnds() {
        assertThat(reason(Sharpe.low(Measured.of(1)))).isEqualTo(Measured.Reason.NOT_POSITIVE);
    }

    @Test
    void hugeReturnsAreOutOfRangeAndNeverNaN() {
        assertThat(reason(Sharpe.perYear(new double[] {1e200, -1e200, 1}, 252)))
                .isEqualTo(Measured.Reason.OUT_OF_RANGE);
    }
}
