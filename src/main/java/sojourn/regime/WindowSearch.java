package sojourn.regime;

import java.util.List;
import java.util.Optional;
import java.util.function.Supplier;
import sojourn.numeric.Check;

/** The search for the best model of one window, whatever its observations look like. */
interface WindowSearch {
    /** Why there is nothing to search; empty where there is. Asked before anything else. */
    Optional<String> refusal();

    /** A single state, whatever the number of states searched for. */
    SearchEnd alone();

    /** One search a start, in the order in which ties are decided; they share nothing that changes. */
    List<Supplier<SearchEnd>> starts(FitRequest request);

    /** The search that fits those observations. */
    static WindowSearch of(FitSettings settings, Observations x) {
        if (x.dimension() == 1) {
            return new ScalarSearch(settings, x);
        }
        Check.that(settings.prior().isEmpty(), "a prior for " + x.dimension() + " series");
        Check.that(
                settings.emission().multivariate(),
                settings.emission().word() + " emissions for " + x.dimension() + " series");
        return new VectorSearch(settings, x);
    }
}
