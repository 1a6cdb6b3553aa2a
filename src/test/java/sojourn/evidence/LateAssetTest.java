package sojourn.evidence;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import sojourn.GivenPrices;
import sojourn.regime.EmissionFamily;
import sojourn.regime.Fit;
import sojourn.regime.ModelKind;
import sojourn.walk.KnownAfter;
import sojourn.walk.LogReturn;
import sojourn.walk.RegimeSettings;

/** An asset whose closes the strategy declares to be known late: nobody that the strategy is held against knows them earlier. */
class LateAssetTest {
    private static final int BARS = 320;
    private static final int LATE = 4;
    private static final RegimeSettings REGIMES = new RegimeSettings(
            ModelKind.HIDDEN_MARKOV,
            List.of(new KnownAfter(new LogReturn("a"), LATE)),
            List.of("calm", "stormy"),
            EmissionFamily.NORMAL,
            Optional.empty(),
            Optional.empty());

    /** Changed closes of the last bars, whose returns nobody knew yet at the last close. */
    private static WalkedRegimes subject(int changed) {
        GivenPrices honest = Subjects.twoWeathers(5, BARS);
        double[] closes = new double[BARS];
        for (int bar = 0; bar < BARS; bar++) {
            closes[bar] = honest.close(0, bar) * (bar >= BARS - changed ? 1.3 : 1);
        }
        return Subjects.walked(GivenPrices.closes(closes), REGIMES, Subjects.expanding(250, 20));
    }

    @Test
    void noRivalKnowsACloseBeforeTheStrategyDoes() {
        List<Rival> honest = Subjects.rivals(subject(0));
        List<Rival> changed = Subjects.rivals(subject(LATE));
        List<Rival> earlier = Subjects.rivals(subject(LATE + 1));
        assertThat(honest).hasSize(4);
        int moved = 0;
        for (int rival = 0; rival < honest.size(); rival++) {
            assertThat(last(changed.get(rival))).as(honest.get(rival).gauge()).isEqualTo(last(honest.get(rival)));
            moved += last(earlier.get(rival)).equals(last(honest.get(rival))) ? 0 : 1;
        }
        assertThat(moved).isPositive();
    }

    /** The probabilities at the last close. */
    private static List<Double> last(Rival rival) {
        WalkedRegimes walked = rival.subject();
        return walked.timeline().regimes().stream()
                .map(regime -> walked.timeline()
                        .probability(BARS - 1, walked.timeline().regimes().indexOf(regime)))
                .toList();
    }

    /** The forecast of the last bar was made the close before, when one bar less was known. */
    @Test
    void noForecastOfVolatilityKnowsACloseBeforeTheStrategyDoes() {
        for (String name : List.of(RegimeEvidence.EXPONENTIAL, RegimeEvidence.ROLLING)) {
            OptionalDouble honest = ofLastBar(subject(0), name);
            assertThat(honest).isPresent();
            assertThat(ofLastBar(subject(LATE + 1), name)).isEqualTo(honest);
            assertThat(ofLastBar(subject(LATE + 2), name)).isNotEqualTo(honest);
        }
    }

    private static OptionalDouble ofLastBar(WalkedRegimes subject, String name) {
        return Optional.ofNullable(Contenders.of(subject, Subjects.attempts(List.of()))
                        .secondMoments()
                        .get(name))
                .orElseThrow()
                .at(BARS - 1);
    }

    /** The cards' deviations in the last fit's window are those that named its regimes, from the same bars. */
    @Test
    void theCardsOfTheLastFitLeaveOutWhatWasNotKnown() {
        WalkedRegimes subject = subject(LATE);
        Stretch last = subject.stretches().get(subject.stretches().size() - 1);
        Fit fit = last.record().fit();
        List<IdentityCard> cards = Subjects.found(IdentityCards.of(subject));
        for (int k = 0; k < 2; k++) {
            double deviation =
                    cards.get(k).lastFit().returns().deviation().number().orElseThrow();
            // the same sum in another order
            assertThat(deviation).isCloseTo(fit.orderBy()[k], within(1e-12));
        }
    }
}
