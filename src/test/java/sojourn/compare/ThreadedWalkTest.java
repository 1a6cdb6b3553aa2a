package sojourn.compare;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import org.junit.jupiter.api.Test;
import sojourn.GivenPrices;
import sojourn.OpenData;
import sojourn.archive.TimelineFiles;
import sojourn.market.PriceTable;
import sojourn.regime.EmissionFamily;
import sojourn.regime.ModelKind;
import sojourn.regime.StartRunner;
import sojourn.walk.LogReturn;
import sojourn.walk.RefitSchedule;
import sojourn.walk.RefitSettings;
import sojourn.walk.RegimeSettings;
import sojourn.walk.RegimeTimeline;
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

    @Test
    void oneThreadFourThreadsAndNoneGiveTheSameTimelineToTheBit() {
        PriceTable table = GivenPrices.closes(OpenData.column("nyse/nyse_1990_2005.csv", "close"))
                .first(800)
                .table();
        RegimeTimeline plain = Walk.forward(table, REGIMES, REFIT, StartRunner.sequential(), bar -> {});
        assertThat(plain.fits()).hasSize(8);
        for (int threads : new int[] {1, 4}) {
            RegimeTimeline threaded;
            try (ThreadedStarts starts = new ThreadedStarts(threads)) {
                threaded = Walk.forward(table, REGIMES, REFIT, starts, bar -> {});
            }
            // shortest decimals differ wherever bits differ
            assertThat(TimelineFiles.bars(threaded).csv())
                    .isEqualTo(TimelineFiles.bars(plain).csv());
            assertThat(TimelineFiles.fits(threaded, List.of("x")).csv())
                    .isEqualTo(TimelineFiles.fits(plain, List.of("x")).csv());
        }
    }
}
