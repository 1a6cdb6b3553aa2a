package sojourn.world;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import org.apache.commons.math3.distribution.PascalDistribution;
import org.junit.jupiter.api.Test;
import sojourn.numeric.RandomStream;

class StayTest {
    /** Rounding of a product of a few hundred factors. */
    private static final double RELATIVE = 1e-11;

    /** Standard errors that a correct drawing strays beyond once in 16 000 tests. */
    private static final double SIGMAS = 4;

    @Test
    void withShapeOneAndShortestOneItIsTheStayOfAMarkovChain() {
        Stay stay = new Stay(1, 25, 1);
        for (int bars : new int[] {1, 2, 3, 10, 100, 300}) {
            double geometric = StrictMath.pow(1 - 1 / 25.0, bars - 1) / 25; // a chain that leaves with probability 1/25
            assertThat(stay.probability(bars)).isCloseTo(geometric, within(RELATIVE * geometric));
        }
    }

    @Test
    void agreesWithAnIndependentNegativeBinomial() {
        Stay stay = new Stay(15, 60, 3);
        PascalDistribution pascal =
                new PascalDistribution(3, 3.0 / (3 + 45)); // commons-math3, own series of logarithms
        for (int bars : new int[] {15, 16, 20, 60, 150, 400}) {
            double expected = pascal.probability(bars - 15);
            assertThat(stay.probability(bars)).isCloseTo(expected, within(1e-9 * expected));
        }
        assertThat(stay.probability(14)).isZero();
    }

    @Test
    void probabilitiesSumToOneAndHaveTheStatedMean() {
        Stay stay = new Stay(10, 80, 2.5);
        double sum = 0;
        double mean = 0;
        for (int bars = 1; bars < 3000; bars++) {
            sum += stay.probability(bars);
            mean += bars * stay.probability(bars);
        }
        assertThat(sum).isCloseTo(1, within(1e-12));
        assertThat(mean).isCloseTo(80, within(1e-9));
    }

    @Test
    void drawsHaveTheStatedMeanAndVariance() {
        Stay stay = new Stay(20, 240, 2);
        RandomStream random = RandomStream.of(7, "stay test");
        int n = 20_000;
        double sum = 0;
        double squares = 0;
        for (int i = 0; i < n; i++) {
            double bars = stay.draw(random);
            sum += bars;
            squares += bars * bars;
        }
        double mean = sum / n;
        double variance = squares / n - mean * mean;
        double stated = 220 + 220.0 * 220 / 2; // m + m²/r of a negative binomial
        assertThat(mean).isCloseTo(240, within(SIGMAS * Math.sqrt(stated / n)));
        // Excess kurtosis of a negative binomial is 6/r + q²/((1-q) r) < 3.1 here, so the variance's standard error is
        // about its size times sqrt((2 + 3.1) / n).
        assertThat(variance).isCloseTo(stated, within(SIGMAS * stated * Math.sqrt(5.1 / n)));
    }

    @Test
    void aStayThatCannotVaryIsItsMean() {
        Stay stay = new Stay(30, 30, 2);
        RandomStream random = RandomStream.of(7, "fixed stay");
        for (int i = 0; i < 50; i++) {
            assertThat(stay.draw(random)).isEqualTo(30);
        }
    }

    @Test
    void theChanceOfLeavingRisesWithAgeUnlikeAMarkovChains() {
        Stay markov = new Stay(1, 60, 1);
        Stay stormy = new Stay(15, 60, 3);
        assertThat(hazard(markov, 5)).isCloseTo(1 / 60.0, within(1e-9));
        assertThat(hazard(markov, 200)).isCloseTo(1 / 60.0, within(1e-9));
        assertThat(hazard(stormy, 14)).isZero();
        assertThat(hazard(stormy, 20)).isLessThan(hazard(stormy, 60) / 3);
        assertThat(hazard(stormy, 60)).isGreaterThan(1 / 60.0);
        assertThat(hazard(stormy, 200)).isGreaterThan(hazard(stormy, 60));
    }

    @Test
    void boundsAreHeld() {
        assertThatThrownBy(() -> new Stay(0, 10, 1)).hasMessageContaining("shortestBars is 0");
        assertThatThrownBy(() -> new Stay(1, Double.NaN, 1)).hasMessageContaining("meanBars is NaN");
        assertThatThrownBy(() -> new Stay(1, 10, 0)).hasMessageContaining("shape is 0");
    }

    /** P(stay = bars) / P(stay >= bars), the tail summed to where nothing is left. */
    private static double hazard(Stay stay, int bars) {
        double tail = 0;
        for (int b = 3000; b >= bars; b--) {
            tail += stay.probability(b);
        }
        return stay.probability(bars) / tail;
    }
}
