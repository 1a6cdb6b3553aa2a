package sojourn.evidence;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import sojourn.regime.Emission;
import sojourn.regime.Fit;
import sojourn.regime.LongRun;
import sojourn.regime.Matching;
import sojourn.regime.RegimeModel;

/**
 * Whether the regimes are the same from fit to fit. Each accepted fit's regimes are matched to those of the accepted fit before, by least
 * total squared Hellinger distance, which relabels nothing; and both fits are asked for the probabilities of the last 60 bars, each filtered from
 * the start of its own window: where they part, the past has been rewritten.
 */
public final class Lineage {
    /** Bars before a fit over which the two fits' probabilities are compared. */
    public static final int BARS = 60;
    /**
     * A regime further than this from what it is matched to is called a birth: 1 - sqrt(4/5), the squared Hellinger distance of a normal
     * from one of twice its standard deviation. Our own mark, no source.
     */
    public static final double BIRTH = 0.10557280900008414;

    private final List<LineageStep> steps;

    private Lineage(List<LineageStep> steps) {
        this.steps = List.copyOf(steps);
    }

    /** Through all accepted fits; nothing for a gauge whose regimes have no distribution to be matched by. */
    static Answer<Lineage> of(Subject subject) {
        List<LineageStep> steps = new ArrayList<>();
        Optional<FrozenFilter> old = Optional.empty();
        Optional<Stretch> before = Optional.empty();
        for (Stretch stretch : subject.stretches()) {
            Fit fit = stretch.record().fit();
            if (fit.model().isEmpty()) {
                return Answer.none("the regimes of this gauge have no distribution to be matched by");
            }
            int reach = Math.min(stretch.end() + 1, subject.timeline().endBar());
            Optional<FrozenFilter> filter = FrozenFilter.of(subject, stretch, reach);
            Optional<LineageStep.Before> compared = Optional.empty();
            if (before.isPresent() && old.isPresent() && filter.isPresent()) {
                compared = compared(before.get(), old.get(), stretch, filter.get());
            }
            steps.add(new LineageStep(stretch.record(), regimes(fit), compared));
            old = filter;
            before = Optional.of(stretch);
        }
        return steps.isEmpty() ? Answer.none("no fit was accepted") : Answer.of(new Lineage(steps));
    }

    private static List<LineageStep.OneRegime> regimes(Fit fit) {
        RegimeModel model = fit.model().orElseThrow();
        double[] deviations = fit.orderBy();
        List<LineageStep.OneRegime> regimes = new ArrayList<>();
        for (int k = 0; k < deviations.length; k++) {
            regimes.add(new LineageStep.OneRegime(deviations[k], LongRun.expectedStay(model, k)));
        }
        return regimes;
    }

    private static Optional<LineageStep.Before> compared(
            Stretch before, FrozenFilter old, Stretch now, FrozenFilter filter) {
        if (old.states() != filter.states()) {
            return Optional.empty();
        }
        Emission earlier = emission(before);
        Emission later = emission(now);
        Matching matching = Matching.of(earlier, later);
        int[] newForOld = matching.newForOld();
        Integer[] ancestor = new Integer[newForOld.length];
        Double[] distance = new Double[newForOld.length];
        for (int k = 0; k < newForOld.length; k++) {
            ancestor[newForOld[k]] = k;
            distance[newForOld[k]] = Matching.squaredHellinger(earlier, k, later, newForOld[k]);
        }
        return Optional.of(new LineageStep.Before(
                before.record().number(),
                matching.cost(),
                Arrays.asList(ancestor),
                Arrays.asList(distance),
                moved(old, filter, now.from())));
    }

    private static Emission emission(Stretch stretch) {
        return stretch.record().fit().model().orElseThrow().emission();
    }

    /** Over the bars up to {@code last} that both windows hold. */
    private static OptionalDouble moved(FrozenFilter old, FrozenFilter filter, int last) {
        int first = Math.max(last - BARS + 1, Math.max(old.start(), filter.start()));
        double most = 0;
        for (int bar = first; bar <= last; bar++) {
            for (int k = 0; k < filter.states(); k++) {
                most = Math.max(most, Math.abs(filter.probability(bar, k) - old.probability(bar, k)));
            }
        }
        return first <= last ? OptionalDouble.of(most) : OptionalDouble.empty();
    }

    /** Every accepted fit, in order. */
    public List<LineageStep> steps() {
        return steps;
    }

    /** The steps that have a fit before them to compare with. */
    public List<LineageStep> compared() {
        return steps.stream().filter(step -> step.before().isPresent()).toList();
    }

    /** The step at which a probability moved furthest, the earliest of several; empty if none was compared. */
    public Optional<LineageStep> furthest() {
        Optional<LineageStep> furthest = Optional.empty();
        double most = Double.NEGATIVE_INFINITY;
        for (LineageStep step : compared()) {
            OptionalDouble moved = step.before().orElseThrow().moved();
            if (moved.isPresent() && moved.getAsDouble() > most) {
                most = moved.getAsDouble();
                furthest = Optional.of(step);
            }
        }
        return furthest;
    }

    /** How many fits have an event whose first word is {@code word}. */
    public long withEvent(String word) {
        return steps.stream()
                .filter(step -> step.record().events().stream().anyMatch(event -> event.split(" ", 2)[0].equals(word)))
                .count();
    }
}
