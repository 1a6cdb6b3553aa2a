package sojourn.walk;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import sojourn.regime.WindowMoments;

/** Makes the readings of a timeline, close after close: each knows the one before, and what the fit before would have said. */
final class LinkedReadings {
    private final List<FitRecord> fits;
    private final List<double[]> transitions = new ArrayList<>();
    private final List<Optional<WindowMoments>> moments = new ArrayList<>();
    private final List<Optional<Reading>> made = new ArrayList<>();
    private Optional<Reading> last = Optional.empty();

    LinkedReadings(List<FitRecord> fits, List<String> regimes) {
        this.fits = fits;
        for (FitRecord record : fits) {
            boolean accepted = record.fit().outcome().accepted();
            transitions.add(accepted ? ModelArrays.transition(record, regimes) : new double[0]);
            moments.add(accepted ? Optional.of(ModelArrays.moments(record, regimes)) : Optional.empty());
        }
    }

    /** The means of all regimes at one close; empty if they are those of the window. */
    record Means(Optional<Double> all) {
        private WindowMoments of(WindowMoments fitted) {
            return all.map(fitted::withMeans).orElse(fitted);
        }
    }

    /** A close at which nothing is in force. */
    void none() {
        last = Optional.empty();
        made.add(last);
    }

    /** The close of {@code bar}; takes over {@code filtered}. */
    void add(int bar, int fit, double[] filtered, Means means) {
        Reading reading = reading(fit, filtered, means);
        List<Double> unmoved = fits.get(fit - 1).withoutIt();
        if (last.isPresent() && fits.get(fit - 1).bar() == bar && !unmoved.isEmpty()) {
            double[] without = unmoved.stream().mapToDouble(p -> p).toArray();
            Reading before = last.get();
            reading = reading.refitted(reading(before.fit(), without, means).following(before));
        }
        last = Optional.of(last.map(reading::following).orElse(reading));
        made.add(last);
    }

    private Reading reading(int fit, double[] filtered, Means means) {
        WindowMoments fitted = moments.get(fit - 1).orElseThrow();
        return Reading.sharing(fit, filtered, transitions.get(fit - 1), means.of(fitted));
    }

    List<Optional<Reading>> made() {
        return List.copyOf(made);
    }
}
