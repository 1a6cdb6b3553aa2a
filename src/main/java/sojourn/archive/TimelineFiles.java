package sojourn.archive;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import sojourn.regime.Fit;
import sojourn.walk.FitRecord;
import sojourn.walk.Forecast;
import sojourn.walk.Reading;
import sojourn.walk.RegimeTimeline;

/** A timeline as two tables: a row a bar, and a row a fit. */
public final class TimelineFiles {
    private TimelineFiles() {}

    /** {@code timelines/<key>.csv}: a row a bar from the first accepted fit on. */
    public static Table bars(RegimeTimeline timeline) {
        List<String> header = new ArrayList<>(List.of("date", "fit"));
        timeline.regimes().forEach(regime -> header.add("probability." + regime));
        timeline.assets().forEach(asset -> header.add("forecast.mean." + asset));
        timeline.assets().forEach(asset -> header.add("forecast.volatility." + asset));
        header.add("log_score");
        Table table = new Table(header);
        int first = timeline.firstBar().orElse(0);
        for (int bar = first; bar < timeline.endBar(); bar++) {
            Table.Row row = table.row().add(timeline.date(bar));
            OptionalInt fit = timeline.fitInForce(bar);
            row.add(fit.isPresent() ? Integer.toString(fit.getAsInt()) : "");
            for (int k = 0; k < timeline.regimes().size(); k++) {
                row.add(fit.isPresent() ? OptionalDouble.of(timeline.probability(bar, k)) : OptionalDouble.empty());
            }
            addForecasts(row, timeline.reading(bar), timeline.assets().size());
            row.add(timeline.logScore(bar)).end();
        }
        return table;
    }

    private static void addForecasts(Table.Row row, Optional<Reading> reading, int assets) {
        Optional<Forecast> next = reading.map(now -> now.forecast(1));
        for (int a = 0; a < assets; a++) {
            int asset = a;
            row.add(next.map(f -> OptionalDouble.of(f.mean(asset))).orElseGet(OptionalDouble::empty));
        }
        for (int a = 0; a < assets; a++) {
            int asset = a;
            row.add(next.map(f -> OptionalDouble.of(f.volatility(asset))).orElseGet(OptionalDouble::empty));
        }
    }

    /**
     * {@code timelines/<key>.fits.csv}: a row a fit, refused ones too, with full precision.
     *
     * @param observed the observed series' column names
     */
    public static Table fits(RegimeTimeline timeline, List<String> observed) {
        List<String> header = new ArrayList<>(List.of(
                "fit",
                "fitted_on",
                "first_used_on",
                "window_start",
                "window_end",
                "states",
                "observations",
                "outcome",
                "log_likelihood",
                "iterations",
                "starts",
                "starts_agreeing",
                "runner_up_gap",
                "runner_up_starts"));
        List<FitColumns.Column> numbers = FitColumns.of(timeline, observed);
        numbers.forEach(column -> header.add(column.name()));
        header.add("events");
        header.add("explanation");
        Table table = new Table(header);
        for (FitRecord record : timeline.fits()) {
            addFit(table.row(), record, numbers);
        }
        return table;
    }

    private static void addFit(Table.Row row, FitRecord record, List<FitColumns.Column> numbers) {
        Fit fit = record.fit();
        row.add(Integer.toString(record.number())).add(record.fittedOn());
        row.add(fit.outcome().accepted() ? record.fittedOn().toString() : "");
        row.add(record.windowStart())
                .add(record.fittedOn())
                .add(Integer.toString(record.regimes().size()));
        row.add(Integer.toString(fit.observations())).add(fit.outcome().word());
        boolean likelihood = fit.model().isPresent();
        row.add(likelihood ? OptionalDouble.of(fit.logLikelihood()) : OptionalDouble.empty());
        row.add(Integer.toString(fit.iterations())).add(Integer.toString(fit.starts()));
        row.add(Integer.toString(fit.startsAgreeing()));
        row.add(fit.runnerUp().map(one -> OptionalDouble.of(one.gap())).orElseGet(OptionalDouble::empty));
        row.add(fit.runnerUp().map(one -> Integer.toString(one.starts())).orElse(""));
        for (FitColumns.Column column : numbers) {
            row.add(column.cell().apply(record));
        }
        row.add(String.join("; ", record.events())).add(record.explanation()).end();
    }
}
