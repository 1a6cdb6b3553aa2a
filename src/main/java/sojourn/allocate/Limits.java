package sojourn.allocate;

import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import sojourn.document.Field;
import sojourn.document.Quoted;
import sojourn.document.Refusal;
import sojourn.document.Shape;
import sojourn.document.Shapes;
import sojourn.numeric.Check;

/**
 * What a target may be: each weight in [{@code low}, {@code high}], the sum of the absolute weights at most {@code gross}. Weights
 * are clipped one by one, then all are scaled by gross / sum|w| if that is exceeded; scaling cannot break a clip because the
 * range holds 0. Limits bind targets, not drift.
 *
 * @param gross above 0; above 1 is leverage
 * @param low at most 0; below 0 allows shorts
 * @param high at least 0
 */
public record Limits(double gross, double low, double high) {
    private static final double MOST_GROSS = 10;

    private static final Field<Double> GROSS = Field.defaulted(
            "gross",
            Shapes.number().above(0).atMost(MOST_GROSS),
            "1",
            "the most that the absolute weights may add up to, a fraction of wealth; above 1 is leverage");
    private static final Field<List<Double>> PER_ASSET = Field.defaulted(
            "per-asset",
            Shapes.list(Shapes.number().atLeast(-MOST_GROSS).atMost(MOST_GROSS), 2, 2),
            "[0, 1]",
            "the lowest and the highest weight of any one asset, fractions of wealth; below 0 is short");

    /** Reads the section {@code limits}. */
    public static final Shape<Limits> SHAPE = Shapes.object(
                    "limits", f -> Limits.range(f.get(GROSS), f.get(PER_ASSET)), GROSS, PER_ASSET)
            .refuse(Range::fault)
            .as(Range::limits);

    /** Refuses a gross limit that is not positive and a range that does not hold 0. */
    public Limits {
        Check.above(gross, 0, "gross");
        Check.within(low, -Double.MAX_VALUE, 0, "low");
        Check.within(high, 0, Double.MAX_VALUE, "high");
    }

    /** Long only, no leverage: gross 1, each weight in [0, 1]. */
    public static Limits longOnly() {
        return new Limits(1, 0, 1);
    }

    /** The nearest weights allowed: clipped, then scaled. Weights within the limits come back as they are. */
    public Weights bind(Weights wanted) {
        if (allows(wanted)) {
            return wanted;
        }
        double[] bound = new double[wanted.size()];
        double sum = 0;
        for (int i = 0; i < bound.length; i++) {
            bound[i] = Math.max(low, Math.min(high, wanted.at(i)));
            sum += Math.abs(bound[i]);
        }
        if (sum > gross + Weights.SLACK) {
            double scale = gross / sum;
            for (int i = 0; i < bound.length; i++) {
                bound[i] *= scale;
            }
        }
        return Weights.of(bound);
    }

    private boolean allows(Weights wanted) {
        for (int i = 0; i < wanted.size(); i++) {
            if (wanted.at(i) < low || wanted.at(i) > high) {
                return false;
            }
        }
        return wanted.gross() <= gross + Weights.SLACK;
    }

    /** Stated weights beyond the limits; pointers from {@code allocate}. A strategy says what it means, so they are refused. */
    public List<Misfit> misfits(Rule rule) {
        List<Misfit> misfits = new ArrayList<>();
        rule.statedWeights().forEach((pointer, weights) -> misfits.addAll(misfits(pointer, weights)));
        misfits.addAll(rule.misfits(this));
        return misfits;
    }

    /** The same for one set of weights at {@code pointer}. */
    public List<Misfit> misfits(String pointer, Map<String, Double> weights) {
        List<Misfit> misfits = new ArrayList<>();
        BigDecimal sum = BigDecimal.ZERO; // of the decimals as written, so that 0.7 and 0.4 make 1.1
        for (Map.Entry<String, Double> one : weights.entrySet()) {
            double weight = one.getValue();
            sum = sum.add(BigDecimal.valueOf(Math.abs(weight)));
            if (weight < low || weight > high) {
                misfits.add(new Misfit(
                        RuleKeys.child(pointer, one.getKey()),
                        "the weight " + Figure.written(weight) + " of " + Quoted.of(one.getKey())
                                + " lies outside limits, per-asset " + range(low, high),
                        "change the weight, or the limits if " + (weight < 0 ? "shorts" : "weights like this")
                                + " are meant"));
            }
        }
        if (sum.doubleValue() > gross + Weights.SLACK) {
            misfits.add(new Misfit(
                    pointer,
                    "absolute weights add up to " + Figure.written(sum.doubleValue()) + ", more than limits, gross "
                            + Figure.written(gross),
                    "lower the weights, or raise gross if leverage is meant"));
        }
        return misfits;
    }

    private static String range(double low, double high) {
        return "[" + Figure.written(low) + ", " + Figure.written(high) + "]";
    }

    private static Range range(double gross, List<Double> perAsset) {
        return new Range(gross, perAsset.get(0), perAsset.get(1));
    }

    /** Limits as written, not yet known to make sense. */
    private record Range(double gross, double low, double high) {
        Optional<Refusal> fault() {
            return low > 0 || high < 0
                    ? Optional.of(new Refusal(
                            "per-asset",
                            "per-asset " + range(low, high) + " does not hold 0",
                            "write the lowest weight first, at most 0, then the highest, at least 0"))
                    : Optional.empty();
        }

        Limits limits() {
            return new Limits(gross, low, high);
        }
    }
}
