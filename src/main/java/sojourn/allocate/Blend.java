package sojourn.allocate;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import sojourn.document.Field;
import sojourn.document.Shape;
import sojourn.document.Shapes;
import sojourn.numeric.Check;

/**
 * The weights of all regimes averaged by their probabilities: w = sum_k p_k W_k. With {@code confirm} above 1 the target moves
 * only at decisions where the same regime has been the most likely for that many closes running; until then the last one stands.
 *
 * @param weights by regime, then asset; every regime must be there; the rest is cash
 */
public record Blend(
        Map<String, Map<String, Double>> weights,
        ProbabilityKind probability,
        Optional<Smoothing> smooth,
        int confirm,
        double stepToward)
        implements Rule {
    /** The key under {@code allocate}. */
    static final String WORD = "blend";

    private static final String POINTER = "/blend/weights";

    private static final Field<Map<String, Map<String, Double>>> WEIGHTS = Field.required(
            "weights",
            RuleKeys.WEIGHTS_BY_REGIME,
            "for each regime, the fraction of wealth in each asset, averaged by probability; the rest is cash");

    /** Reads the map under {@code blend}. */
    public static final Shape<Blend> SHAPE = Shapes.object(
            WORD,
            f -> new Blend(
                    f.get(WEIGHTS),
                    f.get(RuleKeys.PROBABILITY),
                    f.get(RuleKeys.SMOOTH),
                    f.get(RuleKeys.CONFIRM),
                    f.get(RuleKeys.STEP_TOWARD)),
            WEIGHTS,
            RuleKeys.PROBABILITY,
            RuleKeys.SMOOTH,
            RuleKeys.CONFIRM,
            RuleKeys.STEP_TOWARD);

    /** Refuses numbers out of range. */
    public Blend {
        Check.within(confirm, 1, Integer.MAX_VALUE, "confirm");
        Check.within(stepToward, Double.MIN_VALUE, 1, "stepToward");
        weights = RuleKeys.ordered(weights);
    }

    /** Of probabilities as they are. */
    public Blend(
            Map<String, Map<String, Double>> weights, ProbabilityKind probability, int confirm, double stepToward) {
        this(weights, probability, Optional.empty(), confirm, stepToward);
    }

    @Override
    public String word() {
        return WORD;
    }

    @Override
    public Motion motion() {
        return Motion.CONTINUOUS;
    }

    @Override
    public Map<String, Map<String, Double>> statedWeights() {
        return RuleKeys.stated(POINTER, weights);
    }

    @Override
    public List<Misfit> misfits(List<String> regimes, List<String> assets) {
        List<Misfit> misfits = new ArrayList<>(RuleKeys.regimesOf(POINTER, weights, regimes));
        misfits.addAll(RuleKeys.unknownAssets(statedWeights(), assets));
        return misfits;
    }

    @Override
    public Mechanism mechanism(List<String> regimes, List<String> assets, Limits limits) {
        return new Average(this, List.copyOf(regimes), RuleKeys.resolve(weights, regimes, assets), assets.size());
    }

    /** The rule at work: it has one state only. */
    private record Average(Blend rule, List<String> regimes, List<Weights> byRegime, int assets) implements Mechanism {
        private static final int ONLY_STATE = 0;

        @Override
        public Stance live(double[] probabilities, Stance before) {
            Stance most = MostLikely.live(probabilities, rule.confirm, before);
            return before.living(ONLY_STATE, most.candidate(), most.run());
        }

        @Override
        public Weights weights(Situation situation, double[] probabilities, int state, Stance lived) {
            if (lived.run() < rule.confirm && lived.wanted().isPresent()) {
                return lived.wanted().get();
            }
            double[] average = new double[assets];
            for (int k = 0; k < probabilities.length; k++) {
                Weights one = byRegime.get(k);
                for (int i = 0; i < assets; i++) {
                    average[i] += probabilities[k] * one.at(i);
                }
            }
            return Weights.of(average);
        }

        @Override
        public String sentence(Close close) {
            Stance lived = close.lived();
            if (lived.run() < rule.confirm && !lived.undecided()) {
                return regimes.get(lived.candidate()) + " is the most likely regime for " + lived.run() + " of "
                        + rule.confirm + " closes, the last target stands";
            }
            return "weights averaged by " + RuleKeys.prefix(rule) + shares(close.probabilities())
                    + close.earlier()
                            .map(earlier -> "; the bar before by " + shares(earlier))
                            .orElse("");
        }

        private String shares(double[] probabilities) {
            String[] parts = new String[regimes.size()];
            Arrays.setAll(parts, k -> regimes.get(k) + " " + Figure.of(probabilities[k]));
            return String.join(", ", parts);
        }

        @Override
        public String name(int state) {
            return WORD;
        }
    }
}
