package sojourn.inference;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import sojourn.CheckValues;

class MomentsTest {
    /** A few roundings of numbers near 1. */
    private static final double ROUNDING = 1e-14;

    /** NIST Statistical Reference Datasets, univariate: NumAcc1, NumAcc2, NumAcc4, certified mean and standard deviation. */
    @ParameterizedTest
    @ValueSource(strings = {"nist_numacc1", "nist_numacc2", "nist_numacc4"})
    void meanAndDeviationAgreeWithTheCertifiedValues(String id) {
        CheckValues certified = CheckValues.byId(id);
        Moments moments = Moments.of(NumericalAccuracySeries.of(certified));
        certified.assertExpected("mean", moments.mean());
        certified.assertExpected("sd", moments.standardDeviation().number().orElseThrow());
    }

    /** Worked cases computed by an independent implementation in plain numpy. */
    @ParameterizedTest
    @ValueSource(strings = {"measures_daily", "measures_monthly"})
    void shapeStatisticsAgreeWithTheWorkedCases(String id) {
        CheckValues worked = CheckValues.byId(id);
        Moments moments = Moments.of(CheckValues.doubles(worked.input("returns")));
        worked.assertExpected("skew_g1", moments.skewness().number().orElseThrow());
        worked.assertExpected(
                "excess_kurt_g2", moments.excessKurtosis().number().orElseThrow());
        worked.assertExpected("skew_G1", moments.sampleSkewness().number().orElseThrow());
        worked.assertExpected(
                "excess_kurt_G2", moments.sampleExcessKurtosis().number().orElseThrow());
    }

    @Test
    void shapeOfATwoValuedSampleIsThatOfABernoulliVariable() {
        Moments moments = Moments.of(0, 0, 0, 1); // p = 1/4
        assertThat(moments.populationVariance()).isCloseTo(0.1875, within(ROUNDING)); // p q
        // (q - p) / sqrt(p q) and (1 - 6 p q) / (p q)
        assertThat(moments.skewness().number()).hasValueCloseTo(0.5 / Math.sqrt(0.1875), within(ROUNDING));
        assertThat(moments.excessKurtosis().number()).hasValueCloseTo(-0.125 / 0.1875, within(ROUNDING));
    }

    @Test
    void shapeIgnoresWhereTheSampleLiesAndChangesSignWithIt() {
        double[] sample = {0.3, -1.2, 0.7, 2.9, -0.4};
        double[] moved = new double[sample.length];
        double[] mirrored = new double[sample.length];
        for (int i = 0; i < sample.length; i++) {
            moved[i] = 5 + 3 * sample[i];
            mirrored[i] = -sample[i];
        }
        double skewness = Moments.of(sample).skewness().number().orElseThrow();
        assertThat(Moments.of(moved).skewness().number()).hasValueCloseTo(skewness, within(ROUNDING));
        assertThat(Moments.of(mirrored).skewness().number()).hasValueCloseTo(-skewness, within(ROUNDING));
        double kurtosis = Moments.of(sample).excessKurtosis().number().orElseThrow();
        assertThat(Moments.of(moved).excessKurtosis().number()).hasValueCloseTo(kurtosis, within(10 * ROUNDING));
    }

    @Test
    void oneValueHasAMeanAndNoSpread() {
        Moments one = Moments.of(7);
        assertThat(one.mean()).isEqualTo(7);
        assertThat(one.constant()).isTrue();
        assertThat(reason(one.standardDeviation())).isEqualTo(Estimate.Reason.TOO_FEW_OBSERVATIONS);
        assertThat(reason(one.skewness())).isEqualTo(Estimate.Reason.TOO_FEW_OBSERVATIONS);
    }

    @Test
    void eachShapeStatisticNeedsItsNumberOfValues() {
        assertThat(Moments.of(1, 2).skewness().number()).hasValue(0);
        assertThat(Moments.of(1, 2).sampleSkewness())
                .isEqualTo(new Estimate.Undefined(
                        Estimate.Reason.TOO_FEW_OBSERVATIONS, "the formula needs 3 observations and there are 2"));
        assertThat(Moments.of(1, 2, 4).sampleSkewness().number()).isPresent();
        assertThat(reason(Moments.of(1, 2, 4).sampleExcessKurtosis())).isEqualTo(Estimate.Reason.TOO_FEW_OBSERVATIONS);
    }

    @Test
    void valuesThatDifferByRoundingAloneCountAsConstant() {
        Moments almost = Moments.of(0.1 + 0.2, 0.3, 0.3);
        assertThat(almost.constant()).isTrue();
        assertThat(reason(almost.skewness())).isEqualTo(Estimate.Reason.ZERO_VARIANCE);
        assertThat(Moments.of(0.3, 0.3, 0.300001).constant()).isFalse();
    }

    @Test
    void aConstantHasDeviationZero() {
        assertThat(Moments.of(0.1, 0.1, 0.1).standardDeviation().number()).hasValue(0);
    }

    @Test
    void valuesTooLargeToSquareAreOutOfRangeAndNeverNaN() {
        assertThat(reason(Moments.of(1e200, -1e200, 3).standardDeviation())).isEqualTo(Estimate.Reason.OUT_OF_RANGE);
        assertThat(reason(Moments.of(1e100, -1e100, 3).excessKurtosis())).isEqualTo(Estimate.Reason.OUT_OF_RANGE);
    }

    @Test
    void noValuesAndValuesThatAreNotFiniteAreRefused() {
        assertThatThrownBy(Moments::of)
                .isInstanceOf(IllegalArgumentException.class)
                .hasMessageContaining("at least one");
        assertThatThrownBy(() -> Moments.of(1, Double.NaN))
                .isInstanceOf(IllegalArgumentException.class)
                .hasMessageContaining("value 1 is NaN");
        assertThatThrownBy(() -> Moments.of(Double.POSITIVE_INFINITY)).isInstanceOf(IllegalArgumentException.class);
    }

    private static Estimate.Reason reason(Estimate estimate) {
        assertThat(estimate).isInstanceOf(Estimate.Undefined.class);
        return ((Estimate.Undefined) estimate).reason();
    }
}
