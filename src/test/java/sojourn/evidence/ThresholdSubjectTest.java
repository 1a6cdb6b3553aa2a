package sojourn.evidence;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import sojourn.inference.Estimate;
import sojourn.walk.RegimeSettings;

/** A gauge without a likelihood: what can be asked of it is answered, and the rest says why not. */
class ThresholdSubjectTest {
    private static RegimeFindings found;

    @BeforeAll
    static void walk() {
        Subject markov = Subjects.walked(Subjects.twoWeathers(23, 1500), 700, 200);
        RegimeSettings threshold = Rivals.of(markov.regimes()).stream()
                .filter(one -> one.model().word().equals("volatility-threshold"))
                .findFirst()
                .orElseThrow();
        found = Subjects.findings(
                Subjects.walked(Subjects.twoWeathers(23, 1500), threshold, Subjects.expanding(700, 200)));
    }

    @Test
    void whatNeedsALikelihoodSaysWhyItIsUndefined() {
        assertThat(found.ofObservation().because()).contains("no density");
        assertThat(found.residuals().because()).contains("no distribution");
        assertThat(found.reproduction().because()).contains("no distribution");
    }

    @Test
    void theRestIsAnswered() {
        List<IdentityCard> cards = Subjects.found(found.cards());
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
        assertThat(Subjects.found(found.lineage()).compared()).hasSize(3);
        assertThat(Subjects.found(found.influence()).bars()).isNotEmpty();
        ScoreContest contest = Subjects.found(found.ofReturn());
        assertThat(contest.rows()).extracting(ScoreContest.Row::gauge).contains("hidden-markov", "one-regime");
        assertThat(Subjects.found(found.forecasts()).rows())
                .extracting(ForecastContest.Row::gauge)
                .startsWith("volatility-threshold")
                .contains("hidden-markov", RegimeEvidence.EXPONENTIAL, RegimeEvidence.ROLLING);
    }
}
