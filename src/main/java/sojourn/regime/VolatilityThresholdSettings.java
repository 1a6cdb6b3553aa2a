package sojourn.regime;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import sojourn.numeric.Check;
import sojourn.numeric.Quantile;

/**
 * A threshold on recent volatility. Its levels are quantiles of the volatilities of the fit's own window, one a row from the first
 * that has one, as {@link Quantile} has them. That is all there is to fit: the levels then stand until the next fit.
 *
 * @param volatility what is measured
 * @param stormAbove quantile, above 0 and below 1
 * @param calmBelow quantile, above 0 and at most {@code stormAbove}
 */
public record VolatilityThresholdSettings(RecentVolatility volatility, double stormAbove, double calmBelow)
        implements GaugeSettings {
    /** A quantile of fewer volatilities would hardly mean anything; common practice, no source. */
    private static final int LEAST_VOLATILITIES = 20;

    /** Volatilities whose relative differences are no larger differ by rounding only. */
    private static final double ROUNDING = 1e-9;

    /** Refuses quantiles out of order. */
    public VolatilityThresholdSettings {
        Check.that(
                calmBelow > 0 && calmBelow <= stormAbove && stormAbove < 1,
                "quantiles " + calmBelow + " and " + stormAbove);
    }

    @Override
    public int leastObservations() {
        return volatility.needs() - 1 + LEAST_VOLATILITIES;
    }

    @Override
    public Fit fit(FitRequest request, StartRunner runner) {
        Observations x = request.observations();
        Check.within(x.dimension(), 1, 1, "dimension of the observations");
        double[] ascending = volatilities(x);
        Arrays.sort(ascending);
        Optional<String> refusal = Fitter.nothingToDescribe(request).or(() -> refusal(x, ascending));
        if (refusal.isPresent()) {
            return Fit.failed(refusal.get(), Fit.Search.NONE, x.present());
        }
        VolatilityThreshold.Levels levels = new VolatilityThreshold.Levels(
                Quantile.ofAscending(ascending, stormAbove), Quantile.ofAscending(ascending, calmBelow));
        FitRequest judged = request.from(firstJudged(x));
        if (!PosteriorMoments.possible(judged)) {
            return Fit.failed("no row with a volatility holds the returns of all assets", Fit.Search.NONE, x.present());
        }
        RowWeights storms = storms(levels, x);
        VolatilityThreshold gauge = VolatilityThreshold.of(volatility, levels, storms.transitions());
        Described described = Described.of(gauge, storms, judged);
        return PlainFit.of(described, Fit.Search.CLOSED_FORM, 1, Optional.empty());
    }

    private Optional<String> refusal(Observations x, double[] ascending) {
        if (x.present() < leastObservations()) {
            return Optional.of("the window holds " + x.present()
                    + " observations; quantiles of this volatility need at least " + leastObservations());
        }
        double highest = ascending[ascending.length - 1];
        if (!Double.isFinite(highest)) {
            return Optional.of("the observations of the window are too large to square");
        }
        return highest - ascending[0] <= ROUNDING * highest
                ? Optional.of("the volatility is the same throughout the window")
                : Optional.empty();
    }

    /** The volatility at each observation that has one, in the order of the rows. */
    private double[] volatilities(Observations x) {
        List<Double> found = new ArrayList<>();
        RecentVolatility.SoFar soFar = volatility.start();
        for (int row = 0; row < x.size(); row++) {
            if (!x.missing(row)) {
                soFar = soFar.with(x.at(row, 0));
                OptionalDouble now = soFar.value();
                now.ifPresent(found::add);
            }
        }
        return found.stream().mapToDouble(Double::doubleValue).toArray();
    }

    /** The first row that has a volatility; those before it were in no regime that anybody could have told. */
    private int firstJudged(Observations x) {
        RecentVolatility.SoFar soFar = volatility.start();
        int row = 0;
        while (soFar.value().isEmpty()) {
            soFar = x.missing(row) ? soFar : soFar.with(x.at(row, 0));
            row++;
        }
        return row - 1;
    }

    /** The window's rows from the first that has a volatility, each in the regime that the filter was in. */
    private RowWeights storms(VolatilityThreshold.Levels levels, Observations x) {
        GaugeFilter filter = VolatilityThreshold.of(volatility, levels, new double[] {1, 0, 0, 1})
                .filter();
        int first = firstJudged(x);
        int[] path = new int[x.size() - first];
        for (int row = 0; row < x.size(); row++) {
            filter = filter.step(x, row);
            if (row >= first) {
                path[row - first] = filter.probability(1) == 1 ? 1 : 0;
            }
        }
        return RowWeights.path(2, path);
    }
}
