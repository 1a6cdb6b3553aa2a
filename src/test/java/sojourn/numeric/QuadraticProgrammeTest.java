package sojourn.numeric;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Optional;
import org.junit.jupiter.api.Test;
import sojourn.numeric.QuadraticProgramme.HalfSpace;

class QuadraticProgrammeTest {
    private static final double ROUNDING = 1e-13;

    @Test
    void withoutConstraintsItSolvesTheLinearSystem() {
        // x'Qx/2 - c'x with Q = {{2, 1}, {1, 2}}, c = (3, 3): Q x = c at (1, 1)
        assertMinimum(new double[] {2, 1, 1, 2}, new double[] {3, 3}, new double[] {1, 1});
    }

    /**
     * The example of Goldfarb and Idnani (1983), quoted from memory and easily redone: along x + y = 2 the objective
     * 2x² - 2xy + 2y² + 6x is 6x² - 6x + 8, lowest at x = 1/2.
     */
    @Test
    void theExampleOfThePaperComesOut() {
        double[] q = {4, -2, -2, 4};
        double[] c = {-6, 0};
        assertMinimum(
                q,
                c,
                new double[] {0.5, 1.5},
                HalfSpace.atLeast(0, 1, 0),
                HalfSpace.atLeast(0, 0, 1),
                HalfSpace.atLeast(2, 1, 1));
    }

    @Test
    void aConstraintThatWasActiveIsLetGoAgain() {
        // nearest point to (0, 0) with x + y >= 2 and 2x + y >= 6: on the second alone, (12/5, 6/5), where the first is
        // slack
        assertMinimum(
                new double[] {1, 0, 0, 1},
                new double[] {0, 0},
                new double[] {2.4, 1.2},
                HalfSpace.atLeast(2, 1, 1),
                HalfSpace.atLeast(6, 2, 1));
    }

    @Test
    void anEmptyRegionHasNoMinimum() {
        Cholesky identity = Cholesky.of(new double[] {1, 0, 0, 1}, 2).orElseThrow();
        HalfSpace[] apart = {HalfSpace.atLeast(1, 1, 0), HalfSpace.atLeast(0, -1, 0)};
        assertThat(QuadraticProgramme.minimum(identity, new double[2], listed(apart)))
                .isEmpty();
    }

    private static void assertMinimum(double[] q, double[] c, double[] expected, HalfSpace... halfSpaces) {
        Cholesky factor = Cholesky.of(q, c.length).orElseThrow();
        double[] found =
                QuadraticProgramme.minimum(factor, c, listed(halfSpaces)).orElseThrow();
        for (int i = 0; i < expected.length; i++) {
            assertThat(found[i]).isCloseTo(expected[i], within(ROUNDING));
        }
    }

    private static QuadraticProgramme.Region listed(HalfSpace... halfSpaces) {
        return (x, slack) -> {
            double worst = slack;
            Optional<HalfSpace> found = Optional.empty();
            for (HalfSpace one : halfSpaces) {
                double violation = one.violation(x);
                if (violation > worst) {
                    worst = violation;
                    found = Optional.of(one);
                }
            }
            return found;
        };
    }
}
