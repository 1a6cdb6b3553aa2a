package sojourn.measure;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;
import static sojourn.measure.Undefinedness.reason;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class TailTest {
    private static final double ROUNDING = 1e-14;

    @ParameterizedTest
    @ValueSource(strings = {"measures_daily", "measures_monthly"})
    void agreesWithTheWorkedCases(String id) {
        PerformanceCase one = PerformanceCase.byId(id);
        Tail tail = Tail.of(one.returns(), one.tail());
        one.assertExpected("var_hist", tail.valueAtRisk());
        one.assertExpected("es_hist", tail.expectedShortfall());
        one.assertExpected("var_type7", tail.interpolatedValueAtRisk());
    }

    @Test
    void agreesWithAnExampleOnPaper() {
        // n a = 1.2: all of the worst return and a fifth of the next.
        Tail tail = Tail.of(new double[] {-1, -4, 2, -3}, 0.3);
        assertThat(tail.valueAtRisk().number()).hasValue(3);
        assertThat(tail.expectedShortfall().number()).hasValueCloseTo((4 + 0.2 * 3) / 1.2, within(ROUNDING));
        // Position 1 + 3 x 0.3 = 1.9 among -4, -3, -1, 2.
        assertThat(tail.interpolatedValueAtRisk().number()).hasValueCloseTo(4 - 0.9, within(ROUNDING));
    }

    /** Of 100 returns: 100 x 0.07 is a little above 7 in binary, 100 x 0.29 a little below 29. */
    @ParameterizedTest
    @CsvSource({"0.05, 5", "0.07, 7", "0.29, 29", "0.5, 50"})
    void aWholeNumberOfReturnsIsNotBlurredByRounding(double level, int tailSize) {
        double[] returns = new double[100];
        for (int i = 0; i < returns.length; i++) {
            returns[i] = i; // the k-th smallest is k - 1
        }
        Tail tail = Tail.of(returns, level);
        assertThat(tail.valueAtRisk().number()).hasValue(-(tailSize - 1.0));
        assertThat(tail.expectedShortfall().number()).hasValueCloseTo(-(tailSize - 1) / 2.0, within(1e-12));
    }

    @Test
    void aTailSmallerThanOneReturnIsTheWorstReturn() {
        Tail tail = Tail.of(new double[] {0.01, -0.02}, 0.05);
        assertThat(tail.valueAtRisk().number()).hasValue(0.02);
        assertThat(tail.expectedShortfall().number()).hasValueCloseTo(0.02, within(ROUNDING));
    }

    @Test
    void shortfallIsAtLeastTheValueAtRiskAndFallsAsTheTailWidens() {
        double[] returns = PerformanceCase.byId("measures_daily").returns();
        double wider = Double.POSITIVE_INFINITY;
        for (double level = 0.01; level < 0.6; level += 0.03) {
            Tail tail = Tail.of(returns, level);
            double shortfall = tail.expectedShortfall().number().orElseThrow();
            assertThat(shortfall)
                    .isGreaterThanOrEqualTo(tail.valueAtRisk().number().orElseThrow() - ROUNDING)
                    .isLessThanOrEqualTo(wider + ROUNDING);
            wider = shortfall;
        }
    }

    @Test
    void leavesItsArgumentInOrder() {
        double[] returns = {3, 1, 2};
        assertThat(Tail.of(returns, 0.5).valueAtRisk().number()).hasValue(-2);
        assertThat(returns).containsExactly(3, 1, 2);
    }

    @Test
    void isUndefinedWithoutReturns() {
        Tail none = Tail.of(new double[0], 0.05);
        assertThat(reason(none.valueAtRisk())).isEqualTo(Measured.Reason.TOO_FEW_BARS);
        assertThat(reason(none.interpolatedValueAtRisk())).isEqualTo(Measured.Reason.TOO_FEW_BARS);
        assertThat(reason(none.expectedShortfall())).isEqualTo(Measured.Reason.TOO_FEW_BARS);
    }

    @Test
    void levelsOutsideZeroToOneAreRefused() {
        assertThatThrownBy(() -> Tail.of(new double[1], 0)).hasMessageContaining("level is 0.0");
        assertThatThrownBy(() -> Tail.of(new double[1], 1)).hasMessageContaining("level is 1.0");
        assertThatThrownBy(() -> Tail.of(new double[] {Double.NaN}, 0.1)).hasMessageContaining("NaN");
    }
}
