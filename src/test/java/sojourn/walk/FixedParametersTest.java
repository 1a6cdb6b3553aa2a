package sojourn.walk;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import sojourn.GivenPrices;
import sojourn.archive.TimelineFiles;
import sojourn.regime.EmissionFamily;
import sojourn.regime.ModelKind;
import sojourn.regime.Outcome;
import sojourn.regime.RegimeModel;

/** Declared parameters are used as they are, and said to be given. */
class FixedParametersTest {
    private static final FixedParameters DECLARED = new FixedParameters(
            List.of(0.3, 0.7),
            List.of(List.of(0.97, 0.03), List.of(0.08, 0.92)),
            List.of(0.001, -0.002),
            List.of(0.007, 0.03));
    private static final GivenPrices PRICES = Walks.weathers(51, 200, 1);

    @Test
    void everyFitIsGivenAndHoldsExactlyWhatWasDeclared() {
        RegimeTimeline timeline = Walks.forward(
                PRICES, declaring(DECLARED, EmissionFamily.NORMAL), Walks.expanding(100, Walks.every(30)));
        assertThat(timeline.fits()).hasSize(4);
        for (FitRecord record : timeline.fits()) {
            assertThat(record.fit().outcome()).isEqualTo(Outcome.GIVEN);
            assertThat(record.fit().explanation()).isEqualTo("the parameters were given, not estimated");
            RegimeModel model = record.fit().model().orElseThrow();
            for (int i = 0; i < 2; i++) {
                assertThat(model.initial(i)).isEqualTo(DECLARED.initial().get(i));
                assertThat(model.emission().mean(i, 0))
                        .isEqualTo(DECLARED.mean().get(i));
                assertThat(model.emission().standardDeviation(i, 0))
                        .isEqualTo(DECLARED.sd().get(i));
                for (int j = 0; j < 2; j++) {
                    assertThat(model.transition(i, j))
                            .isEqualTo(DECLARED.transition().get(i).get(j));
                }
            }
        }
    }

    @Test
    void onAnExpandingWindowTheFilterRunsOnAsIfItHadNeverBeenRestarted() {
        RegimeTimeline timeline = Walks.forward(
                PRICES, declaring(DECLARED, EmissionFamily.NORMAL), Walks.expanding(100, Walks.every(30)));
        double[] x = new double[199];
        Arrays.setAll(x, i -> Math.log(PRICES.close(0, i + 1) / PRICES.close(0, i)));
        List<PlainFilter.Step> steps = PlainFilter.of(
                        TimelineFiles.fits(timeline, List.of("log_return_a")),
                        0,
                        List.of("calm", "stormy"),
                        "log_return_a")
                .over(x);
        for (int bar = 100; bar < 200; bar++) {
            assertThat(timeline.probability(bar, 1))
                    .isCloseTo(steps.get(bar - 1).filtered().get(1), within(1e-12));
        }
    }

    @Test
    void aZeroMeanDeclarationLeavesTheMeansAtZero() {
        FixedParameters zero =
                new FixedParameters(DECLARED.initial(), DECLARED.transition(), List.of(0.0, 0.0), DECLARED.sd());
        RegimeTimeline timeline = Walks.forward(
                PRICES, declaring(zero, EmissionFamily.NORMAL_ZERO_MEAN), Walks.expanding(100, Walks.every(1000)));
        RegimeModel model = timeline.fits().get(0).fit().model().orElseThrow();
        assertThat(model.emission().mean(0, 0)).isZero();
        assertThat(model.emission().mean(1, 0)).isZero();
    }

    @Test
    void declaredRegimesKeepTheirOrderAndEventsCallThemByName() {
        FixedParameters turned =
                new FixedParameters(DECLARED.initial(), DECLARED.transition(), DECLARED.mean(), List.of(0.03, 0.007));
        RegimeTimeline timeline = Walks.forward(
                PRICES, declaring(turned, EmissionFamily.NORMAL), Walks.expanding(100, Walks.every(1000)));
        FitRecord record = timeline.fits().get(0);
        assertThat(record.fit().model().orElseThrow().emission().standardDeviation(0, 0))
                .isEqualTo(0.03);
        assertThat(record.events()).contains("not-ascending calm/stormy");
        assertThat(String.join(" ", record.events())).doesNotContain("{").doesNotContain("}");
    }

    @Test
    void parametersThatMakeTheWindowImpossibleAreRefused() {
        FixedParameters tiny = new FixedParameters(
                DECLARED.initial(), DECLARED.transition(), DECLARED.mean(), List.of(1e-160, 1e-160));
        RegimeTimeline timeline =
                Walks.forward(PRICES, declaring(tiny, EmissionFamily.NORMAL), Walks.expanding(100, Walks.every(1000)));
        assertThat(timeline.fits()).hasSize(1);
        assertThat(timeline.fits().get(0).fit().outcome()).isEqualTo(Outcome.FAILED);
        assertThat(timeline.firstBar()).isEmpty();
    }

    private static RegimeSettings declaring(FixedParameters declared, EmissionFamily emission) {
        return new RegimeSettings(
                ModelKind.HIDDEN_MARKOV,
                List.of(new LogReturn("a")),
                List.of("calm", "stormy"),
                emission,
                Optional.empty(),
                Optional.of(declared));
    }
}
