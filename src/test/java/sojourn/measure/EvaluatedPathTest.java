package sojourn.measure;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.time.LocalDate;
import java.util.List;
import org.assertj.core.api.ThrowableAssert.ThrowingCallable;
import org.junit.jupiter.api.Test;

class EvaluatedPathTest {
    private static final LocalDate MONDAY = LocalDate.of(2024, 1, 1);
    private static final List<LocalDate> THREE = List.of(MONDAY, MONDAY.plusDays(1), MONDAY.plusDays(2));

    @Test
    void derivesReturnsAndExcessReturnsFromWealth() {
        EvaluatedPath path = EvaluatedPath.of(THREE, new double[] {100, 125, 62.5}, new double[] {0.25, 0}, 252);
        assertThat(path.bars()).isEqualTo(2);
        assertThat(path.returns()).containsExactly(0.25, -0.5);
        assertThat(path.excessReturns()).containsExactly(0, -0.5);
        assertThat(path.calendarDays()).isEqualTo(2);
    }

    @Test
    void returnsAfterRuinAreZero() {
        EvaluatedPath path = path(100, 0, 0);
        assertThat(path.ruined()).isTrue();
        assertThat(path.returns()).containsExactly(-1, 0);
    }

    @Test
    void isNotChangedByWhatHappensToItsArrays() {
        double[] wealth = {100, 110, 120};
        double[] turnover = {0.5, 0};
        EvaluatedPath path = EvaluatedPath.of(THREE, wealth, new double[2], 252).withTrading(turnover, new double[2]);
        wealth[1] = 1;
        turnover[0] = 9;
        path.wealth()[2] = 1;
        path.turnover().orElseThrow()[1] = 9;
        assertThat(path.wealth()).containsExactly(100, 110, 120);
        assertThat(path.turnover().orElseThrow()).containsExactly(0.5, 0);
    }

    @Test
    void recordingOnePartKeepsTheOthers() {
        EvaluatedPath bare = path(100, 110, 120);
        EvaluatedPath full = bare.withSwitches(new int[] {0, 1})
                .withTrading(new double[] {0, 1}, new double[] {0, 3})
                .withExposure(new double[] {1, -0.5}, new double[] {1, 0.5});
        assertThat(full.switches().orElseThrow()).containsExactly(0, 1);
        assertThat(full.costs().orElseThrow()).containsExactly(0, 3);
        assertThat(full.netExposure().orElseThrow()).containsExactly(1, -0.5);
        assertThat(bare.switches()).isEmpty();
    }

    @Test
    void refusesWealthThatCannotBe() {
        refused(() -> path(0, 1, 1), "wealth 0 is 0.0");
        refused(() -> path(100, -1, 1), "wealth 1 is -1.0");
        refused(() -> path(100, Double.NaN, 1), "wealth 1 is NaN");
        refused(() -> path(100, 0, 1), "wealth 2 is 1.0 after ruin");
        refused(() -> path(1e-300, 1e300, 1e300), "beyond the range of a return");
        refused(() -> EvaluatedPath.of(List.of(), new double[0], new double[0], 252), "no dates");
        refused(() -> EvaluatedPath.of(THREE, new double[2], new double[2], 252), "2 amounts of wealth for 3 dates");
    }

    @Test
    void refusesDatesOutOfOrder() {
        refused(
                () -> EvaluatedPath.of(List.of(MONDAY, MONDAY), new double[] {1, 1}, new double[1], 252),
                "date 2024-01-01 does not come after 2024-01-01");
    }

    @Test
    void refusesPartsThatDoNotFit() {
        EvaluatedPath path = path(100, 110, 120);
        refused(() -> EvaluatedPath.of(THREE, new double[] {1, 1, 1}, new double[3], 252), "3 cash returns for 2 bars");
        refused(() -> EvaluatedPath.of(THREE, new double[] {1, 1, 1}, new double[] {0, -1}, 252), "a cash return");
        refused(() -> EvaluatedPath.of(THREE, new double[] {1, 1, 1}, new double[2], 0), "periodsPerYear is 0.0");
        refused(() -> path.withTrading(new double[] {0, -0.1}, new double[2]), "one of the turnovers is -0.1");
        refused(() -> path.withTrading(new double[2], new double[1]), "1 costs for 2 bars");
        refused(() -> path.withExposure(new double[] {0, 1}, new double[] {0, 0.5}), "net exposure 1 is 1.0");
        refused(() -> path.withSwitches(new int[] {0, -1}), "one of the counts of switches is -1.0");
    }

    private static EvaluatedPath path(double... wealth) {
        return EvaluatedPath.of(THREE, wealth, new double[2], 252);
    }

    private static void refused(ThrowingCallable call, String message) {
        assertThatThrownBy(call).isInstanceOf(IllegalArgumentException.class).hasMessageContaining(message);
    }
}
