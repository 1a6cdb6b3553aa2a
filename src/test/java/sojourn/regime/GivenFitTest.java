package sojourn.regime;

import static org.assertj.core.api.Assertions.assertThat;

import org.junit.jupiter.api.Test;
import sojourn.numeric.RandomStream;

/** Given parameters are described like fitted ones, in the order given; events tell what is odd about the states. */
class GivenFitTest {
    private static final double[] X = Fixtures.simulate(
            HiddenMarkov.of(
                    new double[] {1, 0},
                    new double[] {0.95, 0.05, 0.05, 0.95},
                    Normal.of(new double[] {0, 0}, new double[] {1, 3})),
            400,
            RandomStream.of(41, "given"));

    private static Fit given(RegimeModel model) {
        return Fitter.given(model, Fixtures.request(X));
    }

    private static HiddenMarkov chain(double stay, double[] means, double[] deviations) {
        int states = means.length;
        double[] initial = new double[states];
        double[] transition = new double[states * states];
        for (int i = 0; i < states; i++) {
            initial[i] = 1.0 / states;
            for (int j = 0; j < states; j++) {
                transition[i * states + j] = i == j ? stay : (1 - stay) / (states - 1);
            }
        }
        return HiddenMarkov.of(initial, transition, Normal.of(means, deviations));
    }

    @Test
    void keepsParametersAndOrder() {
        HiddenMarkov model = chain(0.95, new double[] {0, 0}, new double[] {1, 3});
        Fit fit = given(model);
        assertThat(fit.outcome()).isEqualTo(Outcome.GIVEN);
        assertThat(fit.outcome().accepted()).isTrue();
        assertThat(fit.model()).containsSame(model);
        assertThat(fit.logLikelihood())
                .isEqualTo(FilterState.after(model, Observations.univariate(X)).logLikelihood());
        assertThat(fit.iterations()).isZero();
        assertThat(fit.starts()).isZero();
        assertThat(fit.explanation()).contains("given");
        assertThat(fit.events()).isEmpty();
        assertThat(fit.orderBy()[0]).isLessThan(fit.orderBy()[1]);
    }

    @Test
    void tellsThatVolatilitiesDoNotAscend() {
        Fit fit = given(chain(0.95, new double[] {0, 0}, new double[] {3, 1}));
        assertThat(fit.events()).containsExactly("not-ascending {0}/{1}");
        assertThat(fit.model().orElseThrow().emission().standardDeviation(0, 0)).isEqualTo(3);
    }

    @Test
    void tellsTwins() {
        Fit fit = given(chain(0.95, new double[] {0, 0}, new double[] {2, 2}));
        assertThat(fit.events()).contains("near-tie {0}/{1}", "duplicated {0}/{1}");
    }

    @Test
    void tellsAStateThatIsNeverLeft() {
        HiddenMarkov model = HiddenMarkov.of(
                new double[] {1, 0},
                new double[] {0.9, 0.1, 0, 1},
                Normal.of(new double[] {0, 0}, new double[] {0.8, 2.5}));
        assertThat(given(model).events()).contains("absorbing {1}");
    }

    @Test
    void aStateWithoutRowsGetsTheMomentsOfTheWindow() {
        HiddenMarkov model = HiddenMarkov.of(
                new double[] {1, 0}, new double[] {1, 0, 0.5, 0.5}, Normal.of(new double[] {0, 0}, new double[] {1, 3
                }));
        Fit fit = given(model);
        assertThat(fit.events()).contains("moments-of-window {1}", "collapsed {1} occupancy 0.0000", "absorbing {0}");
        assertThat(fit.occupancy()).containsExactly(1, 0);
        WindowMoments moments = fit.moments().orElseThrow();
        assertThat(moments.covariance(1, 0, 0)).isEqualTo(moments.covariance(0, 0, 0));
        assertThat(fit.orderBy()[1]).isEqualTo(fit.orderBy()[0]);
    }

    @Test
    void tellsSwapsAgainstThePreviousFit() {
        Fit before = given(chain(0.95, new double[] {0, 0}, new double[] {1, 3}));
        Fit after = Fitter.given(
                chain(0.95, new double[] {0, 0}, new double[] {3, 1}),
                Fixtures.request(X).after(before));
        assertThat(after.events()).contains("swap {0}->{1}", "swap {1}->{0}");
    }

    @Test
    void anImpossibleObservationFails() {
        double[] far = X.clone();
        far[7] = 1e200;
        Fit fit = Fitter.given(chain(0.95, new double[] {0, 0}, new double[] {1, 3}), Fixtures.request(far));
        assertThat(fit.outcome()).isEqualTo(Outcome.FAILED);
        assertThat(fit.explanation()).contains("impossible");
        assertThat(fit.logLikelihood()).isEqualTo(Double.NEGATIVE_INFINITY);
    }
}
