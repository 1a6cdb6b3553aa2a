package sojourn.latest;

import java.time.LocalDate;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import sojourn.archive.Table;
import sojourn.archive.TimelineFiles;
import sojourn.compare.Comparison;
import sojourn.compare.Prepared;
import sojourn.compare.Progress;
import sojourn.compare.Workers;
import sojourn.document.InputException;
import sojourn.document.Problem;
import sojourn.market.AnotherEnd;
import sojourn.market.PriceTable;
import sojourn.strategy.Strategy;
import sojourn.trade.Fill;
import sojourn.trade.LedgerEntry;
import sojourn.trade.Track;
import sojourn.walk.FitRecord;
import sojourn.walk.Observation;
import sojourn.walk.Reading;
import sojourn.walk.RegimeTimeline;

/**
 * One bar with every number behind its probability and its decision, so that it can be redone on paper.
 *
 * @param ready the strategy with its market
 * @param latest what the strategy would have said on the evening of that bar
 * @param step the filter's step; empty if nothing is known of the regimes at that close
 * @param parameters of the fit in force, by their names in the fits file, as written there
 * @param filledHere what filled on this bar
 * @param filledLater what came of the order decided at this close, as far as the files go
 */
public record Trace(
        Prepared.Ready ready,
        Latest latest,
        Optional<FilterStep> step,
        Map<String, String> parameters,
        List<Fill> filledHere,
        List<Fill> filledLater) {
    /** Copies the lists. */
    public Trace {
        filledHere = List.copyOf(filledHere);
        filledLater = List.copyOf(filledLater);
    }

    /** Of the bar of {@code date}; refuses, with the nearest bars, a date that is none. */
    public static Trace of(Prepared.Ready ready, LocalDate date, Workers workers, Progress progress) {
        PriceTable table = ready.market().table();
        int bar = bar(table, date);
        RegimeTimeline timeline = new Comparison(workers, progress).timeline(ready, table);
        PriceTable then = AnotherEnd.cut(table, bar + 1);
        Strategy strategy = ready.file().strategy();
        Standing standing = Standing.of(strategy, ready.policy(), then, timeline);
        Optional<FitRecord> fit = standing.reading()
                .map(Reading::fit)
                .map(number -> timeline.fits().get(number - 1));
        List<Observation> observe = strategy.regimes().observe();
        Optional<Track> whole =
                Standing.of(strategy, ready.policy(), table, timeline).track();
        return new Trace(
                ready,
                Latest.of(ready, standing),
                fit.map(record -> FilterStep.of(then, observe, record)),
                fit.map(record -> parameters(timeline, observe, record)).orElse(Map.of()),
                fills(whole).stream().filter(fill -> fill.filledOn() == bar).toList(),
                fills(whole).stream()
                        .filter(fill -> fill.decidedOn() == bar && fill.filledOn() > bar)
                        .toList());
    }

    /** The traced close. */
    public Standing standing() {
        return latest.standing();
    }

    /** Every movement of cash on this bar, in order; none before the first decision. */
    public List<LedgerEntry> ledger() {
        return standing().track().map(Track::ledger).orElse(List.of()).stream()
                .filter(entry -> entry.bar() == standing().bar())
                .toList();
    }

    private static List<Fill> fills(Optional<Track> track) {
        return track.map(Track::fills).orElse(List.of());
    }

    private static Map<String, String> parameters(RegimeTimeline timeline, List<Observation> observe, FitRecord fit) {
        Table fits = TimelineFiles.fits(
                timeline, observe.stream().map(Observation::column).toList());
        List<String> cells = fits.rows().get(fit.number() - 1);
        Map<String, String> parameters = new LinkedHashMap<>();
        for (int column = 0; column < cells.size(); column++) {
            if (!cells.get(column).isEmpty()) {
                parameters.put(fits.columns().get(column), cells.get(column));
            }
        }
        return parameters;
    }

    private static int bar(PriceTable table, LocalDate date) {
        int after = 0;
        while (after < table.size() && table.knownAt(after).date().isBefore(date)) {
            after++;
        }
        if (after < table.size() && table.knownAt(after).date().equals(date)) {
            return after;
        }
        List<String> near = new ArrayList<>();
        if (after > 0) {
            near.add(table.knownAt(after - 1).date().toString());
        }
        if (after < table.size()) {
            near.add(table.knownAt(after).date().toString());
        }
        String where = after == 0
                ? " lies before the first bar"
                : after == table.size() ? " lies after the last bar" : " is no bar that all files have";
        throw new InputException(new Problem(
                "--date", 0, 0, date + where, "give the date of a bar; nearest: " + String.join(" and ", near)));
    }
}
