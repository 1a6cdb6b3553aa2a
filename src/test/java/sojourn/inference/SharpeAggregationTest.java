package sojourn.inference;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import sojourn.CheckValues;

class SharpeAggregationTest {
    /** Lo (2002), Financial Analysts Journal 58(4), equations (20)-(21); its Table 2 tabulates this first-order case. */
    @Test
    void firstOrderAutocorrelationAgreesWithTheWorkedTable() {
        CheckValues worked = CheckValues.byId("lo_eta_ar1");
        int[] periods = CheckValues.ints(worked.input("q"));
        double[] rho = CheckValues.doubles(worked.input("rho"));
        double[][] eta = new double[periods.length][rho.length];
        for (int i = 0; i < periods.length; i++) {
            for (int j = 0; j < rho.length; j++) {
                eta[i][j] = SharpeAggregation.eta(periods[i], powers(rho[j], periods[i] - 1))
                        .number()
                        .orElseThrow();
            }
        }
        worked.assertExpected("eta", eta);
    }

    /** Computed by an independent implementation (plain numpy). */
    @ParameterizedTest
    @ValueSource(strings = {"sharpe_se_a", "sharpe_se_b"})
    void aSeriesOwnAutocorrelationsAgreeWithTheWorkedCases(String id) {
        CheckValues worked = CheckValues.byId(id);
        double[] excess = CheckValues.doubles(worked.input("excess"));
        double eta =
                SharpeAggregation.eta(12, Autocorrelation.of(excess)).number().orElseThrow();
        worked.assertExpected("eta12", eta);
        worked.assertExpected(
                "sharpe_aggregated_12", eta * SharpeError.ratio(excess).number().orElseThrow());
    }

    @Test
    void onePeriodNeedsNoFactor() {
        assertThat(SharpeAggregation.eta(1).number()).hasValue(1);
    }

    @Test
    void anAggregateWithoutVarianceIsUndefined() {
        // 2 + 2 x (-1) = 0
        Estimate eta = SharpeAggregation.eta(2, -1.0);
        assertThat(eta).isInstanceOf(Estimate.Undefined.class);
        assertThat(((Estimate.Undefined) eta).reason()).isEqualTo(Estimate.Reason.NOT_POSITIVE);
    }

    @Test
    void aSeriesTooShortOrConstantIsUndefined() {
        assertThat(SharpeAggregation.eta(4, Autocorrelation.of(1, 2, 4))).isEqualTo(Estimate.tooFew(3, 4));
        assertThat(SharpeAggregation.eta(2, Autocorrelation.of(1, 1, 1))).isEqualTo(Estimate.zeroVariance());
    }

    @Test
    void tooFewAutocorrelationsAreRefused() {
        assertThatThrownBy(() -> SharpeAggregation.eta(12, 0.1))
                .isInstanceOf(IllegalArgumentException.class)
                .hasMessageContaining("1 autocorrelations for 12 periods, which need 11");
    }

    private static double[] powers(double rho, int count) {
        double[] powers = new double[count];
        double power = 1;
        for (int k = 0; k < count; k++) {
            power *= rho;
            powers[k] = power;
        }
        return powers;
    }
}
