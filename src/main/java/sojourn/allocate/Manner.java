package sojourn.allocate;

import java.util.Optional;
import sojourn.document.Fields;
import sojourn.document.Refusal;
import sojourn.numeric.Check;

/**
 * What a rule does with probabilities before it takes them, and with weights after it found them.
 *
 * @param probability which probability of a regime counts
 * @param smooth how it is averaged over the closes so far
 * @param confirm closes running that the most likely regime must have been it, at least 1
 * @param stepToward the part of the way from held to wanted weights that one decision goes, in (0, 1]
 */
public record Manner(ProbabilityKind probability, Optional<Smoothing> smooth, int confirm, double stepToward) {
    private static final Manner PLAIN = new Manner(ProbabilityKind.FILTERED, Optional.empty(), 1, 1);

    /** Refuses numbers out of range. */
    public Manner {
        Check.within(confirm, 1, Integer.MAX_VALUE, "confirm");
        Check.within(stepToward, Double.MIN_VALUE, 1, "stepToward");
    }

    /** Filtered probabilities as they are, every change taken at once and in full. */
    public static Manner plain() {
        return PLAIN;
    }

    /** From the keys of {@link RuleKeys#and}. */
    static Manner from(Fields fields) {
        return new Manner(
                fields.get(RuleKeys.PROBABILITY),
                fields.get(RuleKeys.SMOOTH),
                fields.get(RuleKeys.CONFIRM),
                fields.get(RuleKeys.STEP_TOWARD));
    }

    /** For a rule that goes by forecasts of the bar held, whatever {@code probability} says, so that only {@code confirm} asks. */
    Optional<Refusal> idleProbability() {
        return probability == ProbabilityKind.PREDICTED && confirm == 1
                ? Optional.of(new Refusal(
                        "probability",
                        "probability: predicted changes nothing here: forecasts refer to the bar that will be held, and only"
                                + " confirm above 1 goes by it",
                        "leave it out, or add confirm"))
                : Optional.empty();
    }
}
