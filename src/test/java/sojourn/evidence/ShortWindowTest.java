package sojourn.evidence;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import org.junit.jupiter.api.Test;
import sojourn.inference.Estimate;
import sojourn.regime.EmissionFamily;
import sojourn.regime.ModelKind;
import sojourn.walk.LogReturn;
import sojourn.walk.RefitSchedule;
import sojourn.walk.RefitSettings;
import sojourn.walk.RegimeSettings;

/** Windows as short as the lags that are asked of them: what is undefined says that observations are too few. */
class ShortWindowTest {
    @Test
    void anAutocorrelationAtALagAsLongAsTheWindowLacksObservations() {
        RegimeSettings one = new RegimeSettings(
                ModelKind.ONE_REGIME,
                List.of(new LogReturn("a")),
                List.of("any"),
                EmissionFamily.NORMAL,
                Optional.empty(),
                Optional.empty());
        RefitSettings refit = new RefitSettings(
                20,
                new RefitSchedule.EveryObservations(5),
                OptionalInt.of(20),
                1,
                Subjects.SEED,
                RefitSettings.OnFailure.KEEP_PREVIOUS);
        WalkedRegimes subject = Subjects.walked(Subjects.oneWeather(3, 60), one, refit);
        Reproduction reproduction = Subjects.found(Reproduction.of(subject));
        assertThat(reproduction.observations()).isEqualTo(20);
        for (Reproduction.Figure figure : reproduction.figures()) {
            Estimate expected = figure.lag() < 20 ? figure.low() : Estimate.tooFew(20, 21);
            assertThat(figure.low()).isEqualTo(expected);
            assertThat(figure.low().number().isPresent()).isEqualTo(figure.lag() < 20);
            assertThat(figure.sample().number().isPresent()).isEqualTo(figure.lag() < 20);
        }
    }
}
