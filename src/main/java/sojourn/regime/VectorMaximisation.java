package sojourn.regime;

import java.util.OptionalInt;
import sojourn.numeric.Cholesky;

/**
 * The maximisation step of EM for several numbers a row: mean sum g x / N and covariance sum g x x' / N - mean mean', of which a
 * diagonal family keeps the diagonal; the chain as for one number. A state without weight keeps its parameters.
 *
 * <p>A state whose covariance S_k minus a ten-thousandth of the window's is no longer positive definite has lost its spread in some
 * direction and is squeezed: the bound on a single variance carried to d dimensions, the same in every unit and rotation. It is
 * reached before a covariance matrix becomes singular, so that none is ever mended.
 */
final class VectorMaximisation {
    private final EmissionFamily family;
    private final Maximisation ofChain;
    private final double[] floor;
    private final int dimension;

    /**
     * @param least what each state's covariance must exceed, dimension × dimension. Not modified.
     */
    VectorMaximisation(EmissionFamily family, InitialDistribution initial, double[] least) {
        this.family = family;
        this.ofChain = new Maximisation(EmissionFamily.NORMAL, initial);
        this.floor = least;
        this.dimension = (int) Math.round(Math.sqrt(least.length));
    }

    /** Whether that entry of the states' covariance matrices is estimated: all of a full one, the variances of a diagonal one. */
    boolean estimates(int entry) {
        int within = entry % (dimension * dimension);
        return family.form() == EmissionFamily.Form.NORMAL || within / dimension == within % dimension;
    }

    /** The next parameters. Neither argument is modified. */
    VectorParameters next(VectorParameters old, VectorSums sums) {
        VectorParameters kept = old.copy();
        Parameters chain = ofChain.next(old.chain(), sums.chain);
        VectorParameters next = new VectorParameters(chain, old.dimension(), kept.means(), kept.covariances());
        for (int k = 0; k < next.states(); k++) {
            if (sums.count[k] > 0) {
                emission(next, sums, k);
            }
        }
        return next;
    }

    private void emission(VectorParameters next, VectorSums sums, int k) {
        int d = next.dimension();
        double n = sums.count[k];
        for (int i = 0; i < d; i++) {
            next.means()[k * d + i] = sums.sum[k * d + i] / n;
        }
        for (int i = 0; i < d; i++) {
            for (int j = 0; j <= i; j++) {
                boolean free = i == j || family.form() == EmissionFamily.Form.NORMAL;
                double product = sums.products[(k * d + i) * d + j] / n;
                double value = free ? product - next.means()[k * d + i] * next.means()[k * d + j] : 0;
                next.covariances()[(k * d + i) * d + j] = value;
                next.covariances()[(k * d + j) * d + i] = value;
            }
        }
    }

    /** The first state that is squeezed. Not modified. */
    OptionalInt squeezed(VectorParameters p) {
        int d = p.dimension();
        double[] above = new double[d * d];
        for (int k = 0; k < p.states(); k++) {
            for (int e = 0; e < above.length; e++) {
                above[e] = p.covariances()[k * d * d + e] - floor[e];
            }
            if (Cholesky.of(above, d).isEmpty()) {
                return OptionalInt.of(k);
            }
        }
        return OptionalInt.empty();
    }
}
