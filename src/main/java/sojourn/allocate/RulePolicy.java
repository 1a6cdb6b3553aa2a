package sojourn.allocate;

import java.util.List;
import java.util.Optional;
import sojourn.numeric.Check;
import sojourn.walk.Reading;

/**
 * A rule of the strategy file, deciding. At every close, decision bar or not: probability, confirmation, hysteresis. On decision
 * bars: weights, stay-at-least, step, limits, band, order. The first decision is on the first decision bar at or after the first
 * reading.
 */
public final class RulePolicy implements Policy {
    private static final Because STANDS_ASIDE = Because.of("stands aside: the last fit was refused");
    private static final Because NO_READING = Because.of("there is no accepted fit at this close");

    private final Rule rule;
    private final Mechanism mechanism;
    private final Pacing pacing;

    private RulePolicy(Rule rule, Mechanism mechanism, Pacing pacing) {
        this.rule = rule;
        this.mechanism = mechanism;
        this.pacing = pacing;
    }

    /**
     * With the names of the rule resolved; they must be known (see {@link Rule#misfits}), and the stated weights within the limits.
     *
     * @param schedule the closes to decide at
     * @param stayAtLeast bars, 1 for a rule without states
     * @param noTradeBand a fraction of wealth
     */
    public static RulePolicy of(
            Rule rule,
            Limits limits,
            Schedule schedule,
            int stayAtLeast,
            double noTradeBand,
            List<String> regimes,
            List<String> assets) {
        List<Misfit> beyond = limits.misfits(rule);
        Check.that(beyond.isEmpty(), "weights beyond the limits: " + beyond);
        List<Misfit> stays = Pacing.misfits(rule, stayAtLeast);
        Check.that(stays.isEmpty(), "nothing to stay in: " + stays);
        Pacing pacing = new Pacing(schedule, stayAtLeast, rule.stepToward(), limits, noTradeBand);
        return new RulePolicy(rule, rule.mechanism(regimes, assets, limits), pacing);
    }

    @Override
    public Decision at(Situation situation, Stance stance) {
        if (situation.reading().isEmpty()) {
            return withoutReading(situation, stance);
        }
        Because because = new RuleReason(this, situation, stance);
        double[] now = rule.probability().of(situation.reading().get());
        Stance seen = averaging(now, stance);
        double[] probabilities = probabilities(now, seen);
        Stance lived = mechanism.live(probabilities, seen);
        if (!pacing.decides(situation)) {
            return Decision.none(lived, because);
        }
        int state = pacing.allowedState(lived, situation.bar());
        Wish wish = mechanism.weights(situation, probabilities, state, lived);
        return wish instanceof Weights wanted
                ? pacing.decide(situation, lived, state, wanted, because)
                : Decision.undefined(lived, ((Wish.Undefined) wish).because());
    }

    /** With this close taken into the average, for a rule that smooths. */
    private Stance averaging(double[] now, Stance stance) {
        return rule.smooth().isEmpty()
                ? stance
                : stance.averaging(rule.smooth().get().after(stance.trailing(), now));
    }

    private static double[] probabilities(double[] now, Stance seen) {
        return seen.trailing().isEmpty() ? now : seen.trailing().get().probabilities();
    }

    /** What {@link #at} saw of a close that has a reading. */
    Close close(Situation situation, Stance stance) {
        Reading reading = situation.reading().orElseThrow();
        double[] now = rule.probability().of(reading);
        Stance seen = averaging(now, stance);
        double[] probabilities = probabilities(now, seen);
        Optional<double[]> earlier =
                reading.before().map(before -> probabilities(rule.probability().of(before), stance));
        return new Close(situation, probabilities, earlier, stance, mechanism.live(probabilities, seen));
    }

    Rule rule() {
        return rule;
    }

    Mechanism mechanism() {
        return mechanism;
    }

    Pacing pacing() {
        return pacing;
    }

    /** Before the first decision nothing is decided; afterwards a missing reading means standing aside, in cash. */
    private Decision withoutReading(Situation situation, Stance stance) {
        if (stance.undecided() || !pacing.decides(situation)) {
            return Decision.none(stance, NO_READING);
        }
        Weights cash = Weights.none(situation.assets().size());
        Stance next = stance.deciding(stance.decided(), cash, situation.bar());
        return cash.strictlyOutside(0, situation.weights())
                ? Decision.order(cash, next, STANDS_ASIDE, Decision.Change.SAME)
                : Decision.keep(cash, next, STANDS_ASIDE, Decision.Change.SAME);
    }
}
