package sojourn.walk;

import java.util.OptionalDouble;
import sojourn.document.Shape;
import sojourn.market.Known;

/**
 * ln(close_t / close_{t-1}); none on the first bar and where its close is carried.
 *
 * @param asset the asset's name
 */
public record LogReturn(String asset) implements Observation {
    static final String WORD = "log-return";

    static final Shape<Observation> SHAPE = Observed.shape(
            WORD, LogReturn::new, "the asset whose log return is observed: ln(close / previous close), per bar");

    @Override
    public OptionalDouble at(Known known) {
        int t = known.bar();
        if (t == 0 || known.carried(asset, t)) {
            return OptionalDouble.empty();
        }
        int index = known.assets().indexOf(asset);
        return OptionalDouble.of(StrictMath.log(known.close(index, t) / known.close(index, t - 1)));
    }

    @Override
    public String word() {
        return WORD;
    }

    @Override
    public String column() {
        return "log_return_" + asset;
    }
}
