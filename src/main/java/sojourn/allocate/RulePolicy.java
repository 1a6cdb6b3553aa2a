package sojourn.allocate;

import java.util.List;
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
        Reading reading = situation.reading().get();
        double[] now = rule.probability().of(reading);
        Stance seen = rule.smooth().isEmpty() ? stance : averaging(rule.smooth().get(), now, stance);
        double[] probabilities =
                seen.trailing().isEmpty() ? now : seen.trailing().get().probabilities();
        Stance lived = mechanism.live(probabilities, seen);
        Because because = mechanism.because(situation, probabilities, stance, lived);
        if (!pacing.decides(situation)) {
            return Decision.none(lived, because);
        }
        int state = pacing.allowedState(lived, situation.bar());
        Wish wish = mechanism.weights(situation, probabilities, state, lived);
        if (!(wish instanceof Weights wanted)) {
            return Decision.undefined(lived, ((Wish.Undefined) wish).because());
        }
        Decision decision = pacing.decide(situation, lived, state, wanted, explained(because, lived, state, stance));
        boolean driftAlone = decision.kind() == Decision.Kind.ORDER
                && stance.wanted().filter(wanted::equals).isPresent();
        return driftAlone ? decision.explainedBy(decision.because().and("held weights had drifted from it")) : decision;
    }

    private static Stance averaging(Smoothing smoothing, double[] now, Stance stance) {
        return stance.averaging(smoothing.after(stance.trailing(), now));
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

    /** Adds what the rule's own sentence cannot know: a state kept by stay-at-least, a change that comes after the fact. */
    private Because explained(Because because, Stance lived, int state, Stance stance) {
        if (state != lived.lived()) {
            String kept = mechanism.name(state);
            return because.and("stay-at-least " + pacing.stayAtLeast() + " bars keeps it at " + kept);
        }
        if (stance.undecided()) {
            return because.and("first decision");
        }
        boolean late = !lived.undecided() && state != lived.decided() && lived.lived() == stance.lived();
        return late ? because.and("first decision since the change to " + mechanism.name(state)) : because;
    }
}
