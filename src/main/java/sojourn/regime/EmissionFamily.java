package sojourn.regime;

import java.util.List;
import java.util.OptionalDouble;
import sojourn.numeric.Check;

/**
 * The family of distributions that a regime's observations come from.
 *
 * @param form the distribution
 * @param fixedDegreesOfFreedom of Student-t emissions, the same in every regime; empty where they are estimated, or are none
 */
public record EmissionFamily(Form form, OptionalDouble fixedDegreesOfFreedom) {
    /** Fewest degrees of freedom of a fit: at 2 the variance is infinite. */
    public static final double LEAST_DEGREES_OF_FREEDOM = 2.05;
    /** Most degrees of freedom of a fit: practically normal. */
    public static final double MOST_DEGREES_OF_FREEDOM = 200;

    /** Normal, each regime with its own mean and standard deviation. */
    public static final EmissionFamily NORMAL = new EmissionFamily(Form.NORMAL, OptionalDouble.empty());
    /** Normal, of several series independent within a regime; of one series the same as {@link #NORMAL}. */
    public static final EmissionFamily NORMAL_DIAGONAL =
            new EmissionFamily(Form.NORMAL_DIAGONAL, OptionalDouble.empty());
    /** Normal with mean zero in every regime: only the volatility changes. */
    public static final EmissionFamily NORMAL_ZERO_MEAN =
            new EmissionFamily(Form.NORMAL_ZERO_MEAN, OptionalDouble.empty());
    /** Normal with one standard deviation for all regimes: only the mean changes. */
    public static final EmissionFamily NORMAL_TIED = new EmissionFamily(Form.NORMAL_TIED, OptionalDouble.empty());
    /** Student-t, each regime with its own mean, scale and degrees of freedom. */
    public static final EmissionFamily STUDENT_T = new EmissionFamily(Form.STUDENT_T, OptionalDouble.empty());

    private static final List<EmissionFamily> VALUES =
            List.of(NORMAL, NORMAL_DIAGONAL, NORMAL_ZERO_MEAN, NORMAL_TIED, STUDENT_T);

    /** The kinds of distribution. */
    public enum Form {
        /** Mean and standard deviation free; of several series the correlations too. */
        NORMAL("normal"),
        /** Mean and standard deviation free, correlations zero. */
        NORMAL_DIAGONAL("normal-diagonal"),
        /** Mean zero. */
        NORMAL_ZERO_MEAN("normal-zero-mean"),
        /** One standard deviation. */
        NORMAL_TIED("normal-tied"),
        /** Fat tails. */
        STUDENT_T("student-t");

        private final String word;

        Form(String word) {
            this.word = word;
        }
    }

    /** Refuses degrees of freedom outside 2.05 to 200, and any for a normal. */
    public EmissionFamily {
        Check.that(fixedDegreesOfFreedom.isEmpty() || form == Form.STUDENT_T, form.word + " has no degrees of freedom");
        fixedDegreesOfFreedom.ifPresent(
                nu -> Check.within(nu, LEAST_DEGREES_OF_FREEDOM, MOST_DEGREES_OF_FREEDOM, "degrees of freedom"));
    }

    /** Every family of which nothing is fixed in advance. */
    public static List<EmissionFamily> values() {
        return VALUES;
    }

    /** Student-t with given degrees of freedom in every regime. */
    public static EmissionFamily studentT(double degreesOfFreedom) {
        return new EmissionFamily(Form.STUDENT_T, OptionalDouble.of(degreesOfFreedom));
    }

    /** The word of the strategy file. */
    public String word() {
        return form.word;
    }

    /** Whether the means are estimated. */
    boolean estimatesMeans() {
        return form != Form.NORMAL_ZERO_MEAN;
    }

    /** Whether each regime has degrees of freedom, given or estimated. */
    boolean fatTailed() {
        return form == Form.STUDENT_T;
    }

    /** Whether it can be the distribution of several series at once. */
    public boolean multivariate() {
        return form == Form.NORMAL || form == Form.NORMAL_DIAGONAL;
    }

    /** Whether there can be a prior on its variances: it has one of each regime, and nothing else of scale. */
    public boolean takesPrior() {
        return form == Form.NORMAL || form == Form.NORMAL_ZERO_MEAN;
    }

    /** Number of free parameters of that many regimes of one series. */
    int parameterCount(int states) {
        return parameterCount(states, 1);
    }

    /** Number of free parameters of that many regimes of so many series. */
    int parameterCount(int states, int dimension) {
        Check.that(dimension == 1 || multivariate(), form.word + " emissions of dimension " + dimension);
        return switch (form) {
            case NORMAL -> states * (dimension + dimension * (dimension + 1) / 2);
            case NORMAL_DIAGONAL -> 2 * states * dimension;
            case NORMAL_ZERO_MEAN -> states;
            case NORMAL_TIED -> states + 1;
            case STUDENT_T -> fixedDegreesOfFreedom.isPresent() ? 2 * states : 3 * states;
        };
    }

    /**
     * The emission with those parameters; what the family does not have is ignored, and of tied deviations the first counts.
     *
     * @param scales standard deviations; for Student-t the scale parameters
     */
    Emission emission(double[] means, double[] scales, double[] degreesOfFreedom) {
        return switch (form) {
            case NORMAL, NORMAL_DIAGONAL -> Normal.of(means, scales);
            case NORMAL_ZERO_MEAN -> Normal.zeroMean(scales);
            case NORMAL_TIED -> Normal.tied(means, scales[0]);
            case STUDENT_T -> StudentT.of(this, means, scales, degreesOfFreedom);
        };
    }
}
