package sojourn.regime;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import sojourn.CheckValues;
import sojourn.numeric.RandomStream;

/** One EM step against worked cases (plain numpy), and the fast expectation steps against the plain filter and smoother. */
class ExpectationTest {
    private static final double SAME = 1e-10;

    @ParameterizedTest
    @ValueSource(strings = {"em_step_free", "em_step_zero_mean"})
    void oneStepAgrees(String id) {
        CheckValues check = CheckValues.byId(id);
        EmissionFamily family = id.endsWith("free") ? EmissionFamily.NORMAL : EmissionFamily.NORMAL_ZERO_MEAN;
        Observations x = Fixtures.observations(check);
        Window window = Window.of(x, family);
        Parameters before = Fixtures.standardised(Fixtures.model(check), window);
        ExpectedSums sums = new ExpectedSums(2);
        assertThat(fastest(2, window).fill(before, sums)).isTrue();
        check.assertExpected("occupancy", sums.count);
        double unit = x.size() * StrictMath.log(window.scale());
        check.assertExpected("loglik_before", sums.logLikelihood - unit);
        RegimeModel after = new Maximisation(family).next(before, sums).toModel(window, family);
        Fixtures.assertTwoStates(check, after);
        check.assertExpected("loglik_after", FilterState.after(after, x).logLikelihood());
    }

    @ParameterizedTest
    @ValueSource(strings = {"em_converged_free", "em_converged_zero"})
    void stepsAndMaximumAgree(String id) {
        CheckValues check = CheckValues.byId(id);
        EmissionFamily family = id.endsWith("free") ? EmissionFamily.NORMAL : EmissionFamily.NORMAL_ZERO_MEAN;
        Observations x = Fixtures.observations(check);
        Window window = Window.of(x, family);
        double[] roots = Fixtures.roots(CheckValues.doubles(check.input("variance0")));
        Normal emission = Normal.of(CheckValues.doubles(check.input("mean0")), roots);
        HiddenMarkov model = HiddenMarkov.of(
                CheckValues.doubles(check.input("delta0")),
                Fixtures.flat(CheckValues.matrix(check.input("A0"))),
                emission);
        Parameters start = Fixtures.standardised(model, window);
        double unit = x.size() * StrictMath.log(window.scale());
        ExpectedSums sums = new ExpectedSums(2);
        Parameters at = start;
        for (int i = 0; i < 5; i++) {
            assertThat(new TwoStateExpectation(window).fill(at, sums)).isTrue();
            check.assertClose(
                    "trace " + i,
                    sums.logLikelihood - unit,
                    check.expected("loglik_trace_first5").get(i));
            at = new Maximisation(family).next(at, sums);
        }
        Climb.Summit summit = Climb.from(start, window, family);
        assertThat(summit.converged()).isTrue();
        RegimeModel fitted = summit.parameters().toModel(window, family);
        FilterState last = FilterState.after(fitted, x);
        double expected = check.expected("loglik").asDouble();
        assertThat(last.logLikelihood()).isCloseTo(expected, within(1e-8 * Math.abs(expected)));
        for (int k = 0; k < 2; k++) { // parameters to 1e-4: the reference stopped plain EM, which converges slowly
            near(check.expected("sd").get(k).asDouble(), fitted.emission().standardDeviation(k, 0));
            near(check.expected("mean").get(k).asDouble(), fitted.emission().mean(k, 0));
            near(check.expected("filtered_last").get(k).asDouble(), last.probability(k));
            for (int j = 0; j < 2; j++) {
                near(check.expected("A").get(k).get(j).asDouble(), fitted.transition(k, j));
            }
        }
    }

    private static void near(double expected, double got) {
        assertThat(got).isCloseTo(expected, within(1e-4 * Math.abs(expected)));
    }

    @ParameterizedTest
    @ValueSource(ints = {2, 3, 4, 5, 6})
    void fastStepAgreesWithThePlainOne(int states) {
        RandomStream random = RandomStream.of(11, "expectation", "states " + states);
        for (int rows : new int[] {1, 2, 15, 16, 17, 32, 33, 47, 48, 49, 63, 64, 65, 400}) {
            HiddenMarkov model = Fixtures.randomModel(states, random);
            double[] values = Fixtures.simulate(model, rows, random);
            boolean[] missing = new boolean[rows];
            for (int t = 1; t < rows; t += 7) {
                missing[t] = true;
            }
            Window window = window(values, missing);
            Parameters p = Fixtures.standardised(model, window);
            agree(window, p, new ManyStateExpectation(states, window));
            agree(window, p, fastest(states, window));
        }
    }

    /** An observation 50 standard deviations out, variances at the floor, and steps that hardly ever happen or never. */
    @ParameterizedTest
    @ValueSource(ints = {2, 3, 4, 5})
    void extremeDataAndParametersAgreeWithThePlainStep(int states) {
        RandomStream random = RandomStream.of(15, "extremes", "states " + states);
        int reached = 0;
        for (int trial = 0; trial < 200; trial++) {
            HiddenMarkov model = Fixtures.randomModel(states, random);
            double[] values = Fixtures.simulate(model, 60, random);
            boolean[] missing = new boolean[60];
            missing[random.nextInt(60)] = true;
            values[random.nextInt(60)] *= trial % 3 == 0 ? 50 : 1;
            Window window = window(values, missing);
            Parameters p = Fixtures.standardised(model, window);
            for (int k = 0; k < states; k++) {
                if (random.nextInt(3) == 0) {
                    p.set(p.variance(k), Maximisation.FLOOR * (1 + random.nextDouble()));
                }
                if (random.nextInt(3) == 0) {
                    int never = random.nextInt(states);
                    int instead = (never + 1) % states;
                    double least = random.nextInt(2) == 0 ? 1e-300 : 0;
                    p.set(
                            p.transition(k, instead),
                            p.at(p.transition(k, instead)) + p.at(p.transition(k, never)) - least);
                    p.set(p.transition(k, never), least);
                }
            }
            Expectation fast = Expectation.of(ModelKind.HIDDEN_MARKOV, states, window);
            if (fast.fill(p, new ExpectedSums(states))) {
                agree(window, p, fast);
                reached++;
            }
        }
        assertThat(reached).isGreaterThan(100);
    }

    /** Means far apart beside equal variances: a ratio to the widest state would overflow within a block. */
    @ParameterizedTest
    @ValueSource(ints = {2, 3, 4})
    void ratiosBeyondTheirRangeAreLeftToTheNextStep(int states) {
        double[] values = new double[50];
        double[] means = new double[states];
        double[] deviations = new double[states];
        double[] transition = new double[states * states];
        double[] initial = new double[states];
        for (int k = 0; k < states; k++) {
            means[k] = 10 * k;
            deviations[k] = 0.5;
            initial[k] = 1.0 / states;
            for (int j = 0; j < states; j++) {
                transition[k * states + j] = 1.0 / states;
            }
        }
        for (int t = 0; t < 50; t++) {
            values[t] = means[t % states] + 0.3 * (t % 5 - 2);
        }
        Window window = Window.of(Observations.univariate(values), EmissionFamily.NORMAL);
        HiddenMarkov model = HiddenMarkov.of(initial, transition, Normal.of(means, deviations));
        Parameters p = Fixtures.standardised(model, window);
        assertThat(fastest(states, window).fill(p, new ExpectedSums(states))).isFalse();
        agree(window, p, Expectation.of(ModelKind.HIDDEN_MARKOV, states, window));
    }

    @ParameterizedTest
    @ValueSource(ints = {2, 4})
    void mixtureStepAgreesWithThePlainOne(int states) {
        RandomStream random = RandomStream.of(12, "mixture", "states " + states);
        HiddenMarkov source = Fixtures.randomModel(states, random);
        double[] weights = new double[states];
        for (int k = 0; k < states; k++) {
            weights[k] = source.initial(k);
        }
        boolean[] missing = new boolean[300];
        missing[0] = true;
        missing[123] = true;
        Window window = window(Fixtures.simulate(source, 300, random), missing);
        Parameters p = Fixtures.standardised(Mixture.of(weights, source.emission()), window);
        agree(window, p, new IndependentExpectation(states, window));
    }

    @ParameterizedTest
    @ValueSource(ints = {2, 3, 5})
    void likelihoodFromEachStateAgreesWithTheFilterStartedThere(int states) {
        RandomStream random = RandomStream.of(14, "corners", "states " + states);
        HiddenMarkov model = Fixtures.randomModel(states, random);
        double[] values = Fixtures.simulate(model, 40, random);
        Window window = window(values, new boolean[40]);
        ExpectedSums sums = new ExpectedSums(states);
        Parameters p = Fixtures.standardised(model, window);
        assertThat(Expectation.of(ModelKind.HIDDEN_MARKOV, states, window).fill(p, sums))
                .isTrue();
        double[] logs = new double[states];
        double[] transition = new double[states * states];
        for (int i = 0; i < states * states; i++) {
            transition[i] = model.transition(i / states, i % states);
        }
        for (int k = 0; k < states; k++) {
            double[] corner = new double[states];
            corner[k] = 1;
            HiddenMarkov cornered = HiddenMarkov.of(corner, transition, model.emission());
            logs[k] =
                    FilterState.after(cornered, Observations.univariate(values)).logLikelihood();
            double ratio = sums.likelihoodFrom[k] / sums.likelihoodFrom[0];
            assertThat(StrictMath.log(ratio)).isCloseTo(logs[k] - logs[0], within(1e-10));
        }
    }

    @Test
    void farOutliersAgreeWithThePlainStep() {
        RandomStream random = RandomStream.of(13, "outlier");
        double[] values = new double[100];
        for (int t = 0; t < 100; t++) {
            values[t] = random.nextNormal() * (t == 50 ? 1000 : 1);
        }
        Window window = window(values, new boolean[100]);
        Normal emission = Normal.of(new double[] {0, 0}, new double[] {0.01, 0.02});
        HiddenMarkov model = HiddenMarkov.of(new double[] {0.5, 0.5}, new double[] {0.98, 0.02, 0.03, 0.97}, emission);
        Parameters p = Fixtures.standardised(model, Window.UNIT);
        agree(window, p, new TwoStateExpectation(window));
        agree(window, p, new ManyStateExpectation(2, window));
    }

    @Test
    void aUnreachableLikelyStateIsGivenUpToThePlainStep() {
        double[] five = {10, 10.5, 9.5, 10.2, -3};
        double[] values = new double[40];
        for (int t = 0; t < 40; t++) {
            values[t] = five[t % 5];
        }
        Window window = window(values, new boolean[40]);
        Normal emission = Normal.of(new double[] {-1, 0.5}, new double[] {0.011, 0.011});
        HiddenMarkov model = HiddenMarkov.of(new double[] {1, 0}, new double[] {1, 0, 0, 1}, emission);
        Parameters p = Fixtures.standardised(model, Window.UNIT);
        ExpectedSums sums = new ExpectedSums(2);
        assertThat(new TwoStateExpectation(window).fill(p, sums)).isFalse();
        assertThat(new ManyStateExpectation(2, window).fill(p, sums)).isFalse();
        assertThat(Expectation.of(ModelKind.HIDDEN_MARKOV, 2, window).fill(p, sums))
                .isFalse();
        assertThat(new PlainExpectation(window, EmissionFamily.NORMAL).fill(p, sums))
                .isTrue();
        assertThat(sums.count).containsExactly(40, 0);
        assertThat(sums.logLikelihood).isFinite();
    }

    private static Window window(double[] values, boolean[] missing) {
        return Window.of(Observations.of(1, values, missing), EmissionFamily.NORMAL_ZERO_MEAN);
    }

    private static Expectation fastest(int states, Window window) {
        return switch (states) {
            case 2 ->
                window.size() < TwoStateExpectation.LEAST_ROWS
                        ? new ManyStateExpectation(2, window)
                        : new TwoStateExpectation(window);
            case 3 -> new ThreeStateExpectation(window);
            case 4 -> new FourStateExpectation(window);
            default -> new ManyStateExpectation(states, window);
        };
    }

    private static void agree(Window window, Parameters p, Expectation fast) {
        ExpectedSums expected = new ExpectedSums(p.states());
        ExpectedSums got = new ExpectedSums(p.states());
        assertThat(new PlainExpectation(window, EmissionFamily.NORMAL).fill(p, expected))
                .isTrue();
        assertThat(fast.fill(p, got)).isTrue();
        assertThat(got.logLikelihood)
                .isCloseTo(expected.logLikelihood, within(SAME * (1 + Math.abs(expected.logLikelihood))));
        same(got.initial, expected.initial);
        same(got.count, expected.count);
        same(got.sum, expected.sum);
        same(got.squares, expected.squares);
        if (p.kind() == ModelKind.HIDDEN_MARKOV) {
            same(got.transitions, expected.transitions);
        }
    }

    private static void same(double[] got, double[] expected) {
        for (int i = 0; i < expected.length; i++) {
            assertThat(got[i]).isCloseTo(expected[i], within(SAME * (1 + Math.abs(expected[i]))));
        }
    }
}
