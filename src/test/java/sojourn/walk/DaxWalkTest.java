package sojourn.walk;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import com.fasterxml.jackson.databind.JsonNode;
import java.util.Map;
import java.util.Set;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import sojourn.CheckValues;
import sojourn.GivenPrices;
import sojourn.OpenData;
import sojourn.regime.Fit;
import sojourn.regime.RegimeModel;

/**
 * The walk over the DAX, 1991-1998, held to one made by an independent implementation (plain numpy; see open-data/dax/README.md).
 * The file has no dates; consecutive weekdays are invented for it. Observation t is the return of bar t.
 */
class DaxWalkTest {
    /** What a maximum found by another search is held to. */
    private static final double LOG_LIKELIHOOD = 1e-6;

    private static final double LOG_SCORE = 1e-4;
    /** Of parameters and of probabilities that follow from them. */
    private static final double PARAMETER = 1e-5;

    private static final GivenPrices DAX = GivenPrices.closes(OpenData.column("dax/eustock_dax.csv", "close"));
    private static final JsonNode FREE = convention("free");
    private static final JsonNode STATIONARY = convention("stationary");
    private static RegimeTimeline timeline;

    @BeforeAll
    static void walk() {
        timeline = Walks.forward(DAX, Walks.twoRegimes(), Walks.expanding(1000, Walks.every(200)));
    }

    @Test
    void fitsFindTheSameMaxima() {
        JsonNode fits = FREE.get("fits");
        assertThat(timeline.fits()).hasSize(fits.size());
        for (int j = 0; j < fits.size(); j++) {
            JsonNode expected = fits.get(j);
            Fit fit = timeline.fits().get(j).fit();
            assertThat(timeline.fits().get(j).bar())
                    .isEqualTo(expected.get("T0").asInt());
            assertThat(fit.logLikelihood())
                    .isCloseTo(expected.get("in_sample_loglik").asDouble(), within(LOG_LIKELIHOOD));
            assertParameters(fit.model().orElseThrow(), expected);
        }
    }

    @Test
    void aFreeInitialDistributionLosesNothingAgainstAStationaryOne() {
        for (int j = 0; j < timeline.fits().size(); j++) {
            Fit fit = timeline.fits().get(j).fit();
            RegimeModel model = fit.model().orElseThrow();
            double gain = fit.logLikelihood()
                    - STATIONARY.get("fits").get(j).get("in_sample_loglik").asDouble();
            // started from its stationary distribution pi, the free maximum has at least pi(0) times its likelihood
            // from state 0
            double pi = model.transition(1, 0) / (model.transition(0, 1) + model.transition(1, 0));
            assertThat(model.initial(0)).isCloseTo(1, within(PARAMETER));
            assertThat(gain).isBetween(0.0, -Math.log(pi) + LOG_LIKELIHOOD);
        }
    }

    @Test
    void filteredProbabilitiesAtEachFitAgree() {
        for (JsonNode expected : FREE.get("fits")) {
            double[] filtered = CheckValues.doubles(expected.get("filtered_at_T0"));
            int bar = expected.get("T0").asInt();
            assertThat(timeline.probability(bar, 0)).isCloseTo(filtered[0], within(PARAMETER));
            assertThat(timeline.probability(bar, 1)).isCloseTo(filtered[1], within(PARAMETER));
        }
    }

    @Test
    void outOfSampleScoresAgreeFitByFitAndInTotal() {
        double total = 0;
        int scored = 0;
        for (JsonNode expected : FREE.get("fits")) {
            double score = 0;
            for (int bar = expected.get("T0").asInt() + 1;
                    bar <= expected.get("to").asInt();
                    bar++) {
                score += timeline.logScore(bar).orElseThrow();
                scored++;
            }
            assertThat(score).isCloseTo(expected.get("oos_log_score").asDouble(), within(LOG_SCORE));
            total += score;
        }
        assertThat(scored).isEqualTo(FREE.get("n_oos").asInt());
        assertThat(total).isCloseTo(FREE.get("total_oos_log_score").asDouble(), within(LOG_SCORE));
    }

    @Test
    void onePredictionAtATimeAgrees() {
        Set<Map.Entry<String, JsonNode>> given = FREE.get("at_1based_index").properties();
        assertThat(given).hasSize(8);
        for (Map.Entry<String, JsonNode> entry : given) {
            int bar = Integer.parseInt(entry.getKey());
            JsonNode expected = entry.getValue();
            double stormy = timeline.reading(bar - 1).orElseThrow().predicted(1)[1];
            assertThat(stormy).isCloseTo(expected.get("pred_prob_state2").asDouble(), within(PARAMETER));
            assertThat(timeline.logScore(bar).orElseThrow())
                    .isCloseTo(expected.get("log_score").asDouble(), within(PARAMETER));
        }
    }

    @Test
    void predictedProbabilitiesOfTheFirstAndLastBarsAndTheirMeanAgree() {
        double[] first = CheckValues.doubles(FREE.get("first_10_pred_prob_state2"));
        double[] last = CheckValues.doubles(FREE.get("last_10_pred_prob_state2"));
        double sum = 0;
        for (int bar = 1001; bar <= 1859; bar++) {
            double stormy = timeline.reading(bar - 1).orElseThrow().predicted(1)[1];
            sum += stormy;
            if (bar <= 1010) {
                assertThat(stormy).isCloseTo(first[bar - 1001], within(PARAMETER));
            }
            if (bar >= 1850) {
                assertThat(stormy).isCloseTo(last[bar - 1850], within(PARAMETER));
            }
        }
        assertThat(sum / 859).isCloseTo(FREE.get("mean_prob_state2").asDouble(), within(PARAMETER));
    }

    @Test
    void oneRegimeScoresLikeASingleNormal() {
        RegimeTimeline one =
                Walks.forward(DAX, Walks.oneRegime(new LogReturn("a")), Walks.expanding(1000, Walks.every(200)));
        double total = 0;
        for (int bar = 1001; bar <= 1859; bar++) {
            total += one.logScore(bar).orElseThrow();
        }
        assertThat(total)
                .isCloseTo(FREE.get("benchmark_single_gaussian_oos_log_score").asDouble(), within(1e-8));
    }

    private static void assertParameters(RegimeModel model, JsonNode expected) {
        double[] initial = CheckValues.doubles(expected.get("initial"));
        double[] means = CheckValues.doubles(expected.get("means"));
        double[] sds = CheckValues.doubles(expected.get("sds"));
        double[][] transition = CheckValues.matrix(expected.get("transition"));
        for (int k = 0; k < 2; k++) {
            assertThat(model.initial(k)).isCloseTo(initial[k], within(PARAMETER));
            assertThat(model.emission().mean(k, 0)).isCloseTo(means[k], within(PARAMETER * sds[1]));
            assertThat(model.emission().standardDeviation(k, 0)).isCloseTo(sds[k], within(PARAMETER * sds[1]));
            for (int j = 0; j < 2; j++) {
                assertThat(model.transition(k, j)).isCloseTo(transition[k][j], within(PARAMETER));
            }
        }
    }

    private static JsonNode convention(String name) {
        for (JsonNode each : OpenData.reference("dax/walkforward_dax.json").get("refits")) {
            if (each.get("convention").asText().equals(name)) {
                return each;
            }
        }
        throw new IllegalArgumentException("the reference has no convention " + name);
    }
}
