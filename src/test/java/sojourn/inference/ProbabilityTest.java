package sojourn.inference;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import org.assertj.core.data.Offset;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class ProbabilityTest {
    /** Relative, of values computed by another implementation. */
    private static final double AGREEMENT = 1e-11;

    /** Last digit of the printed tables of critical values that every textbook has. */
    private static final double TABLE = 5e-5;

    /** Computed by scipy 1.17.1. */
    @ParameterizedTest
    @CsvSource({
        "-10, 7.61985302416047e-24",
        "-6, 9.865876450376946e-10",
        "0.3, 0.6179114221889526",
        "5, 0.9999997133484281"
    })
    void normalAgreesWithAnotherImplementation(double x, double expected) {
        assertThat(Probability.normalBelow(x)).isCloseTo(expected, relative(expected, AGREEMENT));
    }

    @ParameterizedTest
    @ValueSource(doubles = {-1e30, -200.5, -3, -0.4, 0, 1, 7.5, 1e6})
    void studentOfOneAndTwoDegreesHasAClosedForm(double t) {
        // the left tail of the Cauchy distribution far out is 1 / (pi |t|) to the leading order
        double cauchy = t < -1e9 ? -1 / (Math.PI * t) : 0.5 + Math.atan(t) / Math.PI;
        assertThat(Probability.studentBelow(t, 1)).isCloseTo(cauchy, within(1e-14));
        double two = 0.5 + (Math.abs(t) > 1e9 ? 0.5 * Math.signum(t) : t / (2 * Math.sqrt(2 + t * t)));
        assertThat(Probability.studentBelow(t, 2)).isCloseTo(two, within(1e-14));
    }

    /** Computed by scipy 1.17.1. */
    @ParameterizedTest
    @CsvSource({
        "-3.2, 3.7, 0.018370080354780008",
        "-40, 2.05, 0.0002683367722530285",
        "1.4, 200, 0.9184686878439079",
        "-12, 6.5, 5.624612494101039e-06"
    })
    void studentAgreesWithAnotherImplementation(double t, double dof, double expected) {
        assertThat(Probability.studentBelow(t, dof)).isCloseTo(expected, relative(expected, AGREEMENT));
        assertThat(Probability.studentBelow(-t, dof)).isCloseTo(1 - expected, within(AGREEMENT));
    }

    @Test
    void studentTendsToTheNormal() {
        for (double x = -4; x <= 4; x += 0.25) {
            assertThat(Probability.studentBelow(x, 1e7)).isCloseTo(Probability.normalBelow(x), within(1e-7));
        }
    }

    /** Upper 5 % and 1 % points as printed in tables of the t distribution, two-sided. */
    @ParameterizedTest
    @CsvSource({"12.7062, 1, 0.05", "2.5706, 5, 0.05", "2.2281, 10, 0.05", "3.1693, 10, 0.01"})
    void studentAgreesWithPrintedTables(double t, double dof, double beyond) {
        assertThat(Probability.studentBeyond(t, dof)).isCloseTo(beyond, within(TABLE));
        assertThat(Probability.studentBeyond(-t, dof)).isEqualTo(Probability.studentBeyond(t, dof));
    }

    /** Upper points as printed in tables of the chi-squared distribution. */
    @ParameterizedTest
    @CsvSource({"3.8415, 1, 0.05", "5.9915, 2, 0.05", "9.2103, 2, 0.01", "31.4104, 20, 0.05", "37.5662, 20, 0.01"})
    void chiSquareAgreesWithPrintedTables(double x, int dof, double above) {
        assertThat(Probability.chiSquareAbove(x, dof)).isCloseTo(above, within(TABLE));
    }

    @Test
    void chiSquareOfTwoDegreesIsExponential() {
        for (double x : new double[] {0, 1e-9, 0.3, 5, 80, 700}) {
            double expected = Math.exp(-x / 2);
            assertThat(Probability.chiSquareAbove(x, 2)).isCloseTo(expected, relative(expected, AGREEMENT));
        }
        assertThat(Probability.chiSquareAbove(-3, 2)).isEqualTo(1);
    }

    @Test
    void degreesOfFreedomMustBePositive() {
        assertThatThrownBy(() -> Probability.studentBelow(1, 0)).hasMessageContaining("degrees of freedom is 0");
        assertThatThrownBy(() -> Probability.chiSquareAbove(1, 0)).hasMessageContaining("degrees of freedom is 0");
    }

    private static Offset<Double> relative(double expected, double share) {
        return within(share * Math.abs(expected));
    }
}
