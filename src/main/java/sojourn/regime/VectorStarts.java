package sojourn.regime;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import sojourn.numeric.RandomStream;

/**
 * Where the searches of a fit of several series start. Start 0 is deterministic: rows sorted by the mean size of the last 21
 * observations, cut in as many equal groups as there are states; the size of a row is its distance from the mean of a single state
 * in units of that state's covariance, over the root of how many numbers are there. The others are random, odd ones from stretches
 * of the window, even ones from single rows. The previous accepted fit, if any, comes last.
 */
final class VectorStarts {
    private static final int SMOOTHING = 21;
    private static final double STAY = 0.95;
    /** A start's covariance is mixed with so much of the single state's, which keeps it within bounds. */
    private static final double MIXED_IN = 0.05;
    /** Lets a search that starts at the previous fit leave probabilities of 0, and the bounds, again. */
    private static final double SOFTENING = 0.001;

    private final FitSettings settings;
    private final VectorWindow window;
    private final VectorParameters alone;
    private final List<Integer> rows = new ArrayList<>();

    /**
     * @param alone the fit of a single state
     */
    VectorStarts(FitSettings settings, VectorWindow window, VectorParameters alone) {
        this.settings = settings;
        this.window = window;
        this.alone = alone;
        for (int t = 0; t < window.size(); t++) {
            if (!window.patterns().get(window.patternOf(t)).present().isEmpty()) {
                rows.add(t);
            }
        }
    }

    /** All starts of that request, in the order in which ties are decided. */
    List<VectorParameters> all(FitRequest request) {
        List<VectorParameters> starts = new ArrayList<>();
        starts.add(bySize());
        for (int index = 1; index < settings.starts(); index++) {
            RandomStream random = RandomStream.of(
                    request.masterSeed(), "start", request.date(), String.format(Locale.ROOT, "%d", index));
            starts.add(index % 2 == 1 ? fromStretches(random) : fromRows(random));
        }
        request.previous().flatMap(Fit::model).flatMap(this::fromModel).ifPresent(starts::add);
        return starts;
    }

    private VectorParameters bySize() {
        double[] size = smoothed(sizes());
        List<Integer> sorted = new ArrayList<>();
        for (int i = 0; i < size.length; i++) {
            sorted.add(i);
        }
        sorted.sort(Comparator.comparingDouble((Integer i) -> size[i]));
        VectorParameters start = blank(STAY);
        int states = settings.states();
        for (int k = 0; k < states; k++) {
            List<Integer> group = new ArrayList<>();
            for (int i : sorted.subList(k * size.length / states, (k + 1) * size.length / states)) {
                group.add(rows.get(i));
            }
            emission(start, k, group);
        }
        return start;
    }

    private double[] sizes() {
        List<Conditional> seen = window.patterns().stream()
                .map(pattern -> new Conditional(pattern, alone, 0))
                .toList();
        double[] sizes = new double[rows.size()];
        for (int i = 0; i < sizes.length; i++) {
            int t = rows.get(i);
            int pattern = window.patternOf(t);
            double square = seen.get(pattern).squaredDistance(window.values(), t * window.dimension());
            sizes[i] =
                    Math.sqrt(square / window.patterns().get(pattern).present().size());
        }
        return sizes;
    }

    private static double[] smoothed(double[] values) {
        double[] result = new double[values.length];
        double sum = 0;
        for (int i = 0; i < result.length; i++) {
            sum += values[i];
            sum -= i >= SMOOTHING ? values[i - SMOOTHING] : 0;
            result[i] = sum / StrictMath.min(i + 1, SMOOTHING);
        }
        return result;
    }

    /** Each state takes the moments of one randomly placed stretch of the window. */
    private VectorParameters fromStretches(RandomStream random) {
        int length = StrictMath.max(5, StrictMath.min(SMOOTHING * 3, rows.size() / (2 * settings.states())));
        VectorParameters start = blank(0.8 + 0.19 * random.nextDouble());
        for (int k = 0; k < settings.states(); k++) {
            int from = random.nextInt(StrictMath.max(1, rows.size() - length + 1));
            emission(start, k, rows.subList(from, StrictMath.min(rows.size(), from + length)));
        }
        return start;
    }

    /** Each state takes one row as its mean, and between a twentieth and four times the single state's covariance. */
    private VectorParameters fromRows(RandomStream random) {
        VectorParameters start = blank(0.5 + 0.49 * random.nextDouble());
        int square = window.dimension() * window.dimension();
        for (int k = 0; k < settings.states(); k++) {
            double[] mean = window.row(rows.get(random.nextInt(rows.size())));
            System.arraycopy(mean, 0, start.means(), k * mean.length, mean.length);
            double size = StrictMath.exp(StrictMath.log(0.05) + random.nextDouble() * StrictMath.log(80));
            for (int e = 0; e < square; e++) {
                start.covariances()[k * square + e] = size * alone.covariances()[e];
            }
        }
        return start;
    }

    /** The previous model in this window's units, if it has the same shape. */
    private Optional<VectorParameters> fromModel(RegimeModel model) {
        int states = settings.states();
        boolean sameKind = model instanceof HiddenMarkov == (settings.kind() == ModelKind.HIDDEN_MARKOV);
        if (!sameKind
                || model.states() != states
                || !(model.emission() instanceof MultivariateNormal normal)
                || normal.dimension() != window.dimension()) {
            return Optional.empty();
        }
        VectorParameters start = blank(STAY);
        Parameters chain = start.chain();
        for (int k = 0; k < states; k++) {
            if (settings.kind() == ModelKind.MIXTURE) {
                chain.set(chain.initial(k), soft(model.initial(k)));
            }
            for (int j = 0; settings.kind() == ModelKind.HIDDEN_MARKOV && j < states; j++) {
                chain.set(chain.transition(k, j), soft(model.transition(k, j)));
            }
            take(start, k, normal);
        }
        return Optional.of(start);
    }

    private void take(VectorParameters start, int k, MultivariateNormal normal) {
        int d = window.dimension();
        double[] covariance = new double[d * d];
        for (int i = 0; i < d; i++) {
            start.means()[k * d + i] = (normal.mean(k, i) - window.center(i)) / window.scale(i);
            for (int j = 0; j < d; j++) {
                covariance[i * d + j] = normal.covariance(k, i, j) / (window.scale(i) * window.scale(j));
            }
        }
        mix(start, k, covariance, SOFTENING);
    }

    private double soft(double probability) {
        return (1 - SOFTENING) * probability + SOFTENING / settings.states();
    }

    /** Even initial distribution; {@code stay} on the diagonal, the rest even; no emissions. */
    private VectorParameters blank(double stay) {
        int states = settings.states();
        Parameters chain = Parameters.blank(settings.kind(), states);
        for (int i = 0; i < states; i++) {
            chain.set(chain.initial(i), 1.0 / states);
            chain.set(chain.variance(i), 1);
            for (int j = 0; settings.kind() == ModelKind.HIDDEN_MARKOV && j < states; j++) {
                chain.set(chain.transition(i, j), i == j ? stay : (1 - stay) / (states - 1));
            }
        }
        return VectorParameters.blank(chain, window.dimension());
    }

    /** Moments of a group of rows, a missing number standing at the group's mean. */
    private void emission(VectorParameters start, int k, List<Integer> group) {
        int d = window.dimension();
        double[] counts = new double[d];
        double[] mean = new double[d];
        for (int t : group) {
            for (int i : present(t)) {
                counts[i]++;
                mean[i] += window.values()[t * d + i];
            }
        }
        for (int i = 0; i < d; i++) {
            mean[i] = counts[i] > 0 ? mean[i] / counts[i] : 0;
            start.means()[k * d + i] = mean[i];
        }
        double[] covariance = new double[d * d];
        for (int t : group) {
            for (int i : present(t)) {
                for (int j : present(t)) {
                    double product = (window.values()[t * d + i] - mean[i]) * (window.values()[t * d + j] - mean[j]);
                    covariance[i * d + j] += product / group.size();
                }
            }
        }
        mix(start, k, covariance, MIXED_IN);
    }

    private List<Integer> present(int row) {
        return window.patterns().get(window.patternOf(row)).present();
    }

    private void mix(VectorParameters start, int k, double[] covariance, double share) {
        int d = window.dimension();
        for (int e = 0; e < covariance.length; e++) {
            boolean free = e / d == e % d || settings.emission().form() == EmissionFamily.Form.NORMAL;
            double value = free ? (1 - share) * covariance[e] : 0;
            start.covariances()[k * d * d + e] = value + share * alone.covariances()[e];
        }
    }
}
