package sojourn.report;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import sojourn.regime.EmissionFamily;
import sojourn.regime.ModelKind;
import sojourn.regime.Prior;
import sojourn.regime.RecentVolatility;
import sojourn.regime.VolatilityThresholdSettings;
import sojourn.walk.AbsoluteReturn;
import sojourn.walk.LogReturn;
import sojourn.walk.Observation;
import sojourn.walk.Particulars;
import sojourn.walk.RegimeSettings;
import sojourn.walk.StateChoice;

class GaugeTextTest {
    private static final Observation RETURN = new LogReturn("stocks");

    @Test
    void aThresholdIsToldWithItsMeasureAndBothItsQuantiles() {
        RecentVolatility rolling = new RecentVolatility.Rolling(21);
        assertThat(GaugeText.watches(settings(
                        ModelKind.VOLATILITY_THRESHOLD,
                        RETURN,
                        Particulars.threshold(new VolatilityThresholdSettings(rolling, 0.8, 0.6)))))
                .isEqualTo(
                        "log-return of stocks; volatility-threshold: stormy when the standard deviation of the last 21"
                                + " lies above the 0.8 quantile of the window's, calm again when at or below the 0.6 quantile;"
                                + " regimes calm, stormy");
        RecentVolatility weighted = new RecentVolatility.Exponential(0.94);
        assertThat(GaugeText.watches(settings(
                        ModelKind.VOLATILITY_THRESHOLD,
                        RETURN,
                        Particulars.threshold(new VolatilityThresholdSettings(weighted, 0.8, 0.8)))))
                .contains("the exponentially weighted volatility of decay 0.94");
    }

    @Test
    void aJumpModelOfAReturnIsRemarkedOn() {
        RegimeSettings sizes = settings(ModelKind.JUMP, new AbsoluteReturn("stocks"), Particulars.penalty(50));
        assertThat(GaugeText.watches(sizes))
                .contains("jump, each change of regime costs 50.0 squared deviations")
                .endsWith("ordered by the volatility of stocks at every fit");
        assertThat(GaugeText.findings(sizes)).isEmpty();
        assertThat(GaugeText.findings(settings(ModelKind.JUMP, RETURN, Particulars.penalty(50))))
                .singleElement()
                .asString()
                .contains("rises and falls")
                .contains("observe absolute-return");
        assertThat(GaugeText.findings(settings(ModelKind.HIDDEN_MARKOV, RETURN, Particulars.NONE)))
                .isEmpty();
    }

    @Test
    void aPriorIsToldWithWhatItCountsAsSeen() {
        RegimeSettings held =
                settings(ModelKind.HIDDEN_MARKOV, RETURN, Particulars.prior(new Prior(12.5, Prior.Spread.WINDOW)));
        assertThat(GaugeText.watches(held))
                .contains(
                        "normal emissions, taken to have been seen beforehand: 12.5 stays in each regime and about five");
        RegimeSettings free =
                settings(ModelKind.HIDDEN_MARKOV, RETURN, Particulars.prior(new Prior(10, Prior.Spread.NONE)));
        assertThat(GaugeText.watches(free))
                .contains("beforehand: 10 stays in each regime;")
                .doesNotContain("five");
    }

    @Test
    void aChoiceNamesTheRegimesOfEachNumberAndWhatDecides() {
        List<List<String>> counts = List.of(List.of("calm", "stormy"), List.of("calm"));
        assertThat(GaugeText.watches(settings(
                        ModelKind.HIDDEN_MARKOV,
                        RETURN,
                        Particulars.choosing(new StateChoice(counts, StateChoice.By.BIC)))))
                .contains("regimes 1 (calm) or 2 (calm, stormy), chosen at every fit by the information criterion");
        assertThat(GaugeText.watches(settings(
                        ModelKind.HIDDEN_MARKOV,
                        RETURN,
                        Particulars.choosing(new StateChoice(counts, StateChoice.By.PREDICTIVE)))))
                .contains("chosen at every fit by the log score of each number's own forecasts so far");
    }

    private static RegimeSettings settings(ModelKind model, Observation observation, Particulars particulars) {
        return new RegimeSettings(
                model,
                List.of(observation),
                List.of("calm", "stormy"),
                EmissionFamily.NORMAL,
                Optional.empty(),
                Optional.empty(),
                Optional.empty(),
                particulars);
    }
}
