package sojourn.compare;

import java.nio.file.Path;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import sojourn.archive.ComparisonFile;
import sojourn.archive.MeasuresFile;
import sojourn.archive.ResultFolder;
import sojourn.archive.RunFacts;
import sojourn.archive.TimelineFiles;
import sojourn.archive.TradeFiles;
import sojourn.archive.VariantMeasures;
import sojourn.document.YamlText;
import sojourn.market.TimeAxis;
import sojourn.walk.Observation;
import sojourn.walk.RegimeTimeline;

/** Writes a finished comparison: the table, every timeline, and the folders of the variants. */
public final class ResultWriter {
    /** The folder of a result that holds the timelines. */
    static final String TIMELINES = "timelines";

    private ResultWriter() {}

    /**
     * Writes below {@code results} under {@code name}. The folders that {@code paths} names are written; the table, digests and
     * timelines are always whole.
     */
    public static ResultFolder.Published write(
            Path results, String name, Compared compared, RunFacts facts, WhichPaths paths) {
        try (ResultFolder folder = ResultFolder.begin(results)) {
            folder.write("comparison.csv", ComparisonFile.of(compared.rows()).csv());
            writeTimelines(folder, compared);
            for (Judgement one : paths.of(compared.ranked())) {
                writeVariant(folder, results.resolve(name), one);
            }
            return folder.publish(name, compared.digest(), RecordText.of(name, compared, facts));
        }
    }

    private static void writeTimelines(ResultFolder folder, Compared compared) {
        Set<String> written = new LinkedHashSet<>();
        for (Prepared one : compared.prepared()) {
            if (one instanceof Prepared.Ready ready && written.add(ready.timelineKey())) {
                // a timeline whose walk broke is not there; its variants are failed rows
                Optional.ofNullable(compared.timelines().get(ready.timelineKey()))
                        .ifPresent(timeline -> writeTimeline(folder, ready, timeline));
            }
        }
    }

    private static void writeTimeline(ResultFolder folder, Prepared.Ready ready, RegimeTimeline timeline) {
        List<String> observed = ready.file().strategy().regimes().observe().stream()
                .map(Observation::column)
                .toList();
        String base = TIMELINES + "/" + ready.timelineKey();
        folder.write(base + ".csv", TimelineFiles.bars(timeline).csv());
        folder.write(base + ".fits.csv", TimelineFiles.fits(timeline, observed).csv());
    }

    private static void writeVariant(ResultFolder folder, Path target, Judgement one) {
        Run.Traded run = one.run();
        TimeAxis axis = run.ready().market().table().fillPrices().axis();
        String base = run.file().slug() + "/";
        folder.write(
                base + "strategy.yaml",
                YamlText.of(run.file().resolvedFor(target.resolve(run.file().slug()))));
        folder.write(base + "path.csv", run.path().table().csv());
        folder.write(base + "trades.csv", TradeFiles.trades(axis, run.track()).csv());
        folder.write(base + "ledger.csv", TradeFiles.ledger(axis, run.track()).csv());
        if (!one.afterTheFact().isEmpty()) {
            folder.write(
                    base + "yardsticks.csv",
                    TradeFiles.afterTheFact(axis, run.track(), one.afterTheFact())
                            .csv());
        }
        folder.write(
                base + "measures.json",
                MeasuresFile.of(new VariantMeasures(
                        one.strategy(),
                        one.yardsticks(),
                        one.absent(),
                        one.randomSwitches(),
                        one.difference().overTheWindow(),
                        one.difference().perYear(),
                        one.byRegime(),
                        run.timeline().regimes(),
                        Compared.parameters(run),
                        axis.bars().periodsPerYear())));
    }
}
