package sojourn.measure;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static sojourn.measure.Undefinedness.reason;

import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import org.junit.jupiter.params.provider.ValueSource;
import sojourn.inference.Estimate;

class MeasuredTest {
    private static final Measured NONE = Measured.undefined(Measured.Reason.RUIN, "wealth reached 0");

    @ParameterizedTest
    @ValueSource(doubles = {Double.NaN, Double.POSITIVE_INFINITY, Double.NEGATIVE_INFINITY})
    void aNumberThatIsNotFiniteIsNeverAValue(double number) {
        assertThat(reason(Measured.of(number))).isEqualTo(Measured.Reason.OUT_OF_RANGE);
        assertThatThrownBy(() -> new Measured.Value(number, Optional.empty()))
                .isInstanceOf(IllegalArgumentException.class)
                .hasMessageContaining("amount is " + number);
    }

    @Test
    void negativeZeroIsWrittenAsZero() {
        double amount = Measured.of(-0.0).number().orElseThrow();
        assertThat(Double.doubleToRawLongBits(amount)).isZero();
    }

    @Test
    void arithmeticKeepsTheFirstReason() {
        assertThat(Measured.of(3).minus(Measured.of(1)).number()).hasValue(2);
        assertThat(Measured.of(3).times(2).number()).hasValue(6);
        assertThat(NONE.times(2)).isEqualTo(NONE);
        assertThat(Measured.of(3).minus(NONE)).isEqualTo(NONE);
        assertThat(NONE.minus(Measured.tooFew(0, 1))).isEqualTo(NONE);
    }

    @ParameterizedTest
    @EnumSource
    void everyReasonOfAnEstimateHasItsCounterpart(Estimate.Reason reason) {
        Measured measured = Measured.from(new Estimate.Undefined(reason, "of this"));
        assertThat(measured).isInstanceOf(Measured.Undefined.class);
        assertThat(((Measured.Undefined) measured).because()).isEqualTo("of this");
        String expected = reason.name().replace("OBSERVATIONS", "BARS");
        assertThat(reason(measured).name()).isEqualTo(expected);
    }

    @Test
    void anIntervalOutOfOrderIsRefused() {
        assertThatThrownBy(() -> new Measured.Interval(2, 1, "95 %"))
                .isInstanceOf(IllegalArgumentException.class)
                .hasMessageContaining("high is 1.0");
        assertThatThrownBy(() -> new Measured.Interval(Double.NaN, 1, "95 %"))
                .isInstanceOf(IllegalArgumentException.class);
    }
}
