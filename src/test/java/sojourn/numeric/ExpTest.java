package sojourn.numeric;

import static org.assertj.core.api.Assertions.assertThat;

import org.junit.jupiter.api.Test;

/** Oracle: {@code StrictMath.exp}, which is fdlibm and within 1 unit in the last place of the true value. */
class ExpTest {
    private static final double MOST_ULPS = 2;

    @Test
    void staysWithinTwoUlpsOverTheWholeRange() {
        RandomStream random = RandomStream.of(7, "exp");
        double worst = 0;
        for (int i = 0; i < 200_000; i++) {
            double x = -746 + random.nextDouble() * (710 + 746);
            worst = Math.max(worst, ulps(x));
        }
        for (double x = -2; x <= 2; x += 1.0 / 65_536) {
            worst = Math.max(worst, ulps(x));
        }
        assertThat(worst).isLessThanOrEqualTo(MOST_ULPS);
    }

    @Test
    void underflowsGraduallyAndThenToZero() {
        for (double x = -750; x < -700; x += 1.0 / 1024) {
            assertThat(ulps(x)).as("exp(%s)", x).isLessThanOrEqualTo(MOST_ULPS);
        }
        assertThat(Exp.of(-746)).isZero();
        assertThat(Exp.of(-1e300)).isZero();
        assertThat(Exp.of(Double.NEGATIVE_INFINITY)).isZero();
    }

    @Test
    void overflowsToInfinity() {
        assertThat(Exp.of(709.78)).isFinite();
        assertThat(Exp.of(709.79)).isInfinite();
        assertThat(Exp.of(Double.POSITIVE_INFINITY)).isEqualTo(Double.POSITIVE_INFINITY);
    }

    @Test
    void isExactAtZeroAndKeepsNaN() {
        assertThat(Exp.of(0.0)).isEqualTo(1.0);
        assertThat(Exp.of(-0.0)).isEqualTo(1.0);
        assertThat(Exp.of(Double.NaN)).isNaN();
    }

    @Test
    void powersOfTwoAreExact() {
        for (int k = Double.MIN_EXPONENT; k <= Double.MAX_EXPONENT; k++) {
            assertThat(Exp.powerOfTwo(k)).isEqualTo(Math.scalb(1.0, k));
        }
    }

    private static double ulps(double x) {
        double expected = StrictMath.exp(x);
        double got = Exp.of(x);
        return got == expected ? 0 : Math.abs(got - expected) / Math.ulp(expected);
    }

    /** The error of a Taylor series to the ninth power at x / 1024, and ten squarings that double a rounding error each. */
    @Test
    void squaringAgreesWithTheStrictExponential() {
        for (double[] limit : new double[][] {{40, 4e-13}, {-100, 4e-13}, {-230, 1e-9}, {-700, 2e-5}}) {
            int count = 20_001;
            double[] exponential = new double[count];
            for (int i = 0; i < count; i++) {
                exponential[i] = limit[0] * i / (count - 1);
            }
            Exp.bySquaring(exponential);
            for (int i = 0; i < count; i++) {
                double expected = StrictMath.exp(limit[0] * i / (count - 1));
                assertThat(Math.abs(exponential[i] - expected)).isLessThanOrEqualTo(limit[1] * expected);
            }
            assertThat(exponential[0]).isEqualTo(1);
        }
    }

    /** Vector instructions or not, a number's place in the array does not matter. */
    @Test
    void squaringDoesNotDependOnThePlace() {
        double[] many = new double[5000];
        for (int i = 0; i < many.length; i++) {
            many[i] = -0.013 * i;
        }
        for (int round = 0; round < 500; round++) { // until it is compiled
            double[] again = many.clone();
            Exp.bySquaring(again);
            for (int i = round; i < many.length; i += 501) {
                double[] one = {many[i]};
                Exp.bySquaring(one);
                assertThat(again[i]).isEqualTo(one[0]);
            }
        }
    }
}
