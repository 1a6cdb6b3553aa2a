package sojourn.walk;

import java.util.OptionalDouble;
import sojourn.document.Shape;
import sojourn.market.Known;

/**
 * close_t / close_{t-1} - 1; none on the first bar and where its close is carried.
 *
 * @param asset the asset's name
 */
public record SimpleReturn(String asset) implements Observation {
    static final String WORD = "simple-return";

    static final Shape<Observation> SHAPE = Observed.shape(
            WORD, SimpleReturn::new, "the asset whose simple return is observed: close / previous close - 1, per bar");

    @Override
    public OptionalDouble at(Known known) {
        int t = known.bar();
        if (t == 0 || known.carried(asset, t)) {
            return OptionalDouble.empty();
        }
        int index = known.assets().indexOf(asset);
        return OptionalDouble.of(known.close(index, t) / known.close(index, t - 1) - 1);
    }

    @Override
    public String word() {
        return WORD;
    }

    @Override
    public String column() {
        return "simple_return_" + asset;
    }
}
