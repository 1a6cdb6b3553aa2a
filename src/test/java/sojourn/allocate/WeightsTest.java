package sojourn.allocate;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;

class WeightsTest {
    @Test
    void cashIsTheRestAndRoundingIsNoCash() {
        assertThat(Weights.of(0.25, 0.5).cash()).isEqualTo(0.25);
        assertThat(1 - 0.7 - 0.2 - 0.1).as("what plain arithmetic leaves").isNotZero();
        assertThat(Weights.of(0.7, 0.2, 0.1).cash()).isZero();
        assertThat(Weights.of(1.5, -0.25).cash()).isEqualTo(-0.25);
    }

    @Test
    void assetsThatAreNotNamedGetNothing() {
        assertThat(Weights.named(Map.of("b", 0.4), List.of("a", "b", "c"))).isEqualTo(Weights.of(0, 0.4, 0));
        assertThatThrownBy(() -> Weights.named(Map.of("d", 0.4), List.of("a", "b")))
                .isInstanceOf(IllegalArgumentException.class)
                .hasMessageContaining("'d'")
                .hasMessageContaining("[a, b]");
    }

    @Test
    void theyCannotBeChangedFromOutside() {
        double[] shares = {0.5};
        Weights weights = Weights.of(shares);
        shares[0] = 9;
        assertThat(weights.at(0)).isEqualTo(0.5);
    }

    @Test
    void aWeightThatIsNoNumberIsRefused() {
        assertThatThrownBy(() -> Weights.of(0.5, Double.NaN)).hasMessageContaining("NaN");
    }
}
