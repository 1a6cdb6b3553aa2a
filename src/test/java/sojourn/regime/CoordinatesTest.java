package sojourn.regime;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import sojourn.numeric.RandomStream;

/** The gradient of the search against differences of the likelihood, and the algebra around it. */
class CoordinatesTest {
    private static final int ROWS = 200;
    private static final double STEP = 1e-5;
    /** Error of a central difference: the third derivative times the step's square, and rounding by the step. */
    private static final double DIFFERENCES = 1e-6;

    record Case(EmissionFamily family, ModelKind kind, InitialDistribution initial, int states) {}

    static List<Case> cases() {
        List<Case> cases = new ArrayList<>();
        for (EmissionFamily family : EmissionFamily.values()) {
            for (int states = 2; states <= 4; states++) {
                if (family.multivariate() && family.form() != EmissionFamily.Form.NORMAL) {
                    continue;
                }
                cases.add(new Case(family, ModelKind.HIDDEN_MARKOV, InitialDistribution.FREE, states));
                cases.add(new Case(family, ModelKind.HIDDEN_MARKOV, InitialDistribution.STATIONARY, states));
                cases.add(new Case(family, ModelKind.MIXTURE, InitialDistribution.FREE, states));
            }
        }
        return cases;
    }

    @ParameterizedTest
    @MethodSource("cases")
    void gradientIsThatOfTheLikelihood(Case c) {
        Window window = window(c.family());
        Parameters p = parameters(c);
        Objective objective = new Objective(p, window, c.family(), c.initial());
        objective.at(p);
        Coordinates coordinates = new Coordinates(p, c.family(), c.initial());
        double[] place = coordinates.of(p);
        double[] gradient = coordinates.gradient(place, p, objective.sums());
        for (int i = 0; i < place.length; i++) {
            double slope = (moved(objective, coordinates, place, p, i, STEP)
                            - moved(objective, coordinates, place, p, i, -STEP))
                    / (2 * STEP);
            assertThat(gradient[i])
                    .as("coordinate %d", i)
                    .isCloseTo(slope, within(DIFFERENCES * (1 + StrictMath.abs(slope))));
        }
    }

    @ParameterizedTest
    @MethodSource("cases")
    void coordinatesLeadBackToTheModel(Case c) {
        Parameters p = parameters(c);
        Coordinates coordinates = new Coordinates(p, c.family(), c.initial());
        Parameters again = coordinates.model(coordinates.of(p), p);
        for (int e = 0; e < p.size(); e++) {
            assertThat(again.at(e)).isCloseTo(p.at(e), within(1e-12 * (1 + StrictMath.abs(p.at(e)))));
        }
    }

    /** The secant equation: what was learnt last is reproduced (Nocedal and Wright 2006, eq. 6.6). */
    @Test
    void curvatureReproducesWhatItLearntLast() {
        Curvature curvature = new Curvature(new double[] {1, 2, 3});
        double[] step = {0.3, -0.1, 0.2};
        curvature.learn(new double[] {1, 0, 0.5}, new double[] {2, 0.1, 0.4});
        double[] fall = {0.5, -0.4, 0.3};
        curvature.learn(step, fall);
        double[] reproduced = curvature.step(fall);
        for (int i = 0; i < 3; i++) {
            assertThat(reproduced[i]).isCloseTo(step[i], within(1e-14));
        }
    }

    @Test
    void aStepThatCurvesTheWrongWayTeachesNothing() {
        Curvature curvature = new Curvature(new double[] {1, 2});
        curvature.learn(new double[] {1, 1}, new double[] {-1, 0});
        assertThat(curvature.step(new double[] {1, 1})).containsExactly(1, 0.5);
    }

    private static double moved(
            Objective objective, Coordinates coordinates, double[] place, Parameters p, int i, double by) {
        double[] there = place.clone();
        there[i] += by;
        return objective.at(coordinates.model(there, p));
    }

    private static Window window(EmissionFamily family) {
        RandomStream random = RandomStream.of(41, "gradient");
        double[] values = new double[ROWS];
        boolean[] missing = new boolean[ROWS];
        for (int t = 0; t < ROWS; t++) {
            values[t] = random.nextNormal() * (t / 50 % 2 == 0 ? 1 : 3);
            missing[t] = t % 9 == 3;
        }
        return Window.of(Observations.of(1, values, missing), family);
    }

    private static Parameters parameters(Case c) {
        RandomStream random = RandomStream.of(42, "gradient");
        HiddenMarkov chain = Fixtures.randomModel(c.states(), random);
        Parameters p = Parameters.blank(c.kind(), c.states(), c.family());
        for (int k = 0; k < c.states(); k++) {
            double deviation = c.family().form() == EmissionFamily.Form.NORMAL_TIED ? 0.9 : 0.5 + 0.6 * k;
            p.set(p.initial(k), chain.initial(k));
            p.set(p.mean(k), c.family().estimatesMeans() ? 0.3 * k - 0.2 : 0);
            p.set(p.variance(k), deviation * deviation);
            if (c.family().fatTailed()) {
                p.set(p.degreesOfFreedom(k), 4 + 3 * k);
            }
            for (int j = 0; c.kind() == ModelKind.HIDDEN_MARKOV && j < c.states(); j++) {
                p.set(p.transition(k, j), chain.transition(k, j));
            }
        }
        return p;
    }
}
