package sojourn.walk;

import java.util.List;
import java.util.OptionalDouble;
import sojourn.document.Shape;
import sojourn.market.Known;

/**
 * ln sqrt((ln(high / low))^2 / (4 ln 2)): the logarithm of the volatility of one bar as its range gives it, per bar, not
 * annualised; gaps between bars are not seen (Parkinson 1980, Journal of Business 53, 61-65). The logarithm of the range is close
 * to normal where returns are (Alizadeh, Brandt and Diebold 2002, Journal of Finance 57, 1047-1091).
 *
 * <p>None where high or low is missing, and none where the high is not above the low: the logarithm has no value there, such a bar
 * is one of hardly any trading rather than of no risk, and any floor put in its place would be a made-up outlier far from
 * the rest of the sample, of a size that somebody chose.
 *
 * @param asset the asset's name
 */
public record LogParkinsonVolatility(String asset) implements Observation {
    static final String WORD = "log-parkinson-volatility";

    static final Shape<Observation> SHAPE = Observed.shape(
            WORD,
            LogParkinsonVolatility::new,
            "the asset whose range is observed: ln(ln(high / low) / sqrt(4 ln 2)), per bar; needs highs and lows");

    private static final double FOUR_LN_2 = 2.772588722239781;

    @Override
    public OptionalDouble at(Known known) {
        int t = known.bar();
        int index = known.assets().indexOf(asset);
        OptionalDouble high = known.high(index, t);
        OptionalDouble low = known.low(index, t);
        if (high.isEmpty() || low.isEmpty()) {
            return OptionalDouble.empty();
        }
        double range = StrictMath.log(high.getAsDouble() / low.getAsDouble());
        double variance = range * range / FOUR_LN_2;
        return range > 0 && variance > 0 ? OptionalDouble.of(0.5 * StrictMath.log(variance)) : OptionalDouble.empty();
    }

    @Override
    public String word() {
        return WORD;
    }

    @Override
    public String column() {
        return "log_parkinson_volatility_" + asset;
    }

    @Override
    public List<BarColumn> reads() {
        return List.of(BarColumn.HIGH, BarColumn.LOW);
    }

    @Override
    public boolean aroundZero() {
        return false;
    }
}
