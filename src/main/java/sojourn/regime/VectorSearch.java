package sojourn.regime;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.Supplier;

/** The search on a window of several numbers a row. */
final class VectorSearch implements WindowSearch {
    /** Least variance of a single state in any direction, of columns brought to variance 1: correlations are known to 1e-10. */
    private static final double SINGULAR = 1e-10;

    private final FitSettings settings;
    private final Observations x;
    private final VectorWindow window;

    VectorSearch(FitSettings settings, Observations x) {
        this.settings = settings;
        this.x = x;
        this.window = VectorWindow.of(x);
    }

    @Override
    public Optional<String> refusal() {
        for (int i = 0; i < x.dimension(); i++) {
            Optional<String> column = refusal(i);
            if (column.isPresent()) {
                return column;
            }
        }
        if (settings.emission().form() == EmissionFamily.Form.NORMAL) {
            Optional<String> apart = neverTogether();
            return apart.isPresent() ? apart : movingTogether();
        }
        return Optional.empty();
    }

    private Optional<String> refusal(int column) {
        int present = x.present(column);
        int least = Soundness.leastCount(x.dimension()) * settings.states();
        if (present < least) {
            return Optional.of("the window holds " + present + " observations of [" + column + "]; " + settings.states()
                    + " states need at least " + least);
        }
        if (constant(column)) {
            return Optional.of("all observations of [" + column + "] in the window are equal");
        }
        double scale = window.scale(column);
        return scale > 0 && Double.isFinite(scale)
                ? Optional.empty()
                : Optional.of("the observations of [" + column
                        + "] in the window are too large, or too close together, to square");
    }

    private boolean constant(int column) {
        double lowest = Double.POSITIVE_INFINITY;
        double highest = Double.NEGATIVE_INFINITY;
        for (int t = 0; t < x.size(); t++) {
            if (!x.missing(t, column)) {
                lowest = StrictMath.min(lowest, x.at(t, column));
                highest = StrictMath.max(highest, x.at(t, column));
            }
        }
        return lowest == highest;
    }

    /** A correlation can be told only from rows that hold both numbers. */
    private Optional<String> neverTogether() {
        int least = Soundness.leastCount(x.dimension()) * settings.states();
        for (int i = 0; i < x.dimension(); i++) {
            for (int j = 0; j < i; j++) {
                int together = 0;
                for (int t = 0; t < x.size(); t++) {
                    together += x.missing(t, i) || x.missing(t, j) ? 0 : 1;
                }
                if (together < least) {
                    return Optional.of("the window holds " + together + " rows with both [" + j + "] and [" + i
                            + "]; the correlations of " + settings.states() + " states need at least " + least);
                }
            }
        }
        return Optional.empty();
    }

    private Optional<String> movingTogether() {
        return single().squeezed().isPresent()
                ? Optional.of("the observed series move together exactly: one of them follows from the others; observe"
                        + " fewer, or let them be independent within a regime")
                : Optional.empty();
    }

    @Override
    public SearchEnd alone() {
        return end(single(), InitialDistribution.FREE);
    }

    /** The normal distribution of all rows: of complete ones mean and covariance with divisor n. */
    private VectorClimb.Summit single() {
        int d = x.dimension();
        Parameters chain = Parameters.blank(ModelKind.MIXTURE, 1);
        chain.set(chain.initial(0), 1);
        chain.set(chain.variance(0), 1);
        VectorParameters start = VectorParameters.blank(chain, d);
        double[] least = new double[d * d];
        for (int i = 0; i < d; i++) {
            start.covariances()[i * d + i] = 1;
            least[i * d + i] = SINGULAR;
        }
        VectorMaximisation maximisation = new VectorMaximisation(settings.emission(), InitialDistribution.FREE, least);
        return VectorClimb.from(start, window, maximisation, InitialDistribution.FREE);
    }

    @Override
    public List<Supplier<SearchEnd>> starts(FitRequest request) {
        VectorParameters alone = single().parameters();
        double[] least = alone.covariances().clone();
        for (int e = 0; e < least.length; e++) {
            least[e] *= Maximisation.FLOOR;
        }
        VectorMaximisation maximisation = new VectorMaximisation(settings.emission(), settings.initial(), least);
        List<Supplier<SearchEnd>> searches = new ArrayList<>();
        for (VectorParameters start : new VectorStarts(settings, window, alone).all(request)) {
            searches.add(
                    () -> end(VectorClimb.from(start, window, maximisation, settings.initial()), settings.initial()));
        }
        return searches;
    }

    private SearchEnd end(VectorClimb.Summit summit, InitialDistribution initial) {
        return new SearchEnd(
                summit.parameters().toModel(window, settings.emission(), initial),
                summit.logLikelihood(),
                summit.logLikelihood(),
                summit.leastCount(),
                summit.squeezed(),
                summit.evaluations(),
                summit.converged());
    }
}
