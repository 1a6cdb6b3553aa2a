package sojourn.numeric;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;

class QuantileTest {
    /** Position 1 + (n - 1) q by hand: of 1, 2, 4, 8 the quantile 0.5 lies half way between 2 and 4, 0.9 at 1 + 2.7. */
    @Test
    void lieBetweenTheValuesAroundTheirPosition() {
        double[] values = {1, 2, 4, 8};
        assertThat(Quantile.ofAscending(values, 0)).isEqualTo(1);
        assertThat(Quantile.ofAscending(values, 0.5)).isEqualTo(3);
        assertThat(Quantile.ofAscending(values, 0.9)).isCloseTo(4 + 0.7 * 4, within(1e-14));
        assertThat(Quantile.ofAscending(values, 1)).isEqualTo(8);
        assertThat(Quantile.ofAscending(new double[] {5}, 0.3)).isEqualTo(5);
    }

    @Test
    void nothingHasNoQuantile() {
        assertThatThrownBy(() -> Quantile.ofAscending(new double[0], 0.5)).hasMessageContaining("no values");
        assertThatThrownBy(() -> Quantile.ofAscending(new double[] {1}, 1.5)).hasMessageContaining("1.5");
    }
}
