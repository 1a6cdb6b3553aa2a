package sojourn.latest;

import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import sojourn.walk.FitRecord;
import sojourn.walk.Reading;

/**
 * What is thought of the regimes at one close.
 *
 * @param regimes their names
 * @param filtered probability of each now, sums to 1
 * @param predicted probability of each one bar ahead
 * @param mostLikely index of the most likely one
 * @param ageBars closes running, this one included, that it has been that, since the first accepted fit at the longest
 * @param fit the fit in force
 */
public record RegimeNow(
        List<String> regimes,
        List<Double> filtered,
        List<Double> predicted,
        int mostLikely,
        int ageBars,
        FitRecord fit) {
    /** Copies the lists. */
    public RegimeNow {
        regimes = List.copyOf(regimes);
        filtered = List.copyOf(filtered);
        predicted = List.copyOf(predicted);
    }

    /** Of the last close of a standing; empty if nothing is known of the regimes. */
    static Optional<RegimeNow> of(Standing standing) {
        return standing.reading().map(reading -> {
            int age = 1;
            Optional<Reading> before = reading.before();
            while (before.isPresent() && before.get().mostLikely() == reading.mostLikely()) {
                age++;
                before = before.get().before();
            }
            return new RegimeNow(
                    standing.timeline().regimes(),
                    boxed(reading.filtered()),
                    boxed(reading.predicted(1)),
                    reading.mostLikely(),
                    age,
                    standing.timeline().fits().get(reading.fit() - 1));
        });
    }

    private static List<Double> boxed(double[] values) {
        return Arrays.stream(values).boxed().toList();
    }
}
