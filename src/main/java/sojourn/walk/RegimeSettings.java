package sojourn.walk;

import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import sojourn.document.Field;
import sojourn.document.Refusal;
import sojourn.document.Shape;
import sojourn.document.Shapes;
import sojourn.regime.EmissionFamily;
import sojourn.regime.FitSettings;
import sojourn.regime.ModelKind;

/**
 * The section {@code regimes} of a strategy file.
 *
 * @param model the kind of regime model
 * @param observe what it sees at each close; one series
 * @param states the regimes' names, from lowest to highest volatility
 * @param emission how an observation is distributed in a regime
 * @param orderBy the asset whose returns order the regimes; the observed asset when empty
 * @param fixed parameters that are declared instead of fitted
 */
public record RegimeSettings(
        ModelKind model,
        List<Observation> observe,
        List<String> states,
        EmissionFamily emission,
        Optional<String> orderBy,
        Optional<FixedParameters> fixed) {
    private static final int MOST_STATES = 6;

    /** Reads the list {@code observe}. */
    public static final Shape<List<Observation>> OBSERVATIONS = Shapes.list(Observation.shape(), 1, 1);

    /** Reads the list {@code states}. */
    public static final Shape<List<String>> STATE_NAMES = Shapes.list(
                    Shapes.textLike("[a-z][a-z0-9_]*", "a name of lower-case letters, digits and underscores"),
                    1,
                    MOST_STATES)
            .refuse(RegimeSettings::namedTwice);

    private static final Field<ModelKind> MODEL =
            Field.defaulted("model", Shapes.word(models()), "hidden-markov", "the kind of regime model");
    private static final Field<List<Observation>> OBSERVE =
            Field.required("observe", OBSERVATIONS, "what the model sees at each close, e.g. log-return of an asset");
    private static final Field<List<String>> STATES =
            Field.required("states", STATE_NAMES, "names of the regimes, from lowest to highest volatility");
    private static final Field<EmissionFamily> EMISSION = Field.defaulted(
            "emission", Shapes.word(emissions()), "normal", "how an observation is distributed within a regime");
    private static final Field<Optional<String>> ORDER_BY = Field.maybe(
            "order-by", Shapes.text(), "the asset whose volatility orders the regimes; the observed one if left out");
    private static final Field<FixedParameters> FIXED = Field.required(
            "fixed", FixedParameters.SHAPE, "declared parameters: an external prior, marked so on every output");
    private static final Field<Optional<FixedParameters>> PARAMETERS = Field.maybe(
            "parameters",
            Shapes.object("parameters", f -> f.get(FIXED), FIXED),
            "declares parameters instead of fitting them");

    /** The section's shape. */
    public static final Shape<RegimeSettings> SHAPE = Shapes.object(
                    "regimes",
                    f -> new RegimeSettings(
                            f.get(MODEL),
                            f.get(OBSERVE),
                            f.get(STATES),
                            f.get(EMISSION),
                            f.get(ORDER_BY),
                            f.get(PARAMETERS)),
                    MODEL,
                    OBSERVE,
                    STATES,
                    EMISSION,
                    ORDER_BY,
                    PARAMETERS)
            .refuseEach(RegimeSettings::faults);

    /** Copies its lists. */
    public RegimeSettings {
        observe = List.copyOf(observe);
        states = List.copyOf(states);
    }

    /** What is fitted, by so many starts. */
    public FitSettings fitSettings(int starts) {
        return new FitSettings(model, states.size(), emission, starts);
    }

    /** The asset whose returns order the regimes. */
    public String orderedBy() {
        return orderBy.orElseGet(() -> observe.get(0).asset());
    }

    private static Optional<Refusal> namedTwice(List<String> states) {
        Set<String> seen = new HashSet<>();
        return states.stream()
                .filter(name -> !seen.add(name))
                .findFirst()
                .map(name ->
                        new Refusal("", "two regimes have the name '" + name + "'", "give each a name of its own"));
    }

    private List<Refusal> faults() {
        List<Refusal> faults = new ArrayList<>();
        if (model == ModelKind.ONE_REGIME && states.size() != 1) {
            faults.add(new Refusal(
                    "states",
                    "the model one-regime has one regime, not " + states.size(),
                    "name one, or choose another model"));
        }
        if (emission == EmissionFamily.NORMAL_ZERO_MEAN) {
            observe.stream().filter(one -> !one.aroundZero()).findFirst().ifPresent(one -> faults.add(sized(one)));
        }
        fixed.ifPresent(given -> faults.addAll(faultsOf(given)));
        return faults;
    }

    private static Refusal sized(Observation one) {
        return new Refusal(
                "emission",
                "normal-zero-mean takes the mean of the observation for 0 in every regime, which that of " + one.word()
                        + " is not",
                "set emission: normal, or observe a return");
    }

    private List<Refusal> faultsOf(FixedParameters given) {
        List<Refusal> faults = new ArrayList<>();
        if (given.initial().size() != states.size()) {
            faults.add(new Refusal(
                    "parameters",
                    "'parameters' describe " + given.initial().size() + " regimes, 'states' names " + states.size(),
                    "make the two agree"));
        }
        if (model != ModelKind.HIDDEN_MARKOV) {
            faults.add(new Refusal(
                    "parameters",
                    "declared parameters are those of the model hidden-markov, not of " + model.word(),
                    "set model: hidden-markov, or leave the parameters out"));
        }
        if (emission == EmissionFamily.NORMAL_ZERO_MEAN) {
            given.mean().stream()
                    .filter(mean -> mean != 0)
                    .findFirst()
                    .ifPresent(mean -> faults.add(new Refusal(
                            "parameters",
                            "a mean is "
                                    + BigDecimal.valueOf(mean)
                                            .stripTrailingZeros()
                                            .toPlainString() + ", those of the emission normal-zero-mean are 0",
                            "write 0 for each, or set emission: normal")));
        }
        return faults;
    }

    private static Map<String, ModelKind> models() {
        Map<String, ModelKind> words = new LinkedHashMap<>();
        for (ModelKind kind : ModelKind.values()) {
            words.put(kind.word(), kind);
        }
        return words;
    }

    private static Map<String, EmissionFamily> emissions() {
        Map<String, EmissionFamily> words = new LinkedHashMap<>();
        for (EmissionFamily family : EmissionFamily.values()) {
            words.put(family.word(), family);
        }
        return words;
    }
}
