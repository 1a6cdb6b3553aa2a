package sojourn.measure;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;
import static sojourn.measure.Undefinedness.reason;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class SortinoTest {
    @ParameterizedTest
    @ValueSource(strings = {"measures_daily", "measures_monthly"})
    void agreesWithTheWorkedCases(String id) {
        PerformanceCase one = PerformanceCase.byId(id);
        double hurdle = one.worked().input("mar").asDouble();
        one.assertExpected("sortino_ann", Sortino.perYear(one.returns(), hurdle, one.periodsPerYear()));
        one.assertExpected(
                "downside_dev_ann",
                Sortino.downsideDeviation(one.returns(), hurdle).times(Math.sqrt(one.periodsPerYear())));
    }

    @Test
    void dividesByAllReturnsAndNotOnlyTheBadOnes() {
        // Shortfalls below 1: 0, 2, 0, 0; sqrt(4 / 4) = 1; mean 2 - 1 = 1.
        assertThat(Sortino.perYear(new double[] {3, -1, 3, 3}, 1, 4).number()).hasValueCloseTo(2.0, within(1e-15));
    }

    @Test
    void isUndefinedWithoutReturnsOrDownside() {
        assertThat(reason(Sortino.perYear(new double[0], 0, 252))).isEqualTo(Measured.Reason.TOO_FEW_BARS);
        assertThat(reason(Sortino.perYear(new double[] {0.1, 0.2}, 0.1, 252))).isEqualTo(Measured.Reason.NO_DOWNSIDE);
        assertThat(reason(Sortino.perYear(new double[] {0.3, 0.3}, 0.1 + 0.2, 252)))
                .isEqualTo(Measured.Reason.NO_DOWNSIDE); // 0.1 + 0.2 lies one rounding above 0.3
    }
}
