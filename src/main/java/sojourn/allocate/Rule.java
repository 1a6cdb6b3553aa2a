package sojourn.allocate;

import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/**
 * How probabilities of regimes become weights: one entry under {@code allocate} in the strategy file. A rule is what the file
 * says; {@link RulePolicy} makes it decide.
 */
public sealed interface Rule permits Switch, Table, Blend, Sizing {
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

    /** How it averages that probability over the closes so far; empty if it takes it as it is. */
    Optional<Smoothing> smooth();

    /** Closes running that a change must be confirmed by, at least 1. */
    int confirm();

    /** The part of the way from held to wanted weights that one decision goes, in (0, 1]. */
    double stepToward();

    /** Whether it has states. */
    Motion motion();

    /** A state in words, for a rule that has states. */
    default String state(int state, List<String> regimes) {
        return regimes.get(state);
    }

    /** Every set of weights written in the rule, by its JSON pointer from {@code allocate}: "/switch/in". In the order written. */
    Map<String, Map<String, Double>> statedWeights();

    /** Names of regimes that are unknown or missing, names of assets that are unknown; pointers from {@code allocate}. */
    List<Misfit> misfits(List<String> regimes, List<String> assets);

    /** Faults that only the limits show, besides stated weights beyond them; pointers from {@code allocate}. */
    default List<Misfit> misfits(Limits limits) {
        return List.of();
    }

    /** The assets that it names, in any way. */
    default Set<String> namedAssets() {
        Set<String> named = new LinkedHashSet<>();
        statedWeights().values().forEach(weights -> named.addAll(weights.keySet()));
        return named;
    }

    /** The rule with its names resolved; every name must be known. */
    Mechanism mechanism(List<String> regimes, List<String> assets, Limits limits);
}
