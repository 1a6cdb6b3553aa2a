package sojourn.regime;

/**
 * The single most likely path of regimes through a whole series: hindsight, never for a decision. Ties go to the lowest index.
 * Source: Viterbi (1967), IEEE Trans. Inf. Theory 13, 260-269; in logs.
 */
public final class Viterbi {
    private final int[] path;
    private final double logProbability;

    private Viterbi(int[] path, double logProbability) {
        this.path = path;
        this.logProbability = logProbability;
    }

    /** The most likely path through all rows of {@code x}. */
    public static Viterbi of(RegimeModel model, Observations x) {
        int states = model.states();
        int rows = x.size();
        double[] logTransition = new double[states * states];
        for (int i = 0; i < states; i++) {
            for (int j = 0; j < states; j++) {
                logTransition[i * states + j] = StrictMath.log(model.transition(i, j));
            }
        }
        int[] from = new int[rows * states];
        double[] best = new double[states];
        for (int t = 0; t < rows; t++) {
            double[] next = new double[states];
            for (int j = 0; j < states; j++) {
                int source = t == 0 ? j : bestSource(best, logTransition, j);
                double before =
                        t == 0 ? StrictMath.log(model.initial(j)) : best[source] + logTransition[source * states + j];
                from[t * states + j] = source;
                next[j] = before + (x.missing(t) ? 0 : model.emission().logDensity(x, t, j));
            }
            best = next;
        }
        return trace(from, best, rows);
    }

    private static int bestSource(double[] best, double[] logTransition, int j) {
        int states = best.length;
        int source = 0;
        for (int i = 1; i < states; i++) {
            if (best[i] + logTransition[i * states + j] > best[source] + logTransition[source * states + j]) {
                source = i;
            }
        }
        return source;
    }

    private static Viterbi trace(int[] from, double[] best, int rows) {
        int states = best.length;
        int last = 0;
        for (int k = 1; k < states; k++) {
            last = best[k] > best[last] ? k : last;
        }
        double logProbability = best[last];
        int[] path = new int[rows];
        for (int t = rows - 1; t >= 0; t--) {
            path[t] = last;
            last = from[t * states + last];
        }
        return new Viterbi(path, rows == 0 ? 0 : logProbability);
    }

    /** Number of bars. */
    public int size() {
        return path.length;
    }

    /** The regime of the path at {@code row}. */
    public int at(int row) {
        return path[row];
    }

    /** The path, one regime a bar, a copy. */
    public int[] path() {
        return path.clone();
    }

    /** Natural log of the joint density of the path and the observations; 0 for no bars. */
    public double logProbability() {
        return logProbability;
    }
}
