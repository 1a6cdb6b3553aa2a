package sojourn.compare;

import java.time.LocalDate;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import sojourn.archive.ComparisonRow;
import sojourn.market.FillPrices;
import sojourn.measure.EvaluatedPath;
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
 * @param ruinedBefore column names of yardsticks that had nothing left when the window began, and are not judged
 * @param afterTheFact tracks of yardsticks that need the whole window, by column name
 * @param byRegime the variant's returns by the regime that was most likely at the close before
 */
public record Judgement(
        Run.Traded run,
        ComparisonRow.Judged strategy,
        Map<String, ComparisonRow.Judged> yardsticks,
        List<String> ruinedBefore,
        Map<String, Track> afterTheFact,
        RegimeTable byRegime) {

    /** What doing nothing came to over the same window. */
    public ComparisonRow.Judged buyAndHold() {
        return Objects.requireNonNull(yardsticks.get(Yardstick.BUY_AND_HOLD.column()), "buy-and-hold always runs");
    }

    static Judgement of(Run.Traded run, Window window) {
        EvaluatedPath own = path(run, run.track(), window);
        EvaluatedPath held = path(run, run.buyAndHold(), window);
        Map<String, Track> afterTheFact = afterTheFact(run, window);
        Map<String, Track> tracks = new LinkedHashMap<>();
        run.causal().forEach((yardstick, track) -> tracks.put(yardstick.column(), track));
        tracks.putAll(afterTheFact);
        Map<String, ComparisonRow.Judged> yardsticks = new LinkedHashMap<>();
        List<String> ruinedBefore = new ArrayList<>();
        tracks.forEach((name, track) -> {
            if (window.beginsAlive(track)) {
                yardsticks.put(name, judged(path(run, track, window), held, track));
            } else {
                ruinedBefore.add(name);
            }
        });
        return new Judgement(
                run,
                judged(own, held, run.track()),
                yardsticks,
                List.copyOf(ruinedBefore),
                afterTheFact,
                byRegime(run, window, own.returns()));
    }

    private static Map<String, Track> afterTheFact(Run.Traded run, Window window) {
        if (!run.file().strategy().judge().against().contains(Yardstick.SAME_EXPOSURE)) {
            return Map.of();
        }
        return new Yardsticks(
                        run.ready().market().table(),
                        run.timeline(),
                        run.file().strategy().trade().terms(),
                        run.track())
                .sameExposure(window.base(), window.last());
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

    private static EvaluatedPath path(Run.Traded run, Track track, Window window) {
        FillPrices prices = run.ready().market().table().fillPrices();
        int bars = window.last() - window.base();
        List<LocalDate> dates = new ArrayList<>(bars + 1);
        double[] cash = new double[bars];
        double[] turnover = new double[bars];
        double[] cost = new double[bars];
        double[] net = new double[bars];
        double[] gross = new double[bars];
        int[] switches = new int[bars];
        dates.add(prices.axis().date(window.base()));
        for (int i = 0; i < bars; i++) {
            int bar = window.base() + 1 + i;
            dates.add(prices.axis().date(bar));
            cash[i] = prices.cashReturn(bar);
            turnover[i] = track.turnover(bar);
            cost[i] = track.cost(bar);
            switches[i] = track.switched(bar) ? 1 : 0;
            for (int asset = 0; asset < track.assets().size(); asset++) {
                double weight = track.weight(bar - 1, asset);
                net[i] += weight;
                gross[i] += Math.abs(weight);
            }
        }
        double[] wealth = track.wealth(window.base(), window.last());
        return EvaluatedPath.of(dates, wealth, cash, prices.axis().bars().periodsPerYear())
                .withTrading(turnover, cost)
                .withExposure(net, gross)
                .withSwitches(switches);
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
