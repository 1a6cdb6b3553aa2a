package sojourn.measure;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static sojourn.measure.Undefinedness.reason;

import org.junit.jupiter.api.Test;
import sojourn.CheckValues;

class TurnoverTest {
    @Test
    void tradedFractionsAndTheirSumsAYearAgreeWithTheWorkedCase() {
        CheckValues worked = CheckValues.byId("turnover");
        double[][] before = CheckValues.matrix(worked.input("pre_trade"));
        double[][] after = CheckValues.matrix(worked.input("post_trade"));
        double[] twoWay = new double[before.length];
        double[] oneWay = new double[before.length];
        for (int t = 0; t < before.length; t++) {
            twoWay[t] = Turnover.tradedFraction(before[t], after[t]);
            oneWay[t] = twoWay[t] / 2;
        }
        double periods = worked.input("periods_per_year").asDouble();
        worked.assertExpected("traded_fraction_per_day", twoWay);
        worked.assertExpected(
                "two_way_ann", Turnover.perYear(twoWay, periods).number().orElseThrow());
        worked.assertExpected(
                "one_way_ann", Turnover.perYear(oneWay, periods).number().orElseThrow());
    }

    @Test
    void isUndefinedWithoutBarsAndRefusesWeightsThatDoNotFit() {
        assertThat(reason(Turnover.perYear(new double[0], 252))).isEqualTo(Measured.Reason.TOO_FEW_BARS);
        assertThatThrownBy(() -> Turnover.tradedFraction(new double[1], new double[2]))
                .hasMessageContaining("1 weights before and 2 after");
    }
}
