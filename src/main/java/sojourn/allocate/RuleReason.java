package sojourn.allocate;

import java.util.Optional;
import sojourn.walk.Reading;

/**
 * Why a rule decided as it did: what it decided from, so that the sentence can be worked out when somebody asks. Rules are pure,
 * so it is the same whenever that is.
 */
record RuleReason(RulePolicy policy, Situation situation, Stance stance) implements Because {
    @Override
    public String sentence() {
        Close close = policy.close(situation, stance);
        Decision decision = policy.at(situation, stance);
        StringBuilder sentence = new StringBuilder(policy.mechanism().sentence(close));
        if (decision.target().isPresent()) {
            sentence.append(paced(close)).append(drifted(decision));
        }
        return sentence.append(refitted(decision)).toString();
    }

    /** What the rule's own sentence cannot know: a state kept by stay-at-least, a change that comes after the fact. */
    private String paced(Close close) {
        Stance lived = close.lived();
        Mechanism mechanism = policy.mechanism();
        int state = policy.pacing().allowedState(lived, situation.bar());
        if (state != lived.lived()) {
            return "; stay-at-least " + policy.pacing().stayAtLeast() + " bars keeps it at " + mechanism.name(state);
        }
        if (stance.undecided()) {
            return "; first decision";
        }
        boolean late = !lived.undecided() && state != lived.decided() && lived.lived() == stance.lived();
        return late ? "; first decision since the change to " + mechanism.name(state) : "";
    }

    private String drifted(Decision decision) {
        boolean driftAlone = decision.kind() == Decision.Kind.ORDER
                && decision.next().wanted().equals(stance.wanted());
        if (!driftAlone) {
            return "";
        }
        return policy.rule().stepToward() < 1
                ? "; a further step toward it"
                : "; what is held is away from it: "
                        + Figure.apart(situation.weights(), decision.target().orElseThrow(), situation.assets());
    }

    /** Of an order at a close with a refit: what there would be without it. Nothing is said of the market, which moved as well. */
    private String refitted(Decision decision) {
        Optional<Reading> unmoved = situation.reading().flatMap(Reading::withoutRefit);
        boolean moved = decision.kind() == Decision.Kind.ORDER && !stance.undecided();
        return moved && unmoved.isPresent() ? refitted(decision, situation.reading(unmoved.get())) : "";
    }

    private String refitted(Decision decision, Situation unmoved) {
        Decision without = policy.at(unmoved, stance);
        boolean states = policy.rule().motion() == Rule.Motion.STATES;
        boolean sameState = without.next().decided() == decision.next().decided();
        String told = policy.mechanism().sentence(policy.close(unmoved, stance).alone());
        if (states ? !sameState : without.kind() != Decision.Kind.ORDER) {
            return "; the refit at this close made the difference: without it "
                    + (states ? told : "there would be no order");
        }
        if (states) {
            return decision.change() == Decision.Change.SWITCHED
                    ? "; the refit at this close made no difference: without it " + told
                    : "";
        }
        // said only where the figures differ as they are printed
        return without.target().isEmpty() || mix(without).equals(mix(decision))
                ? ""
                : "; without the refit at this close it would be " + mix(without);
    }

    private String mix(Decision decision) {
        return Figure.weights(decision.target().orElseThrow(), situation.assets());
    }

    /** Reasons are the same if they say the same. */
    @Override
    public boolean equals(Object other) {
        return this == other || (other instanceof RuleReason that && sentence().equals(that.sentence()));
    }

    @Override
    public int hashCode() {
        return sentence().hashCode();
    }
}
