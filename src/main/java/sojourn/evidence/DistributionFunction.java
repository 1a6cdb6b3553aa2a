package sojourn.evidence;

import java.util.Optional;
import sojourn.inference.Probability;
import sojourn.regime.Emission;
import sojourn.regime.Normal;
import sojourn.regime.StudentT;

/** P(X &lt;= x) of one observed number in one regime. */
interface DistributionFunction {
    /** The probability of at most {@code x} in regime {@code state}. */
    double below(int state, double x);

    /** That of an emission; empty for one of several numbers, whose order is not one. */
    static Optional<DistributionFunction> of(Emission emission) {
        if (emission.dimension() != 1) {
            return Optional.empty();
        }
        if (emission instanceof StudentT student) {
            return Optional.of((state, x) -> Probability.studentBelow(
                    (x - student.mean(state, 0)) / student.scale(state), student.degreesOfFreedom(state)));
        }
        if (emission instanceof Normal normal) {
            return Optional.of((state, x) ->
                    Probability.normalBelow((x - normal.mean(state, 0)) / normal.standardDeviation(state, 0)));
        }
        return Optional.empty();
    }
}
