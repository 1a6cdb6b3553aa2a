package sojourn.regime;

import java.util.Arrays;
import java.util.Optional;
import java.util.OptionalDouble;

/** What the chain of regimes does in the long run. */
public final class LongRun {
    private LongRun() {}

    /**
     * The stationary distribution pi = pi A; empty when the chain has several closed classes, so that it depends on the start.
     * Elimination without subtraction (Grassmann, Taksar and Heyman 1985, Operations Research 33, 1107-1116) on the closed class;
     * states outside it have probability 0.
     */
    public static Optional<double[]> stationary(RegimeModel model) {
        int states = model.states();
        double[] transition = new double[states * states];
        for (int i = 0; i < states; i++) {
            for (int j = 0; j < states; j++) {
                transition[i * states + j] = model.transition(i, j);
            }
        }
        return stationary(transition, states);
    }

    /** The same of a transition matrix, row-major. Not modified. */
    static Optional<double[]> stationary(double[] transition, int states) {
        boolean[] reaches = reachability(transition, states);
        int[] closed = closedClass(reaches, states);
        for (int k = 0; k < states; k++) {
            if (closed.length == 0 || !reaches[k * states + closed[0]]) {
                return Optional.empty();
            }
        }
        double[] within = eliminate(transition, states, closed);
        double[] result = new double[states];
        for (int i = 0; i < closed.length; i++) {
            result[closed[i]] = within[i];
        }
        return Optional.of(result);
    }

    /** Expected number of bars of one stay in regime {@code k}, 1 / (1 - a_kk); empty when the chain never leaves it. */
    public static OptionalDouble expectedStay(Gauge gauge, int k) {
        double leave = 0;
        for (int j = 0; j < gauge.states(); j++) {
            leave += j == k ? 0 : gauge.transition(k, j);
        }
        return leave > 0 && Double.isFinite(1 / leave) ? OptionalDouble.of(1 / leave) : OptionalDouble.empty();
    }

    private static boolean[] reachability(double[] transition, int n) {
        boolean[] reaches = new boolean[n * n];
        for (int i = 0; i < n; i++) {
            for (int j = 0; j < n; j++) {
                reaches[i * n + j] = i == j || transition[i * n + j] > 0;
            }
        }
        for (int via = 0; via < n; via++) {
            for (int i = 0; i < n; i++) {
                for (int j = 0; j < n; j++) {
                    reaches[i * n + j] |= reaches[i * n + via] && reaches[via * n + j];
                }
            }
        }
        return reaches;
    }

    /** The states of the first class that is never left. */
    private static int[] closedClass(boolean[] reaches, int n) {
        for (int k = 0; k < n; k++) {
            boolean closed = true;
            int size = 0;
            int[] members = new int[n];
            for (int j = 0; j < n; j++) {
                if (reaches[k * n + j]) {
                    closed &= reaches[j * n + k];
                    members[size++] = j;
                }
            }
            if (closed) {
                return Arrays.copyOf(members, size);
            }
        }
        return new int[0];
    }

    private static double[] eliminate(double[] transition, int states, int[] members) {
        int n = members.length;
        double[] a = new double[n * n];
        for (int i = 0; i < n; i++) {
            for (int j = 0; j < n; j++) {
                a[i * n + j] = transition[members[i] * states + members[j]];
            }
        }
        for (int last = n - 1; last > 0; last--) {
            double leave = 0;
            for (int j = 0; j < last; j++) {
                leave += a[last * n + j];
            }
            for (int i = 0; i < last; i++) {
                a[i * n + last] /= leave;
                for (int j = 0; j < last; j++) {
                    a[i * n + j] += a[i * n + last] * a[last * n + j];
                }
            }
        }
        double[] pi = new double[n];
        pi[0] = 1;
        double total = 1;
        for (int j = 1; j < n; j++) {
            for (int i = 0; i < j; i++) {
                pi[j] += pi[i] * a[i * n + j];
            }
            total += pi[j];
        }
        for (int j = 0; j < n; j++) {
            pi[j] /= total;
        }
        return pi;
    }
}
