package sojourn.regime;

import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import sojourn.numeric.Check;

/**
 * Fits a regime model to a window by maximum likelihood, or with a prior to the mode of the posterior: EM from several starts, each to convergence, the best kept. What it
 * returns depends on the request alone, not on threads or time.
 */
public final class Fitter {
    /** Starts agree when they end within so many nats. */
    private static final double AGREEMENT = 1e-4;

    private Fitter() {}

    /** Fits one start after the other. */
    public static Fit fit(FitSettings settings, FitRequest request) {
        return fit(settings, request, StartRunner.sequential());
    }

    /**
     * Fits, the starts being run by {@code runner}. Among starts without a degenerate state the one with the highest objective wins; only if every
     * start is degenerate is the fit. Data that cannot be fitted give a failed fit with its reason, never an exception; an EM step
     * that lowers the likelihood is a bug and throws {@code IllegalStateException}.
     */
    public static Fit fit(FitSettings settings, FitRequest request, StartRunner runner) {
        Observations x = request.observations();
        WindowSearch search = WindowSearch.of(settings, x);
        Optional<String> refusal = nothingObserved(x)
                .or(() -> tooFew(settings, x))
                .or(search::refusal)
                .or(() -> nothingToDescribe(request));
        if (refusal.isPresent()) {
            return Fit.failed(refusal.get(), Fit.Search.NONE, x.present());
        }
        SearchEnd alone = search.alone();
        return settings.states() == 1
                ? single(settings, request, alone)
                : choose(request, alone.logLikelihood(), runner.run(search.starts(request)));
    }

    /**
     * The fit of given parameters: nothing is estimated, the states keep their order. Their volatilities not ascending is an
     * event. The model must be of the dimension of the observations.
     */
    public static Fit given(RegimeModel model, FitRequest request) {
        Observations x = request.observations();
        Check.within(model.emission().dimension(), x.dimension(), x.dimension(), "dimension of the model");
        Optional<String> refusal = nothingToDescribe(request);
        if (refusal.isPresent()) {
            return Fit.failed(refusal.get(), Fit.Search.NONE, x.present());
        }
        Described described = Described.of(model, request);
        if (described.logLikelihood() == Double.NEGATIVE_INFINITY) {
            return Fit.failed(
                    "the given parameters make an observation of the window impossible", Fit.Search.NONE, x.present());
        }
        List<String> events = StateEvents.of(described, request.previous().flatMap(Fit::model));
        return Fit.of(
                Outcome.GIVEN,
                "the parameters were given, not estimated",
                Fit.Search.NONE,
                x.present(),
                described,
                events);
    }

    /** Why no gauge could be described by the request's window, if so. */
    static Optional<String> nothingToDescribe(FitRequest request) {
        return nothingObserved(request.observations())
                .or(() -> PosteriorMoments.possible(request)
                        ? Optional.empty()
                        : Optional.of("no row of the window holds an observation and the returns of all assets"));
    }

    private static Optional<String> nothingObserved(Observations x) {
        return x.present() == 0 ? Optional.of("the window holds no observation") : Optional.empty();
    }

    private static Optional<String> tooFew(FitSettings settings, Observations x) {
        int least = settings.leastObservations(x.dimension());
        return x.present() >= least
                ? Optional.empty()
                : Optional.of(
                        "the window holds " + x.present() + " observations; " + settings.states() + " states with "
                                + settings.parameterCount(x.dimension()) + " parameters need at least " + least);
    }

    private static Fit single(FitSettings settings, FitRequest request, SearchEnd end) {
        Emission emission = end.model().emission();
        double[] one = {1};
        RegimeModel model = switch (settings.kind()) {
            case HIDDEN_MARKOV ->
                settings.initial() == InitialDistribution.STATIONARY
                        ? HiddenMarkov.stationary(one, emission)
                        : HiddenMarkov.of(one, one, emission);
            case MIXTURE -> Mixture.of(one, emission);
            default -> OneRegime.of(emission);
        };
        Described described = Described.of(model, request);
        List<String> events = StateEvents.of(described, request.previous().flatMap(Fit::model));
        Soundness soundness = new Soundness(emission.dimension(), Double.NEGATIVE_INFINITY);
        Fit.Search search = new Fit.Search(end.evaluations(), 1, 1, Optional.empty());
        return ended(end, soundness, search, described, new int[] {0}, events);
    }

    private static Fit choose(FitRequest request, double alone, List<SearchEnd> ends) {
        Soundness soundness = new Soundness(request.observations().dimension(), alone);
        List<SearchEnd> sound = ends.stream().filter(soundness::sound).toList();
        List<SearchEnd> candidates = sound.isEmpty() ? ends : sound;
        SearchEnd best = SearchEnd.best(candidates);
        Fit.Search search =
                new Fit.Search(best.evaluations(), ends.size(), agreeing(candidates, best), runnerUp(sound, best));
        Optional<RegimeModel> previous = request.previous().flatMap(Fit::model);
        int[] order = Roles.expected(best.model().emission());
        Described described = Described.of(best.model().ordered(order), request);
        int[] roles = Roles.order(described, previous);
        if (!Arrays.equals(roles, Roles.asTheyStand(roles.length))) {
            order = Order.after(order, roles);
            described = Described.of(best.model().ordered(order), request);
        }
        List<String> events = StateEvents.of(described, previous);
        int refused = ends.size() - sound.size();
        if (refused > 0) {
            events.add("degenerate-starts " + refused + " of " + ends.size());
        }
        return ended(best, soundness, search, described, order, events);
    }

    private static int agreeing(List<SearchEnd> ends, SearchEnd with) {
        return (int) ends.stream()
                .filter(end -> StrictMath.abs(end.objective() - with.objective()) <= AGREEMENT)
                .count();
    }

    /** The best of the sound ends that do not agree with the best. */
    private static Optional<RunnerUp> runnerUp(List<SearchEnd> sound, SearchEnd best) {
        List<SearchEnd> lower = sound.stream()
                .filter(end -> end.objective() < best.objective() - AGREEMENT)
                .toList();
        return lower.isEmpty()
                ? Optional.empty()
                : Optional.of(runnerUp(lower, SearchEnd.best(lower), best.objective()));
    }

    private static RunnerUp runnerUp(List<SearchEnd> lower, SearchEnd second, double highest) {
        return new RunnerUp(highest - second.objective(), agreeing(lower, second));
    }

    private static Fit ended(
            SearchEnd end,
            Soundness soundness,
            Fit.Search search,
            Described described,
            int[] order,
            List<String> events) {
        Outcome outcome = Outcome.DEGENERATE;
        String explanation = "";
        if (!soundness.sound(end)) {
            explanation = soundness.wrong(end, described, order, search.starts());
        } else if (end.converged()) {
            outcome = Outcome.CONVERGED;
        } else {
            outcome = Outcome.ITERATION_LIMIT;
            explanation =
                    "the search had not come to rest after " + end.evaluations() + " evaluations; the model is usable";
        }
        return Fit.of(outcome, explanation, search, described.observations(), described, events);
    }
}
