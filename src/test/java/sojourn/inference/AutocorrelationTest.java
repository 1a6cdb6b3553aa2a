package sojourn.inference;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import sojourn.CheckValues;

class AutocorrelationTest {
    /** NIST Statistical Reference Datasets, univariate: certified lag-1 autocorrelation. */
    @ParameterizedTest
    @ValueSource(strings = {"nist_numacc1", "nist_numacc2", "nist_numacc4"})
    void lagOneAgreesWithTheCertifiedValue(String id) {
        CheckValues certified = CheckValues.byId(id);
        Autocorrelation rho = Autocorrelation.of(NumericalAccuracySeries.of(certified));
        certified.assertExpected("lag1", rho.at(1).number().orElseThrow());
    }

    /** Computed by an independent implementation (plain numpy, cross-checked against statsmodels 0.13.5). */
    @ParameterizedTest
    @ValueSource(strings = {"sharpe_se_a", "sharpe_se_b"})
    void elevenLagsAgreeWithTheWorkedCases(String id) {
        CheckValues worked = CheckValues.byId(id);
        Autocorrelation rho = Autocorrelation.of(CheckValues.doubles(worked.input("excess")));
        double[] lags = new double[11];
        for (int k = 1; k <= 11; k++) {
            lags[k - 1] = rho.at(k).number().orElseThrow();
        }
        worked.assertExpected("rho", lags);
    }

    @Test
    void lagZeroIsOne() {
        assertThat(Autocorrelation.of(1, 5, 2).at(0).number()).hasValue(1);
    }

    @Test
    void isUndefinedWithoutEnoughValuesOrVariation() {
        assertThat(Autocorrelation.of().at(0)).isEqualTo(Estimate.tooFew(0, 2));
        assertThat(Autocorrelation.of(1, 2).at(2)).isEqualTo(Estimate.tooFew(2, 3));
        assertThat(Autocorrelation.of(4, 4, 4).at(1)).isEqualTo(Estimate.zeroVariance());
        assertThatThrownBy(() -> Autocorrelation.of(1, 2).at(-1)).hasMessageContaining("lag is -1");
    }
}
