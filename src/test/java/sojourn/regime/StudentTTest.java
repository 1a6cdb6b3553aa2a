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

/** Student-t emissions against worked cases, closed forms and the global maxima of an independent implementation. */
class StudentTTest {
    private static final double LOG_LIKELIHOOD = 1e-6;
    /** In standard deviations of the series, and for probabilities. */
    private static final double PARAMETER = 1e-5;
    /** The likelihood hardly depends on degrees of freedom: 1e-9 nats leave them loose. */
    private static final double DEGREES_OF_FREEDOM = 1e-3;

    @Test
    void filterSmootherAndPathAgreeWithTheWorkedCase() {
        CheckValues check = CheckValues.byId("hmm_t_k2");
        HiddenMarkov model = model(check);
        Observations x = Fixtures.observations(check);
        FilterState state = FilterState.before(model);
        double[] logPredictive = new double[x.size()];
        double[][] predicted = new double[x.size()][];
        double[][] filtered = new double[x.size()][];
        for (int t = 0; t < x.size(); t++) {
            predicted[t] = state.predicted(model);
            state = state.step(model, x, t);
            filtered[t] = state.probabilities();
            logPredictive[t] = state.lastLogDensity();
        }
        Smoothed smoothed = Smoothed.of(model, x);
        double[][] gamma = new double[x.size()][2];
        double[][] steps = new double[2][2];
        for (int t = 0; t < x.size(); t++) {
            gamma[t] = new double[] {smoothed.at(t, 0), smoothed.at(t, 1)};
        }
        for (int i = 0; i < 2; i++) {
            steps[i] = new double[] {smoothed.expectedTransitions(i, 0), smoothed.expectedTransitions(i, 1)};
        }
        check.assertExpected("loglik", state.logLikelihood());
        check.assertExpected("log_predictive", logPredictive);
        check.assertExpected("predicted", predicted);
        check.assertExpected("filtered", filtered);
        check.assertExpected("smoothed", gamma);
        check.assertExpected("next_state_probs", state.predicted(model));
        check.assertExpected("expected_transitions", steps);
        Viterbi best = Viterbi.of(model, x);
        assertThat(best.path()).isEqualTo(CheckValues.ints(check.expected("viterbi")));
        check.assertExpected("viterbi_logprob", best.logProbability());
    }

    @Test
    void oneStepOfEmAgreesWithTheWorkedCase() {
        CheckValues check = CheckValues.byId("em_step_student");
        Observations x = Fixtures.observations(check);
        Window window = Window.of(x, EmissionFamily.STUDENT_T);
        Parameters before = standardised(model(check), window);
        ExpectedSums sums = new ExpectedSums(2);
        assertThat(new StudentExpectation(2, window).fill(before, sums)).isTrue();
        check.assertExpected("loglik_before", sums.logLikelihood - x.size() * StrictMath.log(window.scale()));
        RegimeModel after =
                new Maximisation(EmissionFamily.STUDENT_T).next(before, sums).toModel(window, EmissionFamily.STUDENT_T);
        StudentT emission = (StudentT) after.emission();
        check.assertExpected("delta", new double[] {after.initial(0), after.initial(1)});
        check.assertExpected("A", new double[][] {
            {after.transition(0, 0), after.transition(0, 1)}, {after.transition(1, 0), after.transition(1, 1)}
        });
        check.assertExpected("mean", new double[] {emission.mean(0, 0), emission.mean(1, 0)});
        check.assertExpected(
                "scale2", new double[] {emission.scale(0) * emission.scale(0), emission.scale(1) * emission.scale(1)});
        check.assertExpected("nu", new double[] {emission.degreesOfFreedom(0), emission.degreesOfFreedom(1)});
        check.assertExpected("loglik_after", FilterState.after(after, x).logLikelihood());
    }

    @Test
    void fastExpectationAgreesWithThePlainOne() {
        RandomStream random = RandomStream.of(7, "student");
        for (int trial = 0; trial < 12; trial++) {
            int states = 1 + trial % 4;
            double[] x = new double[100];
            boolean[] missing = new boolean[100];
            for (int t = 0; t < x.length; t++) {
                x[t] = random.nextNormal() * (t % 40 < 20 ? 1 : 3);
                missing[t] = t % 17 == 3;
            }
            Window window = Window.of(Observations.of(1, x, missing), EmissionFamily.STUDENT_T);
            HiddenMarkov chain = Fixtures.randomModel(states, random);
            double[] tails = new double[states];
            double[] scales = new double[states];
            for (int k = 0; k < states; k++) {
                tails[k] = 2.1 + 20 * random.nextDouble();
                scales[k] = chain.emission().standardDeviation(k, 0);
            }
            double[] means = new double[states];
            double[] transition = new double[states * states];
            double[] initial = new double[states];
            for (int k = 0; k < states; k++) {
                means[k] = chain.emission().mean(k, 0);
                initial[k] = chain.initial(k);
                for (int j = 0; j < states; j++) {
                    transition[k * states + j] = chain.transition(k, j);
                }
            }
            StudentT emission = StudentT.of(means, scales, tails);
            agree(standardised(HiddenMarkov.of(initial, transition, emission), window), window);
            agree(standardised(Mixture.of(initial, emission), window), window);
        }
    }

    private static void agree(Parameters p, Window window) {
        ExpectedSums fast = new ExpectedSums(p.states());
        ExpectedSums plain = new ExpectedSums(p.states());
        assertThat(new StudentExpectation(p.states(), window).fill(p, fast)).isTrue();
        assertThat(new PlainExpectation(window, EmissionFamily.STUDENT_T).fill(p, plain))
                .isTrue();
        assertThat(fast.logLikelihood).isCloseTo(plain.logLikelihood, within(1e-10));
        assertThat(fast.initial).containsExactly(plain.initial, within(1e-11));
        assertThat(fast.transitions)
                .containsExactly(
                        p.kind() == ModelKind.HIDDEN_MARKOV ? plain.transitions : fast.transitions, within(1e-9));
        assertThat(fast.count).containsExactly(plain.count, within(1e-10));
        assertThat(fast.sum).containsExactly(plain.sum, within(1e-10));
        assertThat(fast.squares).containsExactly(plain.squares, within(1e-9));
        assertThat(fast.weights).containsExactly(plain.weights, within(1e-10));
        assertThat(fast.logWeights).containsExactly(plain.logWeights, within(1e-10));
    }

    @Test
    void tenMillionDegreesOfFreedomAreNormal() {
        CheckValues check = CheckValues.byId("hmm_gauss_k2_free");
        HiddenMarkov normal = Fixtures.model(check);
        double[] scales = {
            normal.emission().standardDeviation(0, 0), normal.emission().standardDeviation(1, 0)
        };
        double[] means = {normal.emission().mean(0, 0), normal.emission().mean(1, 0)};
        HiddenMarkov student = HiddenMarkov.of(
                CheckValues.doubles(check.input("delta")),
                Fixtures.flat(CheckValues.matrix(check.input("A"))),
                StudentT.of(means, scales, new double[] {1e7, 1e7}));
        double expected = check.expected("loglik").asDouble();
        assertThat(FilterState.after(student, Fixtures.observations(check)).logLikelihood())
                .isCloseTo(expected, within(1e-5 * Math.abs(expected)));
    }

    @Test
    void densityOfThreeDegreesOfFreedomIsTheClosedForm() {
        // f(x) = 2 / (pi sqrt 3 (1 + x^2 / 3)^2); variance 3
        StudentT student = StudentT.of(new double[] {0}, new double[] {1}, new double[] {3});
        Observations x = Observations.univariate(new double[] {0, 1.5, -40});
        for (int t = 0; t < 3; t++) {
            double base = 1 + x.at(t, 0) * x.at(t, 0) / 3;
            double expected = 2 / (Math.PI * Math.sqrt(3) * base * base);
            assertThat(StrictMath.exp(student.logDensity(x, t, 0)))
                    .isCloseTo(expected, within(1e-14 * expected + 1e-18));
        }
        assertThat(student.standardDeviation(0, 0)).isCloseTo(Math.sqrt(3), within(1e-15));
        StudentT same = StudentT.withDeviations(new double[] {0}, new double[] {Math.sqrt(3)}, new double[] {3});
        assertThat(same.scale(0)).isCloseTo(1, within(1e-15));
    }

    @ParameterizedTest
    @CsvSource({
        "dax/eustock_dax.csv, dax/dax.json, 5",
        "smi/eustock_smi.csv, smi/smi.json, 10",
        "nyse/nyse_1990_2005.csv, nyse/nyse_1990_2005.json, 5"
    })
    void twoStatesReachTheMaximum(String csv, String json, int starts) {
        double[] x = OpenData.column(csv, "log_return");
        JsonNode expected = OpenData.reference(json).get("maximum_likelihood").get("student_t_K2_stationary_init");
        FitSettings settings = new FitSettings(
                ModelKind.HIDDEN_MARKOV, 2, EmissionFamily.STUDENT_T, InitialDistribution.STATIONARY, starts);
        Fit fit = Fitter.fit(settings, Fixtures.request(x));
        assertThat(fit.outcome()).as(fit.explanation()).isEqualTo(Outcome.CONVERGED);
        assertThat(fit.logLikelihood()).isCloseTo(expected.get("loglik").asDouble(), within(LOG_LIKELIHOOD));
        RegimeModel model = fit.model().orElseThrow();
        assertThat(model.parameterCount()).isEqualTo(expected.get("n_params").asInt());
        assertThat(settings.parameterCount()).isEqualTo(model.parameterCount());
        double unit =
                Window.of(Observations.univariate(x), EmissionFamily.NORMAL).scale();
        StudentT emission = (StudentT) model.emission();
        for (int k = 0; k < 2; k++) {
            assertThat(emission.mean(k, 0) / unit)
                    .isCloseTo(expected.get("means").get(k).asDouble() / unit, within(PARAMETER));
            assertThat(emission.scale(k) / unit)
                    .isCloseTo(expected.get("scales").get(k).asDouble() / unit, within(PARAMETER));
            double tails = expected.get("dof").get(k).asDouble();
            assertThat(emission.degreesOfFreedom(k)).isCloseTo(tails, within(DEGREES_OF_FREEDOM * tails));
            assertThat(model.initial(k))
                    .isCloseTo(expected.get("initial").get(k).asDouble(), within(PARAMETER));
            assertThat(model.transition(k, k))
                    .isCloseTo(expected.get("transition").get(k).get(k).asDouble(), within(PARAMETER));
        }
    }

    @Test
    void fixedDegreesOfFreedomStayAndCostNoParameter() {
        double[] x = OpenData.column("dax/eustock_dax.csv", "log_return");
        EmissionFamily five = EmissionFamily.studentT(5);
        Fit fixed = Fitter.fit(new FitSettings(ModelKind.HIDDEN_MARKOV, 2, five, 2), Fixtures.request(x));
        Fit free = Fitter.fit(
                new FitSettings(ModelKind.HIDDEN_MARKOV, 2, EmissionFamily.STUDENT_T, 2), Fixtures.request(x));
        StudentT emission = (StudentT) fixed.model().orElseThrow().emission();
        assertThat(emission.degreesOfFreedom(0)).isEqualTo(5);
        assertThat(emission.degreesOfFreedom(1)).isEqualTo(5);
        assertThat(fixed.model().orElseThrow().parameterCount()).isEqualTo(7);
        assertThat(free.model().orElseThrow().parameterCount()).isEqualTo(9);
        assertThat(fixed.logLikelihood()).isLessThan(free.logLikelihood());
    }

    @Test
    void oneRegimeIsMoreLikelyThanTheNormalOne() {
        double[] x = OpenData.column("dax/eustock_dax.csv", "log_return");
        Fit normal =
                Fitter.fit(new FitSettings(ModelKind.ONE_REGIME, 1, EmissionFamily.NORMAL, 1), Fixtures.request(x));
        Fit student =
                Fitter.fit(new FitSettings(ModelKind.ONE_REGIME, 1, EmissionFamily.STUDENT_T, 1), Fixtures.request(x));
        assertThat(student.outcome()).isEqualTo(Outcome.CONVERGED);
        assertThat(student.logLikelihood()).isGreaterThan(normal.logLikelihood() + 50);
        // scores of mean, scale and degrees of freedom vanish at a maximum, by central differences
        StudentT at = (StudentT) student.model().orElseThrow().emission();
        double[] p = {at.mean(0, 0), at.scale(0), at.degreesOfFreedom(0)};
        for (int e = 0; e < 3; e++) {
            double step = 1e-4 * (e == 0 ? p[1] : p[e]);
            double curvature = likelihood(p, e, step, x) - 2 * student.logLikelihood() + likelihood(p, e, -step, x);
            double slope = (likelihood(p, e, step, x) - likelihood(p, e, -step, x)) / 2;
            assertThat(curvature).isNegative();
            assertThat(Math.abs(slope / curvature)).as("parameter " + e).isLessThan(0.5); // in steps
        }
    }

    private static double likelihood(double[] p, int entry, double step, double[] x) {
        double[] q = p.clone();
        q[entry] += step;
        OneRegime model = OneRegime.of(StudentT.of(new double[] {q[0]}, new double[] {q[1]}, new double[] {q[2]}));
        return FilterState.after(model, Observations.univariate(x)).logLikelihood();
    }

    private static HiddenMarkov model(CheckValues check) {
        return HiddenMarkov.of(
                CheckValues.doubles(check.input("delta")),
                Fixtures.flat(CheckValues.matrix(check.input("A"))),
                StudentT.of(
                        CheckValues.doubles(check.input("mean")),
                        Fixtures.roots(CheckValues.doubles(check.input("scale2"))),
                        CheckValues.doubles(check.input("nu"))));
    }

    private static Parameters standardised(RegimeModel model, Window window) {
        boolean chain = model instanceof HiddenMarkov;
        ModelKind kind = chain ? ModelKind.HIDDEN_MARKOV : ModelKind.MIXTURE;
        Parameters p = Parameters.blank(kind, model.states(), EmissionFamily.STUDENT_T);
        StudentT emission = (StudentT) model.emission();
        for (int k = 0; k < model.states(); k++) {
            double scale = emission.scale(k) / window.scale();
            p.set(p.initial(k), model.initial(k));
            p.set(p.mean(k), (emission.mean(k, 0) - window.center()) / window.scale());
            p.set(p.variance(k), scale * scale);
            p.set(p.degreesOfFreedom(k), emission.degreesOfFreedom(k));
            for (int j = 0; chain && j < model.states(); j++) {
                p.set(p.transition(k, j), model.transition(k, j));
            }
        }
        return p;
    }
}
