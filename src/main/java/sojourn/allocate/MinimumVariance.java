package sojourn.allocate;

import java.util.List;
import java.util.OptionalDouble;
import sojourn.document.Field;
import sojourn.document.Shape;
import sojourn.document.Shapes;
import sojourn.numeric.Check;

/**
 * The weights w of named assets that add up to a stated sum with the least forecast variance w'Cov w within the limits; without
 * limits that bind, w = s Cov^-1 1 / (1'Cov^-1 1).
 *
 * @param among the assets, each once
 * @param invested what their weights add up to, above 0
 */
public record MinimumVariance(List<String> among, double invested, Manner manner) implements Choosing {
    /** The key under {@code allocate}. */
    static final String WORD = "minimum-variance";

    private static final double MOST = 10;

    private static final Field<Double> INVESTED = Field.defaulted(
            "invested",
            Shapes.number().above(0).atMost(MOST),
            "1",
            "what the weights add up to, a fraction of wealth; the rest is cash");

    /** Reads the map under {@code minimum-variance}. */
    public static final Shape<MinimumVariance> SHAPE = Shapes.object(
                    WORD,
                    f -> new MinimumVariance(f.get(AMONG), f.get(INVESTED), Manner.from(f)),
                    RuleKeys.and(AMONG, INVESTED))
            .refuse(rule -> rule.manner.idleProbability());

    /** Refuses a sum that is not positive. */
    public MinimumVariance {
        Check.above(invested, 0, "invested");
        among = List.copyOf(among);
    }

    @Override
    public String word() {
        return WORD;
    }

    /** The sum must be possible within the limits. */
    @Override
    public List<Misfit> misfits(Limits limits) {
        double most = Math.min(limits.gross(), among.size() * limits.high());
        return invested > most + Weights.SLACK
                ? List.of(new Misfit(
                        "/" + WORD + "/invested",
                        "weights that add up to " + Figure.written(invested) + " are beyond the limits: " + among.size()
                                + " assets can add up to " + Figure.written(most) + " at most",
                        "lower invested, name more assets, or raise the limits"))
                : List.of();
    }

    @Override
    public Mechanism mechanism(List<String> regimes, List<String> assets, Limits limits) {
        Optimum optimum = new Optimum(among, assets, limits, OptionalDouble.of(invested));
        return new Sized(this, List.copyOf(regimes), new Least(this, optimum, List.copyOf(assets)));
    }

    private record Least(MinimumVariance rule, Optimum optimum, List<String> assets) implements Sizer {
        @Override
        public Wish weights(Situation situation, double[] probabilities, Stance lived) {
            return optimum.of(rule.forecast(situation, probabilities), 1, new double[rule.among.size()]);
        }

        @Override
        public String sentence(Close close) {
            return "the least forecast variance with " + Figure.written(rule.invested) + " invested: " + mix(close)
                    + close.closeBefore()
                            .map(before -> "; the bar before " + mix(before))
                            .orElse("");
        }

        private String mix(Close close) {
            return Figure.weights(weights(close), assets, optimum.chosen());
        }
    }
}
