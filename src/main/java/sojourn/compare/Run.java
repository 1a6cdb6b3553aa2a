package sojourn.compare;

import java.time.LocalDate;
import java.util.Map;
import java.util.Objects;
import sojourn.archive.PathFile;
import sojourn.measure.Measured;
import sojourn.measure.Yardstick;
import sojourn.strategy.StrategyFile;
import sojourn.trade.Track;
import sojourn.walk.RegimeTimeline;

/** One variant after its simulation. */
public sealed interface Run {
    /** The strategy. */
    StrategyFile file();

    /** The address of its timeline; empty if it has none. */
    String timelineKey();

    /**
     * It traded.
     *
     * @param ready what it was prepared from
     * @param timeline the regimes as they were known
     * @param track its money
     * @param causal yardsticks that could have been traded
     * @param absent why others that could have been traded did not run
     * @param path the columns of its path file
     * @param digest of its settings and path
     */
    record Traded(
            Prepared.Ready ready,
            RegimeTimeline timeline,
            Track track,
            Map<Yardstick, Track> causal,
            Map<Yardstick, Measured.Undefined> absent,
            PathFile path,
            String digest)
            implements Run {
        @Override
        public StrategyFile file() {
            return ready.file();
        }

        @Override
        public String timelineKey() {
            return ready.timelineKey();
        }

        /** A run is itself alone, so that it can be a key without a look at every setting and price behind it. */
        @Override
        public boolean equals(Object other) {
            return this == other;
        }

        @Override
        public int hashCode() {
            return System.identityHashCode(this);
        }

        /** When it first held something; its first decision if it never did. */
        public LocalDate firstFill() {
            int bar = track.firstFill().orElse(track.firstBar());
            return ready.market().table().fillPrices().axis().date(bar);
        }

        /** The track of doing nothing, which runs beside every variant. */
        Track buyAndHold() {
            return Objects.requireNonNull(causal.get(Yardstick.BUY_AND_HOLD), "buy-and-hold always runs");
        }
    }

    /**
     * It did not.
     *
     * @param reason why, with what to do where something can be done
     */
    record Failed(StrategyFile file, String timelineKey, String reason) implements Run {}
}
