package sojourn.regime;

import java.util.Arrays;

/**
 * What one pass over a window of several numbers a row expects under given parameters: the chain's steps, and each state's count,
 * sum and sum of products of the standardised observations.
 */
final class VectorSums {
    /** Steps, first row and log-likelihood; its counts stay 0. */
    final ExpectedSums chain;

    final double[] count;
    /** States × dimension × dimension: rows that hold both numbers, on the diagonal those that hold the one. */
    final double[] together;
    /** States × dimension. */
    final double[] sum;
    /** States × dimension × dimension, the lower triangles. */
    final double[] products;

    VectorSums(int states, int dimension) {
        chain = new ExpectedSums(states);
        count = new double[states];
        together = new double[states * dimension * dimension];
        sum = new double[states * dimension];
        products = new double[states * dimension * dimension];
    }

    /** Sets everything to 0. */
    void clear() {
        chain.clear();
        Arrays.fill(count, 0);
        Arrays.fill(together, 0);
        Arrays.fill(sum, 0);
        Arrays.fill(products, 0);
    }
}
