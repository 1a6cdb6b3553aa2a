package sojourn.allocate;

import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import sojourn.document.Field;
import sojourn.document.Refusal;
import sojourn.document.Shape;
import sojourn.document.Shapes;
import sojourn.numeric.Check;
import sojourn.walk.Forecast;
import sojourn.walk.Reading;

/**
 * The weights w of named assets that maximise e'w - g w'Cov w / 2 within the limits: e the forecast simple return of the first
 * whole bar held less what cash is expected to earn on a bar, Cov its forecast covariance, g the aversion to risk; without limits
 * that bind, w = Cov^-1 e / g. A fraction f of what maximises expected growth, to second order, is g = 1/f (Kelly 1956, Bell
 * System Technical Journal 35; Merton 1969, Review of Economics and Statistics 51). Regimes' means are poorly estimated, so they
 * may be shrunk towards the window's overall mean.
 *
 * @param among the assets, each once
 * @param risk how risk is weighed
 * @param shrinkMeans the part of the way from regimes' means to the overall mean, in [0, 1]
 */
public record MeanVariance(List<String> among, Risk risk, double shrinkMeans, Manner manner) implements Choosing {
    /** The key under {@code allocate}. */
    static final String WORD = "mean-variance";

    private static final double MOST_AVERSION = 10_000;

    /** How risk is weighed against return. */
    public sealed interface Risk {
        /** The factor g of the variance. */
        double aversion();
    }

    /** By a stated aversion, above 0. */
    public record Aversion(double aversion) implements Risk {}

    /** By a fraction of the weights that maximise growth, above 0. */
    public record GrowthFraction(double fraction) implements Risk {
        @Override
        public double aversion() {
            return 1 / fraction;
        }
    }

    private static final Field<Optional<Double>> RISK_AVERSION = Field.maybe(
            "risk-aversion",
            Shapes.number().above(0).atMost(MOST_AVERSION),
            "how many times half the variance is taken off the expected return");
    private static final Field<Optional<Double>> KELLY_FRACTION = Field.maybe(
            "kelly-fraction",
            Shapes.number().above(0).atMost(1),
            "in place of risk-aversion, its inverse: the fraction of the weights that maximise expected growth");
    private static final Field<Double> SHRINK_MEANS = Field.defaulted(
            "shrink-means",
            Shapes.number().atLeast(0).atMost(1),
            "0",
            "how far regimes' mean returns are moved to the mean of the whole window: 0 not at all, 1 all the way");

    /** Reads the map under {@code mean-variance}. */
    public static final Shape<MeanVariance> SHAPE = Shapes.object(
                    WORD,
                    f -> new Written(
                            f.get(AMONG),
                            f.get(RISK_AVERSION),
                            f.get(KELLY_FRACTION),
                            f.get(SHRINK_MEANS),
                            Manner.from(f)),
                    RuleKeys.and(AMONG, RISK_AVERSION, KELLY_FRACTION, SHRINK_MEANS))
            .refuse(Written::fault)
            .refuse(written -> written.manner.idleProbability())
            .as(Written::rule);

    /** Refuses numbers out of range. */
    public MeanVariance {
        Check.above(risk.aversion(), 0, "aversion");
        Check.within(shrinkMeans, 0, 1, "shrinkMeans");
        among = List.copyOf(among);
    }

    private record Written(
            List<String> among, Optional<Double> aversion, Optional<Double> kelly, double shrinkMeans, Manner manner) {
        Optional<Refusal> fault() {
            return aversion.isPresent() == kelly.isPresent()
                    ? Optional.of(new Refusal(
                            aversion.isPresent() ? "kelly-fraction" : "",
                            aversion.isPresent()
                                    ? "risk-aversion and kelly-fraction at once"
                                    : "neither risk-aversion nor kelly-fraction says how risk is weighed",
                            "give exactly one of them; kelly-fraction f is risk-aversion 1/f"))
                    : Optional.empty();
        }

        MeanVariance rule() {
            Risk risk = aversion.<Risk>map(Aversion::new).orElseGet(() -> new GrowthFraction(kelly.orElseThrow()));
            return new MeanVariance(among, risk, shrinkMeans, manner);
        }
    }

    @Override
    public String word() {
        return WORD;
    }

    /** With the means of regimes shrunk. */
    @Override
    public Forecast forecast(Reading reading, int barsAhead, double[] probabilities) {
        Reading taken = shrinkMeans == 0 ? reading : reading.shrinkingMeans(shrinkMeans);
        return Choosing.super.forecast(taken, barsAhead, probabilities);
    }

    @Override
    public Mechanism mechanism(List<String> regimes, List<String> assets, Limits limits) {
        Optimum optimum = new Optimum(among, assets, limits, OptionalDouble.empty());
        return new Sized(this, List.copyOf(regimes), new BestTrade(this, optimum, List.copyOf(assets)));
    }
}
