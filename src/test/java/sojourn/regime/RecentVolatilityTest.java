package sojourn.regime;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import sojourn.CheckValues;

class RecentVolatilityTest {
    @Test
    void weightedAndRollingVolatilitiesAreThoseOfTheWorkedCase() {
        CheckValues check = CheckValues.byId("ewma_vol");
        double[] returns = CheckValues.doubles(check.input("returns"));
        assertThat(check.input("init_variance").asDouble()).isEqualTo(returns[0] * returns[0]); // v_1 = x_1^2
        check.assertExpected("vol", volatilities(new RecentVolatility.Exponential(0.94), returns));
        double[] rolling = volatilities(new RecentVolatility.Rolling(4), returns);
        assertThat(rolling).hasSize(returns.length - 3);
        check.assertExpected("rolling_sd_4", rolling);
    }

    @Test
    void thereIsNoneUntilThereAreEnoughObservations() {
        RecentVolatility three = new RecentVolatility.Rolling(3);
        RecentVolatility.SoFar two = three.start().with(1).with(2);
        assertThat(two.value()).isEmpty();
        assertThat(two.with(3).value()).hasValue(1); // sum of squares 2, divisor 2
        assertThat(two.with(3).with(4).value()).hasValue(1);
        assertThat(three.needs()).isEqualTo(3);
        assertThat(new RecentVolatility.Exponential(0.5).start().value()).isEmpty();
        assertThat(new RecentVolatility.Exponential(0.5).start().with(-2).value())
                .hasValue(2);
    }

    @Test
    void whatIsNoWindowAndNoDecayIsRefused() {
        assertThatThrownBy(() -> new RecentVolatility.Rolling(1)).hasMessageContaining("observations");
        for (double decay : new double[] {0, 1, -1, Double.NaN}) {
            assertThatThrownBy(() -> new RecentVolatility.Exponential(decay)).hasMessageContaining("decay");
        }
    }

    private static double[] volatilities(RecentVolatility kind, double[] returns) {
        List<Double> found = new ArrayList<>();
        RecentVolatility.SoFar soFar = kind.start();
        for (double x : returns) {
            soFar = soFar.with(x);
            OptionalDouble now = soFar.value();
            now.ifPresent(found::add);
        }
        return found.stream().mapToDouble(Double::doubleValue).toArray();
    }
}
