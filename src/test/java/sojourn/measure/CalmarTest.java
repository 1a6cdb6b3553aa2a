package sojourn.measure;

import static org.assertj.core.api.Assertions.assertThat;
import static sojourn.measure.Undefinedness.reason;

import org.junit.jupiter.api.Test;

class CalmarTest {
    @Test
    void isGrowthOverTheSizeOfTheWorstDrawdown() {
        assertThat(Calmar.of(Measured.of(0.125), -0.25).number()).hasValue(0.5);
        assertThat(Calmar.of(Measured.of(-0.125), -0.5).number()).hasValue(-0.25);
    }

    @Test
    void isUndefinedWithoutADrawdownOrGrowth() {
        assertThat(reason(Calmar.of(Measured.of(0.1), 0))).isEqualTo(Measured.Reason.NO_DRAWDOWN);
        assertThat(reason(Calmar.of(Measured.of(0.1), -1e-16))).isEqualTo(Measured.Reason.NO_DRAWDOWN);
        assertThat(reason(Calmar.of(Measured.tooFew(0, 1), -0.5))).isEqualTo(Measured.Reason.TOO_FEW_BARS);
    }
}
