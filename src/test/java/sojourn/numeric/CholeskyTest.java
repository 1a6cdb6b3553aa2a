package sojourn.numeric;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatIllegalArgumentException;
import static org.assertj.core.api.Assertions.within;

import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.LUDecomposition;
import org.apache.commons.math3.linear.RealMatrix;
import org.junit.jupiter.api.Test;

/** Against the LU decomposition of a general library, and matrices that have no factor. */
class CholeskyTest {
    @Test
    void agreesWithAnotherDecomposition() {
        RandomStream random = RandomStream.of(1, "cholesky");
        for (int n = 1; n <= 6; n++) {
            double[] root = new double[n * n];
            double[] x = new double[n];
            for (int e = 0; e < root.length; e++) {
                root[e] = random.nextNormal();
                x[e % n] = random.nextNormal();
            }
            double[] m = new double[n * n];
            RealMatrix same = new Array2DRowRealMatrix(n, n);
            for (int e = 0; e < m.length; e++) {
                m[e] = e / n == e % n ? 0.1 : 0;
                for (int j = 0; j < n; j++) {
                    m[e] += root[e / n * n + j] * root[e % n * n + j];
                }
                same.setEntry(e / n, e % n, m[e]);
            }
            Cholesky factor = Cholesky.of(m, n).orElseThrow();
            LUDecomposition lu = new LUDecomposition(same);
            assertThat(factor.logDeterminant()).isCloseTo(Math.log(lu.getDeterminant()), within(1e-11));
            double[] solved = lu.getSolver().getInverse().operate(x);
            double square = 0;
            for (int i = 0; i < n; i++) {
                assertThat(factor.solve(x)[i]).isCloseTo(solved[i], within(1e-10));
                square += x[i] * solved[i];
            }
            assertThat(factor.squaredDistance(x)).isCloseTo(square, within(1e-10 * (1 + square)));
            double[] w = factor.inverseOfFactor();
            for (int e = 0; e < w.length; e++) {
                double product = 0;
                for (int j = 0; j < n; j++) {
                    product += factor.at(e / n, j) * w[j * n + e % n];
                }
                assertThat(product).isCloseTo(e / n == e % n ? 1 : 0, within(1e-12));
            }
        }
    }

    @Test
    void whatIsNotPositiveDefiniteHasNone() {
        assertThat(Cholesky.of(new double[] {1, 1, 1, 1}, 2)).isEmpty();
        assertThat(Cholesky.of(new double[] {1, 2, 2, 1}, 2)).isEmpty();
        assertThat(Cholesky.of(new double[] {0}, 1)).isEmpty();
        assertThat(Cholesky.of(new double[] {Double.NaN}, 1)).isEmpty();
        assertThat(Cholesky.of(new double[] {Double.POSITIVE_INFINITY}, 1)).isEmpty();
        assertThatIllegalArgumentException()
                .isThrownBy(() -> Cholesky.of(new double[3], 2))
                .withMessageContaining("3 entries");
    }
}
