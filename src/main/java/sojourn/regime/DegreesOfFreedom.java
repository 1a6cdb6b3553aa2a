package sojourn.regime;

import sojourn.numeric.Digamma;

/**
 * The degrees of freedom nu of one regime in the maximisation step: the root of -psi(nu/2) + ln(nu/2) + 1 + c + psi((old + 1)/2) -
 * ln((old + 1)/2), c being the weighted mean of ln u - u, u = (old + 1) / (old + d^2). The left side falls in nu, so a root outside
 * [2.05, 200] gives the nearer bound. Source: Peel and McLachlan (2000), Statistics and Computing 10, 339-348, eq. 31.
 */
final class DegreesOfFreedom {
    private static final int MOST_HALVINGS = 60;

    private DegreesOfFreedom() {}

    /**
     * Bisection of ln nu to the last bits.
     *
     * @param old the degrees of freedom that the weights were taken at
     * @param meanLogWeight weighted mean of ln u - u
     */
    static double next(double old, double meanLogWeight) {
        double half = 0.5 * (old + 1);
        double constant = 1 + meanLogWeight + Digamma.of(half) - StrictMath.log(half);
        double low = EmissionFamily.LEAST_DEGREES_OF_FREEDOM;
        double high = EmissionFamily.MOST_DEGREES_OF_FREEDOM;
        if (!(slope(low, constant) > 0)) {
            return low;
        }
        if (!(slope(high, constant) < 0)) {
            return high;
        }
        for (int step = 0; step < MOST_HALVINGS; step++) {
            double middle = Math.sqrt(low * high);
            if (middle <= low || middle >= high) {
                break;
            }
            if (slope(middle, constant) > 0) {
                low = middle;
            } else {
                high = middle;
            }
        }
        return Math.sqrt(low * high);
    }

    private static double slope(double nu, double constant) {
        return constant - Digamma.of(0.5 * nu) + StrictMath.log(0.5 * nu);
    }
}
