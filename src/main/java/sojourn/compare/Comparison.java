package sojourn.compare;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.function.IntConsumer;
import sojourn.document.InputException;
import sojourn.document.Problem;
import sojourn.market.PriceTable;
import sojourn.market.TimeAxis;
import sojourn.measure.Measure;
import sojourn.regime.StartRunner;
import sojourn.strategy.StrategyFile;
import sojourn.walk.RegimeTimeline;
import sojourn.walk.Walk;

/** The main job: prepare every strategy, walk each timeline once, trade every variant, judge them over common windows. */
public final class Comparison {
    private static final int PROGRESS_EVERY_BARS = 64;

    private final Workers workers;
    private final Progress progress;

    /** With workers that run its jobs and somebody who is told how far it is. */
    public Comparison(Workers workers, Progress progress) {
        this.workers = workers;
        this.progress = progress;
    }

    /**
     * Compares strategies. A strategy that cannot run is a row with its reason.
     *
     * @param files at least one; names must differ, the ranking measure must be the same
     */
    public Compared run(List<StrategyFile> files) {
        refuseAmbiguity(files);
        List<Prepared> prepared = workers.run(files, Prepared::of);
        Map<String, Attempt<RegimeTimeline>> walked = walkAll(prepared);
        Map<String, RegimeTimeline> timelines = new LinkedHashMap<>();
        List<RuntimeException> faults = new ArrayList<>();
        walked.forEach((key, attempt) -> {
            attempt.result().ifPresent(timeline -> timelines.put(key, timeline));
            attempt.fault().ifPresent(faults::add);
        });
        List<Run> runs = trade(prepared, walked, faults);
        List<Run.Traded> traded = new ArrayList<>();
        List<Run.Failed> failed = new ArrayList<>();
        for (Run run : runs) {
            if (run instanceof Run.Traded one) {
                traded.add(one);
            } else if (run instanceof Run.Failed one) {
                failed.add(one);
            }
        }
        Map<Run.Traded, Window> windows = Window.of(traded);
        for (Run.Traded one : traded) {
            Optional<String> reason = unjudgeable(one, Optional.ofNullable(windows.get(one)));
            if (reason.isPresent()) {
                failed.add(new Run.Failed(one.file(), one.timelineKey(), reason.get()));
                windows.remove(one);
            }
        }
        List<Judgement> judged = judge(windows, failed, faults);
        Measure rankBy = files.get(0).strategy().judge().rankBy();
        return Compared.of(prepared, timelines, Ranking.by(rankBy).sorted(judged), failed, faults, rankBy);
    }

    private List<Judgement> judge(
            Map<Run.Traded, Window> windows, List<Run.Failed> failed, List<RuntimeException> faults) {
        List<Map.Entry<Run.Traded, Window>> jobs = List.copyOf(windows.entrySet());
        List<Attempt<Judgement>> attempts =
                workers.run(jobs, job -> Attempt.at(() -> Judgement.of(job.getKey(), job.getValue())));
        List<Judgement> judged = new ArrayList<>();
        for (int i = 0; i < jobs.size(); i++) {
            Run.Traded run = jobs.get(i).getKey();
            Attempt<Judgement> attempt = attempts.get(i);
            attempt.result()
                    .ifPresentOrElse(
                            judged::add,
                            () -> failed.add(new Run.Failed(run.file(), run.timelineKey(), attempt.reason())));
            attempt.fault().ifPresent(faults::add);
        }
        return judged;
    }

    private static Optional<String> unjudgeable(Run.Traded run, Optional<Window> window) {
        if (window.isEmpty()) {
            return Optional.of("the evaluation window holds no bar that this variant traded; change judge.window, or"
                    + " compare strategies over the same dates");
        }
        OptionalInt ruined = run.track().ruinedOn();
        if (ruined.isEmpty() || window.get().beginsAlive(run.track())) {
            return Optional.empty();
        }
        TimeAxis axis = run.ready().market().table().fillPrices().axis();
        return Optional.of(
                "it was ruined on " + axis.date(ruined.getAsInt()) + ", before the evaluation window begins at "
                        + axis.date(window.get().base()) + "; compare it without variants that begin later");
    }

    private Map<String, Attempt<RegimeTimeline>> walkAll(List<Prepared> prepared) {
        Map<String, Prepared.Ready> byKey = new LinkedHashMap<>();
        long bars = 0;
        for (Prepared one : prepared) {
            if (one instanceof Prepared.Ready ready && byKey.putIfAbsent(ready.timelineKey(), ready) == null) {
                bars += ready.market().table().size();
            }
        }
        List<Prepared.Ready> jobs = List.copyOf(byKey.values());
        progress.begin("walking " + jobs.size() + (jobs.size() == 1 ? " timeline" : " timelines"), bars);
        List<Attempt<RegimeTimeline>> walked = walkEach(jobs);
        progress.end();
        Map<String, Attempt<RegimeTimeline>> timelines = new LinkedHashMap<>();
        for (int i = 0; i < jobs.size(); i++) {
            timelines.put(jobs.get(i).timelineKey(), walked.get(i));
        }
        return timelines;
    }

    /** Several timelines side by side; a single one shares out the starts of each fit instead. */
    private List<Attempt<RegimeTimeline>> walkEach(List<Prepared.Ready> jobs) {
        if (jobs.size() != 1) {
            return workers.run(jobs, ready -> Attempt.at(() -> walk(ready, StartRunner.sequential())));
        }
        try (ThreadedStarts starts = new ThreadedStarts(workers.threads())) {
            return List.of(Attempt.at(() -> walk(jobs.get(0), starts)));
        }
    }

    /**
     * The timeline of one strategy over {@code table}, its own or a part of it; the starts of each fit are shared out among as many
     * threads as there are workers.
     */
    public RegimeTimeline timeline(Prepared.Ready ready, PriceTable table) {
        progress.begin("walking 1 timeline", table.size());
        try (ThreadedStarts starts = new ThreadedStarts(workers.threads())) {
            return walk(ready, table, starts);
        } finally {
            progress.end();
        }
    }

    private RegimeTimeline walk(Prepared.Ready ready, StartRunner starts) {
        return walk(ready, ready.market().table(), starts);
    }

    private RegimeTimeline walk(Prepared.Ready ready, PriceTable table, StartRunner starts) {
        IntConsumer tell = bar -> {
            if ((bar + 1) % PROGRESS_EVERY_BARS == 0) {
                progress.advance(PROGRESS_EVERY_BARS);
            }
        };
        return Walk.forward(
                table,
                ready.file().strategy().regimes(),
                ready.file().strategy().refit(),
                starts,
                tell);
    }

    private List<Run> trade(
            List<Prepared> prepared, Map<String, Attempt<RegimeTimeline>> walked, List<RuntimeException> faults) {
        List<Attempt<Run>> attempts = workers.run(prepared, one -> Attempt.at(() -> trade(one, walked)));
        List<Run> runs = new ArrayList<>();
        for (int i = 0; i < attempts.size(); i++) {
            Attempt<Run> attempt = attempts.get(i);
            StrategyFile file = prepared.get(i).file();
            runs.add(attempt.result().orElseGet(() -> new Run.Failed(file, "", attempt.reason())));
            attempt.fault().ifPresent(faults::add);
        }
        return runs;
    }

    private static Run trade(Prepared one, Map<String, Attempt<RegimeTimeline>> walked) {
        if (one instanceof Prepared.Unreadable unreadable) {
            return new Run.Failed(one.file(), "", unreadable.reason());
        }
        Prepared.Ready ready = (Prepared.Ready) one;
        Attempt<RegimeTimeline> attempt =
                Objects.requireNonNull(walked.get(ready.timelineKey()), "every timeline was walked");
        return attempt.result()
                .map(timeline -> VariantRunner.run(ready, timeline))
                .orElseGet(() -> new Run.Failed(one.file(), ready.timelineKey(), attempt.reason()));
    }

    private static void refuseAmbiguity(List<StrategyFile> files) {
        List<Problem> problems = new ArrayList<>();
        Map<String, StrategyFile> bySlug = new LinkedHashMap<>();
        StrategyFile first = files.get(0);
        for (StrategyFile file : files) {
            StrategyFile other = bySlug.putIfAbsent(file.slug(), file);
            if (other != null) {
                problems.add(new Problem(
                        file.shownName(),
                        0,
                        0,
                        "the name '" + file.strategy().name() + "' gives the folder " + file.slug()
                                + ", and so does that of " + other.shownName(),
                        "give each strategy a name of its own"));
            }
            if (file.slug().equals(ResultWriter.TIMELINES)) {
                problems.add(new Problem(
                        file.shownName(),
                        0,
                        0,
                        "the name '" + file.strategy().name() + "' gives the folder '" + file.slug()
                                + "', where the regimes are written",
                        "give the strategy another name"));
            }
            Measure rankBy = file.strategy().judge().rankBy();
            if (rankBy != first.strategy().judge().rankBy()) {
                problems.add(new Problem(
                        file.shownName(),
                        0,
                        0,
                        "it ranks by " + rankBy.key() + ", while " + first.shownName() + " ranks by "
                                + first.strategy().judge().rankBy().key(),
                        "declare the same judge.rank-by in all files of one comparison"));
            }
        }
        if (!problems.isEmpty()) {
            throw new InputException(problems);
        }
    }
}
