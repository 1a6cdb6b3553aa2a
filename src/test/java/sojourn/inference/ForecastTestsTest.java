package sojourn.inference;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import sojourn.CheckValues;
import sojourn.numeric.RandomStream;

/** Tests of one forecast against another, and of a forecast against what came. */
class ForecastTestsTest {
    private static final double ROUNDING = 1e-12;

    @ParameterizedTest
    @ValueSource(strings = {"dm_gw_h1", "dm_gw_h3"})
    void dieboldAndMarianoAgreeWithTheWorkedCases(String id) {
        CheckValues worked = CheckValues.byId(id);
        double[] d = CheckValues.doubles(worked.input("loss_difference"));
        int horizon = worked.input("horizon").asInt();
        DieboldMariano test = DieboldMariano.of(d, horizon);
        assertThat(test.count()).isEqualTo(d.length);
        worked.assertExpected("mean", number(test.mean()));
        worked.assertExpected("dm", number(test.uncorrected()));
        worked.assertExpected("p_normal", 2 * Probability.normalBelow(-Math.abs(number(test.uncorrected()))));
        worked.assertExpected("hln", number(test.corrected().statistic()));
        worked.assertExpected("p_hln", number(test.corrected().pValue()));
        int lags = worked.input("bartlett_lags").asInt();
        worked.assertExpected(
                "dm_bartlett", number(DieboldMariano.robust(d, horizon, lags).uncorrected()));
    }

    @ParameterizedTest
    @ValueSource(strings = {"dm_gw_h1", "dm_gw_h3"})
    void giacominiAndWhiteAgreeWithTheWorkedCases(String id) {
        CheckValues worked = CheckValues.byId(id);
        TestResult test = GiacominiWhite.of(CheckValues.doubles(worked.input("loss_difference")));
        worked.assertExpected("gw", number(test.statistic()));
        worked.assertExpected("gw_p", number(test.pValue()));
    }

    @Test
    void exchangingTheForecastsChangesTheSignAlone() {
        double[] d = {0.3, -0.1, 0.5, 0.2, -0.4, 0.6};
        double[] other = new double[d.length];
        for (int t = 0; t < d.length; t++) {
            other[t] = -d[t];
        }
        DieboldMariano one = DieboldMariano.robust(d, 1);
        DieboldMariano two = DieboldMariano.robust(other, 1);
        assertThat(number(two.corrected().statistic()))
                .isEqualTo(-number(one.corrected().statistic()));
        assertThat(two.corrected().pValue()).isEqualTo(one.corrected().pValue());
    }

    /** d = (1, -1, 1, -1, 1.5): c_0 + 2 c_1 is below 0, so Bartlett's weights take over. */
    @Test
    void aVarianceThatIsNotPositiveIsReplaced() {
        double[] d = {1, -1, 1, -1, 1.5};
        assertThat(DieboldMariano.of(d, 2)).isEqualTo(DieboldMariano.robust(d, 2));
    }

    @Test
    void nothingToCompareIsUndefined() {
        assertThat(DieboldMariano.of(new double[0], 1).mean()).isEqualTo(Estimate.tooFew(0, 2));
        assertThat(DieboldMariano.of(new double[] {0.2}, 1).corrected().pValue())
                .isEqualTo(Estimate.tooFew(1, 2));
        assertThat(DieboldMariano.of(new double[] {0, 0, 0}, 1).uncorrected()).isEqualTo(Estimate.zeroVariance());
        assertThat(DieboldMariano.robust(new double[] {2, 2, 2}, 1).uncorrected())
                .isEqualTo(Estimate.zeroVariance());
        assertThat(GiacominiWhite.of(1, 2, 3).statistic()).isEqualTo(Estimate.tooFew(3, 4));
        assertThat(GiacominiWhite.of(0, 0, 0, 0, 0).pValue()).isEqualTo(Estimate.zeroVariance());
    }

    /** The definition of Giacomini and White (2006), section 3.2, on the pairs of bars that follow each other, written out. */
    @Test
    void aDifferenceAcrossAGapTellsNothingOfTheNext() {
        double[] d = {0.3, -0.1, 0.4, 0.2, -0.5, 0.1, 0.25, -0.2};
        int[] bars = {3, 4, 5, 9, 10, 11, 20, 21};
        double[][] pairs = {{0.3, -0.1}, {-0.1, 0.4}, {0.2, -0.5}, {-0.5, 0.1}, {0.25, -0.2}};
        double[] mean = new double[2];
        double[] omega = new double[3];
        for (double[] pair : pairs) {
            mean[0] += pair[1] / 5;
            mean[1] += pair[0] * pair[1] / 5;
            omega[0] += pair[1] * pair[1] / 5;
            omega[1] += pair[1] * pair[0] * pair[1] / 5;
            omega[2] += pair[0] * pair[1] * pair[0] * pair[1] / 5;
        }
        double determinant = omega[0] * omega[2] - omega[1] * omega[1];
        double expected = 5
                * (omega[2] * mean[0] * mean[0] - 2 * omega[1] * mean[0] * mean[1] + omega[0] * mean[1] * mean[1])
                / determinant;
        assertThat(number(GiacominiWhite.of(d, bars).statistic())).isCloseTo(expected, within(1e-12));
        assertThat(GiacominiWhite.of(d, new int[] {1, 3, 5, 7, 9, 11, 12, 14}).statistic())
                .isEqualTo(Estimate.tooFew(2, 4));
    }

    @Test
    void equalForecastsAreRarelyToldApart() {
        int apart = 0;
        for (int trial = 0; trial < 400; trial++) {
            RandomStream random = RandomStream.of(5, "equal forecasts", Integer.toString(trial));
            double[] d = new double[250];
            for (int t = 0; t < d.length; t++) {
                d[t] = random.nextNormal();
            }
            apart += number(DieboldMariano.of(d, 1).corrected().pValue()) < 0.05 ? 1 : 0;
            apart += number(GiacominiWhite.of(d).pValue()) < 0.05 ? 1 : 0;
        }
        assertThat(apart).isBetween(22, 60); // 800 tests at 5 %: 40 expected, deviation about 6
    }

    /**
     * Computed in plain numpy 2.4.6 from the matrices themselves: (X'X)^{-1} S (X'X)^{-1} with and without lags, Wald's statistic of
     * a = 0, b = 1, its p-value by scipy 1.17.1.
     */
    @ParameterizedTest
    @CsvSource({
        "0, 0.623928343802583, 0.2517020591276114, 0.15071931273989583, 0.9274098774698888",
        "2, 0.6254001114032616, 0.2653499001354432, 0.5752173690778065, 0.7500550429543774"
    })
    void aLineAgreesWithAnotherImplementation(int lags, double ofIntercept, double ofSlope, double wald, double p) {
        double[] x = {1.0, 2.5, 0.7, 3.1, 4.4, 2.2, 1.9, 5.0};
        double[] y = {0.8, 3.9, 0.2, 2.5, 6.0, 1.1, 3.3, 4.1};
        RegressionLine line = line(x, y, lags);
        assertThat(line.intercept()).isCloseTo(-0.025808457711445545, within(ROUNDING));
        assertThat(line.slope()).isCloseTo(1.0628109452736325, within(ROUNDING));
        assertThat(number(line.interceptError())).isCloseTo(ofIntercept, within(ROUNDING));
        assertThat(number(line.slopeError())).isCloseTo(ofSlope, within(ROUNDING));
        assertThat(line.explained()).isCloseTo(0.6702685199400846, within(ROUNDING));
        assertThat(number(line.against(0, 1).statistic())).isCloseTo(wald, within(ROUNDING));
        assertThat(number(line.against(0, 1).pValue())).isCloseTo(p, within(ROUNDING));
    }

    @Test
    void aLineIsTheSameWhateverTheUnit() {
        double[] x = {1e-8, 2.5e-8, 0.7e-8, 3.1e-8, 4.4e-8};
        double[] y = {0.8e-8, 3.9e-8, 0.2e-8, 2.5e-8, 6.0e-8};
        double[] largeX = {1, 2.5, 0.7, 3.1, 4.4};
        double[] largeY = {0.8, 3.9, 0.2, 2.5, 6.0};
        RegressionLine small = line(x, y, 1);
        RegressionLine large = line(largeX, largeY, 1);
        assertThat(small.slope()).isCloseTo(large.slope(), within(ROUNDING));
        assertThat(1e8 * small.intercept()).isCloseTo(large.intercept(), within(ROUNDING));
        assertThat(number(small.against(0, 1).statistic()))
                .isCloseTo(number(large.against(0, 1).statistic()), within(1e-9));
    }

    @Test
    void thereIsNoLineThroughTwoPointsOrOneValueOfX() {
        assertThat(RegressionLine.through(new double[] {1, 2}, new double[] {1, 2}, 0))
                .isEqualTo(new RegressionLine.Outcome.None((Estimate.Undefined) Estimate.tooFew(2, 3)));
        assertThat(RegressionLine.through(new double[] {0.1, 0.1, 0.1}, new double[] {1, 2, 4}, 0))
                .isEqualTo(new RegressionLine.Outcome.None((Estimate.Undefined) Estimate.zeroVariance()));
    }

    private static RegressionLine line(double[] x, double[] y, int lags) {
        return ((RegressionLine.Outcome.Fitted) RegressionLine.through(x, y, lags)).line();
    }

    private static double number(Estimate estimate) {
        return estimate.number().orElseThrow();
    }
}
