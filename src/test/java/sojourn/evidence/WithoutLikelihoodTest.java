package sojourn.evidence;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import sojourn.inference.Estimate;
import sojourn.walk.RegimeSettings;

/** Gauges without a likelihood: what can be asked of them is answered, and the rest says why not. */
class WithoutLikelihoodTest {
    @ParameterizedTest
    @ValueSource(strings = {"volatility-threshold", "jump"})
    void whatCanBeAskedIsAnsweredAndTheRestSaysWhyNot(String gauge) {
        WalkedRegimes markov = Subjects.walked(Subjects.twoWeathers(23, 1500), 700, 200);
        RegimeSettings own = Rivals.of(markov.regimes()).stream()
                .filter(one -> one.model().word().equals(gauge))
                .findFirst()
                .orElseThrow();
        RegimeFindings found =
                Subjects.findings(Subjects.walked(Subjects.twoWeathers(23, 1500), own, Subjects.expanding(700, 200)));
        assertThat(found.ofObservation().because()).contains("no density");
        assertThat(found.residuals().because()).contains("no distribution");
        assertThat(found.reproduction().because()).contains("no distribution");
        assertCards(Subjects.found(found.cards()));
        assertThat(Subjects.found(found.lineage()).compared()).hasSize(3);
        assertThat(Subjects.found(found.influence()).bars()).isNotEmpty();
        assertThat(Subjects.found(found.ofReturn()).rows())
                .extracting(ScoreContest.Row::gauge)
                .contains("hidden-markov", "one-regime");
        assertThat(Subjects.found(found.forecasts()).rows())
                .extracting(ForecastContest.Row::gauge)
                .startsWith(gauge)
                .contains("hidden-markov", RegimeEvidence.EXPONENTIAL, RegimeEvidence.ROLLING);
        assertThat(found.absent()).isEmpty();
    }

    private static void assertCards(List<IdentityCard> cards) {
        assertThat(cards).hasSize(2);
        for (IdentityCard card : cards) {
            assertThat(card.lastFit().stay()).isPresent();
            assertThat(card.lastFit().returns().deviation().number()).isPresent();
            assertThat(card.lastFit().returns().deviationError()).isInstanceOf(Estimate.Undefined.class);
            assertThat(card.asLived().nextBar().deviationError()).isInstanceOf(Estimate.Value.class);
        }
        assertThat(cards.get(1).asLived().nextBar().deviation().number().orElseThrow())
                .isGreaterThan(
                        cards.get(0).asLived().nextBar().deviation().number().orElseThrow());
    }
}
