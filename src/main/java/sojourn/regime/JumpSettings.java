package sojourn.regime;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.function.Supplier;
import sojourn.numeric.Check;
import sojourn.numeric.CompensatedSum;

/**
 * A jump model, fitted by descents from several starts, the lowest objective kept. Every column counts in units of its standard
 * deviation over the window.
 *
 * @param states number of regimes, 1 to 6
 * @param penalty what a change of regime costs, in squared deviations; 0 or more
 * @param starts how often the search starts, at least 1: one deterministic start, the others random
 */
public record JumpSettings(int states, double penalty, int starts) implements GaugeSettings {
    /** Objectives that differ by less than this times (1 + objective) are the same. */
    private static final double TIE = 1e-9;

    private static final String UNSETTLED =
            "the path was still changing after " + JumpDescent.MOST_ROUNDS + " rounds; the regimes are usable";

    private static final String TOO_DEAR = "; the penalty keeps the path in one regime, lower it";

    /** Refuses what cannot be fitted whatever the data. */
    public JumpSettings {
        Check.within(states, 1, FitSettings.MOST_STATES, "states");
        Check.that(penalty >= 0 && Double.isFinite(penalty), "a penalty of " + penalty);
        Check.within(starts, 1, Integer.MAX_VALUE, "starts");
    }

    @Override
    public int leastObservations() {
        return leastObservations(1);
    }

    @Override
    public int leastObservations(int series) {
        return states * Soundness.leastCount(series);
    }

    @Override
    public Fit fit(FitRequest request, StartRunner runner) {
        Observations x = request.observations();
        double[] scales = scales(x);
        Optional<String> refusal = Fitter.nothingToDescribe(request).or(() -> refusal(x, scales));
        if (refusal.isPresent()) {
            return Fit.failed(refusal.get(), Fit.Search.NONE, x.present());
        }
        List<Supplier<JumpDescent>> descents = new ArrayList<>();
        for (JumpCentres start : new JumpStarts(states, scales, x).all(request, starts)) {
            descents.add(() -> JumpDescent.from(start, penalty, x));
        }
        return choose(request, runner.run(descents));
    }

    /** The lowest among the starts that left every state enough observations; if there is none, the lowest of all. */
    Fit choose(FitRequest request, List<JumpDescent> ends) {
        Observations x = request.observations();
        List<JumpDescent> sound = ends.stream().filter(end -> sound(end, x)).toList();
        List<JumpDescent> candidates = sound.isEmpty() ? ends : sound;
        JumpDescent best = lowest(candidates);
        int agreeing = (int) candidates.stream().filter(end -> tied(end, best)).count();
        Fit.Search search = new Fit.Search(best.rounds(), ends.size(), agreeing, runnerUp(sound, best));
        RowWeights weights = RowWeights.path(states, best.path().states());
        Jump unordered = Jump.of(best.centres(), penalty, weights.transitions());
        Optional<JumpCentres> previous = previous(request);
        int[] order = Roles.matched(
                Described.of(unordered, weights, request), previous.map(before -> matching(before, unordered)));
        Jump gauge = unordered.ordered(order);
        Described described = Described.of(gauge, weights.ordered(order), request);
        Optional<Matching> matching = previous.map(before -> matching(before, gauge));
        return best.settled()
                ? PlainFit.of(described, search, x.dimension(), matching, neverChanges(best) ? TOO_DEAR : "")
                : PlainFit.unfinished(described, search, x.dimension(), matching, UNSETTLED);
    }

    /** The lowest of the sound ends that do not agree with the best. */
    private static Optional<RunnerUp> runnerUp(List<JumpDescent> sound, JumpDescent best) {
        List<JumpDescent> higher =
                sound.stream().filter(end -> !tied(end, best)).toList();
        if (higher.isEmpty()) {
            return Optional.empty();
        }
        JumpDescent second = lowest(higher);
        int agreeing = (int) higher.stream().filter(end -> tied(end, second)).count();
        return Optional.of(new RunnerUp(second.objective() - best.objective(), agreeing));
    }

    private boolean neverChanges(JumpDescent descent) {
        int[] path = descent.path().states();
        return states > 1 && Arrays.stream(path).allMatch(state -> state == path[0]);
    }

    private Optional<JumpCentres> previous(FitRequest request) {
        return request.previous()
                .flatMap(Fit::gauge)
                .flatMap(gauge -> gauge instanceof Jump jump ? Optional.of(jump.centres()) : Optional.empty())
                .filter(centres -> centres.states() == states
                        && centres.dimension() == request.observations().dimension());
    }

    private Matching matching(JumpCentres before, Jump now) {
        return Matching.least(states, (old, state) -> now.centres().distance(state, before, old));
    }

    private boolean sound(JumpDescent end, Observations x) {
        int[] counts = new int[states];
        int[] path = end.path().states();
        for (int row = 0; row < path.length; row++) {
            counts[path[row]] += x.missing(row) ? 0 : 1;
        }
        boolean enough = true;
        for (int count : counts) {
            enough &= count >= Soundness.leastCount(x.dimension());
        }
        return enough;
    }

    private static JumpDescent lowest(List<JumpDescent> ends) {
        JumpDescent best = ends.get(0);
        for (JumpDescent each : ends) {
            best = each.objective() < best.objective() && !tied(each, best) ? each : best;
        }
        return best;
    }

    private static boolean tied(JumpDescent a, JumpDescent b) {
        return StrictMath.abs(a.objective() - b.objective()) <= TIE * (1 + b.objective());
    }

    private Optional<String> refusal(Observations x, double[] scales) {
        int least = states * Soundness.leastCount(x.dimension());
        if (x.present() < least) {
            return Optional.of(
                    "the window holds " + x.present() + " observations; " + states + " states need at least " + least);
        }
        for (int j = 0; j < scales.length; j++) {
            if (constant(x, j)) {
                return Optional.of("all observations of the window are equal");
            }
            if (!(scales[j] > 0 && Double.isFinite(scales[j]))) {
                return Optional.of("the observations of the window are too large, or too close together, to square");
            }
        }
        return JumpStarts.possible(x)
                ? Optional.empty()
                : Optional.of("no row of the window holds an observation of every series");
    }

    private static boolean constant(Observations x, int column) {
        double lowest = Double.POSITIVE_INFINITY;
        double highest = Double.NEGATIVE_INFINITY;
        for (int row = 0; row < x.size(); row++) {
            if (!x.missing(row, column)) {
                lowest = StrictMath.min(lowest, x.at(row, column));
                highest = StrictMath.max(highest, x.at(row, column));
            }
        }
        return !(lowest < highest);
    }

    /** The standard deviation of each column, divisor n; 0 for a column of equal numbers, or of none. */
    private static double[] scales(Observations x) {
        double[] scales = new double[x.dimension()];
        for (int j = 0; j < scales.length; j++) {
            CompensatedSum first = new CompensatedSum();
            for (int row = 0; row < x.size(); row++) {
                first.add(x.missing(row, j) ? 0 : x.at(row, j));
            }
            int count = x.present(j);
            double mean = first.value() / count;
            CompensatedSum second = new CompensatedSum();
            for (int row = 0; row < x.size(); row++) {
                double d = x.missing(row, j) ? 0 : x.at(row, j) - mean;
                second.add(d * d);
            }
            scales[j] = count == 0 ? 0 : Math.sqrt(second.value() / count);
        }
        return scales;
    }
}
