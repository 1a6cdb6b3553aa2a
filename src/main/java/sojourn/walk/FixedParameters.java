package sojourn.walk;

import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.stream.Collectors;
import sojourn.document.Field;
import sojourn.document.Refusal;
import sojourn.document.Shape;
import sojourn.document.Shapes;
import sojourn.regime.Emission;
import sojourn.regime.EmissionFamily;
import sojourn.regime.HiddenMarkov;
import sojourn.regime.Normal;
import sojourn.regime.RegimeModel;
import sojourn.regime.StudentT;

/**
 * Parameters that are declared instead of fitted: an external prior, which every output says so of. One entry a regime, in the
 * order of {@code states}.
 *
 * @param initial probability of each regime at the first observation of the window; sums to 1
 * @param transition probability of the next regime (column) given this one (row); each row sums to 1
 * @param mean of the observation in each regime, per bar
 * @param sd standard deviation of the observation in each regime, per bar
 * @param degreesOfFreedom of Student-t emissions; empty if not written
 */
public record FixedParameters(
        List<Double> initial,
        List<List<Double>> transition,
        List<Double> mean,
        List<Double> sd,
        List<Double> degreesOfFreedom) {
    private static final int MOST_STATES = 6;
    private static final double SUM_SLACK = 1e-9;

    /** Reads degrees of freedom. */
    static final Shape<Double> TAILS = Shapes.number()
            .atLeast(EmissionFamily.LEAST_DEGREES_OF_FREEDOM)
            .atMost(EmissionFamily.MOST_DEGREES_OF_FREEDOM);

    private static final Shape<List<Double>> PROBABILITIES =
            Shapes.list(Shapes.number().atLeast(0).atMost(1), 1, MOST_STATES);
    private static final Field<List<Double>> INITIAL = Field.required(
            "initial", PROBABILITIES, "probability of each regime at the window's first observation; sums to 1");
    private static final Field<List<List<Double>>> TRANSITION = Field.required(
            "transition",
            Shapes.list(PROBABILITIES, 1, MOST_STATES),
            "a row a regime: probabilities of the next regime, each row sums to 1");
    private static final Field<List<Double>> MEAN = Field.required(
            "mean", Shapes.list(Shapes.number(), 1, MOST_STATES), "mean of the observation in each regime, per bar");
    private static final Field<List<Double>> SD = Field.required(
            "sd",
            Shapes.list(Shapes.number().above(0), 1, MOST_STATES),
            "standard deviation of the observation in each regime, per bar");

    private static final Field<Optional<List<Double>>> DEGREES_OF_FREEDOM = Field.maybe(
            "degrees-of-freedom", Shapes.list(TAILS, 1, MOST_STATES), "of emission: student-t, one a regime");

    static final Shape<FixedParameters> SHAPE = Shapes.object(
                    "fixed",
                    f -> new FixedParameters(
                            f.get(INITIAL),
                            f.get(TRANSITION),
                            f.get(MEAN),
                            f.get(SD),
                            f.get(DEGREES_OF_FREEDOM).orElse(List.of())),
                    INITIAL,
                    TRANSITION,
                    MEAN,
                    SD,
                    DEGREES_OF_FREEDOM)
            .refuseEach(FixedParameters::faults);

    /** Copies its lists. */
    public FixedParameters {
        initial = List.copyOf(initial);
        transition = transition.stream().map(List::copyOf).toList();
        mean = List.copyOf(mean);
        sd = List.copyOf(sd);
        degreesOfFreedom = List.copyOf(degreesOfFreedom);
    }

    /** Parameters of normal emissions. */
    public FixedParameters(List<Double> initial, List<List<Double>> transition, List<Double> mean, List<Double> sd) {
        this(initial, transition, mean, sd, List.of());
    }

    /** The model with these parameters; {@code emission} says which of them it has. */
    RegimeModel model(EmissionFamily emission) {
        List<Double> rows = new ArrayList<>();
        transition.forEach(rows::addAll);
        return HiddenMarkov.of(array(initial), array(rows), emissions(emission));
    }

    private Emission emissions(EmissionFamily emission) {
        double[] means = array(mean);
        double[] deviations = array(sd);
        return switch (emission.form()) {
            case NORMAL, NORMAL_DIAGONAL -> Normal.of(means, deviations);
            case NORMAL_ZERO_MEAN -> Normal.zeroMean(deviations);
            case NORMAL_TIED -> Normal.tied(means, deviations[0]);
            case STUDENT_T -> StudentT.withDeviations(means, deviations, tails(emission));
        };
    }

    private double[] tails(EmissionFamily emission) {
        if (emission.fixedDegreesOfFreedom().isEmpty()) {
            return array(degreesOfFreedom);
        }
        double[] same = new double[mean.size()];
        Arrays.fill(same, emission.fixedDegreesOfFreedom().getAsDouble());
        return same;
    }

    private static double[] array(List<Double> values) {
        return values.stream().mapToDouble(Double::doubleValue).toArray();
    }

    private List<Refusal> faults() {
        int states = initial.size();
        String each = "give one for each of the " + states + " regimes of 'initial'";
        List<Refusal> faults = new ArrayList<>();
        if (!sumsToOne(initial)) {
            faults.add(new Refusal("initial", "'initial' sums to " + sum(initial), "make it sum to 1"));
        }
        if (transition.size() != states || transition.stream().anyMatch(row -> row.size() != states)) {
            faults.add(new Refusal(
                    "transition",
                    "'transition' has " + transition.size() + " rows of " + lengths() + " numbers",
                    "give " + states + " rows of " + states + ", as 'initial' has " + states + " regimes"));
        }
        for (int i = 0; i < transition.size(); i++) {
            if (!sumsToOne(transition.get(i))) {
                faults.add(new Refusal(
                        "transition",
                        "row " + (i + 1) + " of 'transition' sums to " + sum(transition.get(i)),
                        "make each row sum to 1"));
            }
        }
        if (mean.size() != states) {
            faults.add(new Refusal("mean", "'mean' has " + mean.size() + " numbers", each));
        }
        if (sd.size() != states) {
            faults.add(new Refusal("sd", "'sd' has " + sd.size() + " numbers", each));
        }
        if (!degreesOfFreedom.isEmpty() && degreesOfFreedom.size() != states) {
            faults.add(new Refusal(
                    "degrees-of-freedom", "'degrees-of-freedom' has " + degreesOfFreedom.size() + " numbers", each));
        }
        return faults;
    }

    private String lengths() {
        return transition.stream()
                .map(row -> Integer.toString(row.size()))
                .distinct()
                .collect(Collectors.joining(" or "));
    }

    private static boolean sumsToOne(List<Double> probabilities) {
        return Math.abs(sum(probabilities).doubleValue() - 1) <= SUM_SLACK;
    }

    /** The exact sum of the decimals as written: 0.7 and 0.4 make 1.1. */
    private static BigDecimal sum(List<Double> terms) {
        return terms.stream().map(BigDecimal::valueOf).reduce(BigDecimal.ZERO, BigDecimal::add);
    }
}
