package sojourn.compare;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import sojourn.GivenPrices;
import sojourn.OpenData;
import sojourn.archive.TimelineFiles;
import sojourn.market.PriceTable;
import sojourn.regime.EmissionFamily;
import sojourn.regime.ModelKind;
import sojourn.regime.StartRunner;
import sojourn.walk.AbsoluteReturn;
import sojourn.walk.LogReturn;
import sojourn.walk.Observation;
import sojourn.walk.Particulars;
import sojourn.walk.RefitSchedule;
import sojourn.walk.RefitSettings;
import sojourn.walk.RegimeSettings;
import sojourn.walk.RegimeTimeline;
import sojourn.walk.StateChoice;
import sojourn.walk.Walk;

/** The starts of a fit may be shared out to threads; the timeline does not show it. */
class ThreadedWalkTest {
    private static final RegimeSettings REGIMES = new RegimeSettings(
            ModelKind.HIDDEN_MARKOV,
            List.of(new LogReturn("a")),
            List.of("calm", "uneasy", "stormy"), // three states have several maxima to end in
            EmissionFamily.NORMAL,
            Optional.empty(),
            Optional.empty());
    private static final RefitSettings REFIT = new RefitSettings(
            400,
            new RefitSchedule.EveryObservations(50),
            OptionalInt.of(400),
            5,
            20260101,
            RefitSettings.OnFailure.KEEP_PREVIOUS);

    private static final RegimeSettings CHOOSING = with(
            ModelKind.HIDDEN_MARKOV,
            new LogReturn("a"),
            Particulars.choosing(new StateChoice(
                    List.of(List.of("calm", "stormy"), List.of("calm", "uneasy", "stormy")),
                    StateChoice.By.PREDICTIVE)));
    private static final RegimeSettings JUMP = with(ModelKind.JUMP, new AbsoluteReturn("a"), Particulars.penalty(10));

    private static RegimeSettings with(ModelKind model, Observation observation, Particulars particulars) {
        return new RegimeSettings(
                model,
                List.of(observation),
                List.of("calm", "uneasy", "stormy"),
                EmissionFamily.NORMAL,
                Optional.empty(),
                Optional.empty(),
                Optional.empty(),
                particulars);
    }

    static List<RegimeSettings> searched() {
        return List.of(REGIMES, CHOOSING, JUMP);
    }

    @ParameterizedTest
    @MethodSource("searched")
    void oneThreadFourThreadsAndNoneGiveTheSameTimelineToTheBit(RegimeSettings regimes) {
        PriceTable table = GivenPrices.closes(OpenData.column("nyse/nyse_1990_2005.csv", "close"))
                .first(800)
                .table();
        RegimeTimeline plain = Walk.forward(table, regimes, REFIT, StartRunner.sequential(), bar -> {});
        assertThat(plain.fits()).hasSize(8);
        for (int threads : new int[] {1, 4}) {
            RegimeTimeline threaded;
            try (ThreadedStarts starts = new ThreadedStarts(threads)) {
                threaded = Walk.forward(table, regimes, REFIT, starts, bar -> {});
            }
            // shortest decimals differ wherever bits differ
            assertThat(TimelineFiles.bars(threaded).csv())
                    .isEqualTo(TimelineFiles.bars(plain).csv());
            assertThat(TimelineFiles.fits(threaded, List.of("x")).csv())
                    .isEqualTo(TimelineFiles.fits(plain, List.of("x")).csv());
        }
    }
}
