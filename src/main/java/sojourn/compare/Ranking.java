package sojourn.compare;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.OptionalDouble;
import sojourn.measure.Direction;
import sojourn.measure.Measure;

/** The order of variants by the declared measure, best first; undefined last, ties by name. */
final class Ranking {
    private final Measure measure;

    private Ranking(Measure measure) {
        this.measure = measure;
    }

    static Ranking by(Measure measure) {
        return new Ranking(measure);
    }

    List<Judgement> sorted(List<Judgement> judged) {
        List<Judgement> sorted = new ArrayList<>(judged);
        sorted.sort(Comparator.comparingDouble(this::badness)
                .thenComparing(one -> one.run().file().slug()));
        return sorted;
    }

    private double badness(Judgement one) {
        OptionalDouble number = one.strategy().get(measure).number();
        if (number.isEmpty()) {
            return Double.POSITIVE_INFINITY;
        }
        return measure.direction() == Direction.LOWER ? number.getAsDouble() : -number.getAsDouble();
    }
}
