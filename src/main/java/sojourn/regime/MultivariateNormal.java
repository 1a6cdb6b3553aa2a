package sojourn.regime;

import sojourn.numeric.Check;
import sojourn.numeric.Cholesky;

/**
 * Normal emissions of several numbers, by {@code StrictMath}: log f_k(x) = -d ln(2 pi)/2 - ln|S_k|/2 - (x - m_k)' S_k^-1 (x - m_k)/2
 * from a Cholesky factor. Of a row with missing numbers the density is that of the numbers that are there: the same formula with
 * their entries of m_k and S_k (Anderson 2003, An Introduction to Multivariate Statistical Analysis, theorem 2.4.3).
 */
public final class MultivariateNormal implements Emission {
    private static final double LN_TWO_PI = 1.8378770664093453;
    /** Two entries that mirror one another differ by less than this times the standard deviations. */
    private static final double SYMMETRY = 1e-9;

    private final EmissionFamily family;
    private final int dimension;
    private final double[] means;
    private final double[] covariances;
    private final Cholesky[] factors;
    private final double[] logDeterminants;

    private MultivariateNormal(EmissionFamily family, int dimension, double[] means, double[] covariances) {
        this.family = family;
        this.dimension = dimension;
        this.means = means;
        this.covariances = covariances;
        this.factors = new Cholesky[means.length / dimension];
        this.logDeterminants = new double[factors.length];
        for (int k = 0; k < factors.length; k++) {
            int state = k;
            factors[k] = Cholesky.of(Order.row(covariances, k, dimension * dimension), dimension)
                    .orElseThrow(() -> new IllegalArgumentException(
                            "the covariance matrix of state " + state + " is not positive definite"));
            logDeterminants[k] = factors[k].logDeterminant();
        }
    }

    /**
     * A covariance matrix a state. Copies its arrays; neither modified.
     *
     * @param means states × dimension, row-major
     * @param covariances states × dimension × dimension, each symmetric and positive definite
     */
    public static MultivariateNormal full(int dimension, double[] means, double[] covariances) {
        int states = checked(dimension, means);
        int square = dimension * dimension;
        Check.that(
                covariances.length == states * square,
                covariances.length + " covariances for " + states + " states of dimension " + dimension);
        for (int e = 0; e < covariances.length; e++) {
            int k = e / square;
            int i = e % square / dimension;
            int j = e % dimension;
            double size = Math.sqrt(covariances[k * square + i * dimension + i])
                    * Math.sqrt(covariances[k * square + j * dimension + j]);
            double mirrored = covariances[k * square + j * dimension + i];
            Check.finite(covariances[e], "covariance of state " + k);
            Check.that(
                    StrictMath.abs(covariances[e] - mirrored) <= SYMMETRY * size,
                    "the covariance matrix of state " + k + " is not symmetric: " + covariances[e] + " and "
                            + mirrored);
        }
        return new MultivariateNormal(EmissionFamily.NORMAL, dimension, means.clone(), covariances.clone());
    }

    /** Independent columns: a standard deviation (above 0) a state and column, as {@code means}. Copied; none modified. */
    public static MultivariateNormal diagonal(int dimension, double[] means, double[] standardDeviations) {
        checked(dimension, means);
        Check.that(
                standardDeviations.length == means.length,
                means.length + " means and " + standardDeviations.length + " standard deviations");
        double[] covariances = new double[means.length * dimension];
        for (int e = 0; e < means.length; e++) {
            double sd = Check.above(standardDeviations[e], 0, "standard deviation of state " + e / dimension);
            covariances[e * dimension + e % dimension] = sd * sd;
        }
        return new MultivariateNormal(EmissionFamily.NORMAL_DIAGONAL, dimension, means.clone(), covariances);
    }

    private static int checked(int dimension, double[] means) {
        Check.within(dimension, 1, Integer.MAX_VALUE, "dimension");
        Check.that(
                means.length > 0 && means.length % dimension == 0,
                means.length + " means for states of dimension " + dimension);
        for (int e = 0; e < means.length; e++) {
            Check.finite(means[e], "mean of state " + e / dimension);
        }
        return means.length / dimension;
    }

    /** Whether the covariances between columns are free or zero. */
    public EmissionFamily family() {
        return family;
    }

    @Override
    public int states() {
        return factors.length;
    }

    @Override
    public int dimension() {
        return dimension;
    }

    @Override
    public double logDensity(Observations x, int row, int state) {
        int[] present = new int[dimension];
        int count = 0;
        for (int i = 0; i < dimension; i++) {
            if (!x.missing(row, i)) {
                present[count++] = i;
            }
        }
        Check.that(count > 0, "row " + row + " is missing");
        double[] residual = new double[count];
        for (int i = 0; i < count; i++) {
            residual[i] = x.at(row, present[i]) - mean(state, present[i]);
        }
        if (count == dimension) {
            return logDensity(count, logDeterminants[state], factors[state].squaredDistance(residual));
        }
        Cholesky part = factorOf(state, present, count);
        return logDensity(count, part.logDeterminant(), part.squaredDistance(residual));
    }

    private static double logDensity(int count, double logDeterminant, double squaredDistance) {
        return -0.5 * (count * LN_TWO_PI + logDeterminant + squaredDistance);
    }

    private Cholesky factorOf(int state, int[] columns, int count) {
        double[] part = new double[count * count];
        for (int i = 0; i < count; i++) {
            for (int j = 0; j < count; j++) {
                part[i * count + j] = covariance(state, columns[i], columns[j]);
            }
        }
        return Cholesky.of(part, count)
                .orElseThrow(() -> new IllegalStateException(
                        "a part of a positive definite matrix is not positive definite; this is a bug"));
    }

    @Override
    public double mean(int state, int column) {
        return means[state * dimension + Check.within(column, 0, dimension - 1, "column")];
    }

    @Override
    public double standardDeviation(int state, int column) {
        return Math.sqrt(covariance(state, column, column));
    }

    /** Covariance of two columns in one regime. */
    public double covariance(int state, int a, int b) {
        Check.within(a, 0, dimension - 1, "column");
        Check.within(b, 0, dimension - 1, "column");
        return covariances[(state * dimension + a) * dimension + b];
    }

    /** Correlation of two columns in one regime; 1 for a column with itself. */
    public double correlation(int state, int a, int b) {
        return a == b ? 1 : covariance(state, a, b) / (standardDeviation(state, a) * standardDeviation(state, b));
    }

    @Override
    public int parameterCount() {
        return family.parameterCount(states(), dimension);
    }

    @Override
    public MultivariateNormal ordered(int[] order) {
        return new MultivariateNormal(
                family, dimension, Order.applyToRows(order, means), Order.applyToRows(order, covariances));
    }
}
