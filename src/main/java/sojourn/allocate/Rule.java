package sojourn.allocate;

import java.util.List;
import java.util.Map;

/**
 * How probabilities of regimes become weights: one entry under {@code allocate} in the strategy file. A rule is what the file
 * says; {@link RulePolicy} makes it decide.
 */
public sealed interface Rule permits Switch, Table, Blend {
    /** Whether a rule jumps between states or moves continuously. */
    enum Motion {
        /** Between a few states, so that switches can be counted and held back. */
        STATES,
        /** With the probabilities. */
        CONTINUOUS
    }

    /** Its key in the strategy file. */
    String word();

    /** Which probability it goes by. */
    ProbabilityKind probability();

    /** Closes running that a change must be confirmed by, at least 1. */
    int confirm();

    /** The part of the way from held to wanted weights that one decision goes, in (0, 1]. */
    double stepToward();

    /** Whether it has states. */
    Motion motion();

    /** Every set of weights written in the rule, by its JSON pointer from {@code allocate}: "/switch/in". In the order written. */
    Map<String, Map<String, Double>> statedWeights();

    /** Names of regimes that are unknown or missing, names of assets that are unknown; pointers from {@code allocate}. */
    List<Misfit> misfits(List<String> regimes, List<String> assets);

    /** The rule with its names resolved; every name must be known. */
    Mechanism mechanism(List<String> regimes, List<String> assets);
}
