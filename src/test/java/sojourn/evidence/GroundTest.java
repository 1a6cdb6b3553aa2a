package sojourn.evidence;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import org.junit.jupiter.api.Test;
import sojourn.GivenPrices;
import sojourn.regime.EmissionFamily;
import sojourn.regime.ModelKind;
import sojourn.walk.LogReturn;
import sojourn.walk.Particulars;
import sojourn.walk.RefitSchedule;
import sojourn.walk.RefitSettings;
import sojourn.walk.RegimeSettings;
import sojourn.walk.StateChoice;

/** What each test of two forecasts is said to stand on. */
class GroundTest {
    private static final GivenPrices PRICES = Subjects.oneWeather(3, 130);
    private static final RegimeSettings PLAIN = Subjects.hiddenMarkov(EmissionFamily.NORMAL);

    private static RefitSettings rolling() {
        return new RefitSettings(
                100,
                new RefitSchedule.EveryObservations(50),
                OptionalInt.of(100),
                1,
                Subjects.SEED,
                RefitSettings.OnFailure.KEEP_PREVIOUS);
    }

    private static RegimeSettings choosing(StateChoice.By by) {
        StateChoice choice = new StateChoice(List.of(List.of("calm"), List.of("calm", "stormy")), by);
        return new RegimeSettings(
                ModelKind.HIDDEN_MARKOV,
                List.of(new LogReturn("a")),
                List.of("calm", "stormy"),
                EmissionFamily.NORMAL,
                Optional.empty(),
                Optional.empty(),
                Optional.empty(),
                new Particulars(
                        Optional.empty(),
                        OptionalDouble.empty(),
                        Optional.of(choice),
                        Optional.empty(),
                        Optional.empty()));
    }

    @Test
    void twoForecastsWithoutParametersAreTakenAsGiven() {
        WalkedRegimes subject = Subjects.walked(PRICES, PLAIN, Subjects.expanding(100, 50));
        assertThat(Ground.of(subject, RegimeEvidence.EXPONENTIAL, RegimeEvidence.ROLLING))
                .isEqualTo(Ground.NOTHING_ESTIMATED);
        assertThat(Ground.of(subject, "hidden-markov", RegimeEvidence.ROLLING)).isEqualTo(Ground.EXPANDING);
    }

    @Test
    void oneRegimeIsASpecialCaseOfEveryGauge() {
        WalkedRegimes subject = Subjects.walked(PRICES, PLAIN, Subjects.expanding(100, 50));
        for (String gauge : List.of("jump", "volatility-threshold", "mixture", "hidden-markov")) {
            assertThat(Ground.of(subject, gauge, "one-regime")).isEqualTo(Ground.EXPANDING_NESTED);
            assertThat(Ground.of(subject, "one-regime", gauge)).isEqualTo(Ground.EXPANDING_NESTED);
        }
        assertThat(Ground.of(subject, "one-regime", RegimeEvidence.ROLLING)).isEqualTo(Ground.EXPANDING);
        assertThat(Ground.of(subject, "jump", "hidden-markov")).isEqualTo(Ground.EXPANDING);
    }

    @Test
    void aChoiceByAllPastScoresIsNotBoundedByARollingWindow() {
        WalkedRegimes byBic = Subjects.walked(PRICES, choosing(StateChoice.By.BIC), rolling());
        assertThat(Ground.of(byBic, "hidden-markov", "jump")).isEqualTo(Ground.ROLLING);
        WalkedRegimes byScores = Subjects.walked(PRICES, choosing(StateChoice.By.PREDICTIVE), rolling());
        assertThat(Ground.of(byScores, "hidden-markov", "jump")).isEqualTo(Ground.EXPANDING);
        assertThat(Ground.of(byScores, "hidden-markov", "one-regime")).isEqualTo(Ground.EXPANDING_NESTED);
        assertThat(Ground.of(byScores, "jump", "one-regime")).isEqualTo(Ground.ROLLING);
    }
}
