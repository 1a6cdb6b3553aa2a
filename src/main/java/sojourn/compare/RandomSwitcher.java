package sojourn.compare;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;
import sojourn.allocate.Pacing;
import sojourn.allocate.Switch;
import sojourn.allocate.Weights;
import sojourn.measure.Measured;
import sojourn.numeric.RandomStream;
import sojourn.strategy.Strategy;
import sojourn.trade.Track;

/**
 * What a strategy did, at random times: the decisions that a window judges in another order, everything before them as it was. Of a
 * switch the spells are shuffled ({@link Spells}); of any other rule the decisions are moved round, the last ones coming first, by a
 * random number of places. Draw i is the same whatever else runs: its stream is named by the master seed, its purpose and i.
 */
final class RandomSwitcher {
    /** Draws, so that the quantiles 0.05, 0.5 and 0.95 are draws themselves. */
    static final int DRAWS = 999;

    private static final String PURPOSE = "random switcher";

    private final long seed;
    private final Pacing pacing;
    private final Decided decided;
    private final List<Replay.Wanted> choices;
    private final int[] own;
    private final Track track;

    private RandomSwitcher(
            long seed, Pacing pacing, Decided decided, List<Replay.Wanted> choices, int[] own, Track track) {
        this.seed = seed;
        this.pacing = pacing;
        this.decided = decided;
        this.choices = choices;
        this.own = own;
        this.track = track;
    }

    /** Of a strategy's decisions; {@code track} is what came of them. */
    static RandomSwitcher of(Strategy file, List<String> assets, Decided decided, Track track) {
        long seed = file.refit().seed();
        double band = file.trade().noTradeBand();
        if (file.rule() instanceof Switch rule) {
            List<Replay.Wanted> sides = List.of(
                    new Replay.Wanted(0, Optional.of(Weights.named(rule.in(), assets))),
                    new Replay.Wanted(1, Optional.of(Weights.named(rule.out(), assets))));
            Pacing pacing = new Pacing(file.trade().decide(), 1, rule.stepToward(), file.limits(), band);
            return new RandomSwitcher(seed, pacing, decided, sides, decided.states(), track);
        }
        List<Replay.Wanted> targets = new ArrayList<>();
        for (Optional<Weights> target : decided.targets()) {
            targets.add(new Replay.Wanted(0, target));
        }
        Pacing pacing = new Pacing(file.trade().decide(), 1, 1, file.limits(), band);
        int[] inTurn = IntStream.range(0, targets.size()).toArray();
        return new RandomSwitcher(seed, pacing, decided, targets, inTurn, track);
    }

    /** Why there is nothing to draw, if so. */
    Optional<Measured.Undefined> whyNot() {
        if (track.ruinedOn().isPresent()) {
            return Optional.of(new Measured.Undefined(
                    Measured.Reason.RUIN, "the strategy was ruined, and what it would have done is not known"));
        }
        if (shuffles()) {
            return spells().canBeShuffled()
                    ? Optional.empty()
                    : noChange("the window holds " + spells().complete(0) + " complete spells in and "
                            + spells().complete(1) + " out, and fewer than two of a kind have one order only");
        }
        long different = Arrays.stream(judged())
                .mapToObj(choices::get)
                .distinct()
                .limit(2)
                .count();
        return different > 1
                ? Optional.empty()
                : noChange("every decision inside the window is the same, and has no other order");
    }

    private static Optional<Measured.Undefined> noChange(String because) {
        return Optional.of(new Measured.Undefined(Measured.Reason.NO_CHANGE, because));
    }

    /** What is put in another order, in words. */
    String how() {
        return shuffles()
                ? spells().complete(0) + " complete spells in and " + spells().complete(1)
                        + " out, each kind in a random order, taking turns"
                : judged().length + " decisions, moved round by a random number of places";
    }

    /** The strategy's own decisions told again. */
    Replay replay() {
        return replay(own);
    }

    /** Draw {@code i}. */
    Replay draw(int i) {
        RandomStream random = RandomStream.of(seed, PURPOSE, Integer.toString(i));
        int[] drawn = own.clone();
        int[] judged = judged();
        int[] moved = shuffles() ? spells().shuffled(random) : rotated(judged, 1 + random.nextInt(judged.length - 1));
        System.arraycopy(moved, 0, drawn, decided.first(), moved.length);
        return replay(drawn);
    }

    private boolean shuffles() {
        return choices.size() == 2 && choices.get(1).state() == 1;
    }

    private Spells spells() {
        return Spells.of(judged());
    }

    private int[] judged() {
        return Arrays.copyOfRange(own, decided.first(), decided.end());
    }

    private static int[] rotated(int[] sequence, int places) {
        int[] rotated = new int[sequence.length];
        Arrays.setAll(rotated, i -> sequence[(i + places) % sequence.length]);
        return rotated;
    }

    private Replay replay(int[] sequence) {
        int[] byBar = new int[track.size()];
        Arrays.fill(byBar, Replay.NOTHING);
        for (int i = 0; i < sequence.length; i++) {
            byBar[decided.bar(i) - track.firstBar()] = sequence[i];
        }
        return new Replay(pacing, choices, track.firstBar(), byBar);
    }
}
