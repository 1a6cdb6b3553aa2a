package sojourn.regime;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import sojourn.numeric.RandomStream;

/**
 * Where the searches of one fit start. Start 0 is deterministic: rows sorted by the mean size, or level, of the last 21
 * observations, cut in as many equal groups as there are states. The others are random, odd ones from stretches of the window, even ones from single
 * observations. The previous accepted fit, if any, comes last.
 */
final class Starts {
    private static final int SMOOTHING = 21;
    private static final double STAY = 0.95;
    private static final double LEAST_VARIANCE = 0.01;
    /** Degrees of freedom at which a search starts, unless they are given. */
    private static final double TAILS = 8;
    /** Lets a search that starts at the previous fit leave probabilities of 0 again. */
    private static final double SOFTENING = 0.001;

    private final FitSettings settings;
    private final Window window;
    /** The observations that are there. */
    private final double[] present;

    Starts(FitSettings settings, Window window) {
        this.settings = settings;
        this.window = window;
        this.present = present(window);
    }

    /** All starts of that request, in the order in which ties are decided. */
    List<Parameters> all(FitRequest request) {
        List<Parameters> starts = new ArrayList<>(cold(request));
        fromPrevious(request).ifPresent(starts::add);
        return starts;
    }

    /** The one from the previous fit, if there is one of the same shape. */
    Optional<Parameters> fromPrevious(FitRequest request) {
        return request.previous().flatMap(Fit::model).flatMap(this::fromModel).map(this::settled);
    }

    /** Those that do not depend on the previous fit. */
    List<Parameters> cold(FitRequest request) {
        List<Parameters> starts = new ArrayList<>();
        starts.add(sorted());
        for (int index = 1; index < settings.starts(); index++) {
            RandomStream random = RandomStream.of(
                    request.masterSeed(), "start", request.date(), String.format(Locale.ROOT, "%d", index));
            boolean stretches = index % 2 == 1;
            if (settings.emission().fatTailed()) {
                Parameters start = stretches ? fromLongStretches(random) : fromStretches(random);
                drawTails(start, random);
                starts.add(start);
            } else {
                starts.add(stretches ? fromStretches(random) : fromValues(random));
            }
        }
        return starts.stream().map(this::settled).toList();
    }

    /** For tied variances gives every state the mean of the starting ones. {@code start} is modified. */
    private Parameters settled(Parameters start) {
        double mean = 0;
        for (int k = 0; k < start.states(); k++) {
            mean += start.at(start.variance(k)) / start.states();
        }
        for (int k = 0; settings.emission().form() == EmissionFamily.Form.NORMAL_TIED && k < start.states(); k++) {
            start.set(start.variance(k), mean);
        }
        return start;
    }

    /**
     * The deterministic start: rows sorted by size, or by level where the observations do not lie around zero, which is where their mean
     * is farther from it than a standard deviation; the mean of the last 21 is what is sorted.
     */
    Parameters sorted() {
        boolean aroundZero = StrictMath.abs(window.center()) <= window.scale();
        double[] values = present;
        double[] smooth = new double[values.length];
        double sum = 0;
        for (int i = 0; i < smooth.length; i++) {
            sum += aroundZero ? StrictMath.abs(values[i]) : values[i];
            if (i >= SMOOTHING) {
                double left = values[i - SMOOTHING];
                sum -= aroundZero ? StrictMath.abs(left) : left;
            }
            smooth[i] = sum / StrictMath.min(i + 1, SMOOTHING);
        }
        double[] ascending = smooth.clone();
        Arrays.sort(ascending);
        Parameters start = chain(STAY);
        int states = settings.states();
        for (int k = 0; k < states; k++) {
            double from = k == 0 ? Double.NEGATIVE_INFINITY : ascending[k * ascending.length / states];
            double to = k + 1 == states ? Double.POSITIVE_INFINITY : ascending[(k + 1) * ascending.length / states];
            double[] group = new double[values.length];
            int size = 0;
            for (int i = 0; i < smooth.length; i++) {
                if (smooth[i] >= from && smooth[i] < to) {
                    group[size++] = values[i];
                }
            }
            emission(start, k, size == 0 ? values : group, 0, size == 0 ? values.length : size);
        }
        return start;
    }

    /** Each state takes the moments of one randomly placed stretch of the window. */
    private Parameters fromStretches(RandomStream random) {
        int rows = present.length;
        int length = StrictMath.max(5, StrictMath.min(SMOOTHING * 3, rows / (2 * settings.states())));
        Parameters start = chain(0.8 + 0.19 * random.nextDouble());
        for (int k = 0; k < settings.states(); k++) {
            int from = random.nextInt(StrictMath.max(1, rows - length + 1));
            emission(start, k, present, from, StrictMath.min(rows, from + length));
        }
        return start;
    }

    /**
     * As {@link #fromStretches}, of stretches up to as long as an even share of the window, with stays as long. Fat tails explain
     * single storms without a change of regime, so that what is left to find may be slow. (A start from single observations would
     * only find spikes inside a fat-tailed regime.)
     */
    private Parameters fromLongStretches(RandomStream random) {
        int rows = present.length;
        int longest = StrictMath.max(5, rows / settings.states());
        int length = 5 + random.nextInt(StrictMath.max(1, longest - 4));
        Parameters start = chain(1 - 1.0 / StrictMath.max(5, length));
        for (int k = 0; k < settings.states(); k++) {
            int from = random.nextInt(StrictMath.max(1, rows - length + 1));
            emission(start, k, present, from, StrictMath.min(rows, from + length));
        }
        return start;
    }

    /** Degrees of freedom between 3 and 30, each scale changed so that the standard deviation stays; given ones stay. */
    private void drawTails(Parameters start, RandomStream random) {
        for (int k = 0; settings.emission().fixedDegreesOfFreedom().isEmpty() && k < start.states(); k++) {
            double before = start.at(start.degreesOfFreedom(k));
            double nu = 3 * StrictMath.exp(random.nextDouble() * StrictMath.log(10));
            double square = start.at(start.variance(k)) * (before / (before - 2)) * ((nu - 2) / nu);
            start.set(start.variance(k), StrictMath.max(Maximisation.FLOOR, square));
            start.set(start.degreesOfFreedom(k), nu);
        }
    }

    /** Each state takes one observation as its mean, and a variance between a hundredth and four times the window's. */
    private Parameters fromValues(RandomStream random) {
        Parameters start = chain(0.5 + 0.49 * random.nextDouble());
        for (int k = 0; k < settings.states(); k++) {
            double mean = present[random.nextInt(present.length)];
            double size = StrictMath.exp(StrictMath.log(0.01) + random.nextDouble() * StrictMath.log(400));
            start.set(start.mean(k), settings.emission().estimatesMeans() ? mean : 0);
            start.set(start.variance(k), size);
            tails(start, k);
        }
        return start;
    }

    /** The previous model in this window's unit, if it has the same shape. */
    private Optional<Parameters> fromModel(RegimeModel model) {
        int states = settings.states();
        boolean sameKind = model instanceof HiddenMarkov == (settings.kind() == ModelKind.HIDDEN_MARKOV);
        if (!sameKind || model.states() != states) {
            return Optional.empty();
        }
        Parameters start = chain(STAY);
        for (int k = 0; k < states; k++) {
            double deviation = model.emission().standardDeviation(k, 0) / window.scale();
            double mean = (model.emission().mean(k, 0) - window.center()) / window.scale();
            start.set(start.mean(k), settings.emission().estimatesMeans() ? mean : 0);
            start.set(start.variance(k), StrictMath.max(Maximisation.FLOOR, deviation * deviation));
            tails(start, k);
            if (model.emission() instanceof StudentT student
                    && settings.emission().fatTailed()) {
                double scale = student.scale(k) / window.scale();
                start.set(start.variance(k), StrictMath.max(Maximisation.FLOOR, scale * scale));
                start.set(start.degreesOfFreedom(k), student.degreesOfFreedom(k));
            }
            if (settings.kind() == ModelKind.MIXTURE) {
                start.set(start.initial(k), soft(model.initial(k)));
            }
            for (int j = 0; settings.kind() == ModelKind.HIDDEN_MARKOV && j < states; j++) {
                start.set(start.transition(k, j), soft(model.transition(k, j)));
            }
        }
        return Optional.of(start);
    }

    private double soft(double probability) {
        return (1 - SOFTENING) * probability + SOFTENING / settings.states();
    }

    /** Even initial distribution; {@code stay} on the diagonal, the rest even. */
    private Parameters chain(double stay) {
        int states = settings.states();
        Parameters start = Parameters.blank(settings.kind(), states, settings.emission());
        for (int i = 0; i < states; i++) {
            start.set(start.initial(i), 1.0 / states);
            for (int j = 0; settings.kind() == ModelKind.HIDDEN_MARKOV && j < states; j++) {
                start.set(start.transition(i, j), i == j ? stay : (1 - stay) / (states - 1));
            }
        }
        return start;
    }

    /** Moments of the values from {@code from} on, up to {@code end} excluded. Not modified. */
    private void emission(Parameters start, int k, double[] values, int from, int end) {
        int size = end - from;
        double mean = 0;
        for (int i = from; i < end; i++) {
            mean += values[i] / size;
        }
        double center = settings.emission().estimatesMeans() ? mean : 0;
        double square = 0;
        for (int i = from; i < end; i++) {
            square += (values[i] - center) * (values[i] - center) / size;
        }
        start.set(start.mean(k), center);
        start.set(start.variance(k), StrictMath.max(LEAST_VARIANCE, square));
        tails(start, k);
    }

    /** For Student-t turns the variance of state {@code k} into the squared scale that has it, degrees of freedom beside. */
    private void tails(Parameters start, int k) {
        if (settings.emission().fatTailed()) {
            double nu = settings.emission().fixedDegreesOfFreedom().orElse(TAILS);
            double square = start.at(start.variance(k)) * (nu - 2) / nu;
            start.set(start.variance(k), StrictMath.max(Maximisation.FLOOR, square));
            start.set(start.degreesOfFreedom(k), nu);
        }
    }

    private static double[] present(Window window) {
        double[] values = new double[window.count()];
        for (int t = 0, next = 0; t < window.size(); t++) {
            if (window.present()[t] > 0) {
                values[next++] = window.values()[t];
            }
        }
        return values;
    }
}
