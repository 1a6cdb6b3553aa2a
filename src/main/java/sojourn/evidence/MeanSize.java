package sojourn.evidence;

import sojourn.inference.Probability;
import sojourn.regime.Emission;
import sojourn.regime.StudentT;

/**
 * E|Y + d| for Y of one regime about its mean: d (2 F(d) - 1) + 2 int_d^inf y f(y) dy for a symmetric density f. For a normal the integral is s phi(d / s); for
 * Student's t of scale s, with w = d / s, it is s (nu + w^2) / (nu - 1) times the standard density at w.
 */
final class MeanSize {
    private static final double ROOT_TWO_PI = 2.5066282746310002;
    private static final double HALF_LN_PI = 0.5723649429247001;

    private MeanSize() {}

    static double of(Emission emission, int state, double d) {
        if (emission instanceof StudentT student) {
            double nu = student.degreesOfFreedom(state);
            double w = d / student.scale(state);
            double density = StrictMath.exp(sojourn.numeric.GammaRatio.ofHalfStep(0.5 * nu)
                    - 0.5 * StrictMath.log(nu)
                    - HALF_LN_PI
                    - 0.5 * (nu + 1) * StrictMath.log1p(w * w / nu));
            double integral = student.scale(state) * (nu + w * w) / (nu - 1) * density;
            return d * (2 * Probability.studentBelow(w, nu) - 1) + 2 * integral;
        }
        double s = emission.standardDeviation(state, 0);
        double w = d / s;
        double integral = s * StrictMath.exp(-0.5 * w * w) / ROOT_TWO_PI;
        return d * (2 * Probability.normalBelow(w) - 1) + 2 * integral;
    }

    /** The regime's own kurtosis: 3 for a normal, infinity where it does not exist. */
    static double kurtosis(Emission emission, int state) {
        if (emission instanceof StudentT student) {
            double nu = student.degreesOfFreedom(state);
            return nu > 4 ? 3 * (nu - 2) / (nu - 4) : Double.POSITIVE_INFINITY;
        }
        return 3;
    }
}
