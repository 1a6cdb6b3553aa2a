package sojourn.allocate;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import sojourn.document.Field;
import sojourn.document.Refusal;
import sojourn.document.Shape;
import sojourn.document.Shapes;
import sojourn.numeric.Check;

/**
 * Two sets of weights and hysteresis between them: {@code out} once the probability p of {@code regime} has been at or above
 * {@code leaveAbove} for {@code confirm} closes running, back {@code in} once it has been at or below {@code reEnterBelow} as
 * long, else as it was. The state before the first close is {@code in}.
 *
 * @param regime the regime to step aside from
 * @param leaveAbove in [0, 1]
 * @param reEnterBelow in [0, {@code leaveAbove}]
 * @param in weights by asset while in; the rest is cash
 * @param out weights by asset while out; the rest is cash
 */
public record Switch(
        String regime,
        double leaveAbove,
        double reEnterBelow,
        Map<String, Double> in,
        Map<String, Double> out,
        ProbabilityKind probability,
        Optional<Smoothing> smooth,
        int confirm,
        double stepToward)
        implements Rule {
    /** The key under {@code allocate}. */
    static final String WORD = "switch";

    private static final Field<String> REGIME =
            Field.required("regime", Shapes.text(), "the regime to step aside from, one of regimes, states");
    private static final Field<Double> LEAVE_ABOVE = Field.required(
            "leave-above",
            Shapes.number().atLeast(0).atMost(1),
            "go out when the regime's probability is at or above this, a fraction");
    private static final Field<Double> RE_ENTER_BELOW = Field.required(
            "re-enter-below",
            Shapes.number().atLeast(0).atMost(1),
            "come back in when the regime's probability is at or below this, a fraction not above leave-above");
    private static final Field<Map<String, Double>> IN =
            Field.required("in", RuleKeys.WEIGHTS, "fraction of wealth in each asset while in; the rest is cash");
    private static final Field<Map<String, Double>> OUT =
            Field.required("out", RuleKeys.WEIGHTS, "fraction of wealth in each asset while out; the rest is cash");

    /** Reads the map under {@code switch}. */
    public static final Shape<Switch> SHAPE = Shapes.object(
                    WORD,
                    f -> new Switch(
                            f.get(REGIME),
                            f.get(LEAVE_ABOVE),
                            f.get(RE_ENTER_BELOW),
                            f.get(IN),
                            f.get(OUT),
                            f.get(RuleKeys.PROBABILITY),
                            f.get(RuleKeys.SMOOTH),
                            f.get(RuleKeys.CONFIRM),
                            f.get(RuleKeys.STEP_TOWARD)),
                    REGIME,
                    LEAVE_ABOVE,
                    RE_ENTER_BELOW,
                    IN,
                    OUT,
                    RuleKeys.PROBABILITY,
                    RuleKeys.SMOOTH,
                    RuleKeys.CONFIRM,
                    RuleKeys.STEP_TOWARD)
            .refuse(Switch::crossedLevels);

    /** Refuses numbers out of range; the order of the two levels is the shape's business, so that it is reported with its place. */
    public Switch {
        Check.within(leaveAbove, 0, 1, "leaveAbove");
        Check.within(reEnterBelow, 0, 1, "reEnterBelow");
        Check.within(confirm, 1, Integer.MAX_VALUE, "confirm");
        Check.within(stepToward, Double.MIN_VALUE, 1, "stepToward");
        in = RuleKeys.ordered(in);
        out = RuleKeys.ordered(out);
    }

    /** Of probabilities as they are. */
    public Switch(
            String regime,
            double leaveAbove,
            double reEnterBelow,
            Map<String, Double> in,
            Map<String, Double> out,
            ProbabilityKind probability,
            int confirm,
            double stepToward) {
        this(regime, leaveAbove, reEnterBelow, in, out, probability, Optional.empty(), confirm, stepToward);
    }

    private static Optional<Refusal> crossedLevels(Switch rule) {
        return rule.reEnterBelow > rule.leaveAbove
                ? Optional.of(new Refusal(
                        "re-enter-below",
                        "re-enter-below " + Figure.written(rule.reEnterBelow) + " lies above leave-above "
                                + Figure.written(rule.leaveAbove),
                        "give a value at or below " + Figure.written(rule.leaveAbove)))
                : Optional.empty();
    }

    @Override
    public String word() {
        return WORD;
    }

    @Override
    public Motion motion() {
        return Motion.STATES;
    }

    @Override
    public String state(int state, List<String> regimes) {
        return Hysteresis.inWords(state);
    }

    @Override
    public Map<String, Map<String, Double>> statedWeights() {
        Map<String, Map<String, Double>> stated = new LinkedHashMap<>();
        stated.put("/switch/in", in);
        stated.put("/switch/out", out);
        return stated;
    }

    @Override
    public List<Misfit> misfits(List<String> regimes, List<String> assets) {
        List<Misfit> misfits = new ArrayList<>();
        if (!regimes.contains(regime)) {
            misfits.add(Misfit.noRegime("/switch/regime", Misfit.At.VALUE, regime, regimes));
        }
        misfits.addAll(RuleKeys.unknownAssets(statedWeights(), assets));
        return misfits;
    }

    @Override
    public Mechanism mechanism(List<String> regimes, List<String> assets, Limits limits) {
        int index = regimes.indexOf(regime);
        Check.that(index >= 0, "no regime '" + regime + "'; known: " + regimes);
        return new Hysteresis(this, index, Weights.named(in, assets), Weights.named(out, assets));
    }
}
