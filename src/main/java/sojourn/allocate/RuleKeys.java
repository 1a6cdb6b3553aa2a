package sojourn.allocate;

import java.util.ArrayList;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import sojourn.document.Field;
import sojourn.document.Nearest;
import sojourn.document.Quoted;
import sojourn.document.Refusal;
import sojourn.document.Shape;
import sojourn.document.Shapes;

/** The keys that every rule takes, and the shapes and checks of weights by name. */
final class RuleKeys {
    static final Field<ProbabilityKind> PROBABILITY = Field.defaulted(
            "probability",
            ProbabilityKind.SHAPE,
            "filtered",
            "which probability of a regime counts: filtered (of this close) or predicted (one bar ahead)");

    static final Field<Optional<Smoothing>> SMOOTH = Field.maybe(
            "smooth",
            Smoothing.SHAPE,
            "average that probability over the closes so far before anything else is made of it; looks back only");

    static final Field<Integer> CONFIRM = Field.defaulted(
            "confirm",
            Shapes.integer().atLeast(1).atMost(10_000),
            "1",
            "closes running that must speak for a change before it is taken");

    static final Field<Double> STEP_TOWARD = Field.defaulted(
            "step-toward",
            Shapes.number().above(0).atMost(1),
            "1",
            "the part of the way from the weights held to the weights wanted that one decision goes, a fraction");

    /** Weights by asset. */
    static final Shape<Map<String, Double>> WEIGHTS =
            Shapes.named(Shapes.text(), Shapes.number()).as(RuleKeys::ordered);

    /** Weights by regime, then asset. */
    static final Shape<Map<String, Map<String, Double>>> WEIGHTS_BY_REGIME =
            Shapes.named(Shapes.text(), WEIGHTS).as(RuleKeys::ordered);

    private RuleKeys() {}

    /** Names of assets, each once. */
    static final Shape<List<String>> ASSETS =
            Shapes.list(Shapes.text(), 1, Integer.MAX_VALUE).refuse(RuleKeys::namedTwice);

    private static Optional<Refusal> namedTwice(List<String> names) {
        return names.stream()
                .filter(name -> names.indexOf(name) != names.lastIndexOf(name))
                .findFirst()
                .map(name -> new Refusal("", Quoted.of(name) + " is named twice", "name each asset once"));
    }

    /** Names in a list at {@code pointer} that are no assets. */
    static List<Misfit> unknownAssets(String pointer, List<String> names, List<String> assets) {
        List<Misfit> misfits = new ArrayList<>();
        for (int i = 0; i < names.size(); i++) {
            if (!assets.contains(names.get(i))) {
                misfits.add(Misfit.noAsset(pointer + "/" + i, Misfit.At.VALUE, names.get(i), assets));
            }
        }
        return misfits;
    }

    /** A rule's own keys, then those that every rule takes. */
    static Field<?>[] and(Field<?>... own) {
        List<Field<?>> all = new ArrayList<>(List.of(own));
        all.addAll(List.of(PROBABILITY, SMOOTH, CONFIRM, STEP_TOWARD));
        return all.toArray(Field<?>[]::new);
    }

    /** What stands before a regime's name in a rule's sentences. */
    static String prefix(Rule rule) {
        return (rule.smooth().isPresent() ? "trailing " : "")
                + rule.probability().prefix();
    }

    /** The JSON pointer of a key below {@code pointer}. */
    static String child(String pointer, String key) {
        return pointer + "/" + key.replace("~", "~0").replace("/", "~1");
    }

    /** An unmodifiable copy that keeps the order of the file. */
    static <T> Map<String, T> ordered(Map<String, T> map) {
        return Collections.unmodifiableMap(new LinkedHashMap<>(map));
    }

    /** Names in {@code stated} that are no assets. */
    static List<Misfit> unknownAssets(Map<String, Map<String, Double>> stated, List<String> assets) {
        List<Misfit> misfits = new ArrayList<>();
        stated.forEach((pointer, weights) -> misfits.addAll(Misfit.inWeights(pointer, weights.keySet(), assets)));
        return misfits;
    }

    /** Regimes in {@code weights} that are unknown, and regimes that it leaves out, unless an unknown one was meant for them. */
    static List<Misfit> regimesOf(String pointer, Map<String, Map<String, Double>> weights, List<String> regimes) {
        List<Misfit> misfits = new ArrayList<>();
        List<String> missing = new ArrayList<>(regimes);
        missing.removeAll(weights.keySet());
        for (String name : weights.keySet()) {
            if (!regimes.contains(name)) {
                misfits.add(Misfit.noRegime(child(pointer, name), Misfit.At.KEY, name, regimes));
                Nearest.to(name, missing).ifPresent(missing::remove);
            }
        }
        for (String regime : missing) {
            misfits.add(new Misfit(
                    pointer,
                    "regime '" + regime + "' has no weights",
                    "give it some; a weight of 0 for one asset means nothing but cash"));
        }
        return misfits;
    }

    /** The pointers of {@link #WEIGHTS_BY_REGIME} under {@code pointer}. */
    static Map<String, Map<String, Double>> stated(String pointer, Map<String, Map<String, Double>> weights) {
        Map<String, Map<String, Double>> stated = new LinkedHashMap<>();
        weights.forEach((regime, byAsset) -> stated.put(child(pointer, regime), byAsset));
        return Collections.unmodifiableMap(stated);
    }

    /** One {@link Weights} a regime, in the order of {@code regimes}. */
    static List<Weights> resolve(Map<String, Map<String, Double>> weights, List<String> regimes, List<String> assets) {
        List<Weights> resolved = new ArrayList<>();
        for (String regime : regimes) {
            Map<String, Double> byAsset = weights.get(regime);
            if (byAsset == null) {
                throw new IllegalArgumentException(
                        "no weights for regime '" + regime + "'; known: " + weights.keySet());
            }
            resolved.add(Weights.named(byAsset, assets));
        }
        return List.copyOf(resolved);
    }
}
