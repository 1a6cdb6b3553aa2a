package sojourn.evidence;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import sojourn.regime.Emission;
import sojourn.regime.Fit;
import sojourn.regime.Gauge;
import sojourn.regime.LongRun;
import sojourn.regime.Matching;
import sojourn.regime.Normal;
import sojourn.regime.WindowMoments;

/**
 * Whether the regimes are the same from fit to fit. Each accepted fit's regimes are matched to those of the accepted fit before, by least
 * total squared Hellinger distance, which relabels nothing; and both fits are asked for the probabilities of the last 60 bars, each filtered from
 * the start of its own window: where they part, the past has been rewritten. A fit that chose another number of regimes than the one
 * before is not compared with it.
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

    /** Through all accepted fits. */
    static Answer<Lineage> of(WalkedRegimes subject) {
        List<LineageStep> steps = new ArrayList<>();
        Optional<Stretch> before = Optional.empty();
        Optional<FrozenFilter> old = Optional.empty();
        for (Stretch stretch : subject.stretches()) {
            int reach = Math.min(stretch.end() + 1, subject.timeline().endBar());
            FrozenFilter filter = FrozenFilter.of(subject, stretch, reach);
            Optional<LineageStep.Before> compared = before.isPresent() && old.isPresent()
                    ? compared(subject, before.get(), old.get(), stretch, filter)
                    : Optional.empty();
            steps.add(new LineageStep(stretch.record(), regimes(subject, stretch), compared));
            old = Optional.of(filter);
            before = Optional.of(stretch);
        }
        return steps.isEmpty() ? Answer.none("no fit was accepted") : Answer.of(new Lineage(steps));
    }

    private static List<LineageStep.OneRegime> regimes(WalkedRegimes subject, Stretch stretch) {
        Fit fit = stretch.record().fit();
        Gauge gauge = fit.gauge().orElseThrow();
        double[] deviations = fit.orderBy();
        List<LineageStep.OneRegime> regimes = new ArrayList<>();
        for (OptionalInt state : stretch.states(subject.timeline().regimes())) {
            OptionalDouble none = OptionalDouble.empty();
            regimes.add(
                    state.isEmpty()
                            ? new LineageStep.OneRegime(none, none)
                            : new LineageStep.OneRegime(
                                    OptionalDouble.of(deviations[state.getAsInt()]),
                                    LongRun.expectedStay(gauge, state.getAsInt())));
        }
        return regimes;
    }

    private static Optional<LineageStep.Before> compared(
            WalkedRegimes subject, Stretch before, FrozenFilter old, Stretch now, FrozenFilter filter) {
        Optional<Emission> earlier = likeness(subject, before);
        Optional<Emission> later = likeness(subject, now);
        if (!before.record().regimes().equals(now.record().regimes()) || earlier.isEmpty() || later.isEmpty()) {
            return Optional.empty();
        }
        Matching matching = Matching.of(earlier.get(), later.get());
        int[] newForOld = matching.newForOld();
        Integer[] ancestor = new Integer[newForOld.length];
        Double[] distance = new Double[newForOld.length];
        for (int k = 0; k < newForOld.length; k++) {
            ancestor[newForOld[k]] = k;
            distance[newForOld[k]] = Matching.squaredHellinger(earlier.get(), k, later.get(), newForOld[k]);
        }
        return Optional.of(new LineageStep.Before(
                before.record().number(),
                matching.cost(),
                Arrays.asList(ancestor),
                Arrays.asList(distance),
                moved(old, filter, now.from())));
    }

    /** What regimes are matched by: their emissions; without any, normals of the asset's moments in the window. */
    private static Optional<Emission> likeness(WalkedRegimes subject, Stretch stretch) {
        Fit fit = stretch.record().fit();
        if (fit.model().isPresent()) {
            return Optional.of(fit.model().get().emission());
        }
        WindowMoments moments = fit.moments().orElseThrow();
        int asset = subject.asset();
        double[] means = new double[moments.states()];
        double[] deviations = new double[moments.states()];
        for (int k = 0; k < means.length; k++) {
            means[k] = moments.mean(k, asset);
            deviations[k] = Math.sqrt(moments.covariance(k, asset, asset));
            if (!(deviations[k] > 0)) {
                return Optional.empty();
            }
        }
        return Optional.of(Normal.of(means, deviations));
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
