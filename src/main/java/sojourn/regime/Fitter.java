package sojourn.regime;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.Supplier;
import sojourn.numeric.Check;

/**
 * Fits a regime model to a window by maximum likelihood: EM from several starts, each to convergence, the best kept. What it
 * returns depends on the request alone, not on threads or time.
 */
public final class Fitter {
    /** Fewest observations that a state must account for. */
    static final int LEAST_COUNT = 5;
    /** Starts whose log-likelihoods differ by less than this times (1 + |l|) are tied; the earliest wins. */
    private static final double TIE = 1e-9;
    /** Starts agree when they end within so many nats. */
    private static final double AGREEMENT = 1e-4;

    /** Nats by which several states must beat a single one. */
    private static final double NOTHING_GAINED = 1e-6;

    private Fitter() {}

    /** Fits one start after the other. */
    public static Fit fit(FitSettings settings, FitRequest request) {
        return fit(settings, request, StartRunner.sequential());
    }

    /**
     * Fits, the starts being run by {@code runner}. Among starts without a degenerate state the most likely wins; only if every
     * start is degenerate is the fit. Data that cannot be fitted give a failed fit with its reason, never an exception; an EM step
     * that lowers the likelihood is a bug and throws {@code IllegalStateException}.
     */
    public static Fit fit(FitSettings settings, FitRequest request, StartRunner runner) {
        Observations x = request.observations();
        Window window = Window.of(x, settings.emission());
        Optional<String> refusal = nothingToDescribe(request).or(() -> refusal(settings, x, window));
        if (refusal.isPresent()) {
            return Fit.failed(refusal.get(), Fit.Search.NONE, x.present());
        }
        if (settings.states() == 1) {
            return single(settings, request, window);
        }
        double alone = oneRegime(settings, window).logLikelihood();
        List<Supplier<Climb.Summit>> climbs = new ArrayList<>();
        for (Parameters start : new Starts(settings, window).all(request)) {
            climbs.add(() -> Climb.from(start, window, settings.emission(), settings.initial()));
        }
        return choose(settings, request, window, alone, runner.run(climbs));
    }

    /**
     * The fit of given parameters: nothing is estimated, the states keep their order. Their volatilities not ascending is an
     * event. The model must be of dimension 1.
     */
    public static Fit given(RegimeModel model, FitRequest request) {
        Observations x = request.observations();
        Check.within(model.emission().dimension(), 1, 1, "dimension of the model");
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

    private static Optional<String> nothingToDescribe(FitRequest request) {
        if (request.observations().present() == 0) {
            return Optional.of("the window holds no observation");
        }
        return PosteriorMoments.possible(request)
                ? Optional.empty()
                : Optional.of("no row of the window holds an observation and the returns of all assets");
    }

    private static Optional<String> refusal(FitSettings settings, Observations x, Window window) {
        int least = settings.leastObservations();
        if (x.present() < least) {
            return Optional.of("the window holds " + x.present() + " observations; " + settings.states()
                    + " states with " + settings.parameterCount() + " parameters need at least " + least);
        }
        if (constant(x)) {
            return Optional.of("all observations of the window are equal");
        }
        if (!(window.scale() > 0 && Double.isFinite(window.scale()))) {
            return Optional.of("the observations of the window are too large, or too close together, to square");
        }
        return Optional.empty();
    }

    private static boolean constant(Observations x) {
        double lowest = Double.POSITIVE_INFINITY;
        double highest = Double.NEGATIVE_INFINITY;
        for (int t = 0; t < x.size(); t++) {
            if (!x.missing(t)) {
                lowest = StrictMath.min(lowest, x.at(t, 0));
                highest = StrictMath.max(highest, x.at(t, 0));
            }
        }
        return lowest == highest;
    }

    /**
     * A single regime: of normals the mean and the standard deviation with divisor n, which are the center and the scale of the
     * window; of Student-t one search.
     */
    private static Climb.Summit oneRegime(FitSettings settings, Window window) {
        FitSettings alone = new FitSettings(ModelKind.MIXTURE, 1, settings.emission(), 1);
        if (settings.emission().fatTailed()) {
            return Climb.from(new Starts(alone, window).bySize(), window, settings.emission());
        }
        Parameters p = Parameters.blank(ModelKind.MIXTURE, 1);
        p.set(p.initial(0), 1);
        p.set(p.variance(0), 1);
        return new Climb.Summit(p, window.oneRegimeLogLikelihood(), window.count(), 0, true);
    }

    private static Fit single(FitSettings settings, FitRequest request, Window window) {
        Climb.Summit summit = oneRegime(settings, window);
        Emission emission =
                summit.parameters().toModel(window, settings.emission()).emission();
        double[] one = {1};
        RegimeModel model = switch (settings.kind()) {
            case HIDDEN_MARKOV ->
                settings.initial() == InitialDistribution.STATIONARY
                        ? HiddenMarkov.stationary(one, emission)
                        : HiddenMarkov.of(one, one, emission);
            case MIXTURE -> Mixture.of(one, emission);
            case ONE_REGIME -> OneRegime.of(emission);
        };
        Described described = Described.of(model, request);
        List<String> events = StateEvents.of(described, request.previous().flatMap(Fit::model));
        Outcome outcome = outcome(summit, Double.NEGATIVE_INFINITY);
        Fit.Search search = new Fit.Search(summit.evaluations(), 1, 1);
        return Fit.of(outcome, explanation(outcome, summit), search, window.count(), described, events);
    }

    private static Fit choose(
            FitSettings settings, FitRequest request, Window window, double alone, List<Climb.Summit> summits) {
        List<Climb.Summit> sound =
                summits.stream().filter(s -> !degenerate(s, alone)).toList();
        Climb.Summit best = best(sound.isEmpty() ? summits : sound);
        int agreeing = (int) summits.stream()
                .filter(s -> degenerate(s, alone) == degenerate(best, alone)
                        && StrictMath.abs(s.logLikelihood() - best.logLikelihood()) <= AGREEMENT)
                .count();
        Fit.Search search = new Fit.Search(best.evaluations(), summits.size(), agreeing);
        Optional<RegimeModel> previous = request.previous().flatMap(Fit::model);
        RegimeModel unordered = best.parameters().toModel(window, settings.emission(), settings.initial());
        int[] order = Roles.order(Described.of(unordered, request), previous);
        Described described = Described.of(unordered.ordered(order), request);
        List<String> events = StateEvents.of(described, previous);
        int refused = summits.size() - sound.size();
        if (refused > 0) {
            events.add("degenerate-starts " + refused + " of " + summits.size());
        }
        Outcome outcome = outcome(best, alone);
        return Fit.of(outcome, explanation(outcome, best), search, window.count(), described, events);
    }

    private static Climb.Summit best(List<Climb.Summit> summits) {
        double highest = Double.NEGATIVE_INFINITY;
        for (Climb.Summit each : summits) {
            highest = StrictMath.max(highest, each.logLikelihood());
        }
        double tied = highest - TIE * (1 + StrictMath.abs(highest));
        return summits.stream()
                .filter(s -> s.logLikelihood() >= tied)
                .findFirst()
                .orElseThrow(() -> new IllegalStateException("no start has a likelihood; this is a bug"));
    }

    private static Outcome outcome(Climb.Summit summit, double alone) {
        if (degenerate(summit, alone)) {
            return Outcome.DEGENERATE;
        }
        return summit.converged() ? Outcome.CONVERGED : Outcome.ITERATION_LIMIT;
    }

    private static String explanation(Outcome outcome, Climb.Summit summit) {
        return switch (outcome) {
            case DEGENERATE ->
                "in every start a state closed in on a few observations (it accounts for fewer than " + LEAST_COUNT
                        + " of them, or its variance fell to a ten-thousandth of the window's), or the states did not part";
            case ITERATION_LIMIT ->
                "the likelihood was still rising after " + summit.evaluations() + " evaluations; the model is usable";
            default -> "";
        };
    }

    /** A state on too few observations or on a single value; or states that add nothing to one regime, which is no maximum. */
    private static boolean degenerate(Climb.Summit summit, double alone) {
        boolean floored = false;
        Parameters p = summit.parameters();
        for (int k = 0; k < p.states(); k++) {
            floored |= p.at(p.variance(k)) <= Maximisation.FLOOR;
        }
        return floored || summit.leastCount() < LEAST_COUNT || summit.logLikelihood() < alone + NOTHING_GAINED;
    }
}
