package sojourn.allocate;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import sojourn.document.Field;
import sojourn.document.Shape;
import sojourn.document.Shapes;
import sojourn.numeric.Check;

/**
 * The weights of the most likely regime (ties go to the one of lower volatility). A new most likely regime is taken over once it
 * has been the most likely for {@code confirm} closes running; the first one is taken at once.
 *
 * @param weights by regime, then asset; every regime must be there; the rest is cash
 */
public record Table(
        Map<String, Map<String, Double>> weights,
        ProbabilityKind probability,
        Optional<Smoothing> smooth,
        int confirm,
        double stepToward)
        implements Rule {
    /** The key under {@code allocate}. */
    static final String WORD = "table";

    private static final String POINTER = "/table/weights";

    private static final Field<Map<String, Map<String, Double>>> WEIGHTS = Field.required(
            "weights",
            RuleKeys.WEIGHTS_BY_REGIME,
            "for each regime, the fraction of wealth in each asset while it is the most likely; the rest is cash");

    /** Reads the map under {@code table}. */
    public static final Shape<Table> SHAPE = Shapes.object(
            WORD,
            f -> new Table(
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
    public Table {
        Check.within(confirm, 1, Integer.MAX_VALUE, "confirm");
        Check.within(stepToward, Double.MIN_VALUE, 1, "stepToward");
        weights = RuleKeys.ordered(weights);
    }

    /** Of probabilities as they are. */
    public Table(
            Map<String, Map<String, Double>> weights, ProbabilityKind probability, int confirm, double stepToward) {
        this(weights, probability, Optional.empty(), confirm, stepToward);
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
        return new Lookup(this, List.copyOf(regimes), RuleKeys.resolve(weights, regimes, assets));
    }

    /** The rule at work: a state is a regime. */
    private record Lookup(Table rule, List<String> regimes, List<Weights> byRegime) implements Mechanism {
        @Override
        public Stance live(double[] probabilities, Stance before) {
            return MostLikely.live(probabilities, rule.confirm, before);
        }

        @Override
        public Weights weights(Situation situation, double[] probabilities, int state, Stance lived) {
            return byRegime.get(state);
        }

        @Override
        public String sentence(Close close) {
            Stance lived = close.lived();
            int label = lived.candidate();
            String start = RuleKeys.prefix(rule) + regimes.get(label) + " " + Figure.of(close.probabilities()[label])
                    + " is the most likely regime";
            if (label != lived.lived()) {
                return start + " for " + lived.run() + " of " + rule.confirm + " closes, stays with "
                        + regimes.get(lived.lived());
            }
            boolean changes =
                    close.before().lived() != Stance.NONE && close.before().lived() != label;
            return changes
                    ? start + (rule.confirm == 1 ? "" : " for " + rule.confirm + " closes running") + earlier(close)
                    : start;
        }

        private String earlier(Close close) {
            return close.earlier()
                    .map(earlier -> {
                        int was = MostLikely.of(earlier);
                        String it = was == close.lived().candidate() ? "it was" : regimes.get(was) + " was, with";
                        return "; the bar before " + it + " " + Figure.of(earlier[was]);
                    })
                    .orElse("");
        }

        @Override
        public String name(int state) {
            return regimes.get(state);
        }
    }
}
