package sojourn.compare;

import java.util.Optional;
import java.util.stream.IntStream;
import sojourn.archive.PathFile;
import sojourn.market.PriceTable;
import sojourn.measure.Yardstick;
import sojourn.strategy.Strategy;
import sojourn.trade.Simulation;
import sojourn.trade.Terms;
import sojourn.trade.Track;
import sojourn.walk.FitRecord;
import sojourn.walk.RegimeTimeline;

/** Trades one variant on its timeline, with the yardsticks that could have been traded beside it. */
final class VariantRunner {
    private VariantRunner() {}

    static Run run(Prepared.Ready ready, RegimeTimeline timeline) {
        Strategy strategy = ready.file().strategy();
        if (timeline.firstBar().isEmpty()) {
            return failed(ready, noFit(timeline, ready.market().table(), strategy));
        }
        PriceTable table = ready.market().table();
        Terms terms = strategy.trade().terms();
        Optional<Track> traded = Simulation.run(
                table, timeline, ready.policy(), terms, timeline.firstBar().getAsInt());
        if (traded.isEmpty()) {
            return failed(
                    ready,
                    NeverDecided.reason(ready, timeline)
                            .orElse("no decision bar follows the first accepted fit;"
                                    + " give longer price files or fit earlier"));
        }
        Track track = traded.get();
        if (track.lastBar() - track.firstBar() <= terms.fill().barsToFirstReturn()) {
            return failed(
                    ready,
                    "the first decision, at " + table.fillPrices().axis().date(track.firstBar())
                            + ", leaves no bar to be judged; give longer price files or fit earlier");
        }
        Alongside<Yardstick> causal = new Yardsticks(ready, timeline, track).causal();
        PathFile path = PathFile.of(table.fillPrices().axis(), timeline, track, causal.tracks());
        String digest = path.digest(ready.file().settingsByContent(ready.contents()));
        return new Run.Traded(ready, timeline, track, causal.tracks(), causal.absent(), path, digest);
    }

    private static Run failed(Prepared.Ready ready, String reason) {
        return new Run.Failed(ready.file(), ready.timelineKey(), reason);
    }

    /** Bars on which anything was observed. */
    private static long observations(PriceTable table, Strategy strategy) {
        return IntStream.range(1, table.size())
                .mapToObj(table::knownAt)
                .filter(known -> strategy.regimes().observe().stream()
                        .anyMatch(one -> one.at(known).isPresent()))
                .count();
    }

    private static String noFit(RegimeTimeline timeline, PriceTable table, Strategy strategy) {
        if (timeline.fits().isEmpty()) {
            return "no fit was due: first-fit-after is " + strategy.refit().firstFitAfter()
                    + " observations and there are " + observations(table, strategy) + " on " + table.size()
                    + " common bars; give longer price files or a smaller first-fit-after";
        }
        FitRecord last = timeline.fits().get(timeline.fits().size() - 1);
        return "none of " + timeline.fits().size() + " fits was accepted; the last, on " + last.fittedOn() + ", was "
                + last.fit().outcome().word() + " (" + last.explanation() + ")";
    }
}
