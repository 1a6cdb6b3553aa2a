package sojourn.evidence;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import sojourn.GivenPrices;
import sojourn.archive.Table;
import sojourn.inference.Probability;
import sojourn.numeric.RandomStream;
import sojourn.regime.Emission;
import sojourn.regime.EmissionFamily;
import sojourn.regime.ModelKind;
import sojourn.walk.LogReturn;
import sojourn.walk.Particulars;
import sojourn.walk.RegimeSettings;
import sojourn.walk.StateChoice;

/** Regimes whose number each fit chooses: one weather for 500 bars, then two. A regime that was not chosen has no part in anything. */
class ChosenNumberTest {
    private static final int BARS = 1000;
    private static WalkedRegimes subject;
    private static RegimeFindings found;

    @BeforeAll
    static void walk() {
        RandomStream random = RandomStream.of(9, "chosen number");
        double[] closes = new double[BARS];
        closes[0] = 100;
        for (int bar = 1; bar < BARS; bar++) {
            boolean storm = bar > 500 && bar / 30 % 2 == 0;
            closes[bar] = closes[bar - 1] * StrictMath.exp((storm ? 0.03 : 0.01) * random.nextNormal());
        }
        RegimeSettings choosing = new RegimeSettings(
                ModelKind.HIDDEN_MARKOV,
                List.of(new LogReturn("a")),
                List.of("all", "calm", "stormy"),
                EmissionFamily.NORMAL,
                Optional.empty(),
                Optional.empty(),
                Optional.empty(),
                Particulars.choosing(
                        new StateChoice(List.of(List.of("all"), List.of("calm", "stormy")), StateChoice.By.BIC)));
        subject = Subjects.walked(GivenPrices.closes(closes), choosing, Subjects.expanding(300, 100));
        found = Subjects.findings(subject);
    }

    @Test
    void thePathOfChoicesIsTold() {
        FitsTold fits = found.fits();
        assertThat(fits.numbers().keySet()).containsExactly(1, 2);
        assertThat(fits.numbers().values().stream().mapToInt(one -> one).sum()).isEqualTo(7);
        assertThat(subject.timeline().fits()).hasSize(7); // at observations 300, 400 … 900
        assertThat(fits.changes()).isEqualTo(1);
    }

    @Test
    void aFrozenFilterSaysWhatTheTimelineSaidOfEveryRegime() {
        for (Stretch stretch : subject.stretches()) {
            FrozenFilter filter = FrozenFilter.of(subject, stretch, stretch.end());
            for (int bar = stretch.from(); bar < stretch.end(); bar++) {
                for (int k = 0; k < 3; k++) {
                    assertThat(filter.probability(bar, k))
                            .isEqualTo(subject.timeline().probability(bar, k));
                }
                assertThat(filter.mostLikely(bar)).isEqualTo(subject.mostLikely(bar));
            }
        }
    }

    /** u = F(x) of the one regime; of two, mixed by the probabilities one bar on. */
    @Test
    void residualsAreThoseOfTheRegimesInForce() {
        PseudoResiduals residuals = Subjects.found(found.residuals());
        int checked = 0;
        for (Stretch stretch : subject.stretches()) {
            Emission emission = stretch.record().fit().model().orElseThrow().emission();
            int bar = stretch.from() + 1;
            double[] next = subject.timeline().reading(bar - 1).orElseThrow().predicted(1);
            double x = subject.observed().at(bar).orElseThrow();
            double expected = 0;
            for (int k = 0; k < emission.states(); k++) {
                double weight = emission.states() == 1 ? 1 : next[1 + k];
                expected +=
                        weight * Probability.normalBelow((x - emission.mean(k, 0)) / emission.standardDeviation(k, 0));
            }
            assertThat(residuals.uniform().at(bar)).hasValueCloseTo(expected, within(1e-12));
            checked++;
        }
        assertThat(checked).isEqualTo(7);
    }

    @Test
    void cardsLineageAndTablesLeaveOutWhatWasNotChosen() {
        List<IdentityCard> cards = Subjects.found(found.cards());
        assertThat(cards).extracting(IdentityCard::regime).containsExactly("all", "calm", "stormy");
        assertThat(cards.get(0).lastFit().share()).hasValue(0);
        assertThat(cards.get(0).lastFit().stay()).isEmpty();
        assertThat(cards.get(0).lastFit().returns().deviation().number()).isEmpty();
        assertThat(cards.get(1).lastFit().share().orElseThrow()
                        + cards.get(2).lastFit().share().orElseThrow())
                .isCloseTo(1, within(1e-9));
        assertThat(cards.get(0).asLived().mostLikely()).isGreaterThan(0.2);
        Lineage lineage = Subjects.found(found.lineage());
        assertThat(lineage.compared()).hasSize(5); // of six refits one changed the number
        Table table = RegimeTables.lineage(found);
        int first = table.columns().indexOf("deviation.all");
        assertThat(table.rows().get(0).get(first)).isNotEmpty();
        assertThat(table.rows().get(0).get(first + 1)).isEmpty();
        assertThat(table.rows().get(6).get(first)).isEmpty();
        assertThat(table.rows().get(6).get(first + 2)).isNotEmpty();
        assertThat(RegimeTables.bars(found).rows()).hasSize(subject.timeline().endBar() - 300);
    }

    @Test
    void rivalsHaveTheMostRegimesThatAreChosenAmong() {
        assertThat(Rivals.of(subject.regimes()))
                .filteredOn(rival -> rival.model() == ModelKind.MIXTURE)
                .extracting(RegimeSettings::states)
                .containsExactly(List.of("calm", "stormy"));
        assertThat(Subjects.found(found.forecasts()).rows()).hasSizeGreaterThan(4);
    }
}
