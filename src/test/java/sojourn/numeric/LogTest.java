package sojourn.numeric;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;

class LogTest {
    @Test
    void isWithinAFewUnitsOfTheStrictLogarithm() {
        RandomStream random = RandomStream.of(3, "log");
        for (int i = 0; i < 20_000; i++) {
            double spread = i % 3 == 0 ? 700 : i % 3 == 1 ? 3 : 1e-3;
            double x = StrictMath.exp(spread * (2 * random.nextDouble() - 1));
            double expected = StrictMath.log(x);
            assertThat(Log.of(x)).as("ln " + x).isCloseTo(expected, within(4e-16 + 4 * Math.ulp(expected)));
        }
    }

    @Test
    void isExactAtOneAndLeavesTheOddCasesToTheStrictLogarithm() {
        assertThat(Log.of(1)).isZero();
        assertThat(Log.of(0)).isEqualTo(Double.NEGATIVE_INFINITY);
        assertThat(Log.of(Double.POSITIVE_INFINITY)).isEqualTo(Double.POSITIVE_INFINITY);
        assertThat(Log.of(-1)).isNaN();
        assertThat(Log.of(Double.NaN)).isNaN();
        assertThat(Log.of(Double.MIN_VALUE)).isEqualTo(StrictMath.log(Double.MIN_VALUE));
    }
}
