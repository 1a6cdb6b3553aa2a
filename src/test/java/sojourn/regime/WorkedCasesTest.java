package sojourn.regime;

import static org.assertj.core.api.Assertions.assertThat;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import sojourn.CheckValues;

/**
 * Filter, smoother, most likely path and mixture against worked cases computed by an independent implementation (plain numpy) and
 * confirmed by summing over all paths; the federal funds case is example 1 of the Stata 14 manual [TS] mswitch.
 */
class WorkedCasesTest {
    @ParameterizedTest
    @ValueSource(
            strings = {
                "hmm_gauss_k2_free",
                "hmm_gauss_k2_stationary",
                "hmm_gauss_k2_zero_mean",
                "hmm_gauss_k3_stationary",
                "hmm_gauss_k2_absorbing_zero",
                "hmm_gauss_k2_underflow",
                "hmm_gauss_k1"
            })
    void filterSmootherAndPathAgree(String id) {
        CheckValues check = CheckValues.byId(id);
        assertAgrees(check, Fixtures.model(check), Fixtures.observations(check));
    }

    /** Filter, smoother and most likely path are those of the worked case. */
    static void assertAgrees(CheckValues check, RegimeModel model, Observations x) {
        double[][] predicted = new double[x.size()][];
        double[][] filtered = new double[x.size()][];
        double[] densities = new double[x.size()];
        FilterState state = FilterState.before(model);
        for (int t = 0; t < x.size(); t++) {
            predicted[t] = state.predicted(model);
            state = state.step(model, x, t);
            filtered[t] = state.probabilities();
            densities[t] = state.lastLogDensity();
        }
        check.assertExpected("log_predictive", densities);
        check.assertExpected("predicted", predicted);
        check.assertExpected("filtered", filtered);
        check.assertExpected("loglik", state.logLikelihood());
        check.assertExpected("next_state_probs", state.predicted(model));
        Smoothed smoothed = Smoothed.of(model, x);
        check.assertExpected("smoothed", table(smoothed));
        double[][] steps = new double[model.states()][model.states()];
        for (int i = 0; i < model.states(); i++) {
            for (int j = 0; j < model.states(); j++) {
                steps[i][j] = smoothed.expectedTransitions(i, j);
            }
        }
        check.assertExpected("expected_transitions", steps);
        Viterbi path = Viterbi.of(model, x);
        assertThat(path.path()).isEqualTo(CheckValues.ints(check.expected("viterbi")));
        check.assertExpected("viterbi_logprob", path.logProbability());
    }

    @Test
    void missingObservationsAreTransitionsWithoutEmission() {
        CheckValues check = CheckValues.byId("hmm_missing");
        RegimeModel model = Fixtures.model(check);
        Observations x = Fixtures.observations(check);
        double[][] filtered = new double[x.size()][];
        FilterState state = FilterState.before(model);
        for (int t = 0; t < x.size(); t++) {
            state = state.step(model, x, t);
            filtered[t] = state.probabilities();
            if (x.missing(t)) {
                assertThat(state.lastLogDensity()).isZero();
            }
        }
        check.assertExpected("filtered", filtered);
        check.assertExpected("loglik", state.logLikelihood());
        check.assertExpected("smoothed", table(Smoothed.of(model, x)));
    }

    @Test
    void federalFundsRateWithOneVariance() {
        CheckValues check = CheckValues.byId("fedfunds_tied_filter");
        RegimeModel model = Fixtures.model(check);
        Observations x = Fixtures.observations(check);
        FilterState state = FilterState.before(model);
        check.assertExpected("delta", state.probabilities());
        double[][] first = new double[3][];
        double[][] last = new double[3][];
        double[][] smoothedFirst = new double[3][];
        double[][] smoothedLast = new double[3][];
        double[][] smoothed = table(Smoothed.of(model, x));
        int n = x.size();
        for (int t = 0; t < n; t++) {
            state = state.step(model, x, t);
            if (t < 3) {
                first[t] = state.probabilities();
                smoothedFirst[t] = smoothed[t];
            } else if (t >= n - 3) {
                last[t - n + 3] = state.probabilities();
                smoothedLast[t - n + 3] = smoothed[t];
            }
        }
        check.assertExpected("loglik", state.logLikelihood());
        check.assertExpected("filtered_first3", first);
        check.assertExpected("filtered_last3", last);
        check.assertExpected("smoothed_first3", smoothedFirst);
        check.assertExpected("smoothed_last3", smoothedLast);
    }

    @Test
    void identicalRowsAreAnIndependentMixture() {
        CheckValues check = CheckValues.byId("mixture_identity");
        double[] weights = CheckValues.doubles(check.input("weights"));
        Normal emission = Normal.of(
                CheckValues.doubles(check.input("mean")), Fixtures.roots(CheckValues.doubles(check.input("variance"))));
        Observations x = Fixtures.observations(check);
        double[] rows = {weights[0], weights[1], weights[0], weights[1]};
        for (RegimeModel model :
                new RegimeModel[] {Mixture.of(weights, emission), HiddenMarkov.of(weights, rows, emission)}) {
            double[][] filtered = new double[x.size()][];
            FilterState state = FilterState.before(model);
            for (int t = 0; t < x.size(); t++) {
                state = state.step(model, x, t);
                filtered[t] = state.probabilities();
            }
            check.assertExpected("posterior", filtered);
            check.assertExpected("posterior", table(Smoothed.of(model, x)));
            check.assertExpected("loglik", state.logLikelihood());
        }
    }

    @Test
    void criteriaAgree() {
        CheckValues check = CheckValues.byId("criteria_k2");
        RegimeModel model = Fixtures.model(check);
        Observations x = Fixtures.observations(check);
        double logLikelihood = FilterState.after(model, x).logLikelihood();
        assertThat(model.parameterCount()).isEqualTo(check.expected("n_params").asInt());
        check.assertExpected("aic", InformationCriterion.AKAIKE.of(logLikelihood, model.parameterCount(), x.present()));
        check.assertExpected("bic", InformationCriterion.BAYES.of(logLikelihood, model.parameterCount(), x.present()));
        double pathCriterion = InformationCriterion.BAYES.of(
                Viterbi.of(model, x).logProbability(), model.parameterCount(), x.present());
        check.assertExpected("icl_viterbi", pathCriterion);
    }

    @Test
    void matchingAgrees() {
        CheckValues check = CheckValues.byId("align_k3");
        Normal before = Normal.of(
                CheckValues.doubles(check.input("old_mean")),
                Fixtures.roots(CheckValues.doubles(check.input("old_variance"))));
        Normal now = Normal.of(
                CheckValues.doubles(check.input("new_mean")),
                Fixtures.roots(CheckValues.doubles(check.input("new_variance"))));
        double[][] distances = new double[3][3];
        for (int i = 0; i < 3; i++) {
            for (int j = 0; j < 3; j++) {
                distances[i][j] = Matching.squaredHellinger(before, i, now, j);
            }
        }
        check.assertExpected("squared_hellinger", distances);
        Matching matching = Matching.of(before, now);
        assertThat(matching.newForOld()).isEqualTo(CheckValues.ints(check.expected("new_index_for_old")));
        check.assertExpected("cost", matching.cost());
    }

    static double[][] table(Smoothed smoothed) {
        double[][] rows = new double[smoothed.size()][smoothed.states()];
        for (int t = 0; t < rows.length; t++) {
            for (int k = 0; k < smoothed.states(); k++) {
                rows[t][k] = smoothed.at(t, k);
            }
        }
        return rows;
    }
}
