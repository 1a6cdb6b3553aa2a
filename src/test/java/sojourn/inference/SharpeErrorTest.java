package sojourn.inference;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import sojourn.CheckValues;
import sojourn.numeric.RandomStream;

class SharpeErrorTest {
    /** Half of the last printed digit. */
    private static final double PRINTED = 0.0005;

    /** Lo (2002), Financial Analysts Journal 58(4), Table 1: standard errors for independent normal returns. */
    @ParameterizedTest
    @CsvSource({"1.5, 60, 0.188", "0.5, 12, 0.306"})
    void normalErrorAgreesWithThePublishedTable(double sharpe, int observations, double published) {
        assertThat(SharpeError.normal(sharpe, observations).number()).hasValueCloseTo(published, within(PRINTED));
    }

    @Test
    void normalErrorAgreesWithAllOfTheTableRecomputed() {
        CheckValues worked = CheckValues.byId("lo_table1");
        double[] sharpe = CheckValues.doubles(worked.input("sharpe"));
        int[] observations = CheckValues.ints(worked.input("T"));
        double[][] errors = new double[sharpe.length][observations.length];
        for (int i = 0; i < sharpe.length; i++) {
            for (int j = 0; j < observations.length; j++) {
                errors[i][j] =
                        SharpeError.normal(sharpe[i], observations[j]).number().orElseThrow();
            }
        }
        worked.assertExpected("se", errors);
    }

    /** Computed by an independent implementation (plain numpy). */
    @ParameterizedTest
    @ValueSource(strings = {"sharpe_se_a", "sharpe_se_b"})
    void allErrorsAgreeWithTheWorkedCases(String id) {
        CheckValues worked = CheckValues.byId(id);
        double[] excess = CheckValues.doubles(worked.input("excess"));
        worked.assertExpected("sharpe", SharpeError.ratio(excess).number().orElseThrow());
        worked.assertExpected(
                "se_iid_normal", SharpeError.normal(excess).number().orElseThrow());
        worked.assertExpected("se_mertens", SharpeError.mertens(excess).number().orElseThrow());
        int lags = worked.input("lags").asInt();
        worked.assertExpected("se_hac", SharpeError.hac(excess, lags).number().orElseThrow());
    }

    @Test
    void withoutLagsTheRobustErrorIsThatOfMertens() {
        RandomStream random = RandomStream.of(11, "sharpe error");
        for (int trial = 0; trial < 50; trial++) {
            double[] excess = new double[5 + random.nextInt(60)];
            for (int t = 0; t < excess.length; t++) {
                double normal = random.nextNormal();
                excess[t] = 0.3 + normal + normal * normal;
            }
            double mertens = SharpeError.mertens(excess).number().orElseThrow();
            assertThat(SharpeError.hac(excess, 0).number().orElseThrow())
                    .as("seed 11, trial %s", trial)
                    .isCloseTo(mertens, within(1e-11 * mertens));
        }
    }

    @Test
    void mertensReducesToLoForNormalMoments() {
        assertThat(SharpeError.mertens(0.4, 0, 3, 120)).isEqualTo(SharpeError.normal(0.4, 120));
    }

    @Test
    void defaultLagsAreThoseOfTheLongRunVariance() {
        double[] excess = CheckValues.doubles(CheckValues.byId("sharpe_se_b").input("excess"));
        assertThat(SharpeError.hac(excess)).isEqualTo(SharpeError.hac(excess, 4)); // floor(4 (120/100)^(2/9))
    }

    @Test
    void errorsDoNotDependOnTheScaleOfReturns() {
        double[] excess = {0.01, -0.02, 0.015, 0.03, -0.005, 0.012};
        double[] larger = new double[excess.length];
        for (int t = 0; t < excess.length; t++) {
            larger[t] = 8 * excess[t]; // a power of two: not even the rounding changes
        }
        assertThat(SharpeError.hac(larger, 2)).isEqualTo(SharpeError.hac(excess, 2));
        assertThat(SharpeError.mertens(larger)).isEqualTo(SharpeError.mertens(excess));
    }

    @Test
    void areUndefinedForTooFewOrConstantReturns() {
        for (double[] few : new double[][] {{}, {0.1}}) {
            assertThat(SharpeError.ratio(few)).isEqualTo(Estimate.tooFew(few.length, 2));
            assertThat(SharpeError.hac(few)).isEqualTo(Estimate.tooFew(few.length, 2));
        }
        double[] constant = {0.01, 0.01, 0.01};
        assertThat(SharpeError.ratio(constant)).isEqualTo(Estimate.zeroVariance());
        assertThat(SharpeError.normal(constant)).isEqualTo(Estimate.zeroVariance());
        assertThat(SharpeError.mertens(constant)).isEqualTo(Estimate.zeroVariance());
        assertThat(SharpeError.hac(constant, 1)).isEqualTo(Estimate.zeroVariance());
    }

    @Test
    void momentsThatLeaveNoVarianceMakeTheErrorUndefined() {
        // 1 - 3 x 1 + (4 - 1)/4 x 1 = -1.25
        Estimate error = SharpeError.mertens(1, 3, 4, 50);
        assertThat(error).isInstanceOf(Estimate.Undefined.class);
        assertThat(((Estimate.Undefined) error).reason()).isEqualTo(Estimate.Reason.NOT_POSITIVE);
    }

    @Test
    void hugeReturnsAreOutOfRangeAndNeverNaN() {
        double[] huge = {1e200, -1e200, 5};
        Estimate outOfRange = Estimate.of(Double.NaN);
        assertThat(SharpeError.hac(huge)).isEqualTo(outOfRange);
        assertThat(SharpeError.mertens(huge)).isEqualTo(outOfRange);
        assertThat(SharpeError.mertens(new double[] {1e100, -1e100, 5})).isEqualTo(outOfRange);
    }

    @Test
    void argumentsOutsideTheirRangeAreRefused() {
        assertThatThrownBy(() -> SharpeError.normal(0.5, 0)).hasMessageContaining("observations is 0");
        assertThatThrownBy(() -> SharpeError.normal(Double.NaN, 5)).hasMessageContaining("sharpe is NaN");
        assertThatThrownBy(() -> SharpeError.hac(new double[] {1, 2}, -1)).hasMessageContaining("lags is -1");
    }
}
