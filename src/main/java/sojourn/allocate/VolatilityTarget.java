package sojourn.allocate;

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
 * As much of a mix m as keeps its forecast volatility at a stated level: w = min(c, v / sqrt(P m' Cov m)) m, with v the level per
 * year, P the bars of a year, Cov the forecast covariance of one bar's simple returns (spread between regimes' means included) and
 * c the cap. Or the same asset by asset: w_i = min(c, v / sqrt(P Cov_ii)) m_i. Without any variance the cap.
 *
 * @param together whether the mix is scaled as one or each asset by itself
 * @param mix weights by asset at a scale of 1
 * @param percentPerYear the level, above 0
 * @param atMost the largest scale, above 0
 */
public record VolatilityTarget(
        Together together, Map<String, Double> mix, double percentPerYear, double atMost, Manner manner)
        implements Sizing {
    /** The key under {@code allocate}. */
    static final String WORD = "volatility-target";

    private static final double MOST_PERCENT = 1_000;
    private static final double MOST_SCALE = 10;

    /** What is scaled. */
    public enum Together {
        /** The mix as one. */
        MIX("of"),
        /** Each asset by its own volatility. */
        EACH("each");

        private final String key;

        Together(String key) {
            this.key = key;
        }
    }

    private static final Field<Optional<Map<String, Double>>> OF = Field.maybe(
            "of",
            RuleKeys.WEIGHTS,
            "the mix that is scaled as one: weights by asset at a scale of 1, the rest is cash");
    private static final Field<Optional<Map<String, Double>>> EACH =
            Field.maybe("each", RuleKeys.WEIGHTS, "assets scaled each by its own volatility: weights at a scale of 1");
    private static final Field<Double> PERCENT_PER_YEAR = Field.required(
            "percent-per-year",
            Shapes.number().above(0).atMost(MOST_PERCENT),
            "the volatility aimed at, percent a year");
    private static final Field<Double> AT_MOST = Field.defaulted(
            "at-most",
            Shapes.number().above(0).atMost(MOST_SCALE),
            "1",
            "the largest scale, a fraction; above 1 is leverage");

    /** Reads the map under {@code volatility-target}. */
    public static final Shape<VolatilityTarget> SHAPE = Shapes.object(
                    WORD,
                    f -> new Written(f.get(OF), f.get(EACH), f.get(PERCENT_PER_YEAR), f.get(AT_MOST), Manner.from(f)),
                    RuleKeys.and(OF, EACH, PERCENT_PER_YEAR, AT_MOST))
            .refuse(Written::fault)
            .refuse(written -> written.manner.idleProbability())
            .as(Written::rule);

    /** Refuses numbers out of range. */
    public VolatilityTarget {
        Check.above(percentPerYear, 0, "percentPerYear");
        Check.above(atMost, 0, "atMost");
        mix = RuleKeys.ordered(mix);
    }

    private record Written(
            Optional<Map<String, Double>> of,
            Optional<Map<String, Double>> each,
            double percentPerYear,
            double atMost,
            Manner manner) {
        Optional<Refusal> fault() {
            if (of.isPresent() == each.isPresent()) {
                return Optional.of(new Refusal(
                        of.isPresent() ? "each" : "",
                        of.isPresent() ? "of and each at once" : "neither of nor each says what to hold",
                        "give exactly one of them: of scales a mix as one, each scales every asset by itself"));
            }
            return Optional.empty();
        }

        VolatilityTarget rule() {
            return new VolatilityTarget(
                    of.isPresent() ? Together.MIX : Together.EACH,
                    of.or(() -> each).orElseThrow(),
                    percentPerYear,
                    atMost,
                    manner);
        }
    }

    @Override
    public String word() {
        return WORD;
    }

    @Override
    public Map<String, Map<String, Double>> statedWeights() {
        return Map.of("/" + WORD + "/" + together.key, mix);
    }

    @Override
    public List<Misfit> misfits(List<String> regimes, List<String> assets) {
        return RuleKeys.unknownAssets(statedWeights(), assets);
    }

    /** A cap beyond the limits could never act. */
    @Override
    public List<Misfit> misfits(Limits limits) {
        String pointer = "/" + WORD + "/" + together.key;
        if (!limits.misfits(pointer, mix).isEmpty()) {
            return List.of();
        }
        return limits.misfits(pointer, scaled()).stream()
                .limit(1)
                .map(beyond -> new Misfit(
                        "/" + WORD + "/at-most",
                        "at-most " + Figure.written(atMost) + " lets weights beyond limits: " + beyond.what(),
                        "lower at-most, or raise the limits if leverage is meant"))
                .toList();
    }

    private Map<String, Double> scaled() {
        Map<String, Double> scaled = new LinkedHashMap<>();
        mix.forEach((asset, weight) -> scaled.put(asset, atMost * weight));
        return scaled;
    }

    @Override
    public Mechanism mechanism(List<String> regimes, List<String> assets, Limits limits) {
        return new Sized(this, List.copyOf(regimes), new VolatilityScale(this, List.copyOf(assets)));
    }
}
