package sojourn.numeric;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class ShortestDecimalTest {
    private static final int VALUES = 3_000;

    // The specification of Double.toString since JDK 19: 2.0E23 is its own example of what earlier releases got wrong.
    @ParameterizedTest
    @CsvSource({
        "0.1, 0.1",
        "1, 1.0",
        "-0.0, -0.0",
        "0.001, 0.001",
        "0.0001, 1.0E-4",
        "9999999, 9999999.0",
        "10000000, 1.0E7",
        "2e23, 2.0E23",
        "1e23, 1.0E23",
        "4.9e-324, 4.9E-324",
        "1.7976931348623157e308, 1.7976931348623157E308"
    })
    void knownValues(double value, String expected) {
        assertThat(ShortestDecimal.of(value)).isEqualTo(expected);
    }

    @ParameterizedTest
    @ValueSource(longs = {1, 2, 3})
    void readsBackAndNoShorterDecimalWould(long seed) {
        SplittableRandom random = new SplittableRandom(seed);
        for (int i = 0; i < VALUES; i++) {
            double value = Double.longBitsToDouble(random.nextLong());
            if (!Double.isFinite(value)) {
                continue;
            }
            String text = ShortestDecimal.of(value);
            assertThat(Double.parseDouble(text))
                    .as("seed %d, value %d", seed, i)
                    .isEqualTo(value);
            int digits = new BigDecimal(text).stripTrailingZeros().precision();
            if (digits > 2) {
                for (RoundingMode mode : new RoundingMode[] {RoundingMode.DOWN, RoundingMode.UP}) {
                    BigDecimal shorter = new BigDecimal(value).round(new MathContext(digits - 1, mode));
                    assertThat(shorter.doubleValue())
                            .as("seed %d, value %d: %s against %s", seed, i, text, shorter)
                            .isNotEqualTo(value);
                }
            }
        }
    }

    @Test
    void onlyFiniteValuesHaveADecimal() {
        assertThatThrownBy(() -> ShortestDecimal.of(Double.NaN)).hasMessageContaining("NaN");
        assertThatThrownBy(() -> ShortestDecimal.of(Double.POSITIVE_INFINITY)).hasMessageContaining("Infinity");
    }
}
