package sojourn.world;

import static org.assertj.core.api.Assertions.assertThat;

import org.junit.jupiter.api.Test;

class DecimalsTest {
    @Test
    void roundsTheBinaryValueExactlyAndTiesToEven() {
        assertThat(Decimals.round(1.005, 2)).isEqualTo(1.00); // the double lies just below 1.005
        assertThat(Decimals.round(0.125, 2)).isEqualTo(0.12); // a true tie
        assertThat(Decimals.round(0.375, 2)).isEqualTo(0.38); // a true tie
        assertThat(Decimals.round(-0.125, 2)).isEqualTo(-0.12);
    }

    @Test
    void writesEveryDecimalWithoutAnExponent() {
        assertThat(Decimals.text(101.3, 2)).isEqualTo("101.30");
        assertThat(Decimals.text(0, 2)).isEqualTo("0.00");
        assertThat(Decimals.text(0.000001, 6)).isEqualTo("0.000001");
        assertThat(Decimals.text(1e9, 0)).isEqualTo("1000000000");
    }

    @Test
    void aPriceIsNeverBelowOneUnitOfItsLastDecimal() {
        assertThat(Decimals.price(0.0001, 2)).isEqualTo(0.01);
        assertThat(Decimals.price(0.0149, 2)).isEqualTo(0.01);
        assertThat(Decimals.price(0.2, 0)).isEqualTo(1);
    }

    @Test
    void aRoundedNumberReadsBackFromItsText() {
        for (int i = 1; i <= 1000; i++) {
            double rounded = Decimals.round(i * 0.7310585786300049, 3);
            assertThat(Double.parseDouble(Decimals.text(rounded, 3))).isEqualTo(rounded);
        }
    }
}
