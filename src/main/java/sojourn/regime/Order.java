package sojourn.regime;

import java.util.Arrays;
import sojourn.numeric.Check;

/** Orders of states: position k takes state {@code order[k]}. */
final class Order {
    private Order() {}

    /** The entries of {@code values} in that order, a new array. Neither modified. */
    static double[] apply(int[] order, double[] values) {
        check(order, values.length);
        double[] result = new double[values.length];
        for (int k = 0; k < values.length; k++) {
            result[k] = values[order[k]];
        }
        return result;
    }

    /** The order that is {@code first} and then {@code second} of what that gave. Neither modified. */
    static int[] after(int[] first, int[] second) {
        check(second, first.length);
        int[] both = new int[first.length];
        for (int k = 0; k < both.length; k++) {
            both[k] = first[second[k]];
        }
        return both;
    }

    /** The rows of {@code table}, one a state, in that order, a new array. Neither modified. */
    static double[] applyToRows(int[] order, double[] table) {
        int n = order.length;
        check(order, n);
        int width = table.length / n;
        double[] result = new double[table.length];
        for (int k = 0; k < n; k++) {
            System.arraycopy(table, order[k] * width, result, k * width, width);
        }
        return result;
    }

    /** One row of {@code table}, a copy. Not modified. */
    static double[] row(double[] table, int row, int width) {
        return Arrays.copyOfRange(table, row * width, (row + 1) * width);
    }

    /** Rows and columns of a square row-major table in that order, a new array. Neither modified. */
    static double[] applyToSquare(int[] order, double[] table) {
        int n = order.length;
        check(order, n);
        double[] result = new double[table.length];
        for (int i = 0; i < n; i++) {
            for (int j = 0; j < n; j++) {
                result[i * n + j] = table[order[i] * n + order[j]];
            }
        }
        return result;
    }

    private static void check(int[] order, int states) {
        Check.that(order.length == states, "an order of " + order.length + " for " + states + " states");
        boolean[] seen = new boolean[states];
        for (int k : order) {
            Check.that(k >= 0 && k < states && !seen[k], "state " + k + " is not a state or stands twice in the order");
            seen[k] = true;
        }
    }
}
