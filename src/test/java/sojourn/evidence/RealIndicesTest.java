package sojourn.evidence;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import sojourn.GivenPrices;
import sojourn.inference.Estimate;

/**
 * What everybody who fits two regimes to daily index returns finds. Common practice, no source: regimes persist, storms are clearly more
 * volatile, the model's returns have fatter tails than a normal, and its sizes cluster, which those of an independent mixture do not.
 */
class RealIndicesTest {
    @ParameterizedTest
    @ValueSource(strings = {"nyse/nyse_1990_2005.csv", "dax/eustock_dax.csv", "smi/eustock_smi.csv"})
    void regimesAreWhatTheyAreKnownToBe(String file) {
        GivenPrices prices = Subjects.real(file);
        int bars = prices.size();
        RegimeFindings found = Subjects.findings(Subjects.walked(prices, bars / 2, bars / 8));
        List<IdentityCard> cards = Subjects.found(found.cards());
        for (IdentityCard card : cards) {
            double stays = 1 - 1 / card.lastFit().stay().orElseThrow();
            assertThat(stays).as(card.regime()).isGreaterThan(0.9);
        }
        assertThat(volatility(found, cards.get(1))).isGreaterThan(1.5 * volatility(found, cards.get(0)));
        // and so it is on the bar after, by what was known the close before
        assertThat(cards.get(1).asLived().nextBar().deviation().number().orElseThrow())
                .isGreaterThan(1.2
                        * cards.get(0).asLived().nextBar().deviation().number().orElseThrow());

        ImpliedMoments chain = implied(found.subject());
        ImpliedMoments mixture = Subjects.rivals(found.subject()).stream()
                .map(Rival::subject)
                .filter(rival -> rival.gauge().equals("mixture"))
                .map(RealIndicesTest::implied)
                .findFirst()
                .orElseThrow();
        assertThat(number(chain.kurtosis())).isGreaterThan(3.5);
        for (int lag = 1; lag <= 5; lag++) {
            assertThat(number(chain.ofSquares(lag))).isGreaterThan(0.02);
            assertThat(number(chain.ofSizes(lag))).isGreaterThan(0.02);
            assertThat(Math.abs(number(mixture.ofSquares(lag)))).isLessThan(1e-12);
            assertThat(Math.abs(number(mixture.ofSizes(lag)))).isLessThan(1e-12);
        }

        Duel oneRegime = Subjects.found(found.ofObservation()).rows().stream()
                .filter(row -> row.gauge().equals("one-regime"))
                .findFirst()
                .orElseThrow()
                .duel()
                .orElseThrow();
        assertThat(number(oneRegime.robust().mean())).isPositive();
    }

    private static double volatility(RegimeFindings found, IdentityCard card) {
        return number(Annual.of(found.subject(), card.lastFit().returns()).volatility());
    }

    private static ImpliedMoments implied(WalkedRegimes subject) {
        Stretch last = subject.stretches().get(subject.stretches().size() - 1);
        return Subjects.found(ImpliedMoments.of(last.record().fit().model().orElseThrow()));
    }

    private static double number(Estimate estimate) {
        return estimate.number().orElseThrow();
    }
}
