package sojourn.latest;

import java.util.ArrayList;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import sojourn.allocate.Decision;
import sojourn.allocate.Weights;
import sojourn.compare.Workers;
import sojourn.evidence.Answer;
import sojourn.latest.TippingReturns.Border;
import sojourn.latest.TippingReturns.Interval;
import sojourn.latest.TippingReturns.Side;
import sojourn.walk.Reading;

/**
 * Finds tipping returns: a grid brackets them (a tenth of a percent apart within 5 %, a percent beyond), halving finds them. What
 * lies wholly between two points of the grid is missed.
 */
final class TippingSearch {
    private static final double FINE_REACH = 0.05;
    private static final int FINE_PER_UNIT = 1000;
    private static final int COARSE_PER_UNIT = 100;
    private static final double BEYOND = 1e-5;

    private final Standing standing;
    private final NextBar next;
    private final Weights wanted;

    private TippingSearch(Standing standing, NextBar next, Weights wanted) {
        this.standing = standing;
        this.next = next;
        this.wanted = wanted;
    }

    /** One answer an asset that is observed, in the order of the file. */
    static Map<String, Answer<TippingReturns>> of(Standing standing, Workers workers) {
        Map<String, Answer<TippingReturns>> answers = new LinkedHashMap<>();
        Optional<String> obstacle = obstacle(standing);
        for (String asset : observed(standing)) {
            Optional<String> level = standing.table().levels().contains(asset)
                    ? Optional.of("of it changes are observed, not returns; in those of others it stays where it is")
                    : Optional.empty();
            answers.put(
                    asset,
                    obstacle.or(() -> level)
                            .<Answer<TippingReturns>>map(Answer::none)
                            .orElseGet(() -> {
                                Reading reading = standing.reading().orElseThrow();
                                Weights wanted = standing.asked()
                                        .orElseThrow()
                                        .decision()
                                        .next()
                                        .wanted()
                                        .orElseThrow();
                                return Answer.of(new TippingSearch(standing, NextBar.of(standing, reading), wanted)
                                        .of(asset, reading, workers));
                            }));
        }
        return Collections.unmodifiableMap(answers);
    }

    /** The assets that are observed, each once. */
    private static List<String> observed(Standing standing) {
        return standing.strategy().regimes().observe().stream()
                .map(one -> one.asset())
                .distinct()
                .toList();
    }

    private static Optional<String> obstacle(Standing standing) {
        if (standing.strategy().regimes().given().isPresent()) {
            return Optional.of(
                    "the probabilities are computed elsewhere, so that no return of ours tells the next ones");
        }
        if (standing.asked().isEmpty()) {
            return Optional.of("wealth is gone and nothing is decided any more");
        }
        if (standing.reading().isEmpty()) {
            return Optional.of("there is no accepted fit at this close");
        }
        if (standing.asked().get().decision().next().wanted().isEmpty()) {
            return Optional.of("nothing has been decided yet");
        }
        NextBar next = NextBar.of(standing, standing.reading().get());
        return next.decides()
                ? Optional.empty()
                : Optional.of(
                        "nothing is decided at the close of the next bar, " + next.date() + ", whatever it brings ("
                                + standing.strategy().trade().decide().word() + ")");
    }

    private TippingReturns of(String asset, Reading reading, Workers workers) {
        int index = standing.table().asset(asset);
        List<Double> grid = grid();
        List<Boolean> tipped = workers.run(grid, r -> tips(index, r));
        List<Border> borders = new ArrayList<>();
        for (int i = 1; i < grid.size(); i++) {
            if (!tipped.get(i).equals(tipped.get(i - 1))) {
                Side side = tipped.get(i) ? Side.ABOVE : Side.BELOW;
                borders.add(border(index, grid.get(i - 1), grid.get(i), side));
            }
        }
        List<Interval> calm = calm(tipped.get(0), borders);
        double chance = new TippingChance(standing, reading).outside(asset, calm);
        return new TippingReturns(asset, calm, borders, chance);
    }

    private static List<Double> grid() {
        List<Double> grid = new ArrayList<>();
        int reach = (int) Math.round(TippingReturns.REACH * COARSE_PER_UNIT);
        int fine = (int) Math.round(FINE_REACH * COARSE_PER_UNIT);
        for (int percent = -reach; percent < reach; percent++) {
            int steps = percent >= -fine && percent < fine ? FINE_PER_UNIT / COARSE_PER_UNIT : 1;
            for (int step = 0; step < steps; step++) {
                grid.add((percent * steps + step) / (double) (COARSE_PER_UNIT * steps));
            }
        }
        grid.add(TippingReturns.REACH);
        return grid;
    }

    private Border border(int asset, double from, double to, Side tips) {
        double low = from;
        double high = to;
        while (high - low > Border.EXACT) {
            double middle = low + (high - low) / 2;
            if (tips(asset, middle) == (tips == Side.ABOVE)) {
                high = middle;
            } else {
                low = middle;
            }
        }
        Decision beyond = beyond(asset, low, high, tips);
        String target = beyond.target().map(this::inWords).orElse("");
        return new Border(low + (high - low) / 2, tips, beyond.because().sentence(), target);
    }

    /** The decision a little beyond the border, where figures differ in fewer digits; at the border if it is another one there. */
    private Decision beyond(int asset, double low, double high, Side tips) {
        double further = tips == Side.ABOVE ? high + BEYOND : low - BEYOND;
        return tips(asset, further) ? decision(asset, further) : decision(asset, tips == Side.ABOVE ? high : low);
    }

    private String inWords(Weights target) {
        return WeightWords.of(target, standing.table().assets());
    }

    private static List<Interval> calm(boolean firstTips, List<Border> borders) {
        List<Interval> calm = new ArrayList<>();
        double from = -TippingReturns.REACH;
        boolean tips = firstTips;
        for (Border border : borders) {
            if (!tips) {
                calm.add(new Interval(from, border.at()));
            }
            from = border.at();
            tips = !tips;
        }
        if (!tips) {
            calm.add(new Interval(from, TippingReturns.REACH));
        }
        return calm;
    }

    private boolean tips(int asset, double simpleReturn) {
        Decision decision = decision(asset, simpleReturn);
        return decision.kind() == Decision.Kind.ORDER
                && !decision.next().wanted().equals(Optional.of(wanted));
    }

    private Decision decision(int asset, double simpleReturn) {
        return next.ifReturns(asset, simpleReturn)
                .asked()
                .map(Asked::decision)
                .orElseGet(() -> Decision.none(
                        standing.asked().orElseThrow().decision().next(), () -> "wealth is gone at that close"));
    }
}
