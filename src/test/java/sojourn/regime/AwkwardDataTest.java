package sojourn.regime;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import sojourn.numeric.RandomStream;

/** Data that cannot be fitted, or should not be: a reason comes back, never NaN. */
class AwkwardDataTest {
    private static FitSettings settings(int states) {
        return new FitSettings(ModelKind.HIDDEN_MARKOV, states, EmissionFamily.NORMAL, 5);
    }

    @Test
    void aConstantSeriesFails() {
        double[] x = new double[300];
        Arrays.fill(x, 0.01);
        for (EmissionFamily family : EmissionFamily.values()) {
            Fit fit = Fitter.fit(new FitSettings(ModelKind.HIDDEN_MARKOV, 2, family, 2), Fixtures.request(x));
            assertThat(fit.outcome()).isEqualTo(Outcome.FAILED);
            assertThat(fit.explanation()).contains("equal");
            assertThat(fit.model()).isEmpty();
            assertThat(fit.moments()).isEmpty();
        }
    }

    @Test
    void twoDistinctValuesAreDegenerate() {
        double[] x = new double[300];
        for (int t = 0; t < x.length; t++) {
            x[t] = (t / 10) % 2 == 0 ? 0.01 : -0.02;
        }
        Fit fit = Fitter.fit(settings(2), Fixtures.request(x));
        assertThat(fit.outcome()).isEqualTo(Outcome.DEGENERATE);
        assertThat(fit.outcome().accepted()).isFalse();
        // ten bars of 0.01, ten of -0.02: fifteen stretches of each
        assertThat(fit.explanation())
                .containsAnyOf("{0} closed in on a single value", "{1} closed in on a single value")
                .contains("a ten-thousandth of the window's")
                .contains("150.0 of 300 observations");
        assertThat(fit.runnerUp()).isEmpty();
        assertFinite(fit);
    }

    @Test
    void aStateOfAHandfulOfObservationsIsNamedWithTheirNumber() {
        RandomStream random = RandomStream.of(36, "handful");
        double[] x = new double[400];
        for (int t = 0; t < x.length; t++) {
            x[t] = 0.01 * random.nextNormal();
        }
        x[100] = 1; // three observations a hundred standard deviations out, far from one another
        x[200] = -1;
        x[300] = 1.5;
        Fit fit = Fitter.fit(settings(2), Fixtures.request(x));
        assertThat(fit.outcome()).isEqualTo(Outcome.DEGENERATE);
        // by construction the stormy state is those three, and a tenth of one that might be calm
        assertThat(fit.explanation())
                .matches("all 5 starts ended in degenerate models; in the likeliest \\{1} accounts for 3\\.[01] of 400"
                        + " observations, fewer than the 5 it needs");
    }

    @Test
    void twentyObservationsAreTooFewForFourStates() {
        double[] x =
                Fixtures.simulate(Fixtures.randomModel(2, RandomStream.of(31, "few")), 20, RandomStream.of(31, "rows"));
        Fit fit = Fitter.fit(settings(4), Fixtures.request(x));
        assertThat(fit.outcome()).isEqualTo(Outcome.FAILED);
        assertThat(fit.explanation()).contains("20 observations").contains("at least 24"); // 12 + 3 + 8 parameters
    }

    @Test
    void statesThatDoNotPartAreDegenerate() {
        double[] x = new double[300]; // 0.01, -0.01, …: every stretch has the same moments, and so has every state
        for (int t = 0; t < x.length; t++) {
            x[t] = t % 2 == 0 ? 0.01 : -0.01;
        }
        FitSettings zeroMean = new FitSettings(ModelKind.HIDDEN_MARKOV, 2, EmissionFamily.NORMAL_ZERO_MEAN, 2);
        Fit fit = Fitter.fit(zeroMean, Fixtures.request(x));
        assertThat(fit.outcome()).isEqualTo(Outcome.DEGENERATE);
        assertThat(fit.explanation()).contains("did not part");
        assertFinite(fit);
    }

    @Test
    void nothingPresentFails() {
        boolean[] missing = new boolean[50];
        Arrays.fill(missing, true);
        Observations none = Observations.of(1, new double[50], missing);
        FitRequest request = FitRequest.of(none, new double[50], Companions.of(1, new double[50]), 1, Fixtures.DATE);
        assertThat(Fitter.fit(settings(2), request).outcome()).isEqualTo(Outcome.FAILED);
        assertThat(Fitter.fit(settings(1), request).explanation()).contains("no observation");
        RegimeModel model = Fixtures.randomModel(2, RandomStream.of(1, "given"));
        assertThat(Fitter.given(model, request).outcome()).isEqualTo(Outcome.FAILED);
    }

    @Test
    void noRowWithAllReturnsFails() {
        double[] x = new double[50];
        Arrays.setAll(x, t -> 0.01 * (t % 7 - 3));
        boolean[] missing = new boolean[50];
        Arrays.fill(missing, true);
        FitRequest request = FitRequest.of(
                Observations.univariate(x), x, Companions.of(1, new double[50], missing), 1, Fixtures.DATE);
        assertThat(Fitter.fit(settings(2), request).explanation()).contains("returns of all assets");
    }

    @Test
    void valuesTooLargeToSquareFail() {
        double[] x = new double[50];
        x[3] = 1e300;
        x[4] = -1e300;
        assertThat(Fitter.fit(settings(2), Fixtures.request(x)).explanation()).contains("too large");
    }

    @ParameterizedTest
    @CsvSource({"2,50", "3,50", "2,1000"})
    void anOutlierLeavesAllNumbersFinite(int states, double deviations) {
        RandomStream random = RandomStream.of(32, "outlier");
        double[] x = new double[600];
        for (int t = 0; t < x.length; t++) {
            x[t] = 0.01 * random.nextNormal();
        }
        x[300] = 0.01 * deviations;
        for (EmissionFamily family : EmissionFamily.values()) {
            for (ModelKind kind : new ModelKind[] {ModelKind.HIDDEN_MARKOV, ModelKind.MIXTURE}) {
                assertFinite(Fitter.fit(new FitSettings(kind, states, family, 5), Fixtures.request(x)));
            }
        }
    }

    @Test
    void anAcceptedFitHasNoSpike() {
        for (int seed = 0; seed < 12; seed++) {
            RandomStream random = RandomStream.of(seed, "spikes");
            double[] x = new double[150];
            for (int t = 0; t < x.length; t++) {
                x[t] = random.nextDouble() < 0.15 ? 0 : 0.01 * random.nextNormal(); // days without a trade
            }
            Fit fit = Fitter.fit(settings(3), Fixtures.request(x));
            assertFinite(fit);
            if (fit.outcome().accepted()) {
                double scale = Window.of(Observations.univariate(x), EmissionFamily.NORMAL)
                        .scale();
                for (int k = 0; k < 3; k++) {
                    double ratio = fit.model().orElseThrow().emission().standardDeviation(k, 0) / scale;
                    assertThat(ratio).isGreaterThan(0.01);
                    assertThat(fit.occupancy()[k] * x.length).isGreaterThan(Soundness.leastCount(1) - 1e-6);
                }
            } else {
                assertThat(fit.outcome()).isEqualTo(Outcome.DEGENERATE);
            }
        }
    }

    @Test
    void aSpikeDoesNotWinOverASoundStart() {
        RandomStream random = RandomStream.of(33, "spike");
        double[] x = new double[1000];
        for (int t = 0; t < x.length; t++) {
            x[t] = random.nextNormal() * ((t / 100) % 2 == 0 ? 0.005 : 0.02);
        }
        for (int t = 0; t < 1000; t += 8) {
            x[t] = 0.03; // one value over and over: a spike there is worth more likelihood than anything else
        }
        FitSettings many = new FitSettings(ModelKind.MIXTURE, 2, EmissionFamily.NORMAL, 40);
        Fit fit = Fitter.fit(many, Fixtures.request(x));
        assertThat(fit.outcome()).isEqualTo(Outcome.CONVERGED);
        assertThat(fit.events()).anyMatch(e -> e.startsWith("degenerate-starts"));
        assertThat(fit.startsAgreeing()).isPositive();
    }

    @Test
    void missingRowsAreNotCountedAndMatchTheShortSeriesOfAMixture() {
        RandomStream random = RandomStream.of(34, "missing");
        double[] all = new double[400];
        boolean[] missing = new boolean[400];
        double[] kept = new double[300];
        int n = 0;
        for (int t = 0; t < 400; t++) {
            all[t] = random.nextNormal() * (random.nextDouble() < 0.3 ? 3 : 1);
            missing[t] = t % 4 == 1;
            if (!missing[t]) {
                kept[n++] = all[t];
            }
        }
        FitSettings mixture = new FitSettings(ModelKind.MIXTURE, 2, EmissionFamily.NORMAL, 3);
        Fit gaps = Fitter.fit(
                mixture, FitRequest.of(Observations.of(1, all, missing), all, Companions.of(1, all), 1, Fixtures.DATE));
        Fit dense = Fitter.fit(mixture, Fixtures.request(kept));
        assertThat(gaps.observations()).isEqualTo(300);
        // logs are summed by blocks of rows, gaps among them, so that likelihoods round differently and searches part
        // by as little
        double nats = 1e-13 * StrictMath.abs(dense.logLikelihood());
        assertThat(gaps.logLikelihood()).isCloseTo(dense.logLikelihood(), within(nats));
        for (int k = 0; k < 2; k++) {
            Emission withGaps = gaps.model().orElseThrow().emission();
            Emission without = dense.model().orElseThrow().emission();
            assertThat(withGaps.mean(k, 0)).isCloseTo(without.mean(k, 0), within(1e-10));
            assertThat(withGaps.standardDeviation(k, 0)).isCloseTo(without.standardDeviation(k, 0), within(1e-10));
            assertThat(gaps.orderBy()[k]).isCloseTo(dense.orderBy()[k], within(1e-10));
        }
    }

    /** Five states on a single normal: 2000 plain EM steps end short of the top, which the search reaches. */
    @Test
    void aFlatTopIsReached() {
        RandomStream random = RandomStream.of(35, "flat");
        double[] x = new double[4000];
        for (int t = 0; t < x.length; t++) {
            x[t] = random.nextNormal();
        }
        FitSettings settings = new FitSettings(ModelKind.MIXTURE, 5, EmissionFamily.NORMAL, 1);
        Fit fit = Fitter.fit(settings, Fixtures.request(x));
        assertThat(fit.outcome()).isEqualTo(Outcome.CONVERGED);
        Window window = Window.of(Observations.univariate(x), EmissionFamily.NORMAL);
        Parameters at = new Starts(settings, window).sorted();
        ExpectedSums sums = new ExpectedSums(5);
        Expectation expectation = new IndependentExpectation(5, window);
        for (int step = 0; step < 2000; step++) {
            assertThat(expectation.fill(at, sums)).isTrue();
            at = new Maximisation(EmissionFamily.NORMAL).next(at, sums);
        }
        double unit = x.length * StrictMath.log(window.scale());
        assertThat(fit.logLikelihood()).isGreaterThan(sums.logLikelihood - unit);
    }

    @Test
    void aFlatTopOfTwoSeriesEndsAtTheIterationLimitAndSaysSo() {
        RandomStream random = RandomStream.of(35, "flat");
        double[] x = new double[8000];
        for (int t = 0; t < x.length; t++) {
            x[t] = random.nextNormal();
        }
        double[] order = new double[4000];
        Fit fit = Fitter.fit(
                new FitSettings(ModelKind.MIXTURE, 6, EmissionFamily.NORMAL_DIAGONAL, 1),
                FitRequest.of(
                        Observations.of(2, x, new boolean[4000]), order, Companions.of(1, order), 1, Fixtures.DATE));
        assertThat(fit.outcome()).isEqualTo(Outcome.ITERATION_LIMIT);
        assertThat(fit.outcome().accepted()).isTrue();
        assertThat(fit.explanation()).contains("not come to rest").contains(Integer.toString(fit.iterations()));
    }

    private static void assertFinite(Fit fit) {
        RegimeModel model = fit.model().orElseThrow();
        assertThat(fit.logLikelihood()).isFinite();
        for (int k = 0; k < model.states(); k++) {
            assertThat(fit.orderBy()[k]).isFinite();
            assertThat(fit.occupancy()[k]).isBetween(0.0, 1 + 1e-9);
            assertThat(model.emission().mean(k, 0)).isFinite();
            assertThat(model.emission().standardDeviation(k, 0)).isPositive().isFinite();
            assertThat(fit.moments().orElseThrow().mean(k, 0)).isFinite();
            assertThat(fit.moments().orElseThrow().covariance(k, 0, 0)).isFinite();
            for (int j = 0; j < model.states(); j++) {
                assertThat(model.transition(k, j)).isBetween(0.0, 1.0);
            }
        }
    }
}
