package sojourn.walk;

import java.time.LocalDate;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import java.util.function.IntConsumer;
import java.util.stream.Collectors;
import sojourn.market.Known;
import sojourn.market.PriceTable;
import sojourn.regime.EmissionFamily;
import sojourn.regime.FitRequest;
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
    private final Candidates candidates;
    /** The fit whose parameters the probabilities go by. */
    private Optional<FitRecord> inForce = Optional.empty();

    private boolean aside;

    private Walk(PriceTable table, RegimeSettings regimes, RefitSettings refit, StartRunner runner) {
        this.regimes = regimes;
        this.refit = refit;
        this.runner = runner;
        this.candidates = new Candidates(regimes, refit.starts());
        this.orderAsset = table.asset(regimes.orderedBy());
        this.log = new ObservationLog(regimes.observe(), table.assets());
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
        Known last = table.knownAt(earlier.endBar() - 1);
        candidates.resume(earlier.fits(), log, last);
        inForce = Optional.of(earlier.lastAccepted());
        aside = earlier.fitInForce(last.bar()).isEmpty();
    }

    private void close(Known known) {
        log.append(known);
        if (inForce.isPresent()) {
            candidates.step(log.last(), 0);
        }
        OptionalDouble score = aside ? OptionalDouble.empty() : score();
        if (!aside && inForce.map(this::candidate).map(Candidate::impossible).orElse(false)) {
            timeline.impossible(known);
        }
        if (refit.schedule().due(known, log.present(), log.lastPresent(), refit.firstFitAfter())) {
            fit(known);
        }
        if (inForce.isPresent()) {
            FitRecord record = inForce.get();
            timeline.bar(known, aside ? 0 : record.number(), filtered(record), score);
        }
    }

    /** The log density that the fit in force gave to the new observation. */
    private OptionalDouble score() {
        return inForce.map(record -> candidate(record).score()).orElseGet(OptionalDouble::empty);
    }

    private Candidate candidate(FitRecord record) {
        return candidates.named(record.regimes());
    }

    private void fit(Known known) {
        int start = log.windowStart(refit.rolling());
        Observations window = log.window(start);
        FitRequest cold = FitRequest.of(
                        window,
                        log.returnsOf(orderAsset, start),
                        log.companions(start),
                        refit.seed(),
                        known.date().toString())
                .withholding(log.withheld(orderAsset, start));
        List<CandidateFit> made = candidates.fit(cold, runner);
        OptionalInt choice = Candidates.choose(made);
        FitRecord record = record(known, known.date(log.bar(start)), made, choice); // before the filters begin afresh
        timeline.fit(record);
        candidates.adopt(made, window);
        if (choice.isPresent()) {
            inForce = Optional.of(record);
            aside = false;
        } else if (refit.onFailure() == RefitSettings.OnFailure.STAND_ASIDE) {
            aside = true;
        }
    }

    private FitRecord record(Known known, LocalDate windowStart, List<CandidateFit> made, OptionalInt choice) {
        CandidateFit told = made.get(choice.orElseGet(() -> shown(made)));
        List<String> events = new ArrayList<>(EventWords.named(told.fit().events(), told.regimes()));
        int before = inForce.map(record -> record.regimes().size())
                .orElse(told.regimes().size());
        if (choice.isPresent() && before != told.regimes().size()) {
            events.add("states " + before + "->" + told.regimes().size());
        }
        return new FitRecord(
                timeline.nextFitNumber(),
                known.bar(),
                known.date(),
                windowStart,
                told.regimes(),
                told.fit(),
                events,
                choice.isPresent() || made.size() == 1 ? explanation(told) : refusals(made),
                made,
                inForce.filter(record -> !aside).map(this::probabilities).orElse(List.of()));
    }

    private List<Double> probabilities(FitRecord record) {
        return Arrays.stream(filtered(record)).boxed().toList();
    }

    /** Probability of each of the timeline's regimes at the last bar. */
    private double[] filtered(FitRecord record) {
        return ModelArrays.spread(record, candidate(record).filter().probabilities(), regimes.states());
    }

    /** Where none was accepted, the number of regimes that is in force is shown, or the smallest. */
    private int shown(List<CandidateFit> made) {
        int shown = 0;
        for (int c = 0; c < made.size(); c++) {
            List<String> names = made.get(c).regimes();
            shown = inForce.filter(record -> record.regimes().equals(names)).isPresent() ? c : shown;
        }
        return shown;
    }

    private String refusals(List<CandidateFit> made) {
        return made.stream()
                .map(one -> one.regimes().size() + ": " + explanation(one))
                .collect(Collectors.joining("; ", "no number of regimes was accepted; ", ""));
    }

    private String explanation(CandidateFit one) {
        return EventWords.named(one.fit().explanation(), one.regimes(), regimes.observe());
    }
}
