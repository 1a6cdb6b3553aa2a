package sojourn.world;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.time.DayOfWeek;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;

class TruePathTest {
    private static final double SIGMAS = 4;
    private static final int SEEDS = 60;
    private static final List<String> STATES = List.of("calm", "unsettled", "stormy");

    /**
     * Renewal theory: a state's share of time is its share of visits times its mean stay. The visits' shares solve
     * c = 0.6 u + 0.3 s, u = 0.8 c + 0.7 s, s = 0.2 c + 0.4 u: with c = 1, u = 0.94 / 0.72 and s = 0.52 / 0.72.
     */
    private static final double[] SHARES = shares(240, 80 * 0.94 / 0.72, 60 * 0.52 / 0.72);

    @Test
    void statesHaveTheSharesThatTheirStaysAndSuccessorsImply() {
        double[][] shares = new double[3][SEEDS];
        for (int seed = 0; seed < SEEDS; seed++) {
            WorldTruth truth = TruePath.draw(Worlds.skerry().withYears(100).withSeed(1000 + seed));
            for (int bar = 0; bar < truth.size(); bar++) {
                shares[truth.stateIndex(bar)][seed] += 1.0 / truth.size();
            }
        }
        for (int k = 0; k < 3; k++) {
            double mean = mean(shares[k]);
            double standardError = standardDeviation(shares[k]) / Math.sqrt(SEEDS);
            assertThat(standardError).isLessThan(0.01);
            assertThat(mean).as(STATES.get(k)).isCloseTo(SHARES[k], within(SIGMAS * standardError));
        }
    }

    @Test
    void completedStaysHaveTheStatedMeansAndSuccessorsTheStatedFrequencies() {
        Map<String, List<Double>> stays = new LinkedHashMap<>();
        Map<String, Integer> moves = new LinkedHashMap<>();
        for (int seed = 0; seed < SEEDS; seed++) {
            WorldTruth truth = TruePath.draw(Worlds.skerry().withYears(100).withSeed(2000 + seed));
            int entered = 0;
            for (int bar = 1; bar < truth.size(); bar++) {
                if (truth.stateIndex(bar) != truth.stateIndex(bar - 1)) {
                    stays.computeIfAbsent(truth.state(bar - 1), s -> new ArrayList<>())
                            .add((double) bar - entered);
                    moves.merge(truth.state(bar - 1) + " " + truth.state(bar), 1, Integer::sum);
                    entered = bar;
                }
            }
        }
        assertMean(stays, "calm", 240, 20, 2);
        assertMean(stays, "unsettled", 80, 10, 2);
        assertMean(stays, "stormy", 60, 15, 3);
        assertFrequency(moves, "calm unsettled", 0.8, of(stays, "calm").size());
        assertFrequency(moves, "unsettled stormy", 0.4, of(stays, "unsettled").size());
        assertFrequency(moves, "stormy calm", 0.3, of(stays, "stormy").size());
    }

    @Test
    void shortStaysAreMissingWhereAMarkovChainWouldHaveMany() {
        int stays = 0;
        int below = 0;
        for (int seed = 0; seed < 10; seed++) {
            WorldTruth truth = TruePath.draw(Worlds.skerry().withYears(100).withSeed(3000 + seed));
            int entered = 0;
            for (int bar = 1; bar < truth.size(); bar++) {
                if (truth.stateIndex(bar) != truth.stateIndex(bar - 1)) {
                    stays += truth.state(bar - 1).equals("stormy") ? 1 : 0;
                    below += truth.state(bar - 1).equals("stormy") && bar - entered < 15 ? 1 : 0;
                    entered = bar;
                }
            }
        }
        double markov = 1 - StrictMath.pow(1 - 1 / 60.0, 14); // P(stay < 15) of a chain with the same mean
        assertThat(stays * markov).isGreaterThan(50);
        assertThat(below).isZero();
    }

    @Test
    void weekendsAndHolidaysAreAbsentAndNothingElseIs() {
        World world = Worlds.skerry();
        WorldTruth truth = TruePath.draw(world);
        int bar = 0;
        for (var day = world.firstDay(); day.isBefore(world.firstDay().plusYears(24)); day = day.plusDays(1)) {
            boolean weekend = day.getDayOfWeek().compareTo(DayOfWeek.FRIDAY) > 0;
            if (!weekend && !world.holidays().include(day)) {
                assertThat(truth.date(bar)).isEqualTo(day);
                bar++;
            }
        }
        assertThat(truth.size()).isEqualTo(bar);
    }

    @Test
    void theFirstStayIsOfTheStateItStartsIn() {
        assertThat(TruePath.draw(Worlds.skerry()).state(0)).isEqualTo("calm");
    }

    private static void assertMean(
            Map<String, List<Double>> stays, String state, double mean, double shortest, double shape) {
        List<Double> found = of(stays, state);
        double excess = mean - shortest;
        double standardError = Math.sqrt((excess + excess * excess / shape) / found.size());
        assertThat(found).hasSizeGreaterThan(2000);
        // The stay that the end of the world cuts off is left out, and longer stays are cut off more often: at most
        // SEEDS stays among all, each longer than the mean by less than the mean.
        double bias = mean * SEEDS / found.size();
        assertThat(found.stream().mapToDouble(Double::doubleValue).average().orElseThrow())
                .isCloseTo(mean, within(SIGMAS * standardError + bias));
    }

    private static List<Double> of(Map<String, List<Double>> stays, String state) {
        return stays.getOrDefault(state, List.of());
    }

    private static void assertFrequency(Map<String, Integer> moves, String move, double probability, int trials) {
        double frequency = (double) moves.getOrDefault(move, 0) / trials;
        double standardError = Math.sqrt(probability * (1 - probability) / trials);
        assertThat(frequency).as(move).isCloseTo(probability, within(SIGMAS * standardError));
    }

    private static double[] shares(double... times) {
        double sum = times[0] + times[1] + times[2];
        return new double[] {times[0] / sum, times[1] / sum, times[2] / sum};
    }

    private static double mean(double[] x) {
        double sum = 0;
        for (double value : x) {
            sum += value;
        }
        return sum / x.length;
    }

    private static double standardDeviation(double[] x) {
        double squares = 0;
        for (double value : x) {
            squares += (value - mean(x)) * (value - mean(x));
        }
        return Math.sqrt(squares / (x.length - 1));
    }
}
