package sojourn.measure;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static sojourn.measure.Undefinedness.reason;

import com.fasterxml.jackson.databind.JsonNode;
import org.junit.jupiter.api.Test;
import sojourn.CheckValues;

class RegimeTableTest {
    @Test
    void rowsAgreeWithTheWorkedCase() {
        CheckValues worked = CheckValues.byId("per_regime_table");
        RegimeTable table = RegimeTable.of(
                CheckValues.ints(worked.input("label_known_at_previous_close")),
                CheckValues.doubles(worked.input("returns")),
                worked.input("regimes").asInt());
        JsonNode expected = worked.expected("rows");
        assertThat(table.rows()).hasSize(expected.size());
        for (int k = 0; k < expected.size(); k++) {
            RegimeTable.Row row = table.rows().get(k);
            assertThat(row.regime()).isEqualTo(expected.get(k).get("regime").asInt());
            assertThat(row.bars()).isEqualTo(expected.get(k).get("days").asInt());
            worked.assertClose(
                    "share", row.share().number().orElseThrow(), expected.get(k).get("share"));
            worked.assertClose(
                    "mean", row.mean().number().orElseThrow(), expected.get(k).get("mean"));
            worked.assertClose(
                    "sd",
                    row.deviation().number().orElseThrow(),
                    expected.get(k).get("sd"));
            worked.assertClose("compounded", row.compounded(), expected.get(k).get("compounded"));
        }
    }

    @Test
    void barsWithoutAKnownRegimeCountInNoRowAndInNoShare() {
        RegimeTable table =
                RegimeTable.of(new int[] {RegimeTable.UNKNOWN, 0, 1, 1}, new double[] {9, 0.5, 0.5, -0.5}, 2);
        assertThat(table.rows().get(0).bars()).isEqualTo(1);
        assertThat(table.rows().get(0).compounded()).isEqualTo(0.5);
        assertThat(table.rows().get(1).share().number()).hasValue(2.0 / 3);
        assertThat(table.rows().get(1).compounded()).isEqualTo(-0.25);
    }

    @Test
    void aRegimeWithFewBarsHasARowWithWhatCanBeSaid() {
        RegimeTable table = RegimeTable.of(new int[] {0}, new double[] {0.1}, 2);
        RegimeTable.Row once = table.rows().get(0);
        assertThat(once.mean().number()).hasValue(0.1);
        assertThat(reason(once.deviation())).isEqualTo(Measured.Reason.TOO_FEW_BARS);
        RegimeTable.Row never = table.rows().get(1);
        assertThat(never.bars()).isZero();
        assertThat(never.share().number()).hasValue(0);
        assertThat(never.compounded()).isZero();
        assertThat(reason(never.mean())).isEqualTo(Measured.Reason.TOO_FEW_BARS);
    }

    @Test
    void withoutLabelledBarsThereAreNoShares() {
        RegimeTable table = RegimeTable.of(new int[] {RegimeTable.UNKNOWN}, new double[] {0.1}, 1);
        assertThat(reason(table.rows().get(0).share())).isEqualTo(Measured.Reason.TOO_FEW_BARS);
    }

    @Test
    void labelsThatDoNotFitAreRefused() {
        assertThatThrownBy(() -> RegimeTable.of(new int[] {2}, new double[1], 2))
                .isInstanceOf(IllegalArgumentException.class)
                .hasMessageContaining("a label is 2, must lie in [-1, 1]");
        assertThatThrownBy(() -> RegimeTable.of(new int[1], new double[2], 2))
                .hasMessageContaining("1 labels for 2 returns");
    }
}
