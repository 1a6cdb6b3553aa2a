package sojourn.evidence;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import sojourn.archive.Table;
import sojourn.walk.RegimeTimeline;

/** The bar-by-bar and fit-by-fit tables of a subject's findings, as files hold them. */
public final class RegimeTables {
    private RegimeTables() {}

    /** A row a bar from the first accepted fit on, of what could be said at its close; no later bar has a part in it. */
    public static Table bars(RegimeFindings found) {
        WalkedRegimes subject = found.subject();
        RegimeTimeline timeline = subject.timeline();
        List<String> header = new ArrayList<>(List.of("date", "fit", "most_likely", "most_likely_without"));
        timeline.regimes().forEach(regime -> header.add("probability." + regime));
        header.addAll(List.of("observation", "log_score", "uniform", "pseudo_residual", "once_in_bars"));
        header.addAll(List.of("return", "return_log_score"));
        Table table = new Table(header);
        PerBar ofReturn = ReturnForecasts.of(subject).logScore();
        Map<Integer, Influence.LeftOut> leftOut = new LinkedHashMap<>();
        found.influence().found().ifPresent(all -> all.bars().forEach(one -> leftOut.put(one.bar(), one)));
        for (int bar = timeline.firstBar().orElse(0); bar < timeline.endBar(); bar++) {
            int here = bar;
            boolean known = subject.known(bar);
            OptionalInt fit = timeline.fitInForce(bar);
            Table.Row row = table.row().add(subject.date(bar)).add(fit.isPresent() ? "" + fit.getAsInt() : "");
            row.add(known ? timeline.regimes().get(subject.mostLikely(bar)) : "");
            row.add(Optional.ofNullable(leftOut.get(bar))
                    .map(one -> timeline.regimes().get(one.without()))
                    .orElse(""));
            for (int k = 0; k < timeline.regimes().size(); k++) {
                row.add(known ? OptionalDouble.of(timeline.probability(bar, k)) : OptionalDouble.empty());
            }
            row.add(subject.observed().at(bar)).add(timeline.logScore(bar));
            row.add(residual(found, one -> one.uniform().at(here)));
            row.add(residual(found, one -> one.normal().at(here)));
            row.add(residual(found, one -> one.onceIn(here)));
            row.add(subject.returns().at(bar)).add(ofReturn.at(bar)).end();
        }
        return table;
    }

    private static OptionalDouble residual(
            RegimeFindings found, java.util.function.Function<PseudoResiduals, OptionalDouble> read) {
        return found.residuals().found().map(read).orElseGet(OptionalDouble::empty);
    }

    /** A row a bar that the strategy's own gauge forecast: what each gauge had forecast the close before, and what it lost. */
    public static Table forecasts(RegimeFindings found) {
        WalkedRegimes subject = found.subject();
        List<String> header = new ArrayList<>(List.of("date", "return", "squared_return"));
        found.secondMoments().keySet().forEach(gauge -> header.add("forecast." + gauge));
        found.secondMoments().keySet().forEach(gauge -> header.add("qlike." + gauge));
        Table table = new Table(header);
        PerBar own = CommonBars.required(found.secondMoments(), subject.gauge());
        for (int bar : own.present()) {
            double earned = subject.returns().at(bar).orElseThrow();
            Table.Row row = table.row().add(subject.date(bar)).add(earned).add(earned * earned);
            found.secondMoments().values().forEach(series -> row.add(series.at(bar)));
            found.secondMoments().values().forEach(series -> row.add(qlike(series.at(bar), earned * earned)));
            row.end();
        }
        return table;
    }

    private static OptionalDouble qlike(OptionalDouble forecast, double square) {
        return forecast.isPresent()
                ? OptionalDouble.of(Loss.QLIKE.of(square, forecast.getAsDouble()))
                : OptionalDouble.empty();
    }

    /** A row an accepted fit, beside the accepted fit before it. */
    public static Table lineage(RegimeFindings found) {
        List<String> regimes = found.subject().timeline().regimes();
        List<String> header = new ArrayList<>(List.of("fit", "fitted_on", "fit_before", "matching_cost", "moved_60"));
        regimes.forEach(regime -> header.add("ancestor." + regime));
        regimes.forEach(regime -> header.add("distance." + regime));
        regimes.forEach(regime -> header.add("deviation." + regime));
        regimes.forEach(regime -> header.add("stay_bars." + regime));
        header.addAll(List.of("starts", "starts_agreeing", "runner_up_gap", "events"));
        Table table = new Table(header);
        List<LineageStep> steps = found.lineage().found().map(Lineage::steps).orElse(List.of());
        for (LineageStep step : steps) {
            Table.Row row = table.row()
                    .add(Integer.toString(step.record().number()))
                    .add(step.record().fittedOn());
            addBefore(row, step, regimes);
            step.regimes().forEach(one -> row.add(one.deviation()));
            step.regimes().forEach(one -> row.add(one.stay()));
            row.add(Integer.toString(step.record().fit().starts()));
            row.add(Integer.toString(step.record().fit().startsAgreeing()));
            row.add(step.record()
                    .fit()
                    .runnerUp()
                    .map(one -> OptionalDouble.of(one.gap()))
                    .orElseGet(OptionalDouble::empty));
            row.add(String.join("; ", step.record().events())).end();
        }
        return table;
    }

    private static void addBefore(Table.Row row, LineageStep step, List<String> regimes) {
        if (step.before().isEmpty()) {
            for (int blank = 0; blank < 3 + 2 * regimes.size(); blank++) {
                row.blank();
            }
            return;
        }
        LineageStep.Before one = step.before().get();
        List<String> own = step.record().regimes();
        List<OptionalInt> states = regimes.stream().map(step.record()::state).toList();
        row.add(Integer.toString(one.fit())).add(one.cost()).add(one.moved());
        for (OptionalInt state : states) {
            row.add(state.isPresent() ? own.get(one.ancestor().get(state.getAsInt())) : "");
        }
        for (OptionalInt state : states) {
            row.add(
                    state.isPresent()
                            ? OptionalDouble.of(one.distance().get(state.getAsInt()))
                            : OptionalDouble.empty());
        }
    }

    /** A row a bar without which some close would have had another most likely regime: later bars up to the next fit have a part in it. */
    public static Table influence(RegimeFindings found) {
        WalkedRegimes subject = found.subject();
        Table table = new Table(List.of(
                "date", "fit", "observation", "pseudo_residual", "most_likely", "without", "closes_changed", "until"));
        List<Influence.LeftOut> bars =
                found.influence().found().map(Influence::bars).orElse(List.of());
        for (Influence.LeftOut one : bars) {
            if (one.changed() > 0) {
                table.row()
                        .add(subject.date(one.bar()))
                        .add(Integer.toString(one.fit()))
                        .add(subject.observed().at(one.bar()))
                        .add(residual(found, all -> all.normal().at(one.bar())))
                        .add(subject.timeline().regimes().get(one.mostLikely()))
                        .add(subject.timeline().regimes().get(one.without()))
                        .add(Integer.toString(one.changed()))
                        .add(subject.date(one.until()))
                        .end();
            }
        }
        return table;
    }
}
