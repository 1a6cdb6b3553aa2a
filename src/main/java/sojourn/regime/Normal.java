package sojourn.regime;

import java.util.Arrays;
import sojourn.numeric.Check;

/**
 * Normal emissions of one number: log f_k(x) = -ln(2 pi)/2 - ln sd_k - ((x - mean_k) / sd_k)^2 / 2, by {@code StrictMath}.
 */
public final class Normal implements Emission {
    private static final double HALF_LN_TWO_PI = 0.9189385332046727;

    private final EmissionFamily family;
    private final double[] means;
    private final double[] deviations;
    private final double[] logScales;

    private Normal(EmissionFamily family, double[] means, double[] deviations) {
        this.family = family;
        this.means = means;
        this.deviations = deviations;
        this.logScales = new double[means.length];
        for (int k = 0; k < means.length; k++) {
            logScales[k] = -HALF_LN_TWO_PI - StrictMath.log(deviations[k]);
        }
    }

    /** One mean (finite) and one standard deviation (above 0) a regime. Copies its arrays; neither modified. */
    public static Normal of(double[] means, double[] standardDeviations) {
        return checked(EmissionFamily.NORMAL, means.clone(), standardDeviations.clone());
    }

    /** Mean zero in every regime, one standard deviation (above 0) a regime. Copied; not modified. */
    public static Normal zeroMean(double[] standardDeviations) {
        return checked(
                EmissionFamily.NORMAL_ZERO_MEAN, new double[standardDeviations.length], standardDeviations.clone());
    }

    /** One mean a regime, the same standard deviation (above 0) in all. Copied; not modified. */
    public static Normal tied(double[] means, double standardDeviation) {
        double[] deviations = new double[means.length];
        Arrays.fill(deviations, standardDeviation);
        return checked(EmissionFamily.NORMAL_TIED, means.clone(), deviations);
    }

    private static Normal checked(EmissionFamily family, double[] means, double[] deviations) {
        Check.that(
                means.length == deviations.length && means.length > 0,
                means.length + " means and " + deviations.length + " standard deviations");
        for (int k = 0; k < means.length; k++) {
            Check.finite(means[k], "mean of state " + k);
            Check.above(deviations[k], 0, "standard deviation of state " + k);
        }
        return new Normal(family, means, deviations);
    }

    /** Whether the means are free or zero, and the standard deviations free or tied. */
    public EmissionFamily family() {
        return family;
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
        double z = (x.at(row, 0) - means[state]) / deviations[state];
        return logScales[state] - 0.5 * z * z;
    }

    @Override
    public double mean(int state, int column) {
        Check.within(column, 0, 0, "column");
        return means[state];
    }

    @Override
    public double standardDeviation(int state, int column) {
        Check.within(column, 0, 0, "column");
        return deviations[state];
    }

    @Override
    public int parameterCount() {
        return family.parameterCount(states());
    }

    @Override
    public Normal ordered(int[] order) {
        return new Normal(family, Order.apply(order, means), Order.apply(order, deviations));
    }
}
