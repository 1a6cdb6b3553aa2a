package sojourn.measure;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;
import static sojourn.measure.Undefinedness.reason;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import sojourn.inference.Moments;

class FittedTailTest {
    @ParameterizedTest
    @ValueSource(strings = {"measures_daily", "measures_monthly"})
    void agreesWithTheWorkedCases(String id) {
        PerformanceCase one = PerformanceCase.byId(id);
        Moments moments = Moments.of(one.returns());
        double deviation = moments.standardDeviation().number().orElseThrow();
        FittedTail normal = FittedTail.normal(moments.mean(), deviation, one.tail());
        one.assertExpected("var_gauss", normal.valueAtRisk());
        one.assertExpected("es_gauss", normal.expectedShortfall());
        FittedTail bent = FittedTail.cornishFisher(
                moments.mean(),
                deviation,
                moments.skewness().number().orElseThrow(),
                moments.excessKurtosis().number().orElseThrow(),
                one.tail());
        one.assertExpected("var_cornish_fisher", bent.valueAtRisk());
        one.assertExpected("es_cornish_fisher", bent.expectedShortfall());
    }

    /** The shortfall is -(1/a) times the integral of w phi up to z_a, w taken from the value at risk at each level. */
    @ParameterizedTest
    @CsvSource({"0, 0", "-0.3, 1.0", "0.4, 2.0", "-0.8, 4.0"})
    void shortfallIsTheMeanOfTheValuesAtRiskInTheTail(double skewness, double excessKurtosis) {
        double level = 0.05;
        int slices = 20_000;
        double sum = 0;
        for (int i = 0; i < slices; i++) {
            double inside = level * (i + 0.5) / slices;
            sum += FittedTail.cornishFisher(0.01, 2, skewness, excessKurtosis, inside)
                    .valueAtRisk()
                    .number()
                    .orElseThrow();
        }
        double shortfall = FittedTail.cornishFisher(0.01, 2, skewness, excessKurtosis, level)
                .expectedShortfall()
                .number()
                .orElseThrow();
        // The midpoint rule misses a little of the unbounded end of the tail.
        assertThat(sum / slices).isCloseTo(shortfall, within(2e-3));
    }

    @Test
    void anExpansionThatFallsInTheTailIsUndefined() {
        // dw/dz has the leading coefficient K/8 - S^2/6, here 3/8 - 9/6 < 0.
        FittedTail broken = FittedTail.cornishFisher(0, 1, -3, 3, 0.05);
        assertThat(reason(broken.valueAtRisk())).isEqualTo(Measured.Reason.NOT_APPLICABLE);
        assertThat(reason(broken.expectedShortfall())).isEqualTo(Measured.Reason.NOT_APPLICABLE);
    }

    @Test
    void anExpansionThatFallsOnlyAboveTheTailStands() {
        // S = 0, K = 9: dw/dz = 9/8 z^2 - 1/8 is negative around 0 alone, far above z_0.05 = -1.645.
        assertThat(FittedTail.cornishFisher(0, 1, 0, 9, 0.05).valueAtRisk().number())
                .isPresent();
        assertThat(reason(FittedTail.cornishFisher(0, 1, 0, 9, 0.6).valueAtRisk()))
                .isEqualTo(Measured.Reason.NOT_APPLICABLE);
    }

    @Test
    void argumentsOutsideTheirRangeAreRefused() {
        assertThatThrownBy(() -> FittedTail.normal(0, -1, 0.05)).hasMessageContaining("deviation is -1.0");
        assertThatThrownBy(() -> FittedTail.normal(0, 1, 1)).hasMessageContaining("level is 1.0");
        assertThatThrownBy(() -> FittedTail.cornishFisher(0, 1, Double.NaN, 0, 0.05))
                .hasMessageContaining("skewness is NaN");
    }
}
