package sojourn.regime;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.function.Supplier;

/** The search on a window of one number a row. */
final class ScalarSearch implements WindowSearch {
    private final FitSettings settings;
    private final Observations x;
    private final Window window;

    ScalarSearch(FitSettings settings, Observations x) {
        this.settings = settings;
        this.x = x;
        this.window = Window.of(x, settings.emission());
    }

    @Override
    public Optional<String> refusal() {
        if (constant()) {
            return Optional.of("all observations of the window are equal");
        }
        if (!(window.scale() > 0 && Double.isFinite(window.scale()))) {
            return Optional.of("the observations of the window are too large, or too close together, to square");
        }
        return Optional.empty();
    }

    private boolean constant() {
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
     * Of normals the mean and the standard deviation with divisor n, which are the center and the scale of the window; of Student-t
     * one search.
     */
    @Override
    public SearchEnd alone() {
        FitSettings one = new FitSettings(ModelKind.MIXTURE, 1, settings.emission(), 1);
        if (settings.emission().fatTailed()) {
            Climb.Summit summit = Climb.from(new Starts(one, window).sorted(), window, settings.emission());
            return end(summit, InitialDistribution.FREE);
        }
        Parameters p = Parameters.blank(ModelKind.MIXTURE, 1);
        p.set(p.initial(0), 1);
        p.set(p.variance(0), 1);
        return end(
                new Climb.Summit(p, window.oneRegimeLogLikelihood(), window.count(), 0, true),
                InitialDistribution.FREE);
    }

    @Override
    public List<Supplier<SearchEnd>> starts(FitRequest request) {
        Starts starts = new Starts(settings, window);
        return settings.prior()
                .map(prior -> under(prior.density(settings.states()), starts.all(request)))
                .orElseGet(() -> likeliest(starts, request));
    }

    private List<Supplier<SearchEnd>> under(PriorDensity prior, List<Parameters> starts) {
        List<Supplier<SearchEnd>> searches = new ArrayList<>();
        for (Parameters start : starts) {
            searches.add(() -> end(
                    Climb.under(prior, start, window, settings.emission(), settings.initial()), settings.initial()));
        }
        return searches;
    }

    private List<Supplier<SearchEnd>> likeliest(Starts starts, FitRequest request) {
        Optional<Landmark> first = starts.fromPrevious(request)
                .map(start -> Climb.again(start, window, settings.emission(), settings.initial()));
        Optional<Landmark> landmark = first.filter(known -> sound(known.summit()));
        List<Supplier<SearchEnd>> searches = new ArrayList<>();
        for (Parameters start : starts.cold(request)) {
            searches.add(() -> end(climb(start, landmark), settings.initial()));
        }
        first.ifPresent(known -> searches.add(() -> end(known.summit(), settings.initial())));
        return searches;
    }

    private Climb.Summit climb(Parameters start, Optional<Landmark> landmark) {
        return Climb.from(start, window, settings.emission(), settings.initial(), landmark);
    }

    private boolean sound(Climb.Summit summit) {
        return summit.converged()
                && summit.leastCount() >= Soundness.LEAST_COUNT
                && end(summit, settings.initial()).squeezed().isEmpty();
    }

    private SearchEnd end(Climb.Summit summit, InitialDistribution initial) {
        Parameters p = summit.parameters();
        OptionalInt squeezed = OptionalInt.empty();
        for (int k = 0; squeezed.isEmpty() && k < p.states(); k++) {
            squeezed = p.at(p.variance(k)) <= Maximisation.FLOOR ? OptionalInt.of(k) : squeezed;
        }
        return new SearchEnd(
                p.toModel(window, settings.emission(), initial),
                summit.logLikelihood(),
                summit.objective(),
                summit.leastCount(),
                squeezed,
                summit.evaluations(),
                summit.converged());
    }
}
