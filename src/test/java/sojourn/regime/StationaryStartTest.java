package sojourn.regime;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import com.fasterxml.jackson.databind.JsonNode;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import sojourn.CheckValues;
import sojourn.OpenData;
import sojourn.numeric.RandomStream;

/** Chains that start in their long run, fitted exactly, and normals with one variance. */
class StationaryStartTest {
    private static final double LOG_LIKELIHOOD = 1e-6;
    /** In standard deviations of the series, and for probabilities. */
    private static final double PARAMETER = 1e-5;

    @ParameterizedTest
    @CsvSource({
        "dax/eustock_dax.csv, log_return, dax/dax.json, gaussian_K2, NORMAL",
        "smi/eustock_smi.csv, log_return, smi/smi.json, gaussian_K2, NORMAL",
        "nyse/nyse_1990_2005.csv, log_return, nyse/nyse_1990_2005.json, gaussian_K2, NORMAL",
        "fedfunds/fedfunds.csv, fedfunds, fedfunds/fedfunds.json, gaussian_K2, NORMAL",
        "dax/eustock_dax.csv, log_return, dax/dax.json, gaussian_K2_zero_mean, NORMAL_ZERO_MEAN",
        "smi/eustock_smi.csv, log_return, smi/smi.json, gaussian_K2_zero_mean, NORMAL_ZERO_MEAN",
        "nyse/nyse_1990_2005.csv, log_return, nyse/nyse_1990_2005.json, gaussian_K2_zero_mean, NORMAL_ZERO_MEAN",
        "fedfunds/fedfunds.csv, fedfunds, fedfunds/fedfunds.json, gaussian_K2_tied_variance, NORMAL_TIED",
        "smi/eustock_smi.csv, log_return, smi/smi.json, gaussian_K2_tied_variance, NORMAL_TIED",
        "nyse/nyse_1990_2005.csv, log_return, nyse/nyse_1990_2005.json, gaussian_K2_tied_variance, NORMAL_TIED"
    })
    void twoStatesReachTheMaximum(String csv, String column, String json, String entry, EmissionFamily.Form form) {
        double[] x = OpenData.column(csv, column);
        JsonNode expected = OpenData.reference(json).get("maximum_likelihood").get(entry + "_stationary_init");
        Fit fit = fit(x, form, InitialDistribution.STATIONARY, 20);
        assertThat(fit.outcome()).as(fit.explanation()).isEqualTo(Outcome.CONVERGED);
        assertThat(fit.logLikelihood()).isCloseTo(expected.get("loglik").asDouble(), within(LOG_LIKELIHOOD));
        RegimeModel model = fit.model().orElseThrow();
        assertThat(model.parameterCount()).isEqualTo(expected.get("n_params").asInt());
        double unit =
                Window.of(Observations.univariate(x), EmissionFamily.NORMAL).scale();
        int swapped = model.emission().mean(0, 0) / unit
                                - expected.get("means").get(0).asDouble() / unit
                        > 0.01
                ? 1
                : 0;
        for (int k = 0; k < 2; k++) {
            int there = k ^ swapped;
            assertThat(model.emission().mean(k, 0) / unit)
                    .isCloseTo(expected.get("means").get(there).asDouble() / unit, within(PARAMETER));
            assertThat(model.emission().standardDeviation(k, 0) / unit)
                    .isCloseTo(expected.get("sds").get(there).asDouble() / unit, within(PARAMETER));
            assertThat(model.initial(k))
                    .isCloseTo(expected.get("initial").get(there).asDouble(), within(PARAMETER));
            assertThat(model.transition(k, k))
                    .isCloseTo(expected.get("transition").get(there).get(there).asDouble(), within(PARAMETER));
        }
    }

    @Test
    void theThreeEstimatesOfTheFederalFundsRateAreToldApart() {
        CheckValues check = CheckValues.byId("fedfunds_three_estimates");
        double[] x = CheckValues.doubles(check.input("x"));
        Fit exact = fit(x, EmissionFamily.Form.NORMAL_TIED, InitialDistribution.STATIONARY, 5);
        Fit free = fit(x, EmissionFamily.Form.NORMAL_TIED, InitialDistribution.FREE, 5);
        check.assertExpected("exact_ml_stationary_loglik", exact.logLikelihood());
        check.assertExpected("free_delta_em_loglik", free.logLikelihood());
        assertThat(exact.logLikelihood())
                .isGreaterThan(check.expected("plug_in_em_loglik").asDouble() + 0.02);
        RegimeModel model = free.model().orElseThrow();
        int low = model.emission().mean(0, 0) < model.emission().mean(1, 0) ? 0 : 1;
        int high = 1 - low;
        check.assertExpected("free_A11", model.transition(low, low));
        check.assertExpected("free_A21", model.transition(high, low));
        check.assertExpected(
                "free_mean",
                new double[] {model.emission().mean(low, 0), model.emission().mean(high, 0)});
        check.assertExpected("free_sigma", model.emission().standardDeviation(low, 0));
    }

    @Test
    void publishedEstimatesOfTheFederalFundsRateAreReproduced() {
        // Stata 14 Time-Series manual, mswitch, example 1: 1954q3-2010q4, one variance, stationary start; half the last
        // digit
        double[] x = OpenData.column("fedfunds/fedfunds.csv", "fedfunds");
        Fit fit = fit(x, EmissionFamily.Form.NORMAL_TIED, InitialDistribution.STATIONARY, 5);
        RegimeModel model = fit.model().orElseThrow();
        int low = model.emission().mean(0, 0) < model.emission().mean(1, 0) ? 0 : 1;
        int high = 1 - low;
        assertThat(fit.logLikelihood()).isCloseTo(-508.63592, within(5e-6));
        assertThat(model.emission().mean(low, 0)).isCloseTo(3.70877, within(5e-6));
        assertThat(model.emission().mean(high, 0)).isCloseTo(9.556793, within(1e-6));
        assertThat(model.emission().standardDeviation(low, 0)).isCloseTo(2.107562, within(1e-6));
        assertThat(model.emission().standardDeviation(high, 0))
                .isEqualTo(model.emission().standardDeviation(low, 0));
        assertThat(model.transition(low, low)).isCloseTo(0.9820939, within(2e-7));
        assertThat(model.transition(high, low)).isCloseTo(0.0503587, within(2e-7));
    }

    @Test
    void oneStepWithOneVarianceAgreesWithTheWorkedCase() {
        CheckValues check = CheckValues.byId("em_step_tied");
        Observations x = Fixtures.observations(check);
        Window window = Window.of(x, EmissionFamily.NORMAL_TIED);
        Parameters before = Fixtures.standardised(Fixtures.model(check), window);
        ExpectedSums sums = new ExpectedSums(2);
        assertThat(Expectation.of(ModelKind.HIDDEN_MARKOV, 2, window).fill(before, sums))
                .isTrue();
        check.assertExpected("loglik_before", sums.logLikelihood - x.size() * StrictMath.log(window.scale()));
        check.assertExpected("occupancy", sums.count);
        RegimeModel after = new Maximisation(EmissionFamily.NORMAL_TIED)
                .next(before, sums)
                .toModel(window, EmissionFamily.NORMAL_TIED);
        check.assertExpected("delta", new double[] {after.initial(0), after.initial(1)});
        check.assertExpected("A", new double[][] {
            {after.transition(0, 0), after.transition(0, 1)}, {after.transition(1, 0), after.transition(1, 1)}
        });
        check.assertExpected(
                "mean",
                new double[] {after.emission().mean(0, 0), after.emission().mean(1, 0)});
        double deviation = after.emission().standardDeviation(0, 0);
        double other = after.emission().standardDeviation(1, 0);
        check.assertExpected("variance", new double[] {deviation * deviation, other * other});
        check.assertExpected("loglik_after", FilterState.after(after, x).logLikelihood());
    }

    @Test
    void raisedTransitionsBeatEveryNeighbour() {
        RandomStream random = RandomStream.of(11, "stationary");
        for (int trial = 0; trial < 30; trial++) {
            int states = 2 + trial % 4;
            ExpectedSums sums = new ExpectedSums(states);
            Parameters old = Parameters.blank(ModelKind.HIDDEN_MARKOV, states);
            for (int i = 0; i < states; i++) {
                sums.initial[i] = random.nextDouble();
                for (int j = 0; j < states; j++) {
                    sums.transitions[i * states + j] = (i == j ? 20 : 0.5) + random.nextDouble();
                    old.set(old.transition(i, j), 1.0 / states);
                }
            }
            StationaryStart.impose(old);
            Parameters next = rowsByCount(old, sums);
            double shortcut = objective(next, sums);
            StationaryStart.raise(next, old, sums);
            double best = objective(next, sums);
            assertThat(best).isGreaterThanOrEqualTo(shortcut).isGreaterThan(objective(old, sums));
            for (int i = 0; i < states; i++) {
                for (int j = 0; j < states; j++) {
                    for (double step : new double[] {-1e-4, 1e-4}) {
                        assertThat(objective(moved(next, i, j, step), sums)).isLessThan(best);
                    }
                }
            }
        }
    }

    @Test
    void aChainWithoutOneLongRunKeepsItsTransitions() {
        ExpectedSums sums = new ExpectedSums(2);
        sums.initial[0] = 1;
        sums.transitions[0] = 50;
        sums.transitions[3] = 0;
        sums.transitions[1] = 1; // state 1 is never left for 0, and 0 comes first: no stationary chain does that
        Parameters old = Parameters.blank(ModelKind.HIDDEN_MARKOV, 2);
        double[] rows = {0.9, 0.1, 0.2, 0.8};
        for (int e = 0; e < 4; e++) {
            old.set(old.transition(e / 2, e % 2), rows[e]);
        }
        StationaryStart.impose(old);
        Parameters next = rowsByCount(old, sums);
        next.set(next.transition(1, 0), 0);
        next.set(next.transition(1, 1), 1);
        StationaryStart.raise(next, old, sums);
        assertThat(objective(next, sums)).isFinite().isGreaterThanOrEqualTo(objective(old, sums));
        assertThat(next.at(next.initial(0))).isPositive();
    }

    private static Parameters rowsByCount(Parameters old, ExpectedSums sums) {
        Parameters next = old.copy();
        int states = old.states();
        for (int i = 0; i < states; i++) {
            double total = 0;
            for (int j = 0; j < states; j++) {
                total += sums.transitions[i * states + j];
            }
            for (int j = 0; j < states && total > 0; j++) {
                next.set(next.transition(i, j), sums.transitions[i * states + j] / total);
            }
        }
        StationaryStart.impose(next);
        return next;
    }

    private static Parameters moved(Parameters p, int i, int j, double step) {
        Parameters moved = p.copy();
        for (int l = 0; l < p.states(); l++) {
            double value = p.at(p.transition(i, l)) + (l == j ? step : -step / (p.states() - 1));
            moved.set(moved.transition(i, l), value);
        }
        StationaryStart.impose(moved);
        return moved;
    }

    /** sum n_ij ln A_ij + sum g_k ln pi_k. */
    private static double objective(Parameters p, ExpectedSums sums) {
        double sum = 0;
        double total = 0;
        for (double g : sums.initial) {
            total += g;
        }
        for (int i = 0; i < p.states(); i++) {
            sum += sums.initial[i] > 0 ? sums.initial[i] / total * StrictMath.log(p.at(p.initial(i))) : 0;
            for (int j = 0; j < p.states(); j++) {
                double n = sums.transitions[i * p.states() + j];
                sum += n > 0 ? n * StrictMath.log(p.at(p.transition(i, j))) : 0;
            }
        }
        return sum;
    }

    private static Fit fit(double[] x, EmissionFamily.Form form, InitialDistribution initial, int starts) {
        EmissionFamily family = EmissionFamily.values().stream()
                .filter(each -> each.form() == form)
                .findFirst()
                .orElseThrow();
        return Fitter.fit(new FitSettings(ModelKind.HIDDEN_MARKOV, 2, family, initial, starts), Fixtures.request(x));
    }
}
