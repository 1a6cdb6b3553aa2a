package sojourn.walk;

import java.util.ArrayList;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.function.Predicate;
import java.util.stream.Stream;
import sojourn.document.Field;
import sojourn.document.Refusal;
import sojourn.document.Shape;
import sojourn.document.Shapes;
import sojourn.market.GivenColumns;
import sojourn.market.GivenSource;
import sojourn.regime.EmissionFamily;
import sojourn.regime.FitSettings;
import sojourn.regime.GaugeSettings;
import sojourn.regime.GivenParameters;
import sojourn.regime.GivenProbabilitiesSettings;
import sojourn.regime.InitialDistribution;
import sojourn.regime.JumpSettings;
import sojourn.regime.ModelKind;
import sojourn.regime.Prior;
import sojourn.regime.VolatilityThresholdSettings;

/**
 * The section {@code regimes} of a strategy file.
 *
 * @param model the kind of regime model
 * @param observe what it sees at each close: one series, or several of a normal model
 * @param states the regimes' names, from lowest to highest volatility
 * @param emission how an observation is distributed in a regime
 * @param initial where a chain of regimes starts; free when empty
 * @param orderBy the asset whose returns order the regimes; the observed asset when empty
 * @param fixed parameters that are declared instead of fitted
 * @param particulars what only some models have
 */
public record RegimeSettings(
        ModelKind model,
        List<Observation> observe,
        List<String> states,
        EmissionFamily emission,
        Optional<InitialDistribution> initial,
        Optional<String> orderBy,
        Optional<FixedParameters> fixed,
        Particulars particulars) {
    /** Reads the list {@code observe}. */
    public static final Shape<List<Observation>> OBSERVATIONS =
            Shapes.list(Observation.shape(), 1, FitSettings.MOST_SERIES).refuse(RegimeSettings::observedTwice);

    private static final Field<ModelKind> MODEL =
            Field.defaulted("model", Shapes.word(models()), "hidden-markov", "the kind of regime model");
    private static final Field<List<Observation>> OBSERVE = Field.required(
            "observe",
            OBSERVATIONS,
            "what the model sees at each close, e.g. log-return of an asset; up to six series, seen together");
    private static final Field<List<String>> STATES =
            Field.required("states", StateNames.SHAPE, "names of the regimes, from lowest to highest volatility");
    private static final Field<Double> DEGREES_OF_FREEDOM =
            Field.required("degrees-of-freedom", FixedParameters.TAILS, "of every regime, fixed instead of estimated");
    private static final Field<Double> STUDENT_T = Field.required(
            "student-t",
            Shapes.object("student-t", f -> f.get(DEGREES_OF_FREEDOM), DEGREES_OF_FREEDOM),
            "a Student-t distribution whose degrees of freedom are fixed");
    private static final Field<EmissionFamily> EMISSION = Field.defaulted(
                    "emission",
                    Shapes.<EmissionFamily>either(
                            Shapes.word(EmissionFamily.values(), EmissionFamily::word),
                            Shapes.object("emission", f -> EmissionFamily.studentT(f.get(STUDENT_T)), STUDENT_T)),
                    "normal",
                    "how an observation is distributed within a regime; normal-diagonal: several series,"
                            + " independent within a regime; normal-tied: one volatility, only the mean changes; student-t:"
                            + " fat tails, degrees of freedom estimated between 2.05 and 200")
            .onlyWith(MODEL, words(ModelKind::hasLikelihood));
    private static final Field<Optional<InitialDistribution>> INITIAL = Field.maybe(
            "initial",
            Shapes.word(List.of(InitialDistribution.values()), InitialDistribution::word),
            "where the chain starts in each window: free (estimated; if left out) or stationary (in its long run)");
    private static final Field<Optional<String>> ORDER_BY = Field.maybe(
                    "order-by",
                    Shapes.text(),
                    "the asset whose volatility orders the regimes; the observed one if left out")
            .onlyWith(MODEL, words(kind -> kind != ModelKind.VOLATILITY_THRESHOLD));
    private static final Field<FixedParameters> FIXED = Field.required(
            "fixed", FixedParameters.SHAPE, "declared parameters: an external prior, marked so on every output");
    private static final Field<Optional<FixedParameters>> PARAMETERS = Field.maybe(
            "parameters",
            Shapes.object("parameters", f -> f.get(FIXED), FIXED),
            "declares parameters instead of fitting them");

    private static final Field<Optional<VolatilityThresholdSettings>> THRESHOLD = Field.maybe(
                    "threshold", ThresholdKeys.SHAPE, "what volatility-threshold measures and where it draws the line")
            .onlyWith(MODEL, List.of(ModelKind.VOLATILITY_THRESHOLD.word()));

    private static final Field<Optional<Double>> PENALTY = Field.maybe(
                    "penalty",
                    Shapes.number().atLeast(0),
                    "what each change of regime costs, in squared standard deviations of what is observed: at 0 every bar goes to"
                            + " the nearest regime; the larger, the longer the stays")
            .onlyWith(MODEL, List.of(ModelKind.JUMP.word()));

    private static final Field<Optional<StateChoice>> CHOOSE = Field.maybe(
                    "choose",
                    StateChoice.SHAPE,
                    "lets each fit choose the number of regimes; 'states' then names the regimes of all numbers")
            .onlyWith(MODEL, List.of(ModelKind.HIDDEN_MARKOV.word(), ModelKind.MIXTURE.word()));

    private static final Field<Optional<Prior>> PRIOR = Field.maybe(
                    "prior",
                    PriorKeys.SHAPE,
                    "what is believed before a window is seen, so that a fit is the mode of the posterior instead of the likeliest:"
                            + " that regimes stay, and that no regime's variance is next to nothing")
            .onlyWith(MODEL, List.of(ModelKind.HIDDEN_MARKOV.word()));

    private static final Field<GivenSource> GIVEN = Field.required(
            "given",
            GivenSource.SHAPE,
            "probabilities computed elsewhere, in place of a model; marked so on every output, for how they were computed is not"
                    + " audited");
    private static final Field<List<String>> GIVEN_STATES = Field.required(
            "states", StateNames.SHAPE, "names of the regimes, which are columns of the file of probabilities");
    private static final Field<String> GIVEN_ORDER_BY = Field.required(
            "order-by",
            Shapes.text(),
            "the asset whose returns say how volatile each regime is; the regimes keep their order");

    private static final Shape<RegimeSettings> GIVEN_SHAPE = Shapes.object(
            "regimes",
            f -> given(f.get(GIVEN), f.get(GIVEN_STATES), f.get(GIVEN_ORDER_BY)),
            GIVEN,
            GIVEN_STATES,
            GIVEN_ORDER_BY);

    private static final Shape<RegimeSettings> FITTED_SHAPE = Shapes.object(
                    "regimes",
                    f -> new RegimeSettings(
                            f.get(MODEL),
                            f.get(OBSERVE),
                            f.get(STATES),
                            f.get(EMISSION),
                            f.get(INITIAL),
                            f.get(ORDER_BY),
                            f.get(PARAMETERS),
                            new Particulars(
                                    f.get(THRESHOLD),
                                    number(f.get(PENALTY)),
                                    f.get(CHOOSE),
                                    Optional.empty(),
                                    f.get(PRIOR))),
                    MODEL,
                    OBSERVE,
                    STATES,
                    EMISSION,
                    INITIAL,
                    ORDER_BY,
                    PARAMETERS,
                    THRESHOLD,
                    PENALTY,
                    CHOOSE,
                    PRIOR)
            .refuseEach(RegimeFaults::of);

    /** The section's shape: probabilities that are given, or a model that is fitted. */
    public static final Shape<RegimeSettings> SHAPE = Shapes.keyed(GIVEN.key(), GIVEN_SHAPE, FITTED_SHAPE);

    /** Copies its lists. */
    public RegimeSettings {
        observe = List.copyOf(observe);
        states = List.copyOf(states);
    }

    /** The same with nothing that only some models have. */
    public RegimeSettings(
            ModelKind model,
            List<Observation> observe,
            List<String> states,
            EmissionFamily emission,
            Optional<InitialDistribution> initial,
            Optional<String> orderBy,
            Optional<FixedParameters> fixed) {
        this(model, observe, states, emission, initial, orderBy, fixed, Particulars.NONE);
    }

    /** The same with a free initial distribution, and nothing that only some models have. */
    public RegimeSettings(
            ModelKind model,
            List<Observation> observe,
            List<String> states,
            EmissionFamily emission,
            Optional<String> orderBy,
            Optional<FixedParameters> fixed) {
        this(model, observe, states, emission, Optional.empty(), orderBy, fixed);
    }

    /** Probabilities that were computed elsewhere; {@code orderBy} is the asset that tells how volatile each regime is. */
    public static RegimeSettings given(GivenSource source, List<String> states, String orderBy) {
        List<Observation> columns = new ArrayList<>();
        for (int k = 0; k < states.size(); k++) {
            columns.add(new GivenProbability(k, states.get(k), orderBy));
        }
        return new RegimeSettings(
                ModelKind.GIVEN,
                columns,
                states,
                EmissionFamily.NORMAL,
                Optional.empty(),
                Optional.of(orderBy),
                Optional.empty(),
                Particulars.given(source));
    }

    /** The columns of the file of given probabilities, if they are given. */
    public Optional<GivenColumns> given() {
        return particulars.given().map(source -> new GivenColumns(source, states));
    }

    /** What is fitted, by so many starts where there is a search. */
    public GaugeSettings gauge(int starts) {
        if (particulars.given().isPresent()) {
            return new GivenProbabilitiesSettings(states.size());
        }
        if (particulars.threshold().isPresent()) {
            return particulars.threshold().get();
        }
        if (particulars.penalty().isPresent()) {
            return new JumpSettings(states.size(), particulars.penalty().getAsDouble(), starts);
        }
        return fixed.<GaugeSettings>map(declared -> new GivenParameters(declared.model(emission)))
                .orElseGet(() -> likelihood(states.size(), starts));
    }

    /** The fewest observations from which it may be fitted; with a choice, the smallest number of regimes. */
    public int leastObservations() {
        GaugeSettings smallest = particulars.choose().isPresent() ? likelihood(fewestStates(), 1) : gauge(1);
        return smallest.leastObservations(observe.size());
    }

    /** The number of regimes; with a choice, the smallest. */
    public int fewestStates() {
        return particulars
                .choose()
                .map(choice -> choice.regimes().get(0).size())
                .orElseGet(states::size);
    }

    /** A model with a likelihood and so many regimes. */
    FitSettings likelihood(int count, int starts) {
        return new FitSettings(
                model, count, emission, initial.orElse(InitialDistribution.FREE), starts, particulars.prior());
    }

    /** How many bars late a close of this asset is known: as late as the earliest observation of it; 0 if it is not observed. */
    public int barsLate(String asset) {
        return ObservationLog.barsLate(observe, asset);
    }

    /** The asset whose returns order the regimes. */
    public String orderedBy() {
        return orderBy.orElseGet(() -> observe.get(0).asset());
    }

    private static Optional<Refusal> observedTwice(List<Observation> observed) {
        Set<String> seen = new HashSet<>();
        return observed.stream()
                .filter(one -> !seen.add(one.column()))
                .findFirst()
                .map(one -> new Refusal(
                        "", one.inWords() + " is observed twice, and twice the same is no more", "leave one out"));
    }

    private static OptionalDouble number(Optional<Double> written) {
        return written.map(OptionalDouble::of).orElseGet(OptionalDouble::empty);
    }

    private static List<String> words(Predicate<ModelKind> which) {
        return Stream.of(ModelKind.values())
                .filter(ModelKind::fitted)
                .filter(which)
                .map(ModelKind::word)
                .toList();
    }

    private static Map<String, ModelKind> models() {
        Map<String, ModelKind> words = new LinkedHashMap<>();
        for (ModelKind kind : ModelKind.values()) {
            if (kind.fitted()) {
                words.put(kind.word(), kind);
            }
        }
        return words;
    }
}
