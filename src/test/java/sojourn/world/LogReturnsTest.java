package sojourn.world;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import java.util.List;
import java.util.Map;
import org.apache.commons.math3.distribution.TDistribution;
import org.junit.jupiter.api.Test;

/** A century of Skerry against what its world states, state by state. */
class LogReturnsTest {
    private static final double SIGMAS = 4;
    private static final World WORLD = Worlds.skerry().withYears(100);
    private static final WorldTruth TRUTH = TruePath.draw(WORLD);
    private static final LogReturns RETURNS = LogReturns.draw(WORLD, TRUTH);
    private static final List<String> ASSETS = List.of("stocks", "bonds", "gold");

    @Test
    void meansAndVolatilitiesAreTheStatedOnes() {
        for (String state : TRUTH.states()) {
            // Kurtosis of Student-t: 3 + 6 / (n - 4).
            double kurtosis = 3 + 6.0 / (WORLD.state(state).degreesOfFreedom() - 4);
            for (int a = 0; a < 3; a++) {
                double[] x = of(state, a);
                Move stated = WORLD.state(state).move(ASSETS.get(a));
                double sd = stated.volatilityPercentPerYear() / 100 / Math.sqrt(252);
                assertThat(mean(x))
                        .as(state + " " + ASSETS.get(a))
                        .isCloseTo(stated.driftPercentPerYear() / 100 / 252, within(SIGMAS * sd / Math.sqrt(x.length)));
                assertThat(Math.sqrt(covariance(x, x)))
                        .as(state + " " + ASSETS.get(a))
                        .isCloseTo(sd, within(SIGMAS * sd * Math.sqrt((kurtosis - 1) / (4 * x.length))));
            }
        }
    }

    @Test
    void correlationsAreTheStatedOnesOfEachState() {
        Map<String, double[]> stated = Map.of(
                "calm", new double[] {0.25, 0.05, 0.15},
                "unsettled", new double[] {0, 0, 0.2},
                "stormy", new double[] {-0.4, -0.1, 0.25});
        for (String state : TRUTH.states()) {
            double[] expected = stated.getOrDefault(state, new double[0]);
            assertCorrelation(state, 0, 1, expected[0]);
            assertCorrelation(state, 0, 2, expected[1]);
            assertCorrelation(state, 1, 2, expected[2]);
        }
    }

    @Test
    void tailsAreThoseOfStudentsDistribution() {
        for (String state : TRUTH.states()) {
            int n = WORLD.state(state).degreesOfFreedom();
            TDistribution student = new TDistribution(n);
            for (int a = 0; a < 3; a++) {
                double[] x = of(state, a);
                Move stated = WORLD.state(state).move(ASSETS.get(a));
                for (double far : new double[] {0.5, 1, 2, 3}) {
                    double p = 2 * student.cumulativeProbability(-far * Math.sqrt(n / (n - 2.0)));
                    double beyond = 0;
                    for (double r : x) {
                        double z = (r - stated.driftPercentPerYear() / 100 / 252)
                                / (stated.volatilityPercentPerYear() / 100 / Math.sqrt(252));
                        beyond += Math.abs(z) > far ? 1 : 0;
                    }
                    assertThat(beyond / x.length)
                            .as(state + " " + ASSETS.get(a) + " beyond " + far)
                            .isCloseTo(p, within(SIGMAS * Math.sqrt(p * (1 - p) / x.length)));
                }
            }
        }
    }

    @Test
    void kurtosisLiesAboveANormalsInEveryState() {
        for (String state : TRUTH.states()) {
            for (int a = 0; a < 3; a++) {
                double[] x = of(state, a);
                double centre = mean(x);
                double variance = covariance(x, x);
                double fourth = 0;
                for (double r : x) {
                    double d = (r - centre) * (r - centre);
                    fourth += d * d / x.length;
                }
                // sqrt(24 / n): standard error of a normal sample's kurtosis.
                assertThat(fourth / (variance * variance)).isGreaterThan(3 + SIGMAS * Math.sqrt(24.0 / x.length));
            }
        }
    }

    @Test
    void withinAStateReturnsHaveNoMemory() {
        double[] x = of("calm", 0);
        double centre = mean(x);
        double products = 0;
        for (int i = 1; i < x.length; i++) {
            products += (x[i] - centre) * (x[i - 1] - centre);
        }
        assertThat(products / x.length / covariance(x, x)).isCloseTo(0, within(SIGMAS / Math.sqrt(x.length)));
    }

    private static void assertCorrelation(String state, int a, int b, double expected) {
        double[] x = of(state, a);
        double[] y = of(state, b);
        double found = covariance(x, y) / Math.sqrt(covariance(x, x) * covariance(y, y));
        // Elliptical distributions: variance (1 + k)(1 - rho²)² / n with k = 2 / (dof - 4); Muirhead (1982), section
        // 5.1.
        double excess = 2.0 / (WORLD.state(state).degreesOfFreedom() - 4);
        double standardError = (1 - expected * expected) * Math.sqrt((1 + excess) / x.length);
        assertThat(found).as(state).isCloseTo(expected, within(SIGMAS * standardError));
    }

    private static double[] of(String state, int asset) {
        double[] found = new double[TRUTH.size()];
        int n = 0;
        for (int bar = 0; bar < TRUTH.size(); bar++) {
            if (TRUTH.state(bar).equals(state)) {
                found[n++] = RETURNS.at(bar, asset);
            }
        }
        return Arrays.copyOf(found, n);
    }

    private static double mean(double[] x) {
        double sum = 0;
        for (double value : x) {
            sum += value;
        }
        return sum / x.length;
    }

    private static double covariance(double[] x, double[] y) {
        double meanX = mean(x);
        double meanY = mean(y);
        double sum = 0;
        for (int i = 0; i < x.length; i++) {
            sum += (x[i] - meanX) * (y[i] - meanY);
        }
        return sum / x.length;
    }
}
