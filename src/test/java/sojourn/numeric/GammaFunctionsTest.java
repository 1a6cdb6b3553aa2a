package sojourn.numeric;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatIllegalArgumentException;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;

/** Closed forms: Abramowitz and Stegun (1964), 6.1.8, 6.1.12, 6.3.2, 6.3.3, 6.3.4. */
class GammaFunctionsTest {
    private static final double EULER = 0.5772156649015329;
    private static final double TIGHT = 1e-14;

    @Test
    void digammaOfWholeAndHalfNumbersIsASum() {
        double whole = -EULER;
        double half = -EULER - 2 * StrictMath.log(2);
        for (int n = 1; n <= 60; n++) {
            assertThat(Digamma.of(n)).as("psi(" + n + ")").isCloseTo(whole, within(TIGHT));
            assertThat(Digamma.of(n - 0.5)).as("psi(" + n + " - 1/2)").isCloseTo(half, within(TIGHT));
            whole += 1.0 / n;
            half += 1 / (n - 0.5);
        }
    }

    @Test
    void gammaRatioOfWholeAndHalfNumbersIsAProduct() {
        double whole = Math.sqrt(Math.PI) / 2; // Gamma(3/2) / Gamma(1)
        double half = 1 / Math.sqrt(Math.PI); // Gamma(1) / Gamma(1/2)
        for (int n = 1; n <= 60; n++) {
            assertThat(GammaRatio.ofHalfStep(n)).as("at " + n).isCloseTo(StrictMath.log(whole), within(TIGHT));
            assertThat(GammaRatio.ofHalfStep(n - 0.5))
                    .as("at " + n + " - 1/2")
                    .isCloseTo(StrictMath.log(half), within(TIGHT));
            whole *= (n + 0.5) / n;
            half *= n / (n - 0.5);
        }
    }

    @Test
    void gammaRatioKeepsItsDigitsForLargeArguments() {
        // two half steps are one whole: Gamma(a + 1) / Gamma(a) = a
        for (double a : new double[] {50, 1e4, 5e6, 1e12}) {
            assertThat(GammaRatio.ofHalfStep(a) + GammaRatio.ofHalfStep(a + 0.5))
                    .isCloseTo(StrictMath.log(a), within(TIGHT));
        }
    }

    @Test
    void argumentsBelowZeroAreRefused() {
        assertThatIllegalArgumentException().isThrownBy(() -> Digamma.of(0)).withMessageContaining("0.0");
        assertThatIllegalArgumentException()
                .isThrownBy(() -> GammaRatio.ofHalfStep(-1))
                .withMessageContaining("-1");
        assertThatIllegalArgumentException()
                .isThrownBy(() -> Digamma.of(Double.NaN))
                .withMessageContaining("NaN");
    }
}
