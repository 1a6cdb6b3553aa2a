package sojourn.regime;

import com.fasterxml.jackson.databind.JsonNode;
import sojourn.CheckValues;
import sojourn.OpenData;
import sojourn.numeric.Cholesky;
import sojourn.numeric.RandomStream;

/** Models and windows of several series that several tests need. */
final class Vectors {
    private Vectors() {}

    /** Log returns of DAX and SMI on the same days. */
    static Observations daxAndSmi() {
        double[] dax = OpenData.column("dax/eustock_dax.csv", "log_return");
        double[] smi = OpenData.column("smi/eustock_smi.csv", "log_return");
        return columns(dax, smi);
    }

    /** Columns of equal length side by side. */
    static Observations columns(double[]... columns) {
        double[] all = new double[columns[0].length * columns.length];
        for (int e = 0; e < all.length; e++) {
            all[e] = columns[e % columns.length][e / columns.length];
        }
        return Observations.withMissingCells(columns.length, all, new boolean[all.length]);
    }

    /** The same with some numbers taken away. */
    static Observations without(Observations x, boolean[] missing) {
        double[] all = new double[x.size() * x.dimension()];
        for (int e = 0; e < all.length; e++) {
            all[e] = x.at(e / x.dimension(), e % x.dimension());
        }
        return Observations.withMissingCells(x.dimension(), all, missing);
    }

    /** A request ordered by the first column, 0 where it is missing, which is the only asset too. */
    static FitRequest request(Observations x) {
        double[] first = new double[x.size()];
        for (int t = 0; t < first.length; t++) {
            first[t] = x.missing(t, 0) ? 0 : x.at(t, 0);
        }
        return FitRequest.of(x, first, Companions.of(1, first), 1, Fixtures.DATE);
    }

    /** A random chain of states with random means and full covariances. */
    static HiddenMarkov randomModel(int states, int dimension, RandomStream random) {
        double[] means = new double[states * dimension];
        double[] covariances = new double[states * dimension * dimension];
        for (int k = 0; k < states; k++) {
            double[] root = new double[dimension * dimension];
            for (int e = 0; e < root.length; e++) {
                root[e] = random.nextNormal() * (0.4 + k);
            }
            for (int i = 0; i < dimension; i++) {
                means[k * dimension + i] = random.nextNormal();
                for (int j = 0; j < dimension; j++) {
                    double sum = i == j ? 0.05 : 0;
                    for (int m = 0; m < dimension; m++) {
                        sum += root[i * dimension + m] * root[j * dimension + m];
                    }
                    covariances[(k * dimension + i) * dimension + j] = sum;
                }
            }
        }
        HiddenMarkov chain = Fixtures.randomModel(states, random);
        double[] initial = new double[states];
        double[] transition = new double[states * states];
        for (int e = 0; e < transition.length; e++) {
            initial[e / states] = chain.initial(e / states);
            transition[e] = chain.transition(e / states, e % states);
        }
        return HiddenMarkov.of(initial, transition, MultivariateNormal.full(dimension, means, covariances));
    }

    /** Draws a path and observations of a model, row-major. */
    static Observations simulate(RegimeModel model, int rows, RandomStream random) {
        MultivariateNormal normal = (MultivariateNormal) model.emission();
        int d = normal.dimension();
        double[] x = new double[rows * d];
        int state = -1;
        for (int t = 0; t < rows; t++) {
            double u = random.nextDouble();
            int next = 0;
            double cumulated = 0;
            for (int k = 0; k + 1 < model.states(); k++) {
                cumulated += state < 0 ? model.initial(k) : model.transition(state, k);
                next = u >= cumulated ? k + 1 : next;
            }
            state = next;
            Cholesky factor = Cholesky.of(covariance(normal, state), d).orElseThrow();
            double[] z = new double[d];
            for (int i = 0; i < d; i++) {
                z[i] = random.nextNormal();
            }
            for (int i = 0; i < d; i++) {
                x[t * d + i] = normal.mean(state, i);
                for (int j = 0; j <= i; j++) {
                    x[t * d + i] += factor.at(i, j) * z[j];
                }
            }
        }
        return Observations.of(d, x, new boolean[rows]);
    }

    /** One state's covariance matrix, row-major. */
    static double[] covariance(MultivariateNormal normal, int state) {
        int d = normal.dimension();
        double[] s = new double[d * d];
        for (int e = 0; e < s.length; e++) {
            s[e] = normal.covariance(state, e / d, e % d);
        }
        return s;
    }

    /** The parameters of a hidden Markov model in a window's units. */
    static VectorParameters standardised(RegimeModel model, VectorWindow window) {
        MultivariateNormal normal = (MultivariateNormal) model.emission();
        int d = normal.dimension();
        int states = model.states();
        Parameters chain = Parameters.blank(ModelKind.HIDDEN_MARKOV, states);
        VectorParameters p = VectorParameters.blank(chain, d);
        for (int k = 0; k < states; k++) {
            chain.set(chain.initial(k), model.initial(k));
            chain.set(chain.variance(k), 1);
            for (int j = 0; j < states; j++) {
                chain.set(chain.transition(k, j), model.transition(k, j));
            }
            for (int i = 0; i < d; i++) {
                p.means()[k * d + i] = (normal.mean(k, i) - window.center(i)) / window.scale(i);
                for (int j = 0; j < d; j++) {
                    p.covariances()[(k * d + i) * d + j] =
                            normal.covariance(k, i, j) / (window.scale(i) * window.scale(j));
                }
            }
        }
        return p;
    }

    /** All numbers of nested JSON lists, in order. */
    static double[] flat(JsonNode lists) {
        return lists.isArray() && !lists.isEmpty() && lists.get(0).isArray()
                ? flatRows(lists)
                : CheckValues.doubles(lists);
    }

    private static double[] flatRows(JsonNode lists) {
        double[][] parts = new double[lists.size()][];
        int length = 0;
        for (int i = 0; i < parts.length; i++) {
            parts[i] = flat(lists.get(i));
            length += parts[i].length;
        }
        double[] all = new double[length];
        int at = 0;
        for (double[] part : parts) {
            System.arraycopy(part, 0, all, at, part.length);
            at += part.length;
        }
        return all;
    }
}
