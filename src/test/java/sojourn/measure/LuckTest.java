package sojourn.measure;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;

class LuckTest {
    /** 999 draws of 1..999: the quantile p is 1000 p, and a number x has x - 1 draws below it. */
    private static final List<Measured> DRAWS = IntStream.rangeClosed(1, 999)
            .map(i -> 1 + (i * 500) % 999) // out of order; 500 and 999 share no divisor
            .mapToObj(i -> Measured.of(i))
            .toList();

    @Test
    void quantilesAreDrawsAndThePlaceIsCounted() {
        Luck luck = Luck.of(Measured.of(900), DRAWS);
        assertThat(luck.low().number()).hasValue(50);
        assertThat(luck.middle().number()).hasValue(500);
        assertThat(luck.high().number()).hasValue(950);
        assertThat(luck.worse().number().orElseThrow()).isCloseTo(899.0 / 999, within(1e-15));
        assertThat(luck.chance().number().orElseThrow()).isCloseTo(101.0 / 1000, within(1e-15));
    }

    @Test
    void chanceIsNeverNothingAndAtMostAll() {
        assertThat(Luck.of(Measured.of(5000), DRAWS).chance().number()).hasValue(1.0 / 1000);
        assertThat(Luck.of(Measured.of(-1), DRAWS).chance().number()).hasValue(1);
    }

    @Test
    void anUndefinedNumberOrDrawLeavesItUndefinedWithTheReason() {
        Measured none = Measured.undefined(Measured.Reason.UNDER_ONE_YEAR, "it is short");
        assertThat(Luck.of(none, DRAWS).low()).isEqualTo(none);
        Luck luck = Luck.of(Measured.of(1), List.of(Measured.of(1), none));
        assertThat(luck.chance())
                .isInstanceOfSatisfying(
                        Measured.Undefined.class,
                        why -> assertThat(why.because()).contains("1 of 2 draws"));
    }
}
