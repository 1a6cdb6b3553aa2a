package sojourn.compare;

import java.time.LocalDate;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import sojourn.archive.ComparisonRow;
import sojourn.market.FillPrices;
import sojourn.market.PriceTable;
import sojourn.measure.Attribution;
import sojourn.measure.EvaluatedPath;
import sojourn.measure.GrowthDifference;
import sojourn.measure.Measured;
import sojourn.measure.RandomSwitches;
import sojourn.measure.RegimeTable;
import sojourn.measure.Scorecard;
import sojourn.measure.Yardstick;
import sojourn.trade.Track;
import sojourn.walk.Reading;

/**
 * What one variant and its yardsticks came to over its window.
 *
 * @param run the variant
 * @param strategy its measures
 * @param yardsticks the yardsticks' measures, by column name, in the order they are shown
 * @param absent why other yardsticks that were asked for are not judged, by column name
 * @param afterTheFact tracks of yardsticks that need the whole window, by column name
 * @param randomSwitches where it falls among random switchers, if that was asked for and can be told
 * @param difference where its difference to buy-and-hold comes from
 * @param byRegime the variant's returns by the regime that was most likely at the close before
 */
public record Judgement(
        Run.Traded run,
        ComparisonRow.Judged strategy,
        Map<String, ComparisonRow.Judged> yardsticks,
        Map<String, Measured.Undefined> absent,
        Map<String, Track> afterTheFact,
        Optional<RandomSwitches> randomSwitches,
        Difference difference,
        RegimeTable byRegime) {
    private static final Measured.Undefined RUINED_BEFORE =
            new Measured.Undefined(Measured.Reason.RUIN, "it was ruined before the window begins and had nothing left");

    /** Copies its maps, in order. */
    public Judgement {
        yardsticks = Collections.unmodifiableMap(new LinkedHashMap<>(yardsticks));
        absent = Collections.unmodifiableMap(new LinkedHashMap<>(absent));
    }

    /** What doing nothing came to over the same window. */
    public ComparisonRow.Judged buyAndHold() {
        return Objects.requireNonNull(yardsticks.get(Yardstick.BUY_AND_HOLD.column()), "buy-and-hold always runs");
    }

    static Judgement of(Run.Traded run, Window window) {
        PriceTable table = run.ready().market().table();
        WindowPath paths = new WindowPath(table, window);
        EvaluatedPath own = paths.of(run.track());
        EvaluatedPath held = paths.of(run.buyAndHold());
        Yardsticks runner = new Yardsticks(run.ready(), run.timeline(), run.track());
        RandomDraws drawn = runner.randomDraws(window, paths, own, held);
        Alongside<String> afterTheFact =
                runner.afterTheFact(run.buyAndHold(), window).and(drawn.beside());
        Map<String, Track> tracks = new LinkedHashMap<>();
        Map<String, Measured.Undefined> absent = new LinkedHashMap<>();
        run.causal().forEach((yardstick, track) -> tracks.put(yardstick.column(), track));
        run.absent().forEach((yardstick, because) -> absent.put(yardstick.column(), because));
        tracks.putAll(afterTheFact.tracks());
        absent.putAll(afterTheFact.absent());
        Map<String, ComparisonRow.Judged> yardsticks = new LinkedHashMap<>();
        tracks.forEach((name, track) -> {
            if (window.beginsAlive(track)) {
                yardsticks.put(name, judged(paths.of(track), held, track));
            } else {
                absent.put(name, RUINED_BEFORE);
            }
        });
        return new Judgement(
                run,
                judged(own, held, run.track()),
                yardsticks,
                absent,
                afterTheFact.tracks(),
                drawn.switches(),
                Difference.of(run.track(), run.buyAndHold(), table.fillPrices(), window),
                byRegime(run, window, own.returns()));
    }

    /**
     * The difference to buy-and-hold in parts.
     *
     * @param overTheWindow of total returns
     * @param perYear of growth per year
     */
    public record Difference(Attribution overTheWindow, Attribution perYear) {
        private static Difference of(Track own, Track held, FillPrices prices, Window window) {
            return new Difference(
                    GrowthDifference.overTheWindow(own, held, prices, window.base(), window.last()),
                    GrowthDifference.perYear(own, held, prices, window.base(), window.last()));
        }
    }

    private static ComparisonRow.Judged judged(EvaluatedPath path, EvaluatedPath held, Track track) {
        List<LocalDate> dates = path.dates();
        return new ComparisonRow.Judged(
                dates.get(0),
                dates.get(dates.size() - 1),
                path.bars(),
                track.ruinedOn().isPresent() ? "ruined" : "ran",
                Scorecard.of(path, held));
    }

    private static RegimeTable byRegime(Run.Traded run, Window window, double[] returns) {
        int[] labels = new int[returns.length];
        for (int i = 0; i < labels.length; i++) {
            labels[i] = run.timeline()
                    .reading(window.base() + i)
                    .map(Reading::mostLikely)
                    .orElse(RegimeTable.UNKNOWN);
        }
        return RegimeTable.of(labels, returns, run.timeline().regimes().size());
    }
}
