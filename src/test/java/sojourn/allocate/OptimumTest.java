package sojourn.allocate;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.OptionalDouble;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import sojourn.numeric.RandomStream;
import sojourn.regime.WindowMoments;
import sojourn.walk.Forecast;
import sojourn.walk.Reading;

/**
 * Optimality by its own certificate: w minimises a convex f over a region exactly if no y of the region has g'y below g'w, g the
 * gradient at w. The lowest g'y is found by filling up the most rewarding weights first, which shares nothing with the search.
 */
class OptimumTest {
    private static final long SEED = 20260101;
    /** Of the gap, as a part of the size of the gradient's two terms. */
    private static final double KKT = 1e-10;

    @Test
    void noDirectionWithinTheLimitsImprovesWeightsThatAreBestForReturnAndRisk() {
        RandomStream random = RandomStream.of(SEED, "best trades");
        int bound = 0;
        for (int trial = 0; trial < 3_000; trial++) {
            int n = 1 + trial % 8;
            Problem problem = Problem.random(random, n);
            Limits limits = new Limits(
                    0.2 + 2 * random.nextDouble(),
                    random.nextInt(2) == 0 ? 0 : -random.nextDouble(),
                    0.05 + random.nextDouble());
            Weights found = problem.solve(limits, OptionalDouble.empty());
            double[] gradient = problem.gradient(found);
            double gap = product(gradient, found) - lowest(gradient, limits);
            assertThat(Math.abs(gap)).as("trial %d of seed %d", trial, SEED).isLessThan(KKT * problem.size(found));
            assertThat(limits.bind(found)).as("limits already hold").isEqualTo(found);
            bound += found.gross() > limits.gross() - 1e-9 ? 1 : 0;
        }
        assertThat(bound).as("trials in which gross binds").isBetween(500, 2_900);
    }

    @Test
    void noDirectionLowersTheLeastVarianceOfAStatedSum() {
        RandomStream random = RandomStream.of(SEED, "least variances");
        for (int trial = 0; trial < 2_000; trial++) {
            int n = 1 + trial % 8;
            Problem problem = Problem.random(random, n).withoutReturns();
            double sum = 0.3 + 0.7 * random.nextDouble();
            Limits limits = new Limits(1, 0, Math.max(random.nextDouble(), 1.01 * sum / n));
            Weights found = problem.solve(limits, OptionalDouble.of(sum));
            double[] gradient = problem.gradient(found);
            double gap = product(gradient, found) - lowestOfSum(gradient, limits, sum);
            assertThat(Math.abs(gap)).as("trial %d of seed %d", trial, SEED).isLessThan(KKT * problem.size(found));
            assertThat(Math.abs(found.gross() - sum)).isLessThan(1e-12);
        }
    }

    @Test
    void aCovarianceWithoutInverseHasAReasonAndNoWeights() {
        double[] twins = {1e-4, 1e-4, 1e-4, 1e-4};
        double[] still = {1e-4, 0, 0, 0};
        double[] almost = {1e-4, 1e-4, 1e-4, 1e-4 * (1 + 1e-14)};
        for (double[] covariance : List.of(twins, still, almost)) {
            Problem problem = new Problem(new double[2], covariance, 2);
            Optimum optimum =
                    new Optimum(List.of("a", "b"), List.of("a", "b"), Limits.longOnly(), OptionalDouble.of(1));
            Wish wish = optimum.of(problem.forecast(), 1, new double[2]);
            assertThat(wish).isInstanceOf(Wish.Undefined.class);
            assertThat(((Wish.Undefined) wish).because().sentence())
                    .isEqualTo(
                            "the forecast covariance of a, b has no inverse: one of them hardly moves on its own beyond"
                                    + " the others");
        }
    }

    /** Each weight at the end that lowers g'y most, the largest |g| first, until gross is used up. */
    private static double lowest(double[] g, Limits limits) {
        double left = limits.gross();
        double sum = 0;
        for (int i : order(g, Comparator.comparingDouble(i -> -Math.abs(g[i])))) {
            double most = Math.min(left, g[i] > 0 ? -limits.low() : limits.high());
            sum -= Math.abs(g[i]) * most;
            left -= most;
        }
        return sum;
    }

    /** The sum filled into the lowest g first, long only. */
    private static double lowestOfSum(double[] g, Limits limits, double total) {
        double left = total;
        double sum = 0;
        for (int i : order(g, Comparator.comparingDouble(i -> g[i]))) {
            double most = Math.min(left, limits.high());
            sum += g[i] * most;
            left -= most;
        }
        return sum;
    }

    private static List<Integer> order(double[] g, Comparator<Integer> by) {
        return IntStream.range(0, g.length).boxed().sorted(by).toList();
    }

    private static double product(double[] g, Weights w) {
        double sum = 0;
        for (int i = 0; i < g.length; i++) {
            sum += g[i] * w.at(i);
        }
        return sum;
    }

    /** Random returns and a random covariance whose standard deviations differ a hundredfold. */
    private record Problem(List<Double> mean, List<Double> covariance, int n) {
        Problem(double[] mean, double[] covariance, int n) {
            this(
                    Arrays.stream(mean).boxed().toList(),
                    Arrays.stream(covariance).boxed().toList(),
                    n);
        }

        static Problem random(RandomStream random, int n) {
            double[] mean = new double[n];
            double[][] root = new double[n][n + 1];
            for (int i = 0; i < n; i++) {
                mean[i] = 5e-4 * random.nextNormal();
                double deviation = 0.01 * Math.pow(10, 2 * random.nextDouble() - 1);
                for (int j = 0; j <= n; j++) {
                    root[i][j] = deviation * random.nextNormal();
                }
            }
            double[] covariance = new double[n * n];
            for (int i = 0; i < n; i++) {
                for (int j = 0; j < n; j++) {
                    for (int m = 0; m <= n; m++) {
                        covariance[i * n + j] += root[i][m] * root[j][m] / (n + 1);
                    }
                }
            }
            return new Problem(mean, covariance, n);
        }

        Problem withoutReturns() {
            return new Problem(List.copyOf(Arrays.stream(new double[n]).boxed().toList()), covariance, n);
        }

        Forecast forecast() {
            WindowMoments moments = WindowMoments.of(1, n, new double[] {1}, numbers(mean), numbers(covariance));
            return Reading.of(1, new double[] {1}, new double[] {1}, moments).forecast(1);
        }

        Weights solve(Limits limits, OptionalDouble sum) {
            List<String> names = new ArrayList<>();
            for (int i = 0; i < n; i++) {
                names.add("a" + i);
            }
            Wish wish = new Optimum(names, names, limits, sum).of(forecast(), 3, numbers(mean));
            assertThat(wish).isInstanceOf(Weights.class);
            return (Weights) wish;
        }

        double[] gradient(Weights w) {
            double[] gradient = new double[n];
            for (int i = 0; i < n; i++) {
                gradient[i] = -mean.get(i);
                for (int j = 0; j < n; j++) {
                    gradient[i] += 3 * covariance.get(i * n + j) * w.at(j);
                }
            }
            return gradient;
        }

        /** What the gap is measured against. */
        double size(Weights w) {
            double size = 0;
            for (int i = 0; i < n; i++) {
                double part = Math.abs(mean.get(i));
                for (int j = 0; j < n; j++) {
                    part += Math.abs(3 * covariance.get(i * n + j) * w.at(j));
                }
                size += part;
            }
            return size;
        }

        private static double[] numbers(List<Double> list) {
            return list.stream().mapToDouble(Double::doubleValue).toArray();
        }
    }
}
