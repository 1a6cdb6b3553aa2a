package sojourn.archive;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import sojourn.regime.Fit;
import sojourn.regime.RegimeModel;
import sojourn.regime.StudentT;
import sojourn.walk.FitRecord;
import sojourn.walk.Forecast;
import sojourn.walk.Reading;
import sojourn.walk.RegimeTimeline;

/** A timeline as two tables: a row a bar, and a row a fit. */
public final class TimelineFiles {
    private TimelineFiles() {}

    /** Whether the fits have scales and degrees of freedom. */
    private enum Tails {
        NORMAL,
        FAT;

        static Tails of(RegimeTimeline timeline) {
            return timeline.fits().stream()
                            .flatMap(record -> record.fit().model().stream())
                            .anyMatch(model -> model.emission() instanceof StudentT)
                    ? FAT
                    : NORMAL;
        }
    }

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
     * @param observation the observed series' column name
     */
    public static Table fits(RegimeTimeline timeline, String observation) {
        List<String> regimes = timeline.regimes();
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
                "starts_agreeing"));
        regimes.forEach(regime -> header.add("initial." + regime));
        regimes.forEach(from -> regimes.forEach(to -> header.add("transition." + from + "." + to)));
        regimes.forEach(regime -> header.add("mean." + observation + "." + regime));
        regimes.forEach(regime -> header.add("sd." + observation + "." + regime));
        Tails tails = Tails.of(timeline);
        if (tails == Tails.FAT) {
            regimes.forEach(regime -> header.add("scale." + observation + "." + regime));
            regimes.forEach(regime -> header.add("dof." + regime));
        }
        regimes.forEach(regime -> header.add("order_by." + regime));
        regimes.forEach(regime -> header.add("stay_bars." + regime));
        regimes.forEach(regime -> header.add("occupancy." + regime));
        header.add("events");
        header.add("explanation");
        Table table = new Table(header);
        for (FitRecord record : timeline.fits()) {
            addFit(table.row(), record, regimes.size(), tails);
        }
        return table;
    }

    private static void addFit(Table.Row row, FitRecord record, int states, Tails tails) {
        Fit fit = record.fit();
        row.add(Integer.toString(record.number())).add(record.fittedOn());
        row.add(fit.outcome().accepted() ? record.fittedOn().toString() : "");
        row.add(record.windowStart()).add(record.fittedOn()).add(Integer.toString(states));
        row.add(Integer.toString(fit.observations())).add(fit.outcome().word());
        boolean modelled = fit.model().isPresent();
        row.add(modelled ? OptionalDouble.of(fit.logLikelihood()) : OptionalDouble.empty());
        row.add(Integer.toString(fit.iterations())).add(Integer.toString(fit.starts()));
        row.add(Integer.toString(fit.startsAgreeing()));
        if (modelled) {
            addModel(row, fit, fit.model().orElseThrow());
        } else {
            for (int blank = 0; blank < states * states + (tails == Tails.FAT ? 8 : 6) * states; blank++) {
                row.blank();
            }
        }
        row.add(String.join("; ", record.events())).add(record.explanation()).end();
    }

    private static void addModel(Table.Row row, Fit fit, RegimeModel model) {
        int states = model.states();
        for (int k = 0; k < states; k++) {
            row.add(model.initial(k));
        }
        for (int i = 0; i < states; i++) {
            for (int j = 0; j < states; j++) {
                row.add(model.transition(i, j));
            }
        }
        for (int k = 0; k < states; k++) {
            row.add(model.emission().mean(k, 0));
        }
        for (int k = 0; k < states; k++) {
            row.add(model.emission().standardDeviation(k, 0));
        }
        if (model.emission() instanceof StudentT student) {
            for (int k = 0; k < states; k++) {
                row.add(student.scale(k));
            }
            for (int k = 0; k < states; k++) {
                row.add(student.degreesOfFreedom(k));
            }
        }
        for (double deviation : fit.orderBy()) {
            row.add(deviation);
        }
        for (int k = 0; k < states; k++) {
            double leave = 1 - model.transition(k, k);
            row.add(leave > 0 ? OptionalDouble.of(1 / leave) : OptionalDouble.empty());
        }
        for (double share : fit.occupancy()) {
            row.add(share);
        }
    }
}
