package sojourn.regime;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import com.fasterxml.jackson.databind.JsonNode;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import sojourn.OpenData;

/**
 * Fits against the global maxima that an independent implementation found by its own two searches (plain numpy; EM, then direct
 * optimisation, from at least 22 starts). Free initial distribution.
 */
class MaximumLikelihoodTest {
    private static final double LOG_LIKELIHOOD = 1e-6;
    /** In standard deviations of the series, and for probabilities. */
    private static final double PARAMETER = 1e-5;
    /** Three components on a flat top: 1e-8 nats leave the weights and means loose. */
    private static final double LOOSE_PARAMETER = 5e-4;

    private static final double THREE_STATES_ABOVE = 1e-4;

    @ParameterizedTest
    @CsvSource({
        "dax/eustock_dax.csv, dax/dax.json",
        "smi/eustock_smi.csv, smi/smi.json",
        "nyse/nyse_1990_2005.csv, nyse/nyse_1990_2005.json",
        "sp500/sp500_monthly.csv, sp500/sp500_monthly.json"
    })
    void twoStatesReachTheMaximumFromFiveStarts(String csv, String json) {
        double[] x = OpenData.column(csv, "log_return");
        JsonNode maxima = OpenData.reference(json).get("maximum_likelihood");
        agree(x, maxima.get("gaussian_K1"), settings(ModelKind.ONE_REGIME, 1, EmissionFamily.NORMAL, 1), PARAMETER);
        agree(
                x,
                maxima.get("gaussian_K2_free_init"),
                settings(ModelKind.HIDDEN_MARKOV, 2, EmissionFamily.NORMAL, 5),
                PARAMETER);
        agree(
                x,
                maxima.get("gaussian_K2_zero_mean_free_init"),
                settings(ModelKind.HIDDEN_MARKOV, 2, EmissionFamily.NORMAL_ZERO_MEAN, 5),
                PARAMETER);
    }

    @ParameterizedTest
    @CsvSource({
        "dax/eustock_dax.csv, log_return, dax/dax.json, 5",
        "smi/eustock_smi.csv, log_return, smi/smi.json, 5",
        "nyse/nyse_1990_2005.csv, log_return, nyse/nyse_1990_2005.json, 5",
        "sp500/sp500_monthly.csv, log_return, sp500/sp500_monthly.json, 40",
        "faithful/faithful.csv, waiting, faithful/faithful_waiting.json, 5"
    })
    void mixtureOfTwoReachesTheMaximum(String csv, String column, String json, int starts) {
        double[] x = OpenData.column(csv, column);
        JsonNode maxima = OpenData.reference(json).get("maximum_likelihood");
        agree(
                x,
                maxima.get("iid_mixture_K2"),
                settings(ModelKind.MIXTURE, 2, EmissionFamily.NORMAL, starts),
                PARAMETER);
    }

    @ParameterizedTest
    @CsvSource({
        "dax/eustock_dax.csv, log_return, dax/dax.json, 20",
        "smi/eustock_smi.csv, log_return, smi/smi.json, 20",
        "sp500/sp500_monthly.csv, log_return, sp500/sp500_monthly.json, 20",
        "faithful/faithful.csv, waiting, faithful/faithful_waiting.json, 20"
    })
    void threeStatesReachTheMaximumFromTwentyStarts(String csv, String column, String json, int starts) {
        double[] x = OpenData.column(csv, column);
        JsonNode maxima = OpenData.reference(json).get("maximum_likelihood");
        FitSettings settings = settings(ModelKind.HIDDEN_MARKOV, 3, EmissionFamily.NORMAL, starts);
        Fit fit = agree(x, maxima.get("gaussian_K3_free_init"), settings, LOOSE_PARAMETER);
        assertThat(fit.logLikelihood())
                .isLessThan(maxima.get("gaussian_K3_free_init").get("loglik").asDouble() + THREE_STATES_ABOVE);
        agree(
                x,
                maxima.get("iid_mixture_K3"),
                settings(ModelKind.MIXTURE, 3, EmissionFamily.NORMAL, starts),
                LOOSE_PARAMETER);
    }

    private static FitSettings settings(ModelKind kind, int states, EmissionFamily family, int starts) {
        return new FitSettings(kind, states, family, starts);
    }

    private static Fit agree(double[] x, JsonNode expected, FitSettings settings, double tolerance) {
        Fit fit = Fitter.fit(settings, Fixtures.request(x));
        assertThat(fit.outcome()).as(fit.explanation()).isEqualTo(Outcome.CONVERGED);
        assertThat(fit.logLikelihood()).isCloseTo(expected.get("loglik").asDouble(), within(LOG_LIKELIHOOD));
        RegimeModel model = fit.model().orElseThrow();
        assertThat(fit.observations()).isEqualTo(expected.get("n_obs").asInt());
        assertThat(model.parameterCount()).isEqualTo(expected.get("n_params").asInt());
        assertThat(settings.parameterCount()).isEqualTo(model.parameterCount());
        assertThat(InformationCriterion.AKAIKE.of(fit.logLikelihood(), model.parameterCount(), fit.observations()))
                .isCloseTo(expected.get("aic").asDouble(), within(3 * LOG_LIKELIHOOD));
        assertThat(InformationCriterion.BAYES.of(fit.logLikelihood(), model.parameterCount(), fit.observations()))
                .isCloseTo(expected.get("bic").asDouble(), within(3 * LOG_LIKELIHOOD));
        double scale =
                Window.of(Observations.univariate(x), EmissionFamily.NORMAL).scale();
        int[] order = sameOrder(model, expected);
        for (int i = 0; i < model.states(); i++) {
            int k = order[i];
            assertThat(model.emission().mean(k, 0) / scale)
                    .isCloseTo(expected.get("means").get(i).asDouble() / scale, within(tolerance));
            assertThat(model.emission().standardDeviation(k, 0) / scale)
                    .isCloseTo(expected.get("sds").get(i).asDouble() / scale, within(tolerance));
            assertThat(model.initial(k))
                    .isCloseTo(expected.get("initial").get(i).asDouble(), within(tolerance));
            for (int j = 0; j < model.states(); j++) {
                assertThat(model.transition(k, order[j]))
                        .isCloseTo(expected.get("transition").get(i).get(j).asDouble(), within(tolerance));
            }
        }
        return fit;
    }

    /** The reference orders some sets by mean; for each of its states, ours with the nearest emission. */
    private static int[] sameOrder(RegimeModel model, JsonNode expected) {
        int states = model.states();
        double[] means = new double[states];
        double[] deviations = new double[states];
        for (int k = 0; k < states; k++) {
            means[k] = expected.get("means").get(k).asDouble();
            deviations[k] = expected.get("sds").get(k).asDouble();
        }
        return Matching.of(Normal.of(means, deviations), model.emission()).newForOld();
    }
}
