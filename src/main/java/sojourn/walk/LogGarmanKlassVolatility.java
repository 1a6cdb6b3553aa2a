package sojourn.walk;

import java.util.List;
import java.util.OptionalDouble;
import sojourn.document.Shape;
import sojourn.market.Known;

/**
 * ln sqrt(v), where v = (ln(high / low))^2 / 2 - (2 ln 2 - 1) (ln(close / open))^2: the logarithm of the volatility of one bar as
 * its four prices give it, per bar, not annualised; gaps between bars are not seen (Garman and Klass 1980, Journal of Business 53,
 * 67-78, their "practical" estimator).
 *
 * <p>None where a price is missing, where the high is not above the low (see {@link LogParkinsonVolatility}), and where v is not
 * above 0, which takes an open or close outside low to high.
 *
 * @param asset the asset's name
 */
public record LogGarmanKlassVolatility(String asset) implements Observation {
    static final String WORD = "log-garman-klass-volatility";

    static final Shape<Observation> SHAPE = Observed.shape(
            WORD,
            LogGarmanKlassVolatility::new,
            "the asset whose range is observed: ln sqrt((ln(high / low))^2 / 2 - (2 ln 2 - 1) (ln(close / open))^2),"
                    + " per bar; needs opens, highs and lows");

    private static final double TWO_LN_2_LESS_1 = 0.38629436111989063;

    @Override
    public OptionalDouble at(Known known) {
        int t = known.bar();
        int index = known.assets().indexOf(asset);
        OptionalDouble open = known.open(index, t);
        OptionalDouble high = known.high(index, t);
        OptionalDouble low = known.low(index, t);
        if (open.isEmpty() || high.isEmpty() || low.isEmpty()) {
            return OptionalDouble.empty();
        }
        double range = StrictMath.log(high.getAsDouble() / low.getAsDouble());
        double move = StrictMath.log(known.close(index, t) / open.getAsDouble());
        double variance = 0.5 * range * range - TWO_LN_2_LESS_1 * move * move;
        return range > 0 && variance > 0 ? OptionalDouble.of(0.5 * StrictMath.log(variance)) : OptionalDouble.empty();
    }

    @Override
    public String word() {
        return WORD;
    }

    @Override
    public String column() {
        return "log_garman_klass_volatility_" + asset;
    }

    @Override
    public List<BarColumn> reads() {
        return List.of(BarColumn.OPEN, BarColumn.HIGH, BarColumn.LOW);
    }

    @Override
    public boolean aroundZero() {
        return false;
    }
}
