package sojourn.inference;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import sojourn.CheckValues;
import sojourn.numeric.NormalQuantile;
import sojourn.numeric.RandomStream;

/** The three tests that residuals are put to: are they normal, independent, uniform? */
class ResidualTestsTest {
    private static final CheckValues WORKED = CheckValues.byId("pseudo_residuals_k2");

    /** z as the worked case gives it; it was cross-checked against statsmodels 0.13.5. */
    private static double[] z() {
        return CheckValues.doubles(WORKED.expected("z"));
    }

    @Test
    void jarqueBeraAgreesWithTheWorkedCase() {
        TestResult test = JarqueBera.of(z());
        WORKED.assertExpected("jarque_bera", number(test.statistic()));
        WORKED.assertExpected("jb_pvalue", number(test.pValue()));
    }

    @Test
    void ljungBoxAgreesWithTheWorkedCase() {
        int lags = WORKED.input("ljung_box_lags").asInt();
        double[] squares = z();
        for (int t = 0; t < squares.length; t++) {
            squares[t] *= squares[t];
        }
        WORKED.assertExpected("ljung_box_z", number(LjungBox.of(z(), lags).statistic()));
        WORKED.assertExpected("ljung_box_z2", number(LjungBox.of(squares, lags).statistic()));
    }

    /** (1, 2, 4): mean 7/3, rho_1 = -1/42, so Q = 3 * 5 * (1/42)^2 / 2. */
    @Test
    void ljungBoxAgreesWithAnExampleOnPaper() {
        double expected = 15.0 / (42 * 42) / 2;
        assertThat(number(LjungBox.of(new double[] {1, 2, 4}, 1).statistic())).isCloseTo(expected, within(1e-15));
    }

    @Test
    void theDistanceFromUniformIsTheLargestStepAboveOrBelow() {
        assertThat(number(KolmogorovSmirnov.uniform(0.5).statistic())).isEqualTo(0.5);
        assertThat(number(KolmogorovSmirnov.uniform(0.9, 0.1).statistic())).isCloseTo(0.4, within(1e-15));
        assertThat(number(KolmogorovSmirnov.uniform(0, 0, 0, 0).statistic())).isEqualTo(1);
        assertThat(number(KolmogorovSmirnov.uniform(0.125, 0.375, 0.625, 0.875).statistic()))
                .isEqualTo(0.125);
    }

    /** Exact distribution of D by scipy 1.17.1 (kstwo); the correction is good to about 0.005 (Stephens 1970). */
    @ParameterizedTest
    @CsvSource({
        "10, 0.3, 0.27053557479999946",
        "50, 0.15, 0.19026366518248072",
        "800, 0.04, 0.15044610819718107",
        "3000, 0.035, 0.0012537055198790338"
    })
    void pOfADistanceAgreesWithTheExactDistribution(int n, double distance, double exact) {
        double[] values =
                new double[n]; // spread evenly over [distance, 1]: the largest step is the one at the first value
        for (int i = 0; i < n; i++) {
            values[i] = Math.min(1, distance + (double) i / n);
        }
        TestResult test = KolmogorovSmirnov.uniform(values);
        assertThat(number(test.statistic())).isCloseTo(distance, within(1e-12));
        assertThat(number(test.pValue())).isCloseTo(exact, within(0.005));
    }

    @Test
    void uniformAndNormalDrawsAreRarelyRefused() {
        int refused = 0;
        for (int trial = 0; trial < 400; trial++) {
            RandomStream random = RandomStream.of(11, "residual tests", Integer.toString(trial));
            double[] u = new double[300];
            double[] z = new double[300];
            for (int t = 0; t < u.length; t++) {
                u[t] = (random.nextInt(1 << 20) + 0.5) / (1 << 20);
                z[t] = NormalQuantile.of(u[t]);
            }
            refused += number(KolmogorovSmirnov.uniform(u).pValue()) < 0.05 ? 1 : 0;
            refused += number(JarqueBera.of(z).pValue()) < 0.05 ? 1 : 0;
            refused += number(LjungBox.of(z, 10).pValue()) < 0.05 ? 1 : 0;
        }
        // 1200 tests at 5 %: 60 expected, deviation about 7.5; Jarque and Bera's test refuses a little less in small
        // samples
        assertThat(refused).isBetween(35, 85);
    }

    @Test
    void theyAreUndefinedWithoutEnoughValuesOrVariation() {
        assertThat(JarqueBera.of().statistic()).isEqualTo(Estimate.tooFew(0, 2));
        assertThat(JarqueBera.of(3, 3, 3).pValue()).isEqualTo(Estimate.zeroVariance());
        assertThat(LjungBox.of(new double[] {1, 2}, 2).statistic()).isEqualTo(Estimate.tooFew(2, 3));
        assertThat(LjungBox.of(new double[] {4, 4, 4}, 1).pValue()).isEqualTo(Estimate.zeroVariance());
        assertThat(KolmogorovSmirnov.uniform().statistic()).isEqualTo(Estimate.tooFew(0, 1));
        assertThatThrownBy(() -> KolmogorovSmirnov.uniform(0.5, Double.NaN)).hasMessageContaining("NaN");
        assertThatThrownBy(() -> LjungBox.of(new double[] {1, 2, 3}, 0)).hasMessageContaining("lags is 0");
    }

    private static double number(Estimate estimate) {
        return estimate.number().orElseThrow();
    }
}
