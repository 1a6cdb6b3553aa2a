package sojourn.regime;

import com.fasterxml.jackson.databind.JsonNode;
import sojourn.CheckValues;
import sojourn.numeric.RandomStream;

/** Models and series that several tests need. */
final class Fixtures {
    static final String DATE = "2001-02-03";

    private Fixtures() {}

    /** The model that a worked case's inputs {@code A, delta, mean, variance} describe. */
    static HiddenMarkov model(CheckValues check) {
        double[] transition = flat(CheckValues.matrix(check.input("A")));
        double[] variance = CheckValues.doubles(check.input("variance"));
        Normal emission = Normal.of(CheckValues.doubles(check.input("mean")), roots(variance));
        return HiddenMarkov.of(initial(check, transition, emission), transition, emission);
    }

    private static double[] initial(CheckValues check, double[] transition, Normal emission) {
        JsonNode delta = check.input("delta");
        if (!delta.isTextual()) {
            return CheckValues.doubles(delta);
        }
        double[] first = new double[emission.states()];
        first[0] = 1;
        return LongRun.stationary(HiddenMarkov.of(first, transition, emission)).orElseThrow();
    }

    /** The observations of a worked case; null marks a missing one. */
    static Observations observations(CheckValues check) {
        JsonNode list = check.input("x");
        double[] values = CheckValues.doubles(list);
        boolean[] missing = new boolean[values.length];
        for (int t = 0; t < values.length; t++) {
            missing[t] = list.get(t).isNull();
        }
        return Observations.of(1, values, missing);
    }

    static double[] roots(double[] squares) {
        double[] result = new double[squares.length];
        for (int k = 0; k < result.length; k++) {
            result[k] = Math.sqrt(squares[k]);
        }
        return result;
    }

    static double[] flat(double[][] rows) {
        double[] result = new double[rows.length * rows.length];
        for (int i = 0; i < rows.length; i++) {
            System.arraycopy(rows[i], 0, result, i * rows.length, rows.length);
        }
        return result;
    }

    /** A request whose order-by series and only asset are the observations themselves. */
    static FitRequest request(double[] x) {
        return FitRequest.of(Observations.univariate(x), x, Companions.of(1, x), 1, DATE);
    }

    /** Draws a path and observations of a model. */
    static double[] simulate(RegimeModel model, int rows, RandomStream random) {
        double[] x = new double[rows];
        int state = -1;
        for (int t = 0; t < rows; t++) {
            double u = random.nextDouble();
            int next = 0;
            double cumulated = 0;
            for (int k = 0; k < model.states(); k++) {
                cumulated += state < 0 ? model.initial(k) : model.transition(state, k);
                if (u >= cumulated && k + 1 < model.states()) {
                    next = k + 1;
                }
            }
            state = next;
            x[t] = model.emission().mean(state, 0) + model.emission().standardDeviation(state, 0) * random.nextNormal();
        }
        return x;
    }

    /** A random hidden Markov model of moderately separated states. */
    static HiddenMarkov randomModel(int states, RandomStream random) {
        double[] initial = simplex(states, random);
        double[] transition = new double[states * states];
        double[] means = new double[states];
        double[] deviations = new double[states];
        for (int k = 0; k < states; k++) {
            System.arraycopy(simplex(states, random), 0, transition, k * states, states);
            means[k] = random.nextNormal();
            deviations[k] = 0.3 + 2 * random.nextDouble();
        }
        return HiddenMarkov.of(initial, transition, Normal.of(means, deviations));
    }

    private static double[] simplex(int n, RandomStream random) {
        double[] p = new double[n];
        double total = 0;
        for (int k = 0; k < n; k++) {
            p[k] = 0.05 + random.nextDouble();
            total += p[k];
        }
        for (int k = 0; k < n; k++) {
            p[k] /= total;
        }
        return p;
    }

    /** The parameters of a model in a window's unit. */
    static Parameters standardised(RegimeModel model, Window window) {
        boolean chain = model instanceof HiddenMarkov;
        Parameters p = Parameters.blank(chain ? ModelKind.HIDDEN_MARKOV : ModelKind.MIXTURE, model.states());
        for (int k = 0; k < model.states(); k++) {
            double deviation = model.emission().standardDeviation(k, 0) / window.scale();
            p.set(p.initial(k), model.initial(k));
            p.set(p.mean(k), (model.emission().mean(k, 0) - window.center()) / window.scale());
            p.set(p.variance(k), deviation * deviation);
            for (int j = 0; chain && j < model.states(); j++) {
                p.set(p.transition(k, j), model.transition(k, j));
            }
        }
        return p;
    }

    /** Means, variances, initial distribution and transitions of two normal states are those that the check expects. */
    static void assertTwoStates(CheckValues check, RegimeModel after) {
        double[][] transition = new double[2][2];
        for (int k = 0; k < 2; k++) {
            double sd = after.emission().standardDeviation(k, 0);
            check.assertClose(
                    "mean", after.emission().mean(k, 0), check.expected("mean").get(k));
            check.assertClose("variance", sd * sd, check.expected("variance").get(k));
            check.assertClose("delta", after.initial(k), check.expected("delta").get(k));
            for (int j = 0; j < 2; j++) {
                transition[k][j] = after.transition(k, j);
            }
        }
        check.assertExpected("A", transition);
    }
}
