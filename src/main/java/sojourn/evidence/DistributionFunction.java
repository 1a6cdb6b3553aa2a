package sojourn.evidence;

import sojourn.inference.Probability;
import sojourn.regime.Emission;
import sojourn.regime.StudentT;

/** P(X &lt;= x) of one observed number in one regime; of several, the first, whatever the others are. */
interface DistributionFunction {
    /** The probability of at most {@code x} in regime {@code state}. */
    double below(int state, double x);

    /** That of an emission; of several normal numbers, the first is normal by itself. */
    static DistributionFunction of(Emission emission) {
        if (emission instanceof StudentT student) {
            return (state, x) -> Probability.studentBelow(
                    (x - student.mean(state, 0)) / student.scale(state), student.degreesOfFreedom(state));
        }
        return (state, x) ->
                Probability.normalBelow((x - emission.mean(state, 0)) / emission.standardDeviation(state, 0));
    }
}
