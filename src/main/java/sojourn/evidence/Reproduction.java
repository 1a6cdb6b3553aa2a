package sojourn.evidence;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import sojourn.inference.Autocorrelation;
import sojourn.inference.Estimate;
import sojourn.inference.Moments;
import sojourn.numeric.RandomStream;
import sojourn.regime.LongRun;
import sojourn.regime.RegimeModel;

/**
 * Whether the last accepted fit reproduces what its window showed: skewness, fat tails (kurtosis) and clustering (autocorrelation of squared
 * and absolute deviations). Beside the implied value stands the middle 95 % of what 199 series drawn from the model, as long as the window, showed:
 * a sample's kurtosis strays far, and the implied value alone would refuse too often. Missing observations are passed over.
 *
 * @param fit the number of the fit
 * @param observations in its window
 * @param figures one line each
 */
public record Reproduction(int fit, int observations, List<Figure> figures) {
    /** The longest lag. */
    public static final int LAGS = 20;
    /** Series drawn. */
    public static final int DRAWN = 199;
    /** Of 199 ordered values, the one below which 2.5 % lie; the same from above. */
    private static final int OUTER = 5;

    /** Copies the list. */
    public Reproduction {
        figures = List.copyOf(figures);
    }

    /**
     * One property.
     *
     * @param what it is of
     * @param lag of an autocorrelation; 0 for a moment
     * @param sample what the window showed
     * @param implied what the model says of an endless series
     * @param low 2.5 % of the drawn series lie below
     * @param high 2.5 % of the drawn series lie above
     */
    public record Figure(Property what, int lag, Estimate sample, Estimate implied, Estimate low, Estimate high) {
        /** Whether the sample lies where 95 % of the drawn series do; empty where something is undefined. */
        public Optional<Boolean> reproduced() {
            OptionalDouble value = sample.number();
            if (value.isEmpty() || low.number().isEmpty() || high.number().isEmpty()) {
                return Optional.empty();
            }
            double got = value.getAsDouble();
            return Optional.of(
                    got >= low.number().getAsDouble() && got <= high.number().getAsDouble());
        }
    }

    /** A property of a series. */
    public enum Property {
        /** Of the values. */
        SKEWNESS("skewness"),
        /** Of the values, 3 for a normal. */
        KURTOSIS("kurtosis"),
        /** Autocorrelation of the squared deviations from the mean. */
        SQUARES("autocorrelation of squares"),
        /** Autocorrelation of the absolute deviations from the mean. */
        SIZES("autocorrelation of sizes");

        private final String words;

        Property(String words) {
            this.words = words;
        }

        /** In words. */
        public String words() {
            return words;
        }
    }

    /** Of the last accepted fit. */
    static Answer<Reproduction> of(WalkedRegimes subject) {
        if (subject.stretches().isEmpty()) {
            return Answer.none("no fit was accepted");
        }
        Stretch last = subject.stretches().get(subject.stretches().size() - 1);
        if (last.record().fit().model().isEmpty()) {
            return Answer.none("this gauge implies no distribution of its observation");
        }
        RegimeModel model = last.record().fit().model().get();
        Answer<ImpliedMoments> implied = ImpliedMoments.of(model);
        return implied.map(moments -> of(subject, last, model, moments));
    }

    private static Reproduction of(WalkedRegimes subject, Stretch last, RegimeModel model, ImpliedMoments implied) {
        PerBar observed = subject.observed();
        double[] window = observed.at(
                observed.where(bar -> bar >= last.windowStart() && bar <= last.from() && observed.has(bar)));
        Shown sample = Shown.by(window);
        List<Shown> drawn = drawn(subject, last, model, window.length);
        List<Figure> figures = new ArrayList<>();
        figures.add(figure(Property.SKEWNESS, 0, sample, implied.skewness(), drawn));
        figures.add(figure(Property.KURTOSIS, 0, sample, implied.kurtosis(), drawn));
        for (int lag = 1; lag <= LAGS; lag++) {
            figures.add(figure(Property.SQUARES, lag, sample, implied.ofSquares(lag), drawn));
        }
        for (int lag = 1; lag <= LAGS; lag++) {
            figures.add(figure(Property.SIZES, lag, sample, implied.ofSizes(lag), drawn));
        }
        return new Reproduction(last.record().number(), window.length, figures);
    }

    private static List<Shown> drawn(WalkedRegimes subject, Stretch last, RegimeModel model, int count) {
        double[] longRun = LongRun.stationary(model).orElseThrow();
        List<Shown> drawn = new ArrayList<>();
        for (int i = 0; i < DRAWN; i++) {
            RandomStream random = RandomStream.of(
                    subject.refit().seed(),
                    "implied moments",
                    last.record().fittedOn().toString(),
                    Integer.toString(i));
            drawn.add(Shown.by(DrawnSeries.of(model, longRun, count, random)));
        }
        return drawn;
    }

    private static Figure figure(Property what, int lag, Shown sample, Estimate implied, List<Shown> drawn) {
        List<Estimate> all =
                drawn.stream().map(shown -> shown.figure(what, lag)).toList();
        Optional<Estimate> none =
                all.stream().filter(one -> one.number().isEmpty()).findFirst();
        double[] values = all.stream()
                .flatMap(one -> one.number().stream().boxed())
                .mapToDouble(Double::doubleValue)
                .sorted()
                .toArray();
        return new Figure(
                what,
                lag,
                sample.figure(what, lag),
                implied,
                none.orElseGet(() -> Estimate.of(values[OUTER - 1])),
                none.orElseGet(() -> Estimate.of(values[DRAWN - OUTER])));
    }

    /** What one series shows. */
    private record Shown(Moments moments, Autocorrelation squares, Autocorrelation sizes) {
        static Shown by(double[] series) {
            Moments raw = Moments.of(series);
            double[] standard = series.clone(); // so that neither unit nor origin decides what counts as constant
            double deviation = Math.sqrt(raw.populationVariance());
            Arrays.setAll(standard, t -> deviation > 0 ? (series[t] - raw.mean()) / deviation : 0);
            Moments moments = Moments.of(standard);
            double[] squares = new double[series.length];
            double[] sizes = new double[series.length];
            Arrays.setAll(sizes, t -> Math.abs(standard[t] - moments.mean()));
            Arrays.setAll(squares, t -> sizes[t] * sizes[t]);
            return new Shown(moments, Autocorrelation.of(squares), Autocorrelation.of(sizes));
        }

        Estimate figure(Property what, int lag) {
            return switch (what) {
                case SKEWNESS -> moments.skewness();
                case KURTOSIS -> {
                    Estimate excess = moments.excessKurtosis();
                    yield excess instanceof Estimate.Value value ? Estimate.of(value.amount() + 3) : excess;
                }
                case SQUARES -> squares.at(lag);
                case SIZES -> sizes.at(lag);
            };
        }
    }
}
