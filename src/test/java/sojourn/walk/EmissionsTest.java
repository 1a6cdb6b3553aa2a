package sojourn.walk;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import sojourn.GivenPrices;
import sojourn.regime.EmissionFamily;
import sojourn.regime.Fit;
import sojourn.regime.HiddenMarkov;
import sojourn.regime.InitialDistribution;
import sojourn.regime.LongRun;
import sojourn.regime.ModelKind;
import sojourn.regime.StudentT;

/** That the choice of emission and of the chain's start acts in a walk, and looks no further ahead than the default. */
class EmissionsTest {
    private static final int BARS = 400;
    private static final GivenPrices PRICES = Walks.weathers(5, BARS, 1);
    private static final RefitSettings REFIT = Walks.expanding(200, Walks.every(60));

    @Test
    void everyEmissionGivesATimelineThatDoesNotLookAhead() {
        for (EmissionFamily family : EmissionFamily.values()) {
            for (InitialDistribution initial : InitialDistribution.values()) {
                RegimeSettings settings = settings(family, initial, Optional.empty());
                RegimeTimeline whole = Walks.forward(PRICES, settings, REFIT);
                if (family.form() != EmissionFamily.Form.NORMAL_TIED) { // the weathers have one mean
                    assertThat(whole.firstBar()).as(family.word()).isPresent();
                }
                for (int end : new int[] {230, 301}) {
                    same(Walks.forward(PRICES.first(end), settings, REFIT), whole);
                }
            }
        }
    }

    private static void same(RegimeTimeline part, RegimeTimeline whole) {
        assertThat(part.fits()).isNotEmpty();
        for (int f = 0; f < part.fits().size(); f++) {
            Fit early = part.fits().get(f).fit();
            Fit late = whole.fits().get(f).fit();
            assertThat(early.outcome()).isEqualTo(late.outcome());
            assertThat(early.logLikelihood()).isEqualTo(late.logLikelihood());
        }
        for (int bar = part.firstBar().orElse(0); bar < part.endBar(); bar++) {
            assertThat(part.probability(bar, 0)).isEqualTo(whole.probability(bar, 0));
        }
    }

    @Test
    void aStationaryChainStartsInItsLongRunAtEveryFit() {
        RegimeTimeline timeline = Walks.forward(
                PRICES, settings(EmissionFamily.STUDENT_T, InitialDistribution.STATIONARY, Optional.empty()), REFIT);
        for (FitRecord record : timeline.fits()) {
            HiddenMarkov model = (HiddenMarkov) record.fit().model().orElseThrow();
            double[] longRun = LongRun.stationary(model).orElseThrow();
            assertThat(model.start()).isEqualTo(InitialDistribution.STATIONARY);
            assertThat(model.initial(0)).isCloseTo(longRun[0], within(1e-12));
            assertThat(model.initial(1)).isBetween(0.001, 0.999);
        }
    }

    @Test
    void declaredParametersOfFatTailsAreStandardDeviations() {
        FixedParameters declared = new FixedParameters(
                List.of(0.5, 0.5),
                List.of(List.of(0.98, 0.02), List.of(0.05, 0.95)),
                List.of(0.0005, -0.0005),
                List.of(0.006, 0.02),
                List.of(5.0, 4.0));
        StudentT own = emission(EmissionFamily.STUDENT_T, declared);
        assertThat(own.standardDeviation(1, 0)).isCloseTo(0.02, within(1e-15));
        assertThat(own.scale(1))
                .isCloseTo(0.02 / Math.sqrt(2), within(1e-15)); // nu = 4: variance is twice the squared scale
        assertThat(own.degreesOfFreedom(0)).isEqualTo(5);
        FixedParameters without =
                new FixedParameters(declared.initial(), declared.transition(), declared.mean(), declared.sd());
        StudentT shared = emission(EmissionFamily.studentT(6), without);
        assertThat(shared.degreesOfFreedom(0)).isEqualTo(6);
        assertThat(shared.degreesOfFreedom(1)).isEqualTo(6);
    }

    private static StudentT emission(EmissionFamily family, FixedParameters declared) {
        RegimeSettings settings = new RegimeSettings(
                ModelKind.HIDDEN_MARKOV,
                List.of(new LogReturn("a")),
                List.of("calm", "stormy"),
                family,
                Optional.empty(),
                Optional.of(declared));
        RegimeTimeline timeline = Walks.forward(PRICES, settings, REFIT);
        return (StudentT) timeline.fits().get(0).fit().model().orElseThrow().emission();
    }

    private static RegimeSettings settings(
            EmissionFamily family, InitialDistribution initial, Optional<FixedParameters> fixed) {
        return new RegimeSettings(
                ModelKind.HIDDEN_MARKOV,
                List.of(new LogReturn("a")),
                List.of("calm", "stormy"),
                family,
                Optional.of(initial),
                Optional.empty(),
                fixed);
    }
}
