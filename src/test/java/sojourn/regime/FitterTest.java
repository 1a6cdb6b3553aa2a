package sojourn.regime;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.function.Supplier;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import sojourn.OpenData;
import sojourn.numeric.RandomStream;

/** What a fit promises whatever the data: roles, invariances, determinism, recovery of the truth. */
class FitterTest {
    private static final FitSettings TWO = new FitSettings(ModelKind.HIDDEN_MARKOV, 2, EmissionFamily.NORMAL, 5);
    private static final HiddenMarkov TRUTH = HiddenMarkov.of(
            new double[] {1, 0},
            new double[] {0.98, 0.02, 0.05, 0.95},
            Normal.of(new double[] {0.0006, -0.0008}, new double[] {0.007, 0.02}));

    @Test
    void recoversTheTruthWithinItsStandardErrors() {
        double[] x = Fixtures.simulate(TRUTH, 6000, RandomStream.of(21, "truth"));
        Fit fit = Fitter.fit(TWO, Fixtures.request(x));
        RegimeModel model = fit.model().orElseThrow();
        assertThat(fit.outcome()).isEqualTo(Outcome.CONVERGED);
        assertThat(fit.logLikelihood())
                .isGreaterThan(
                        FilterState.after(TRUTH, Observations.univariate(x)).logLikelihood());
        for (int k = 0; k < 2; k++) {
            double n = fit.occupancy()[k] * x.length;
            double sd = TRUTH.emission().standardDeviation(k, 0);
            // five standard errors of complete data: sd / sqrt(n), sd / sqrt(2 n), sqrt(a (1 - a) / n)
            assertThat(model.emission().mean(k, 0))
                    .isCloseTo(TRUTH.emission().mean(k, 0), within(5 * sd / Math.sqrt(n)));
            assertThat(model.emission().standardDeviation(k, 0)).isCloseTo(sd, within(5 * sd / Math.sqrt(2 * n)));
            double a = TRUTH.transition(k, k);
            assertThat(model.transition(k, k)).isCloseTo(a, within(5 * Math.sqrt(a * (1 - a) / n)));
        }
        assertThat(fit.occupancy()[0] + fit.occupancy()[1]).isCloseTo(1, within(1e-12));
    }

    @Test
    void aNewUnitChangesNothingButTheUnit() {
        double[] x = Fixtures.simulate(TRUTH, 800, RandomStream.of(22, "unit"));
        double[] eight = new double[x.length];
        double[] third = new double[x.length];
        for (int t = 0; t < x.length; t++) {
            eight[t] = 8 * x[t];
            third[t] = x[t] / 3;
        }
        Fit fit = Fitter.fit(TWO, Fixtures.request(x));
        Fit byEight = Fitter.fit(TWO, Fixtures.request(eight));
        Fit byThird = Fitter.fit(TWO, Fixtures.request(third));
        double[] last = last(fit, x);
        assertThat(byEight.logLikelihood()).isCloseTo(fit.logLikelihood() - x.length * StrictMath.log(8), within(1e-8));
        assertThat(byThird.logLikelihood()).isCloseTo(fit.logLikelihood() + x.length * StrictMath.log(3), within(1e-8));
        for (int k = 0; k < 2; k++) {
            // a power of two scales doubles exactly
            assertThat(byEight.model().orElseThrow().emission().standardDeviation(k, 0))
                    .isEqualTo(8 * fit.model().orElseThrow().emission().standardDeviation(k, 0));
            assertThat(last(byEight, eight)[k]).isCloseTo(last[k], within(1e-12));
            assertThat(last(byThird, third)[k]).isCloseTo(last[k], within(1e-6));
        }
    }

    @ParameterizedTest
    @ValueSource(ints = {2, 3, 4})
    void relabellingChangesNoLikelihood(int states) {
        RandomStream random = RandomStream.of(23, "labels", "states " + states);
        HiddenMarkov model = Fixtures.randomModel(states, random);
        Observations x = Observations.univariate(Fixtures.simulate(model, 60, random));
        int[] order = new int[states];
        for (int k = 0; k < states; k++) {
            order[k] = (k + 1) % states;
        }
        FilterState plain = FilterState.after(model, x);
        FilterState turned = FilterState.after(model.ordered(order), x);
        assertThat(turned.logLikelihood()).isCloseTo(plain.logLikelihood(), within(1e-11));
        for (int k = 0; k < states; k++) {
            assertThat(turned.probability(k)).isCloseTo(plain.probability(order[k]), within(1e-13));
        }
    }

    @Test
    void everyEmStepClimbs() {
        RandomStream random = RandomStream.of(24, "climb");
        for (int states = 2; states <= 4; states++) {
            double[] x = Fixtures.simulate(Fixtures.randomModel(states, random), 200, random);
            Window window = Window.of(Observations.univariate(x), EmissionFamily.NORMAL);
            FitSettings settings = new FitSettings(ModelKind.HIDDEN_MARKOV, states, EmissionFamily.NORMAL, 4);
            for (Parameters start : new Starts(settings, window).all(Fixtures.request(x))) {
                Parameters at = start;
                double before = Double.NEGATIVE_INFINITY;
                for (int step = 0; step < 60; step++) {
                    ExpectedSums sums = new ExpectedSums(states);
                    assertThat(new PlainExpectation(window, EmissionFamily.NORMAL).fill(at, sums))
                            .isTrue();
                    assertThat(sums.logLikelihood).isGreaterThanOrEqualTo(before - 1e-10);
                    before = sums.logLikelihood;
                    at = new Maximisation(EmissionFamily.NORMAL).next(at, sums);
                }
            }
        }
    }

    @Test
    void speedingUpEndsNoLowerThanPlainEm() {
        double[] x = OpenData.column("dax/eustock_dax.csv", "log_return");
        Window window = Window.of(Observations.univariate(x), EmissionFamily.NORMAL);
        for (Parameters start : new Starts(TWO, window).all(Fixtures.request(x))) {
            ExpectedSums sums = new ExpectedSums(2);
            Parameters at = start;
            for (int step = 0; step < 1000; step++) {
                assertThat(new TwoStateExpectation(window).fill(at, sums)).isTrue();
                at = new Maximisation(EmissionFamily.NORMAL).next(at, sums);
            }
            Climb.Summit summit = Climb.from(start, window, EmissionFamily.NORMAL);
            assertThat(summit.logLikelihood()).isGreaterThan(sums.logLikelihood - 1e-6);
            assertThat(summit.evaluations()).isLessThan(200);
        }
    }

    @Test
    void oneStateIsTheSameModelUnderEveryName() {
        double[] x = OpenData.column("sp500/sp500_monthly.csv", "log_return");
        Fit chain =
                Fitter.fit(new FitSettings(ModelKind.HIDDEN_MARKOV, 1, EmissionFamily.NORMAL, 3), Fixtures.request(x));
        Fit single =
                Fitter.fit(new FitSettings(ModelKind.ONE_REGIME, 1, EmissionFamily.NORMAL, 3), Fixtures.request(x));
        Fit mixture = Fitter.fit(new FitSettings(ModelKind.MIXTURE, 1, EmissionFamily.NORMAL, 3), Fixtures.request(x));
        for (Fit other : List.of(single, mixture)) {
            assertThat(other.logLikelihood()).isEqualTo(chain.logLikelihood());
            assertThat(other.orderBy()).isEqualTo(chain.orderBy());
            assertThat(other.moments().orElseThrow().covariance(0, 0, 0))
                    .isEqualTo(chain.moments().orElseThrow().covariance(0, 0, 0));
        }
        double n = x.length;
        double sd = chain.model().orElseThrow().emission().standardDeviation(0, 0);
        // closed form: -T/2 (ln(2 pi s2) + 1)
        assertThat(chain.logLikelihood()).isCloseTo(-n / 2 * (StrictMath.log(2 * Math.PI * sd * sd) + 1), within(1e-9));
    }

    @Test
    void threadsChangeNoBit() {
        double[] x = OpenData.column("smi/eustock_smi.csv", "log_return");
        StartRunner parallel = new StartRunner() {
            @Override
            public <T> List<T> run(List<Supplier<T>> starts) {
                return starts.parallelStream().map(Supplier::get).toList();
            }
        };
        Fit alone = Fitter.fit(TWO, Fixtures.request(x));
        Fit together = Fitter.fit(TWO, Fixtures.request(x), parallel);
        assertThat(together.logLikelihood()).isEqualTo(alone.logLikelihood());
        assertThat(together.orderBy()).isEqualTo(alone.orderBy());
        assertThat(together.occupancy()).isEqualTo(alone.occupancy());
        assertThat(together.iterations()).isEqualTo(alone.iterations());
        assertThat(together.events()).isEqualTo(alone.events());
        assertThat(last(together, x)).isEqualTo(last(alone, x));
    }

    @Test
    void otherSeedsAndDatesDrawOtherStarts() {
        double[] x = OpenData.column("smi/eustock_smi.csv", "log_return");
        Window window = Window.of(Observations.univariate(x), EmissionFamily.NORMAL);
        Starts starts = new Starts(TWO, window);
        Companions none = Companions.of(1, x);
        Observations observations = Observations.univariate(x);
        List<Parameters> one = starts.all(FitRequest.of(observations, x, none, 1, "2001-01-01"));
        List<Parameters> seed = starts.all(FitRequest.of(observations, x, none, 2, "2001-01-01"));
        List<Parameters> date = starts.all(FitRequest.of(observations, x, none, 1, "2001-01-02"));
        assertThat(one).hasSize(5);
        int mean = one.get(1).mean(0);
        assertThat(seed.get(1).at(mean)).isNotEqualTo(one.get(1).at(mean));
        assertThat(date.get(1).at(mean)).isNotEqualTo(one.get(1).at(mean));
        assertThat(seed.get(0).at(mean)).isEqualTo(one.get(0).at(mean));
    }

    @Test
    void rolesFollowTheVolatilityOfTheOrderBySeries() {
        double[] x = Fixtures.simulate(TRUTH, 1500, RandomStream.of(25, "roles"));
        double[] opposite = new double[x.length]; // volatile exactly where x is calm
        for (int t = 0; t < x.length; t++) {
            opposite[t] = (t % 2 == 0 ? 1 : -1) * 0.01 / (0.2 + StrictMath.abs(x[t]) * 100);
        }
        Observations observations = Observations.univariate(x);
        Fit fit = Fitter.fit(TWO, FitRequest.of(observations, opposite, Companions.of(1, x), 1, Fixtures.DATE));
        RegimeModel model = fit.model().orElseThrow();
        assertThat(fit.orderBy()[0]).isLessThan(fit.orderBy()[1]);
        assertThat(model.emission().standardDeviation(0, 0))
                .isGreaterThan(model.emission().standardDeviation(1, 0));
        Smoothed smoothed = Smoothed.of(model, observations);
        for (int k = 0; k < 2; k++) {
            double weight = 0;
            double mean = 0;
            for (int t = 0; t < x.length; t++) {
                weight += smoothed.at(t, k);
                mean += smoothed.at(t, k) * x[t];
            }
            mean /= weight;
            double square = 0;
            for (int t = 0; t < x.length; t++) {
                square += smoothed.at(t, k) * (x[t] - mean) * (x[t] - mean) / weight;
            }
            WindowMoments moments = fit.moments().orElseThrow();
            assertThat(moments.mean(k, 0)).isCloseTo(mean, within(1e-15));
            assertThat(moments.covariance(k, 0, 0)).isCloseTo(square, within(1e-15));
            assertThat(fit.occupancy()[k]).isCloseTo(weight / x.length, within(1e-12));
        }
    }

    @Test
    void theRunnerUpIsTheBestOfTheStartsThatEndedLower() {
        double[] x = OpenData.column("smi/eustock_smi.csv", "log_return");
        FitSettings three = new FitSettings(ModelKind.HIDDEN_MARKOV, 3, EmissionFamily.NORMAL, 20);
        Fit fit = Fitter.fit(three, Fixtures.request(x));
        List<Double> below = new ArrayList<>();
        double highest = Double.NEGATIVE_INFINITY;
        Soundness soundness = new Soundness(1, Double.NEGATIVE_INFINITY);
        List<SearchEnd> ends = new ScalarSearch(three, Observations.univariate(x))
                .starts(Fixtures.request(x)).stream().map(Supplier::get).toList();
        for (SearchEnd end : ends) {
            highest = soundness.sound(end) ? Math.max(highest, end.logLikelihood()) : highest;
        }
        for (SearchEnd end : ends) {
            if (soundness.sound(end) && end.logLikelihood() < highest - 1e-4) {
                below.add(end.logLikelihood());
            }
        }
        below.sort(Comparator.reverseOrder());
        RunnerUp second = fit.runnerUp().orElseThrow();
        assertThat(second.gap()).isCloseTo(highest - below.get(0), within(1e-6)).isGreaterThan(1e-4);
        assertThat(second.starts()).isEqualTo((int)
                below.stream().filter(l -> l >= below.get(0) - 1e-4).count());
        assertThat(fit.startsAgreeing() + below.size()).isLessThanOrEqualTo(20);
    }

    @Test
    void startsThatAllAgreeLeaveNoRunnerUp() {
        double[] x = OpenData.column("nyse/nyse_1990_2005.csv", "log_return");
        Fit fit = Fitter.fit(TWO, Fixtures.request(x));
        assertThat(fit.startsAgreeing()).isEqualTo(fit.starts());
        assertThat(fit.runnerUp()).isEmpty();
    }

    @Test
    void thePreviousFitIsOneMoreStart() {
        double[] x = Fixtures.simulate(TRUTH, 900, RandomStream.of(26, "previous"));
        double[] shorter = Arrays.copyOf(x, 850);
        Fit earlier = Fitter.fit(TWO, Fixtures.request(shorter));
        Fit later = Fitter.fit(TWO, Fixtures.request(x).after(earlier));
        assertThat(later.starts()).isEqualTo(6);
        assertThat(later.startsAgreeing()).isBetween(1, 6);
        assertThat(later.logLikelihood())
                .isCloseTo(Fitter.fit(TWO, Fixtures.request(x)).logLikelihood(), within(1e-6));
        Fit failed = Fitter.fit(TWO, Fixtures.request(new double[3]));
        assertThatThrownBy(() -> Fixtures.request(x).after(failed)).hasMessageContaining("failed");
    }

    private static double[] last(Fit fit, double[] x) {
        return FilterState.after(fit.model().orElseThrow(), Observations.univariate(x))
                .probabilities();
    }
}
