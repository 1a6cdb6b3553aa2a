package sojourn.walk;

import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.IntConsumer;
import sojourn.market.Known;
import sojourn.market.PriceTable;
import sojourn.regime.Companions;
import sojourn.regime.EmissionFamily;
import sojourn.regime.Fit;
import sojourn.regime.FitRequest;
import sojourn.regime.Gauge;
import sojourn.regime.GaugeFilter;
import sojourn.regime.Observations;
import sojourn.regime.StartRunner;

/**
 * Walks a gauge of regimes forward through a history, close by close. At each close: the new observation is taken in; the gauge in
 * force scores it, if it has a likelihood, and filters on with frozen parameters; where a fit is due, the gauge is fitted to the
 * window that ends here and, if accepted, filters that window afresh and is in force from this close on.
 */
public final class Walk {
    private final RegimeSettings regimes;
    private final RefitSettings refit;
    private final StartRunner runner;
    private final int orderAsset;
    private final ObservationLog log;
    private final RegimeTimeline.Builder timeline;
    private Optional<InForce> inForce = Optional.empty();
    private boolean aside;

    /** The fit whose parameters the filter goes by. */
    private record InForce(FitRecord record, GaugeFilter filter) {}

    private Walk(PriceTable table, RegimeSettings regimes, RefitSettings refit, StartRunner runner) {
        this.regimes = regimes;
        this.refit = refit;
        this.runner = runner;
        this.orderAsset = table.asset(regimes.orderedBy());
        this.log = new ObservationLog(regimes.observe(), table.assets().size());
        this.timeline = new RegimeTimeline.Builder(
                regimes.states(),
                table.assets(),
                regimes.emission().equals(EmissionFamily.NORMAL_ZERO_MEAN)
                        ? RegimeTimeline.Builder.MeanOf.CASH
                        : RegimeTimeline.Builder.MeanOf.WINDOW);
    }

    /**
     * The timeline of a history. Depends on prices and settings alone, not on {@code runner} or its threads.
     *
     * @param runner runs the starts of each fit
     * @param walked told each bar that is done, for progress
     */
    public static RegimeTimeline forward(
            PriceTable table, RegimeSettings regimes, RefitSettings refit, StartRunner runner, IntConsumer walked) {
        Walk walk = new Walk(table, regimes, refit, runner);
        for (int bar = 0; bar < table.size(); bar++) {
            walk.close(table.knownAt(bar));
            walked.accept(bar);
        }
        return walk.timeline.build();
    }

    /**
     * The timeline of a history that has grown: equal, to the bit, to a fresh one of all of it, with only the fits made that the
     * new bars bring. {@code earlier} is the timeline of the same settings on the same first bars; that it is can be told by its
     * {@link TimelineAddress}, which the caller compares. Refuses one of other regimes, assets or dates.
     */
    public static RegimeTimeline onward(
            RegimeTimeline earlier,
            PriceTable table,
            RegimeSettings regimes,
            RefitSettings refit,
            StartRunner runner,
            IntConsumer walked) {
        Walk walk = new Walk(table, regimes, refit, runner);
        walk.resume(earlier, table);
        for (int bar = earlier.endBar(); bar < table.size(); bar++) {
            walk.close(table.knownAt(bar));
            walked.accept(bar);
        }
        return walk.timeline.build();
    }

    /** Stands where the walk of {@code earlier} stopped; at the start, if no fit of it was accepted. */
    private void resume(RegimeTimeline earlier, PriceTable table) {
        timeline.takeOver(earlier, table);
        for (int bar = 0; bar < earlier.endBar(); bar++) {
            log.append(table.knownAt(bar));
        }
        if (earlier.firstBar().isEmpty()) {
            return;
        }
        FitRecord record = earlier.lastAccepted();
        int start = log.row(table.knownAt(earlier.endBar() - 1), record.windowStart());
        inForce = Optional.of(new InForce(record, gauge(record.fit()).filterAfter(log.window(start))));
        aside = earlier.fitInForce(earlier.endBar() - 1).isEmpty();
    }

    private void close(Known known) {
        log.append(known);
        OptionalDouble score = filterOn();
        if (refit.schedule().due(known, log.present(), log.lastPresent(), refit.firstFitAfter())) {
            fit(known);
        }
        if (inForce.isPresent()) {
            InForce now = inForce.get();
            timeline.bar(known, aside ? 0 : now.record().number(), now.filter().probabilities(), score);
        }
    }

    /**
     * One step with frozen parameters; the log density it gave to the new observation, empty if there was none to score, the gauge
     * has no likelihood or no fit is in force. The filter goes on while standing aside, for the next fit that is accepted starts
     * it afresh.
     */
    private OptionalDouble filterOn() {
        if (inForce.isEmpty()) {
            return OptionalDouble.empty();
        }
        InForce before = inForce.get();
        GaugeFilter after = before.filter().step(log.last(), 0);
        inForce = Optional.of(new InForce(before.record(), after));
        return aside ? OptionalDouble.empty() : after.lastLogDensity();
    }

    private void fit(Known known) {
        int start = log.windowStart(refit.rolling());
        Observations window = log.window(start);
        Companions companions = Companions.of(known.assets().size(), log.assetReturns(start));
        FitRequest cold = FitRequest.of(
                window,
                log.returnsOf(orderAsset, start),
                companions,
                refit.seed(),
                known.date().toString());
        FitRequest request =
                inForce.map(previous -> cold.after(previous.record().fit())).orElse(cold);
        Fit fit = regimes.gauge(refit.starts()).fit(request, runner);
        FitRecord record = new FitRecord(
                timeline.nextFitNumber(),
                known.bar(),
                known.date(),
                known.date(log.bar(start)),
                fit,
                EventWords.named(fit.events(), regimes.states()),
                EventWords.named(fit.explanation(), regimes));
        timeline.fit(record);
        if (fit.outcome().accepted()) {
            inForce = Optional.of(new InForce(record, gauge(fit).filterAfter(window)));
            aside = false;
        } else if (refit.onFailure() == RefitSettings.OnFailure.STAND_ASIDE) {
            aside = true;
        }
    }

    private static Gauge gauge(Fit fit) {
        return fit.gauge().orElseThrow();
    }
}
