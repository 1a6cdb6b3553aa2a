package sojourn.evidence;

import java.util.Optional;
import sojourn.inference.Estimate;
import sojourn.regime.Emission;
import sojourn.regime.LongRun;
import sojourn.regime.RegimeModel;
import sojourn.regime.StudentT;

/**
 * What a model says of its observations in the long run, whatever any sample showed. With pi the stationary distribution, d_k = mean_k - pi mean
 * and s2_k the variance in regime k: m2 = sum pi (s2 + d^2), m3 = sum pi (3 d s2 + d^3), m4 = sum pi (f s2^2 + 6 d^2 s2 + d^4), f the regime's own kurtosis: 3 for a
 * normal, 3 (nu - 2) / (nu - 4) for Student's t, infinite for nu up to 4. Kurtosis m4 / m2^2. Autocorrelation of the squared deviations
 * [(pi q) A^h q - m2^2] / (m4 - m2^2), q_k = s2_k + d_k^2; of their sizes [(pi b) A^h b - (pi b)^2] / (m2 - (pi b)^2), b_k = E|x - pi mean| in regime k. An independent
 * mixture has both 0. Timmermann (2000), J. Econometrics 96, 75-111; Rydén, Teräsvirta and Åsbrink (1998), J. Applied Econometrics 13, 217-244.
 */
public final class ImpliedMoments {
    private static final Estimate NO_FOURTH = new Estimate.Undefined(
            Estimate.Reason.NOT_APPLICABLE,
            "a regime has 4 or fewer degrees of freedom, so that its kurtosis is infinite");

    private static final Estimate NO_THIRD = new Estimate.Undefined(
            Estimate.Reason.NOT_APPLICABLE, "a regime has 3 or fewer degrees of freedom, so that it has no skewness");

    private final RegimeModel model;
    private final double[] longRun;
    private final double[] squares;
    private final double[] sizes;
    private final double m2;
    private final double m3;
    private final double m4;
    private final double meanSize;

    private ImpliedMoments(RegimeModel model, double[] longRun) {
        Emission emission = model.emission();
        int states = model.states();
        double mean = 0;
        for (int k = 0; k < states; k++) {
            mean += longRun[k] * emission.mean(k, 0);
        }
        double second = 0;
        double third = 0;
        double fourth = 0;
        double size = 0;
        this.squares = new double[states];
        this.sizes = new double[states];
        for (int k = 0; k < states; k++) {
            if (longRun[k] == 0) {
                continue; // a regime that is left for good adds nothing, not even if its kurtosis is infinite
            }
            double d = emission.mean(k, 0) - mean;
            double s2 = emission.standardDeviation(k, 0) * emission.standardDeviation(k, 0);
            squares[k] = s2 + d * d;
            sizes[k] = MeanSize.of(emission, k, d);
            second += longRun[k] * squares[k];
            third += longRun[k] * (3 * d * s2 + d * d * d);
            fourth += longRun[k] * (MeanSize.kurtosis(emission, k) * s2 * s2 + 6 * d * d * s2 + d * d * d * d);
            size += longRun[k] * sizes[k];
        }
        this.model = model;
        this.longRun = longRun;
        this.m2 = second;
        this.m3 = third;
        this.m4 = fourth;
        this.meanSize = size;
    }

    /** Of the first number that the model describes; nothing where the chain has no single long run. */
    static Answer<ImpliedMoments> of(RegimeModel model) {
        Optional<double[]> longRun = LongRun.stationary(model);
        return longRun.isPresent()
                ? Answer.of(new ImpliedMoments(model, longRun.get()))
                : Answer.none("the chain of regimes has no single long run");
    }

    /** m3 / m2^1.5. Does not exist where a regime's tails are too fat. */
    public Estimate skewness() {
        return thirdExists() ? Estimate.of(m3 / (m2 * Math.sqrt(m2))) : NO_THIRD;
    }

    private boolean thirdExists() {
        boolean exists = true;
        if (model.emission() instanceof StudentT student) {
            for (int k = 0; k < longRun.length; k++) {
                exists &= student.degreesOfFreedom(k) > 3 || longRun[k] == 0;
            }
        }
        return exists;
    }

    /** m4 / m2^2, 3 for a normal. Does not exist where a regime's tails are too fat. */
    public Estimate kurtosis() {
        return Double.isFinite(m4) ? Estimate.of(m4 / (m2 * m2)) : NO_FOURTH;
    }

    /** Autocorrelation of the squared deviations from the mean at {@code lag} of at least 1. */
    public Estimate ofSquares(int lag) {
        return Double.isFinite(m4) ? Estimate.of((lagged(squares, lag) - m2 * m2) / (m4 - m2 * m2)) : NO_FOURTH;
    }

    /** Autocorrelation of the sizes of the deviations from the mean at {@code lag} of at least 1. */
    public Estimate ofSizes(int lag) {
        double square = meanSize * meanSize;
        return Estimate.of((lagged(sizes, lag) - square) / (m2 - square));
    }

    /** (pi v) A^lag v. */
    private double lagged(double[] values, int lag) {
        double[] ahead = values.clone();
        for (int step = 0; step < lag; step++) {
            double[] next = new double[ahead.length];
            for (int i = 0; i < ahead.length; i++) {
                for (int j = 0; j < ahead.length; j++) {
                    next[i] += model.transition(i, j) * ahead[j];
                }
            }
            ahead = next;
        }
        double sum = 0;
        for (int k = 0; k < ahead.length; k++) {
            sum += longRun[k] * values[k] * ahead[k];
        }
        return sum;
    }
}
