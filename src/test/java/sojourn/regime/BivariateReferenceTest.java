package sojourn.regime;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import com.fasterxml.jackson.databind.JsonNode;
import java.util.List;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import sojourn.CheckValues;
import sojourn.OpenData;

/**
 * DAX and SMI together against an independent implementation (plain numpy): filter, smoother and path at fixed parameters, and the
 * maxima that its own two searches found.
 */
class BivariateReferenceTest {
    private static final JsonNode REFERENCE = OpenData.reference("dax_smi/dax_smi_bivariate.json");
    private static final Observations PAIR = Vectors.daxAndSmi();
    private static final double LOG_LIKELIHOOD = 1e-8;
    private static final double PROBABILITY = 1e-10;
    private static final double MAXIMUM = 1e-6;
    /** In standard deviations of the series, and for probabilities. */
    private static final double PARAMETER = 1e-5;
    /** Three states: the reference found the best of three maxima from 2 of 45 starts; parameters as in the one-series tests. */
    private static final double LOOSE_PARAMETER = 5e-4;

    @ParameterizedTest
    @ValueSource(strings = {"K2", "K3", "K4"})
    void fixedParametersAgree(String name) {
        JsonNode node = REFERENCE.get("fixed_parameters").get(name);
        JsonNode expected = node.get("gaussian");
        MultivariateNormal normal = emission(node);
        int states = normal.states();
        double[] transition = Vectors.flat(node.get("transition"));
        double[] stationary = CheckValues.doubles(node.get("stationary"));
        likelihoods(transition, stationary, normal, expected);
        RegimeModel model = HiddenMarkov.of(stationary, transition, normal);
        Smoothed smoothed = Smoothed.of(model, PAIR);
        FilterState state = FilterState.before(model);
        int compared = 0;
        for (int t = 0; t < PAIR.size(); t++) {
            state = state.step(model, PAIR, t);
            JsonNode at = expected.get("at_1based_index").get(Integer.toString(t + 1));
            if (at != null) {
                compared++;
                close(at.get("log_predictive_density_of_this_obs"), state.lastLogDensity(), PROBABILITY);
                for (int k = 0; k < states; k++) {
                    close(at.get("filtered").get(k), state.probability(k), PROBABILITY);
                    close(at.get("smoothed").get(k), smoothed.at(t, k), PROBABILITY);
                    close(at.get("next_state_prob").get(k), state.predicted(model)[k], PROBABILITY);
                }
            }
        }
        assertThat(compared).isEqualTo(expected.get("at_1based_index").size()).isPositive();
        Viterbi path = Viterbi.of(model, PAIR);
        close(expected.get("viterbi").get("log_prob"), path.logProbability(), LOG_LIKELIHOOD);
        int changes = 0;
        for (int t = 1; t < path.size(); t++) {
            changes += path.at(t) == path.at(t - 1) ? 0 : 1;
        }
        assertThat(changes).isEqualTo(expected.get("viterbi").get("n_changes").asInt());
        close(
                node.get("iid_mixture_with_stationary_weights_loglik"),
                FilterState.after(Mixture.of(stationary, normal), PAIR).logLikelihood(),
                LOG_LIKELIHOOD);
    }

    @ParameterizedTest
    @ValueSource(strings = {"K2"})
    void fixedParametersOfIndependentSeriesAgree(String name) {
        JsonNode node = REFERENCE.get("fixed_parameters").get(name);
        MultivariateNormal diagonal =
                MultivariateNormal.diagonal(2, Vectors.flat(node.get("means")), Vectors.flat(node.get("sds")));
        likelihoods(
                Vectors.flat(node.get("transition")),
                CheckValues.doubles(node.get("stationary")),
                diagonal,
                node.get("gaussian_diagonal_covariance"));
    }

    @ParameterizedTest
    @CsvSource({
        "gaussian_K1, ONE_REGIME, 1, FREE, 1, false",
        "gaussian_K2_free_init, HIDDEN_MARKOV, 2, FREE, 5, false",
        "gaussian_K2_stationary_init, HIDDEN_MARKOV, 2, STATIONARY, 5, false",
        "iid_mixture_K2, MIXTURE, 2, FREE, 5, false",
        "gaussian_K3_free_init, HIDDEN_MARKOV, 3, FREE, 40, true",
        "gaussian_K3_stationary_init, HIDDEN_MARKOV, 3, STATIONARY, 40, true"
    })
    void fitsReachTheMaximum(
            String entry, ModelKind kind, int states, InitialDistribution initial, int starts, boolean loose) {
        JsonNode expected = REFERENCE.get("maximum_likelihood").get(entry);
        FitSettings settings = new FitSettings(kind, states, EmissionFamily.NORMAL, initial, starts);
        Fit fit = Fitter.fit(settings, Vectors.request(PAIR));
        assertThat(fit.outcome()).as(fit.explanation()).isEqualTo(Outcome.CONVERGED);
        close(expected.get("loglik"), fit.logLikelihood(), MAXIMUM);
        assertThat(settings.parameterCount(2))
                .isEqualTo(expected.get("n_params").asInt());
        RegimeModel model = fit.model().orElseThrow();
        assertThat(model.parameterCount()).isEqualTo(expected.get("n_params").asInt());
        MultivariateNormal normal = (MultivariateNormal) model.emission();
        double tolerance = loose ? LOOSE_PARAMETER : PARAMETER;
        double[] unit = CheckValues.doubles(REFERENCE.get("sample").get("sd_ml"));
        for (int k = 0;
                k < states;
                k++) { // ours are in the order of the first series' volatility, theirs of the determinant
            close(expected.get("initial").get(k), model.initial(k), tolerance);
            for (int i = 0; i < 2; i++) {
                double mean = expected.get("means").get(k).get(i).asDouble();
                assertThat(normal.mean(k, i) / unit[i]).isCloseTo(mean / unit[i], within(tolerance));
                double sd = expected.get("sds").get(k).get(i).asDouble();
                assertThat(normal.standardDeviation(k, i) / unit[i]).isCloseTo(sd / unit[i], within(tolerance));
            }
            close(expected.get("correlations_12").get(k), normal.correlation(k, 0, 1), 2 * tolerance);
            for (int j = 0; states > 1 && j < states; j++) {
                close(expected.get("transition").get(k).get(j), model.transition(k, j), tolerance);
            }
        }
    }

    private static void likelihoods(
            double[] transition, double[] stationary, MultivariateNormal normal, JsonNode expected) {
        int states = normal.states();
        double[] even = new double[states];
        double[] first = new double[states];
        double[] last = new double[states];
        for (int k = 0; k < states; k++) {
            even[k] = 1.0 / states;
            first[k] = k == 0 ? 1 : 0;
            last[k] = k == states - 1 ? 1 : 0;
        }
        List<String> names = List.of("stationary", "uniform", "first_state", "last_state");
        double[][] initials = {stationary, even, first, last};
        for (int n = 0; n < initials.length; n++) {
            RegimeModel model = HiddenMarkov.of(initials[n], transition, normal);
            close(
                    expected.get("loglik_init_" + names.get(n)),
                    FilterState.after(model, PAIR).logLikelihood(),
                    LOG_LIKELIHOOD);
        }
    }

    private static MultivariateNormal emission(JsonNode node) {
        double[] means = Vectors.flat(node.get("means"));
        double[] sds = Vectors.flat(node.get("sds"));
        double[] correlations = CheckValues.doubles(node.get("correlation_all_pairs_by_state"));
        double[] covariances = new double[correlations.length * 4];
        for (int e = 0; e < covariances.length; e++) {
            int k = e / 4;
            int i = e / 2 % 2;
            int j = e % 2;
            covariances[e] = sds[2 * k + i] * sds[2 * k + j] * (i == j ? 1 : correlations[k]);
        }
        return MultivariateNormal.full(2, means, covariances);
    }

    private static void close(JsonNode expected, double got, double tolerance) {
        assertThat(got).isCloseTo(expected.asDouble(), within(tolerance));
    }
}
