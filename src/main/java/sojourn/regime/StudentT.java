package sojourn.regime;

import java.util.Arrays;
import sojourn.numeric.Check;
import sojourn.numeric.GammaRatio;

/**
 * Student-t emissions of one number, by {@code StrictMath}: log f_k(x) = ln Gamma((nu + 1)/2) - ln Gamma(nu/2) - ln(nu pi)/2 - ln s
 * - (nu + 1)/2 ln(1 + d^2 / nu) with d = (x - mean_k) / s, scale s = s_k and degrees of freedom nu = nu_k. The standard deviation is
 * s sqrt(nu / (nu - 2)). Source: Peel and McLachlan (2000), Statistics and Computing 10, 339-348.
 */
public final class StudentT implements Emission {
    private static final double HALF_LN_PI = 0.5723649429247001;

    private final EmissionFamily family;
    private final double[] means;
    private final double[] scales;
    private final double[] degreesOfFreedom;
    private final double[] logScales;

    private StudentT(EmissionFamily family, double[] means, double[] scales, double[] degreesOfFreedom) {
        this.family = family;
        this.means = means;
        this.scales = scales;
        this.degreesOfFreedom = degreesOfFreedom;
        this.logScales = new double[means.length];
        for (int k = 0; k < means.length; k++) {
            logScales[k] = logConstant(degreesOfFreedom[k]) - StrictMath.log(scales[k]);
        }
    }

    /** One mean (finite), scale (above 0) and number of degrees of freedom (above 2) a regime. Copied; none modified. */
    public static StudentT of(double[] means, double[] scales, double[] degreesOfFreedom) {
        return of(EmissionFamily.STUDENT_T, means, scales, degreesOfFreedom);
    }

    static StudentT of(EmissionFamily family, double[] means, double[] scales, double[] degreesOfFreedom) {
        int states = means.length;
        Check.that(
                states > 0 && scales.length == states && degreesOfFreedom.length == states,
                states + " means, " + scales.length + " scales and " + degreesOfFreedom.length
                        + " numbers of degrees of freedom");
        for (int k = 0; k < states; k++) {
            Check.finite(means[k], "mean of state " + k);
            Check.above(scales[k], 0, "scale of state " + k);
            Check.above(degreesOfFreedom[k], 2, "degrees of freedom of state " + k);
        }
        return new StudentT(family, means.clone(), scales.clone(), degreesOfFreedom.clone());
    }

    /** The same with standard deviations in place of scales. Copied; none modified. */
    public static StudentT withDeviations(double[] means, double[] standardDeviations, double[] degreesOfFreedom) {
        double[] scales = Arrays.copyOf(standardDeviations, standardDeviations.length);
        for (int k = 0; k < scales.length && k < degreesOfFreedom.length; k++) {
            double nu = Check.above(degreesOfFreedom[k], 2, "degrees of freedom of state " + k);
            scales[k] *= Math.sqrt((nu - 2) / nu);
        }
        return of(means, scales, degreesOfFreedom);
    }

    /** The logarithm of the density's constant for scale 1: ln Gamma((nu + 1)/2) - ln Gamma(nu/2) - ln(nu pi)/2. */
    static double logConstant(double nu) {
        return GammaRatio.ofHalfStep(0.5 * nu) - 0.5 * StrictMath.log(nu) - HALF_LN_PI;
    }

    @Override
    public int states() {
        return means.length;
    }

    @Override
    public int dimension() {
        return 1;
    }

    @Override
    public double logDensity(Observations x, int row, int state) {
        double nu = degreesOfFreedom[state];
        double d = (x.at(row, 0) - means[state]) / scales[state];
        return logScales[state] - 0.5 * (nu + 1) * StrictMath.log1p(d * d / nu);
    }

    /** How much a row counts towards a regime's mean and scale: (nu + 1) / (nu + d^2), small for an outlier. */
    double weight(Observations x, int row, int state) {
        double nu = degreesOfFreedom[state];
        double d = (x.at(row, 0) - means[state]) / scales[state];
        return (nu + 1) / (nu + d * d);
    }

    @Override
    public double mean(int state, int column) {
        Check.within(column, 0, 0, "column");
        return means[state];
    }

    @Override
    public double standardDeviation(int state, int column) {
        Check.within(column, 0, 0, "column");
        double nu = degreesOfFreedom[state];
        return scales[state] * Math.sqrt(nu / (nu - 2));
    }

    /** The scale parameter of one regime, smaller than its standard deviation. */
    public double scale(int state) {
        return scales[state];
    }

    /** The degrees of freedom of one regime. */
    public double degreesOfFreedom(int state) {
        return degreesOfFreedom[state];
    }

    @Override
    public int parameterCount() {
        return family.parameterCount(states());
    }

    @Override
    public StudentT ordered(int[] order) {
        return new StudentT(
                family, Order.apply(order, means), Order.apply(order, scales), Order.apply(order, degreesOfFreedom));
    }
}
