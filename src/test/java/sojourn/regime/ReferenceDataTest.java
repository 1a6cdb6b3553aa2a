package sojourn.regime;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import com.fasterxml.jackson.databind.JsonNode;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.stream.Stream;
import org.junit.jupiter.api.DynamicTest;
import org.junit.jupiter.api.TestFactory;
import sojourn.CheckValues;
import sojourn.OpenData;

/**
 * Filter, smoother and path at fixed parameters on open series, against an independent implementation (plain numpy, cross-checked
 * against statsmodels 0.13.5).
 */
class ReferenceDataTest {
    private static final double LOG_LIKELIHOOD = 1e-8;
    private static final double PROBABILITY = 1e-10;
    /** Sums of thousands of probabilities. */
    private static final double COUNT = 1e-7;

    private record Set(String csv, String column, String json) {}

    private static final List<Set> SETS = List.of(
            new Set("dax/eustock_dax.csv", "log_return", "dax/dax.json"),
            new Set("smi/eustock_smi.csv", "log_return", "smi/smi.json"),
            new Set("nyse/nyse_1990_2005.csv", "log_return", "nyse/nyse_1990_2005.json"),
            new Set("sp500/sp500_monthly.csv", "log_return", "sp500/sp500_monthly.json"),
            new Set("faithful/faithful.csv", "waiting", "faithful/faithful_waiting.json"));

    @TestFactory
    Stream<DynamicTest> fixedParameters() {
        List<DynamicTest> tests = new ArrayList<>();
        for (Set set : SETS) {
            Observations x = Observations.univariate(OpenData.column(set.csv(), set.column()));
            JsonNode fixed = OpenData.reference(set.json()).get("fixed_parameters");
            for (String name : List.of("K2", "K3", "K4")) {
                JsonNode node = fixed.get(name);
                Normal normal = Normal.of(CheckValues.doubles(node.get("means")), CheckValues.doubles(node.get("sds")));
                tests.add(DynamicTest.dynamicTest(
                        set.json() + " " + name, () -> everything(x, node, normal, node.get("gaussian"))));
                if (node.hasNonNull("gaussian_zero_mean")) {
                    Normal zeroMean = Normal.zeroMean(CheckValues.doubles(node.get("sds")));
                    tests.add(DynamicTest.dynamicTest(
                            set.json() + " " + name + " zero mean",
                            () -> starts(x, node, zeroMean, node.get("gaussian_zero_mean"))));
                }
            }
        }
        assertThat(tests).hasSize(5 * 3 + 4);
        return tests.stream();
    }

    private static void everything(Observations x, JsonNode node, Normal emission, JsonNode expected) {
        starts(x, node, emission, expected);
        RegimeModel model = model(node, emission, CheckValues.doubles(node.get("stationary")));
        int states = model.states();
        Smoothed smoothed = Smoothed.of(model, x);
        double[] meanFiltered = new double[states];
        double[] meanSmoothed = new double[states];
        int compared = 0;
        FilterState state = FilterState.before(model);
        for (int t = 0; t < x.size(); t++) {
            state = state.step(model, x, t);
            JsonNode at = expected.get("at_1based_index").get(Integer.toString(t + 1));
            for (int k = 0; k < states; k++) {
                meanFiltered[k] += state.probability(k) / x.size();
                meanSmoothed[k] += smoothed.at(t, k) / x.size();
                if (at != null) {
                    close(at.get("filtered").get(k), state.probability(k), PROBABILITY);
                    close(at.get("smoothed").get(k), smoothed.at(t, k), PROBABILITY);
                    close(at.get("next_state_prob").get(k), state.predicted(model)[k], PROBABILITY);
                }
            }
            if (at != null) {
                compared++;
                close(at.get("log_predictive_density_of_this_obs"), state.lastLogDensity(), PROBABILITY);
            }
        }
        assertThat(compared).isEqualTo(expected.get("at_1based_index").size());
        for (int k = 0; k < states; k++) {
            close(expected.get("mean_filtered").get(k), meanFiltered[k], PROBABILITY);
            close(expected.get("mean_smoothed").get(k), meanSmoothed[k], PROBABILITY);
            for (int j = 0; j < states; j++) {
                close(
                        expected.get("expected_transitions_sum_xi").get(k).get(j),
                        smoothed.expectedTransitions(k, j),
                        COUNT);
            }
        }
        path(Viterbi.of(model, x), expected.get("viterbi"));
        RegimeModel mixture = Mixture.of(CheckValues.doubles(node.get("stationary")), emission);
        close(
                node.get("iid_mixture_with_stationary_weights_loglik"),
                FilterState.after(mixture, x).logLikelihood(),
                LOG_LIKELIHOOD);
    }

    private static void path(Viterbi viterbi, JsonNode expected) {
        close(expected.get("log_prob"), viterbi.logProbability(), LOG_LIKELIHOOD);
        assertThat(viterbi.at(0)).isEqualTo(expected.get("first_state_0based").asInt());
        List<Integer> changes = new ArrayList<>();
        List<Integer> after = new ArrayList<>();
        for (int t = 1; t < viterbi.size(); t++) {
            if (viterbi.at(t) != viterbi.at(t - 1)) {
                changes.add(t + 1);
                after.add(viterbi.at(t));
            }
        }
        assertThat(changes).hasSize(expected.get("n_changes").asInt());
        int listed = expected.get("change_points_1based").size();
        assertThat(listed).isLessThanOrEqualTo(changes.size());
        for (int i = 0; i < listed; i++) {
            assertThat(changes.get(i))
                    .isEqualTo(expected.get("change_points_1based").get(i).asInt());
            assertThat(after.get(i))
                    .isEqualTo(expected.get("states_after_change_0based").get(i).asInt());
        }
    }

    private static void starts(Observations x, JsonNode node, Normal emission, JsonNode expected) {
        int states = emission.states();
        double[] even = new double[states];
        Arrays.fill(even, 1.0 / states);
        double[] first = new double[states];
        first[0] = 1;
        double[] last = new double[states];
        last[states - 1] = 1;
        Map<String, double[]> starts = Map.of(
                "loglik_init_stationary", CheckValues.doubles(node.get("stationary")),
                "loglik_init_uniform", even,
                "loglik_init_first_state", first,
                "loglik_init_last_state", last);
        starts.forEach((name, initial) -> close(
                expected.get(name),
                FilterState.after(model(node, emission, initial), x).logLikelihood(),
                LOG_LIKELIHOOD));
        RegimeModel any = model(node, emission, even);
        double[] stationary = LongRun.stationary(any).orElseThrow();
        for (int k = 0; k < states; k++) {
            close(node.get("stationary").get(k), stationary[k], 1e-13);
        }
    }

    private static RegimeModel model(JsonNode node, Normal emission, double[] initial) {
        return HiddenMarkov.of(initial, Fixtures.flat(CheckValues.matrix(node.get("transition"))), emission);
    }

    private static void close(JsonNode expected, double got, double tolerance) {
        assertThat(got).isCloseTo(expected.asDouble(), within(tolerance));
    }
}
