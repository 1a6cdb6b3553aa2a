package sojourn.regime;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import org.junit.jupiter.params.provider.ValueSource;
import sojourn.CheckValues;
import sojourn.OpenData;
import sojourn.numeric.RandomStream;

/** The mode of the posterior: one worked step, no step down, the limits in which it must be the plain fit, and what it is for. */
class PriorTest {
    private static final Prior USUAL = new Prior(10, Prior.Spread.WINDOW);
    private static final Prior FLAT = new Prior(0, Prior.Spread.NONE);

    /** One step of expectation and maximisation by an independent implementation (plain numpy). */
    @Test
    void oneStepAgrees() {
        CheckValues check = CheckValues.byId("em_step_map");
        Observations x = Fixtures.observations(check);
        Window window = Window.of(x, EmissionFamily.NORMAL);
        double square = window.scale() * window.scale();
        double[][] alpha = CheckValues.matrix(check.input("prior").get("alpha"));
        double shape = check.input("prior").get("ig_shape").asDouble();
        double scale = check.input("prior").get("ig_scale").asDouble();
        PriorDensity prior = new PriorDensity(alpha[0][1] - 1, alpha[0][0] - alpha[0][1], shape, scale / square);
        Objective objective = objective(2, window, prior);
        // log densities of the standardised window and its variances, less those in the unit of the observations
        double unit = (x.size() + 2 * 2 * (shape + 1)) * StrictMath.log(window.scale());
        Parameters before = Fixtures.standardised(Fixtures.model(check), window);
        check.assertExpected("objective_before", objective.at(before) - unit);
        check.assertExpected("occupancy", objective.sums().count);
        Parameters next = maximisation(prior).next(before, objective.sums());
        check.assertExpected("objective_after", objective.at(next) - unit);
        RegimeModel after = next.toModel(window, EmissionFamily.NORMAL);
        check.assertExpected("loglik_after", FilterState.after(after, x).logLikelihood());
        Fixtures.assertTwoStates(check, after);
    }

    @ParameterizedTest
    @EnumSource(InitialDistribution.class)
    void noStepOfEmLowersTheObjective(InitialDistribution initial) {
        for (int seed = 1; seed <= 20; seed++) {
            RandomStream random = RandomStream.of(seed, "prior", initial.word());
            int states = 2 + seed % 3;
            RegimeModel model = Fixtures.randomModel(states, random);
            Window window = window(Fixtures.simulate(model, 150, random));
            PriorDensity prior = new PriorDensity(
                    random.nextDouble(), 50 * random.nextDouble(), 3 * random.nextDouble(), random.nextDouble());
            Objective objective = new Objective(
                    Fixtures.standardised(model, window), window, EmissionFamily.NORMAL, initial, Optional.of(prior));
            Maximisation maximisation = new Maximisation(EmissionFamily.NORMAL, initial, Optional.of(prior));
            Parameters at = Fixtures.standardised(Fixtures.randomModel(states, random), window);
            double reached = objective.at(at);
            double first = reached;
            for (int step = 0; step < 100; step++) {
                at = maximisation.next(at, objective.sums());
                double next = objective.at(at);
                assertThat(next).isGreaterThanOrEqualTo(reached - 1e-9 * (1 + Math.abs(reached)));
                reached = next;
            }
            assertThat(reached).isGreaterThan(first);
        }
    }

    /** That it ends on a top: the log posterior, written out in the unit of the observations, is lower on every side. */
    @ParameterizedTest
    @ValueSource(strings = {"normal", "normal-zero-mean"})
    void nothingNearTheFitIsMoreProbable(String word) {
        EmissionFamily family = EmissionFamily.values().stream()
                .filter(one -> one.word().equals(word))
                .findFirst()
                .orElseThrow();
        RandomStream random = RandomStream.of(3, "around the mode");
        RegimeModel truth = HiddenMarkov.of(
                new double[] {0.5, 0.5},
                new double[] {0.95, 0.05, 0.1, 0.9},
                Normal.of(new double[] {0.2, -0.2}, new double[] {1, 2.5}));
        double[] x = Fixtures.simulate(truth, 300, random);
        Fit fit = fit(x, family, Optional.of(USUAL));
        HiddenMarkov mode = (HiddenMarkov) fit.model().orElseThrow();
        assertThat(fit.outcome()).isEqualTo(Outcome.CONVERGED);
        double[] means = {mode.emission().mean(0, 0), mode.emission().mean(1, 0)};
        double[] deviations = {
            mode.emission().standardDeviation(0, 0), mode.emission().standardDeviation(1, 0)
        };
        double[] stays = {mode.transition(0, 0), mode.transition(1, 1)};
        double top = logPosterior(x, family, mode, means, deviations, stays);
        for (double step : new double[] {-1e-3, 1e-3}) {
            for (int k = 0; k < 2; k++) {
                double[] moved = means.clone();
                moved[k] += step;
                if (family.equals(EmissionFamily.NORMAL)) {
                    assertThat(logPosterior(x, family, mode, moved, deviations, stays))
                            .isLessThan(top);
                }
                moved = deviations.clone();
                moved[k] *= 1 + step;
                assertThat(logPosterior(x, family, mode, means, moved, stays)).isLessThan(top);
                moved = stays.clone();
                moved[k] += step * (1 - moved[k]);
                assertThat(logPosterior(x, family, mode, means, deviations, moved))
                        .isLessThan(top);
            }
        }
    }

    /** Log-likelihood by the filter; sticky Dirichlet rows of 10 stays; IG(1.5, s^2 / 8): METHODS 1.6 with K = 2. */
    private static double logPosterior(
            double[] x, EmissionFamily family, RegimeModel mode, double[] means, double[] deviations, double[] stays) {
        double[] initial = {mode.initial(0), mode.initial(1)};
        double[] transition = {stays[0], 1 - stays[0], 1 - stays[1], stays[1]};
        RegimeModel model = HiddenMarkov.of(initial, transition, Normal.of(means, deviations));
        double mean = 0;
        for (double value : x) {
            mean += family.equals(EmissionFamily.NORMAL) ? value / x.length : 0;
        }
        double square = 0;
        for (double value : x) {
            square += (value - mean) * (value - mean) / x.length;
        }
        double sum = FilterState.after(model, Observations.univariate(x)).logLikelihood();
        for (int k = 0; k < 2; k++) {
            double variance = deviations[k] * deviations[k];
            sum += 10 * Math.log(stays[k]) - 2.5 * Math.log(variance) - square / 8 / variance;
        }
        return sum;
    }

    @ParameterizedTest
    @ValueSource(strings = {"dax/eustock_dax.csv", "smi/eustock_smi.csv", "nyse/nyse_1990_2005.csv"})
    void aPriorThatSaysNothingIsThePlainFit(String csv) {
        double[] x = OpenData.column(csv, "log_return");
        Fit plain = fit(x, EmissionFamily.NORMAL, Optional.empty());
        Fit flat = fit(x, EmissionFamily.NORMAL, Optional.of(FLAT));
        assertThat(flat.outcome()).isEqualTo(Outcome.CONVERGED);
        assertThat(flat.logLikelihood()).isCloseTo(plain.logLikelihood(), within(1e-8));
    }

    @Test
    void aPriorCostsLikelihoodAndLengthensStays() {
        double[] x = OpenData.column("dax/eustock_dax.csv", "log_return");
        double last = 0;
        double likelihood = fit(x, EmissionFamily.NORMAL, Optional.empty()).logLikelihood();
        for (double stay : new double[] {0, 100, 10_000, 1_000_000}) {
            Fit fit = fit(x, EmissionFamily.NORMAL, Optional.of(new Prior(stay, Prior.Spread.WINDOW)));
            RegimeModel model = fit.model().orElseThrow();
            double stays = model.transition(0, 0) + model.transition(1, 1);
            assertThat(stays).isGreaterThan(last);
            assertThat(fit.logLikelihood()).isLessThan(likelihood);
            last = stays;
        }
        assertThat(last).isGreaterThan(2 * 0.999);
    }

    @Test
    void theUnitDoesNotMatter() {
        double[] x = OpenData.column("dax/eustock_dax.csv", "log_return");
        Observations one = Observations.univariate(x);
        RegimeModel model =
                fit(x, EmissionFamily.NORMAL, Optional.of(USUAL)).model().orElseThrow();
        Smoothed expected = Smoothed.of(model, one);
        for (double unit : new double[] {1e-3, 1e3}) {
            double[] scaled = new double[x.length];
            for (int t = 0; t < x.length; t++) {
                scaled[t] = unit * x[t];
            }
            Fit fit = fit(scaled, EmissionFamily.NORMAL, Optional.of(USUAL));
            Smoothed got = Smoothed.of(fit.model().orElseThrow(), Observations.univariate(scaled));
            for (int t = 0; t < x.length; t++) {
                assertThat(got.at(t, 1)).isCloseTo(expected.at(t, 1), within(1e-9));
            }
        }
    }

    /** A price that did not move for a tenth of its days: without a prior one regime closes in on the zeros. */
    @Test
    void equalObservationsDoNotSwallowARegime() {
        RandomStream random = RandomStream.of(8, "halted");
        double[] x = new double[400];
        for (int t = 0; t < x.length; t++) {
            x[t] = t % 100 < 10 ? 0 : random.nextNormal();
        }
        Fit plain = fit(x, EmissionFamily.NORMAL, Optional.empty());
        assertThat(plain.outcome()).isEqualTo(Outcome.DEGENERATE);
        assertThat(plain.explanation()).contains("closed in on a single value");
        Fit held = fit(x, EmissionFamily.NORMAL, Optional.of(USUAL));
        assertThat(held.outcome()).isEqualTo(Outcome.CONVERGED);
        // variance of n equal observations: 2b / (n + 2a + 2) = s^2 / 4 / (n + 5); 40 of them are zeros that halts hold
        // for certain
        double s2 = variance(x);
        double sd = held.model().orElseThrow().emission().standardDeviation(0, 0);
        assertThat(sd * sd / s2).isBetween(0.25 / 50, 0.25 / 40);
    }

    private static double variance(double[] x) {
        double scale =
                Window.of(Observations.univariate(x), EmissionFamily.NORMAL).scale();
        return scale * scale;
    }

    @Test
    void startsAreComparedByThePosteriorAndTheLikelihoodIsReported() {
        double[] x = OpenData.column("smi/eustock_smi.csv", "log_return");
        Observations observations = Observations.univariate(x);
        Fit fit = fit(x, EmissionFamily.NORMAL, Optional.of(USUAL));
        RegimeModel model = fit.model().orElseThrow();
        assertThat(fit.logLikelihood())
                .isEqualTo(FilterState.after(model, observations).logLikelihood());
        FitSettings settings = settings(EmissionFamily.NORMAL, Optional.of(USUAL));
        Window window = window(x);
        PriorDensity prior = USUAL.density(2);
        double best = Double.NEGATIVE_INFINITY;
        for (Parameters start : new Starts(settings, window).cold(Fixtures.request(x))) {
            Objective objective = objective(2, window, prior);
            Parameters at = start.copy();
            double reached = objective.at(at);
            for (int step = 0; step < 1500; step++) {
                at = maximisation(prior).next(at, objective.sums());
                reached = objective.at(at);
            }
            best = Math.max(best, reached);
        }
        Parameters found = Fixtures.standardised(model, window);
        assertThat(objective(2, window, prior).at(found)).isGreaterThan(best - 1e-4);
    }

    @Test
    void aSingleRegimeIsFittedWithout() {
        double[] x = OpenData.column("dax/eustock_dax.csv", "log_return");
        FitSettings one = new FitSettings(
                ModelKind.HIDDEN_MARKOV, 1, EmissionFamily.NORMAL, InitialDistribution.FREE, 1, Optional.of(USUAL));
        FitSettings plain = new FitSettings(ModelKind.HIDDEN_MARKOV, 1, EmissionFamily.NORMAL, 1);
        assertThat(Fitter.fit(one, Fixtures.request(x)).logLikelihood())
                .isEqualTo(Fitter.fit(plain, Fixtures.request(x)).logLikelihood());
    }

    @Test
    void whatAPriorDoesNotFitIsRefused() {
        assertThatThrownBy(() -> new Prior(-1, Prior.Spread.NONE)).hasMessageContaining("stay");
        assertThatThrownBy(() -> new Prior(Double.NaN, Prior.Spread.NONE)).hasMessageContaining("stay");
        assertThatThrownBy(() -> new Prior(Double.POSITIVE_INFINITY, Prior.Spread.NONE))
                .hasMessageContaining("stay");
        for (EmissionFamily family : List.of(EmissionFamily.STUDENT_T, EmissionFamily.NORMAL_TIED)) {
            assertThatThrownBy(() -> settings(family, Optional.of(USUAL))).hasMessageContaining(family.word());
        }
    }

    private static Fit fit(double[] x, EmissionFamily family, Optional<Prior> prior) {
        return Fitter.fit(settings(family, prior), Fixtures.request(x));
    }

    private static FitSettings settings(EmissionFamily family, Optional<Prior> prior) {
        return new FitSettings(ModelKind.HIDDEN_MARKOV, 2, family, InitialDistribution.FREE, 5, prior);
    }

    private static Window window(double[] x) {
        return Window.of(Observations.univariate(x), EmissionFamily.NORMAL);
    }

    private static Objective objective(int states, Window window, PriorDensity prior) {
        Parameters like = Parameters.blank(ModelKind.HIDDEN_MARKOV, states);
        return new Objective(like, window, EmissionFamily.NORMAL, InitialDistribution.FREE, Optional.of(prior));
    }

    private static Maximisation maximisation(PriorDensity prior) {
        return new Maximisation(EmissionFamily.NORMAL, InitialDistribution.FREE, Optional.of(prior));
    }
}
